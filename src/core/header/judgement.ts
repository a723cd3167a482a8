import type { Header, HeaderCapacity, PlantRules } from '../plant/plant';
import { capacityMinutes, type CapacityMinutes } from './capacityMinutes';
import type { Carried } from './carry';
import { belowLeast, type LowFlow } from './lowFlow';
import { overLimit, type OverSummary } from './over';
import type { HeaderFlows } from './settle';
import { leastSpare, loadFactor, loadKg, peakLoad, type LoadFactor, type RateAt } from './spare';
import { steepSteps, type SteepStep } from './steps';

/** A header over the week: load against limit. Arrays are per minute [kg/h] and to be read only. */
export interface HeaderJudgement {
  readonly headerId: string;
  /** What the header's own feed must bring, after flash steam and accumulators: what is judged. */
  readonly loadKgPerH: Float64Array;
  /** What users, base load and lower headers take by mass alone: load + flash + discharge − charge. */
  readonly drawnKgPerH: Float64Array;
  /** Flash steam credited here and below; null: none. */
  readonly flashKgPerH: Float64Array | null;
  /** What accumulators carry here and below; null: none works on this header. */
  readonly carried: Carried | null;
  /** null: not judged. */
  readonly limitKgPerH: Float64Array | null;
  /** null: not judged. */
  readonly over: OverSummary | null;
  /** Load over what the letdown that feeds the header can pass; null where boilers feed it. */
  readonly letdown: OverSummary | null;
  /** Spans in which the letdown passes less than it can hold the pressure with: a note, not a breach. */
  readonly letdownLow: readonly LowFlow[];
  readonly steps: readonly SteepStep[];
  readonly peak: RateAt;
  readonly leastSpare: RateAt | null;
  readonly loadFactor: LoadFactor;
  readonly steamKg: number;
}

/**
 * Judges a load per minute [kg/h] against a header's capacity; without one, or without a limit, it is not judged. `beside`
 * says what of the draw the header's own feed need not bring; left out: it brings all.
 */
export function judgeHeader(
  header: Header,
  capacity: HeaderCapacity | undefined,
  load: Float64Array,
  rules: PlantRules,
  beside: Omit<HeaderFlows, 'loadKgPerH'> = { drawnKgPerH: load, flashKgPerH: null, carried: null },
): HeaderJudgement {
  const minutes = capacity && capacityMinutes(capacity, load.length);
  const limit = minutes?.limitKgPerH ?? null;
  return {
    headerId: header.id,
    loadKgPerH: load,
    ...beside,
    limitKgPerH: limit,
    over: limit && overLimit(load, limit, minutes?.storedKgPerBar ?? null),
    letdown: letdownOver(header, load),
    letdownLow: belowLeast(header, load),
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
