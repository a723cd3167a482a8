import { boilerExport, type BoilerInForce } from '../header/capacity';
import type { Interval } from '../time/interval';
import { combineSteps } from '../time/stepMath';

/** Stands for "nothing is exported, so nothing can be lost". */
const NONE = -1;

/**
 * The boilers of a header with, at each moment, the one that exports most taken out; of equals the first in the list.
 * What is left carries the week when any one of them fails.
 */
export function withoutLargest(boilers: readonly BoilerInForce[]): BoilerInForce[] {
  const largest = combineSteps(boilers.map(boilerExport), (kgPerH) => {
    const most = Math.max(...kgPerH);
    return most > 0 ? kgPerH.indexOf(most) : NONE;
  });
  return boilers.map((boiler, i) => {
    const out = largest.flatMap(({ from, value }, at): Interval[] => {
      return value === i ? [{ from, to: largest[at + 1]?.from ?? Infinity }] : [];
    });
    return { ...boiler, outages: [...boiler.outages, ...out] };
  });
}
