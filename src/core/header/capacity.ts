import type { HeaderCapacity } from '../plant/plant';
import type { Interval } from '../time/interval';
import { subtractIntervals } from '../time/spans';
import { combineSteps, leastSteps, mapSteps, stepsFromSpans, sumSteps, type ValuedSpan } from '../time/stepMath';
import type { Step, StepFunction } from '../time/stepFunction';

/** Stands for "no limit known here" in a header that is judged elsewhere in the week; JSON has no infinity. [kg/h] */
export const NOT_JUDGED_KG_PER_H = 1e12;

/** A boiler over the week, as far as the header is concerned. */
export interface BoilerInForce {
  readonly id: string;
  /** Net export at header conditions when lit and not derated. [kg/h] */
  readonly exportKgPerH: number;
  /** Greatest rise per minute as a fraction of its export, 0 to 1. [1/min] */
  readonly greatestRisePerMin: number;
  /** null: not known. [t] */
  readonly waterTonnes: number | null;
  /** Steam that a tonne of its water gives up per bar of falling pressure; null: not known. [kg/(bar t)] */
  readonly storedKgPerBarAndTonne: number | null;
  /** Ready to export. */
  readonly lit: readonly Interval[];
  readonly outages: readonly Interval[];
  /** `value` is the fraction of the export that is left, 0 to 1; where spans overlap, the least. */
  readonly deratings: readonly ValuedSpan[];
}

/** What a header's capacity is built from. */
export interface HeaderCapacityInput {
  readonly headerId: string;
  /** Empty: the boilers are not known, and only set limits judge. */
  readonly boilers: readonly BoilerInForce[];
  /** Part of the export kept back, 0 to 1. */
  readonly reserveFraction: number;
  /** Limits that the utilities lead has set; where spans overlap, the later in the list holds. [kg/h] */
  readonly setLimits: readonly ValuedSpan[];
  readonly baseLoadKgPerH: StepFunction;
}

/**
 * Export, limit, rise and stored steam of a header over the week. The limit is the export less the reserve, or the set
 * limit where that is lower. Without boilers and without set limits it is null: not judged.
 */
export function buildHeaderCapacity(input: HeaderCapacityInput): HeaderCapacity {
  const known = input.boilers.length > 0;
  const exports = input.boilers.map(boilerExport);
  const exportKgPerH = known ? sumSteps(exports) : null;
  return {
    headerId: input.headerId,
    exportKgPerH,
    limitKgPerH: limit(exportKgPerH, input),
    baseLoadKgPerH: input.baseLoadKgPerH,
    greatestRiseKgPerHPerMin: known
      ? sumSteps(exports.map((fn, i) => mapSteps(fn, (kgPerH) => kgPerH * (input.boilers[i]?.greatestRisePerMin ?? 0))))
      : null,
    storedKgPerBar: storedKgPerBar(input.boilers),
  };
}

/** What a boiler can export over the week. [kg/h] */
export function boilerExport(boiler: BoilerInForce): Step[] {
  const inFire = litSteps(boiler);
  const left = boiler.deratings.map((span) => stepsFromSpans([span], 1));
  return mapSteps(combineSteps([inFire, leastSteps([[{ from: 0, value: 1 }], ...left])], product), (part) => {
    return part * boiler.exportKgPerH;
  });
}

function litSteps(boiler: BoilerInForce): Step[] {
  const spans = subtractIntervals(boiler.lit, boiler.outages);
  return stepsFromSpans(
    spans.map((span) => ({ ...span, value: 1 })),
    0,
  );
}

function limit(exportKgPerH: StepFunction | null, input: HeaderCapacityInput): Step[] | null {
  const kept = exportKgPerH && mapSteps(exportKgPerH, (kgPerH) => kgPerH * (1 - input.reserveFraction));
  if (input.setLimits.length === 0) return kept;
  const set = stepsFromSpans(input.setLimits, NOT_JUDGED_KG_PER_H);
  return kept ? leastSteps([kept, set]) : set;
}

function storedKgPerBar(boilers: readonly BoilerInForce[]): Step[] | null {
  const stored: Step[][] = [];
  for (const boiler of boilers) {
    const { waterTonnes, storedKgPerBarAndTonne } = boiler;
    if (waterTonnes === null || storedKgPerBarAndTonne === null) return null;
    stored.push(mapSteps(litSteps(boiler), (lit) => lit * waterTonnes * storedKgPerBarAndTonne));
  }
  return boilers.length === 0 ? null : sumSteps(stored);
}

function product(values: readonly number[]): number {
  return values.reduce((result, value) => result * value, 1);
}
