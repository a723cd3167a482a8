import type { HeaderCapacity } from '../plant/plant';
import { toMinutes, type StepFunction } from '../time/stepFunction';

/** A header's capacity per minute. */
export interface CapacityMinutes {
  readonly horizonMin: number;
  readonly limitKgPerH: Float64Array | null;
  readonly exportKgPerH: Float64Array | null;
  readonly greatestRiseKgPerHPerMin: Float64Array | null;
  readonly storedKgPerBar: Float64Array | null;
}

const minutesByCapacity = new WeakMap<HeaderCapacity, CapacityMinutes>();

/** A header's capacity per minute, worked out once for each capacity value. */
export function capacityMinutes(capacity: HeaderCapacity, horizonMin: number): CapacityMinutes {
  const cached = minutesByCapacity.get(capacity);
  if (cached?.horizonMin === horizonMin) return cached;
  const spread = (fn: StepFunction | null) => (fn === null ? null : toMinutes(fn, horizonMin));
  const minutes = {
    horizonMin,
    limitKgPerH: spread(capacity.limitKgPerH),
    exportKgPerH: spread(capacity.exportKgPerH),
    greatestRiseKgPerHPerMin: spread(capacity.greatestRiseKgPerHPerMin),
    storedKgPerBar: spread(capacity.storedKgPerBar),
  };
  minutesByCapacity.set(capacity, minutes);
  return minutes;
}
