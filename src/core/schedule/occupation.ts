import { ownSpan } from '../demand/activityLoad';
import type { Activity } from '../plant/activity';
import type { Interval } from '../time/interval';
import type { Week } from './week';
import { indexOf, momentOf } from './weekIndex';

/** A unit taken by an activity, whole minutes [from, to). */
export interface Occupation extends Interval {
  readonly activityId: string;
  readonly unitId: string;
}

/**
 * When an activity has its unit: to its own end or, where it is taken off by a link, until that link's later moment, whichever
 * is later. Until the later activity is placed, its own end counts. Null where the activity is not placed or has no mode.
 */
export function occupation(activity: Activity, week: Week): Occupation | null {
  const span = ownSpan(activity);
  if (!span || !activity.placement) return null;
  return {
    activityId: activity.id,
    unitId: activity.placement.unitId,
    from: span.from,
    to: Math.max(span.to, takenOffAt(activity, week) ?? span.to),
  };
}

/** Occupations by unit, each in order of time; activities that are not placed are left out. */
export function occupationsByUnit(activities: readonly Activity[], week: Week): Map<string, Occupation[]> {
  const byUnit = new Map<string, Occupation[]>();
  for (const activity of activities) {
    const taken = occupation(activity, week);
    if (!taken) continue;
    const list = byUnit.get(taken.unitId);
    if (list) list.push(taken);
    else byUnit.set(taken.unitId, [taken]);
  }
  for (const list of byUnit.values()) list.sort(byTime);
  return byUnit;
}

function takenOffAt(activity: Activity, week: Week): number | null {
  if (activity.occupiesUntil === 'end') return null;
  const link = indexOf(week).links.get(activity.occupiesUntil.linkId);
  return link ? momentOf(link.to, week) : null;
}

function byTime(a: Occupation, b: Occupation): number {
  return a.from - b.from || a.to - b.to || (a.activityId < b.activityId ? -1 : 1);
}
