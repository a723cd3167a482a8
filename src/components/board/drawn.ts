import { drawnMode, type Activity, type Link } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';
import { isPlanned, isRun } from './carry';

/** A placed activity as the board draws it. */
export interface Drawn {
  readonly activity: Activity;
  readonly unitId: string;
  readonly start: number;
  readonly minutes: number;
}

export function drawnOf(activity: Activity): Drawn | null {
  const mode = drawnMode(activity);
  const { placement } = activity;
  return placement && mode
    ? { activity, unitId: placement.unitId, start: placement.start, minutes: mode.minutes }
    : null;
}

/** Placed activities by unit, each unit's in order of start. */
export function drawnByUnit(activities: readonly Activity[]): ReadonlyMap<string, readonly Drawn[]> {
  const byUnit = new Map<string, Drawn[]>();
  for (const activity of activities) {
    const drawn = drawnOf(activity);
    if (!drawn) continue;
    const list = byUnit.get(drawn.unitId);
    if (list) list.push(drawn);
    else byUnit.set(drawn.unitId, [drawn]);
  }
  for (const list of byUnit.values())
    list.sort((a, b) => a.start - b.start || (a.activity.id < b.activity.id ? -1 : 1));
  return byUnit;
}

/** Activities that are not yet placed: cleans that were added, then runs, the earliest due first. */
export function notYetPlaced(activities: readonly Activity[]): Activity[] {
  return activities
    .filter((activity) => !activity.placement && isPlanned(activity))
    .sort(
      (a, b) =>
        Number(isRun(a)) - Number(isRun(b)) ||
        (a.due ?? Infinity) - (b.due ?? Infinity) ||
        (a.code < b.code ? -1 : a.code > b.code ? 1 : 0),
    );
}

/** The breaches that concern each activity. */
export function breachesByActivity(breaches: readonly Breach[]): ReadonlyMap<string, readonly Breach[]> {
  const byActivity = new Map<string, Breach[]>();
  for (const breach of breaches) {
    for (const id of breach.activityIds) {
      const list = byActivity.get(id);
      if (list) list.push(breach);
      else byActivity.set(id, [breach]);
    }
  }
  return byActivity;
}

const CLASS_ORDER = ['process', 'steam', 'shared', 'time'] as const;
export type BreachClass = (typeof CLASS_ORDER)[number];

export interface BreachGroup {
  readonly class: BreachClass;
  readonly breaches: readonly Breach[];
  /** Those that were over before now: nothing can be put right of them. */
  readonly past: readonly Breach[];
}

/** Breaches by class, those that can't be agreed to first; within a class in order of time. */
export function breachGroups(breaches: readonly Breach[], nowMin: number): BreachGroup[] {
  return CLASS_ORDER.map((name) => {
    const all = breaches.filter((breach) => breach.class === name).sort((a, b) => a.from - b.from || a.to - b.to);
    return {
      class: name,
      breaches: all.filter((breach) => breach.to > nowMin),
      past: all.filter((breach) => breach.to <= nowMin),
    };
  }).filter((group) => group.breaches.length + group.past.length > 0);
}

/** Activities that wait for a place and hang together. */
export interface WaitingGroup {
  readonly key: string;
  readonly title: string;
  readonly due: number | null;
  readonly activities: readonly Activity[];
}

/** Waiting activities, those that links join together in one group; groups and activities keep their order. */
export function waitingGroups(waiting: readonly Activity[], links: readonly Link[]): WaitingGroup[] {
  const root = new Map(waiting.map((activity) => [activity.id, activity.id]));
  const rootOf = (id: string): string => {
    const up = root.get(id) as string;
    return up === id ? id : rootOf(up);
  };
  for (const { from, to } of links) {
    if (root.has(from.activityId) && root.has(to.activityId)) root.set(rootOf(to.activityId), rootOf(from.activityId));
  }
  const groups = new Map<string, Activity[]>();
  for (const activity of waiting) {
    const key = rootOf(activity.id);
    groups.set(key, [...(groups.get(key) ?? []), activity]);
  }
  return [...groups.entries()].map(([key, activities]) => ({
    key,
    title: activities[0]?.title ?? '',
    due: activities.reduce<number | null>((due, a) => (a.due === null ? due : Math.max(due ?? a.due, a.due)), null),
    activities: [...activities].sort((a, b) => (a.code < b.code ? -1 : a.code > b.code ? 1 : 0)),
  }));
}
