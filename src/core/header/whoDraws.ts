import { drawAt, placedPhases } from '../demand/activityLoad';
import type { Activity } from '../plant/activity';
import type { LoadSource } from './loadCurve';
import { countsOn, headersOfUnit } from './network';

/** An activity's draw at a moment. */
export interface DrawShare {
  readonly activityId: string;
  readonly unitId: string;
  readonly kgPerH: number;
}

/** Answers who draws, for many moments of one plan. */
export interface DrawFinder {
  /** The activities that draw on a header at a minute, directly or through letdowns, greatest first. [kg/h] */
  whoDraws(headerId: string, minute: number): DrawShare[];
  /** Those whose draw is higher than in the minute before, greatest rise first. [kg/h] */
  whoRises(headerId: string, minute: number): DrawShare[];
}

interface Drawing {
  readonly activity: Activity;
  readonly unitId: string;
  readonly from: number;
  readonly to: number;
}

/** A finder over placed activities, cleanings included where they are among them. */
export function drawFinder(source: Pick<LoadSource, 'plant' | 'activities'>): DrawFinder {
  const drawing = source.activities.flatMap((activity): Drawing[] => {
    const unitId = activity.placement?.unitId;
    if (unitId === undefined || headersOfUnit(source.plant, unitId).length === 0) return [];
    return drawSpan(activity, unitId);
  });
  const find = (headerId: string, minute: number, kgPerHOf: (activity: Activity) => number) => {
    const shares: DrawShare[] = [];
    for (const { activity, unitId, from, to } of drawing) {
      if (minute < from || minute >= to || !countsOn(source.plant, unitId, headerId)) continue;
      const kgPerH = kgPerHOf(activity);
      if (kgPerH > 0) shares.push({ activityId: activity.id, unitId, kgPerH });
    }
    return shares.sort(greatestFirst);
  };
  return {
    whoDraws: (headerId, minute) => find(headerId, minute, (activity) => drawAt(activity, minute)),
    whoRises: (headerId, minute) =>
      find(headerId, minute, (activity) => drawAt(activity, minute) - drawAt(activity, minute - 1)),
  };
}

/** The activities that draw on a header at a minute, directly or through letdowns, greatest first. [kg/h] */
export function whoDraws(
  source: Pick<LoadSource, 'plant' | 'activities'>,
  headerId: string,
  minute: number,
): DrawShare[] {
  return drawFinder(source).whoDraws(headerId, minute);
}

function drawSpan(activity: Activity, unitId: string): Drawing[] {
  let from = Infinity;
  let to = -Infinity;
  for (const phase of placedPhases(activity)) {
    from = Math.min(from, phase.from);
    to = Math.max(to, phase.to);
  }
  return from < to ? [{ activity, unitId, from, to }] : [];
}

function greatestFirst(a: DrawShare, b: DrawShare): number {
  return b.kgPerH - a.kgPerH || (a.activityId < b.activityId ? -1 : 1);
}
