import { drawnMode, type Activity } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';

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

/** Activities that are not yet placed, the earliest due first. */
export function notYetPlaced(activities: readonly Activity[]): Activity[] {
  return activities
    .filter((activity) => !activity.placement && activity.kind !== 'cleaning')
    .sort((a, b) => (a.due ?? Infinity) - (b.due ?? Infinity) || (a.code < b.code ? -1 : a.code > b.code ? 1 : 0));
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
}

/** Breaches by class, those that can't be agreed to first; within a class in order of time. */
export function breachGroups(breaches: readonly Breach[]): BreachGroup[] {
  return CLASS_ORDER.map((name) => ({
    class: name,
    breaches: breaches.filter((breach) => breach.class === name).sort((a, b) => a.from - b.from || a.to - b.to),
  })).filter((group) => group.breaches.length > 0);
}
