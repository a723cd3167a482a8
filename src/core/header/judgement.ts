import type { Header, HeaderCapacity, PlantRules } from '../plant/plant';
import { toMinutes, type StepFunction } from '../time/stepFunction';
import { overLimit, type OverSummary } from './over';
import { leastSpare, loadFactor, loadKg, peakLoad, type LoadFactor, type RateAt } from './spare';
import { steepSteps, type SteepStep } from './steps';

/** A header over the week: load against limit. Arrays are per minute [kg/h] and to be read only. */
export interface HeaderJudgement {
  readonly headerId: string;
  readonly loadKgPerH: Float64Array;
  /** null: not judged. */
  readonly limitKgPerH: Float64Array | null;
  /** null: not judged. */
  readonly over: OverSummary | null;
  /** Load over what the letdown that feeds the header can pass; null where boilers feed it. */
  readonly letdown: OverSummary | null;
  readonly steps: readonly SteepStep[];
  readonly peak: RateAt;
  readonly leastSpare: RateAt | null;
  readonly loadFactor: LoadFactor;
  readonly steamKg: number;
}

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

/** Judges a load per minute [kg/h] against a header's capacity; without one, or without a limit, it is not judged. */
export function judgeHeader(
  header: Header,
  capacity: HeaderCapacity | undefined,
  load: Float64Array,
  rules: PlantRules,
): HeaderJudgement {
  const minutes = capacity && capacityMinutes(capacity, load.length);
  const limit = minutes?.limitKgPerH ?? null;
  return {
    headerId: header.id,
    loadKgPerH: load,
    limitKgPerH: limit,
    over: limit && overLimit(load, limit, minutes?.storedKgPerBar ?? null),
    letdown: letdownOver(header, load),
    steps: minutes ? steps(load, minutes, rules) : [],
    peak: peakLoad(load),
    leastSpare: limit && leastSpare(load, limit),
    loadFactor: loadFactor(load, limit),
    steamKg: loadKg(load),
  };
}

function letdownOver(header: Header, load: Float64Array): OverSummary | null {
  if (header.feed.kind !== 'letdown') return null;
  return overLimit(load, new Float64Array(load.length).fill(header.feed.greatestKgPerH), null);
}

function steps(load: Float64Array, minutes: CapacityMinutes, rules: PlantRules): SteepStep[] {
  const { exportKgPerH, greatestRiseKgPerHPerMin, storedKgPerBar } = minutes;
  if (!greatestRiseKgPerHPerMin || !storedKgPerBar) return [];
  return steepSteps(load, { exportKgPerH, greatestRiseKgPerHPerMin, storedKgPerBar }, rules.sagToleranceBar);
}
