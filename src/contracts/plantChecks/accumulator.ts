import { shortNumber } from '../../core/quantity/range';
import { inUse, type CheckContext, type Fault, type Given } from './context';

interface End {
  readonly name: string;
  readonly pressureBarG: number;
}

const bar = (value: number): string => `${shortNumber(value)} bar g`;

function missing(accumulator: Given<'accumulators'>, { library }: CheckContext): Fault[] {
  return (['chargedFromHeaderId', 'feedsHeaderId'] as const).flatMap((path) => {
    const id = accumulator[path];
    if (id === undefined || inUse(library, 'headers', id)) return [];
    return [{ path, message: 'There is no such header in use.' }];
  });
}

function ends(from: End | undefined, to: End | undefined): Fault[] {
  if (!from || !to || to.pressureBarG < from.pressureBarG) return [];
  const pressures = `${to.name} has ${bar(to.pressureBarG)}, ${from.name} ${bar(from.pressureBarG)}`;
  return [{ path: 'feedsHeaderId', message: `It is charged from a higher header than it feeds: ${pressures}.` }];
}

function pressures({ highBarG: high, lowBarG: low }: Given<'accumulators'>, from?: End, to?: End): Fault[] {
  const faults: Fault[] = [];
  const add = (path: string, message: string): void => void faults.push({ path, message });
  if (high !== undefined && from && high > from.pressureBarG) {
    add('highBarG', `Charged up to ${bar(high)}; it must be at most ${bar(from.pressureBarG)} (${from.name}).`);
  }
  if (low !== undefined && high !== undefined && low >= high) {
    add('lowBarG', `Discharged down to ${bar(low)}; it must be below ${bar(high)} (charged up to).`);
  } else if (low !== undefined && to && low < to.pressureBarG) {
    add('lowBarG', `Discharged down to ${bar(low)}; it must be at least ${bar(to.pressureBarG)} (${to.name}).`);
  }
  return faults;
}

/** Everything about an accumulator that its ranges don't say. */
export function accumulatorFaults(accumulator: Given<'accumulators'>, context: CheckContext): Fault[] {
  const from = inUse(context.library, 'headers', accumulator.chargedFromHeaderId)?.values;
  const to = inUse(context.library, 'headers', accumulator.feedsHeaderId)?.values;
  return [...missing(accumulator, context), ...ends(from, to), ...pressures(accumulator, from, to)];
}
