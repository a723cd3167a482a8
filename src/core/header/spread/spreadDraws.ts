import { addableKgPerH, placedPhases } from '../../demand/activityLoad';
import type { Activity } from '../../plant/activity';
import { capacityMinutes } from '../capacityMinutes';
import { loadOf, type LoadSource } from '../loadCurve';
import type { StartSpread } from './startSpread';

/** The spread of starts by unit id; a unit without one starts on time. */
export type UnitSpreads = ReadonlyMap<string, StartSpread>;

/** A constant draw on the header as planned. [min, kg/h] */
export interface PlannedDraw {
  readonly from: number;
  readonly to: number;
  readonly kgPerH: number;
}

/** An activity that draws on the header. */
export interface SpreadDraw {
  readonly activity: Activity;
  /** Draws of one key are early or late together; draws of different keys are independent. */
  readonly key: string;
  readonly spread: StartSpread;
  readonly draws: readonly PlannedDraw[];
}

/** A header that draws are spread on, per minute. */
export interface SpreadHeader {
  readonly horizonMin: number;
  /** Base load, what lower headers pass on included. [kg/h] */
  readonly baseKgPerH: Float64Array;
  /** The lower of the steam limit and what the letdown that feeds the header passes; null: not judged. [kg/h] */
  readonly limitKgPerH: Float64Array | null;
}

/**
 * A header's base load and limit per minute, of the network without flash steam and accumulators: both only ever take load
 * off, so that a chance of going over is never said to be less than it is.
 */
export function spreadHeader(source: LoadSource, headerId: string): SpreadHeader {
  return {
    horizonMin: source.horizonMin,
    baseKgPerH: loadOf({ ...source, activities: [] }).kgPerH(headerId),
    limitKgPerH: boundOf(source, headerId),
  };
}

function boundOf({ plant, capacities, horizonMin }: LoadSource, headerId: string): Float64Array | null {
  const capacity = capacities.find((one) => one.headerId === headerId);
  const limit = capacity ? capacityMinutes(capacity, horizonMin).limitKgPerH : null;
  const feed = plant.headers.find(({ id }) => id === headerId)?.feed;
  if (feed?.kind !== 'letdown') return limit;
  if (!limit) return new Float64Array(horizonMin).fill(feed.greatestKgPerH);
  return limit.map((kgPerH) => Math.min(kgPerH, feed.greatestKgPerH));
}

/** What a placed activity draws as planned. */
export function plannedDraws(activity: Activity): PlannedDraw[] {
  return placedPhases(activity)
    .map(({ from, to, steamKgPerH }) => ({ from, to, kgPerH: addableKgPerH(steamKgPerH) }))
    .filter(({ from, to, kgPerH }) => to > from && kgPerH !== 0);
}
