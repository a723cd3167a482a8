import type { Activity, Link, Mode, Placement } from '../plant/activity';
import { fail, ok, problem, type Result } from '../result';
import { contains, type Interval } from '../time/interval';
import type { Edit } from './edit';
import { changeOf, editOf } from './edits';
import { occupation, occupationsByUnit } from './occupation';
import type { Week } from './week';
import { indexOf, openSpansOf } from './weekIndex';

/**
 * Places the activities of a batch that are not yet placed, one after the other along their links, each on the eligible
 * unit that has it done first, at or after `fromMinute`. A first place for the hand to go on from: greatest waits
 * and steam are not looked at. Fails where a unit has no room left in the week.
 */
export function placeBatch(week: Week, batchId: string, fromMinute: number): Result<Edit> {
  const open = week.activities.filter((activity) => activity.batchId === batchId && !activity.placement);
  const before = new Map(open.map((activity) => [activity.id, activity]));
  let tried = week;
  for (const id of inLinkOrder(open, week.links)) {
    const activity = before.get(id) as Activity;
    const placement = firstPlace(activity, tried, fromMinute);
    if (!placement) {
      const message = `${activity.code} ${activity.title} finds no free time on its units in this week.`;
      return fail(problem('PLACE_NO_ROOM', message));
    }
    tried = { ...tried, activities: tried.activities.map((a) => (a.id === id ? { ...a, placement } : a)) };
  }
  const placed = indexOf(tried).activities;
  const changes = open.map((activity) => changeOf(activity, { placement: placed.get(activity.id)?.placement ?? null }));
  return ok(editOf('place', changes));
}

/** Ids in an order in which links lead from earlier to later; those of a ring come last, as given. */
function inLinkOrder(activities: readonly Activity[], links: readonly Link[]): string[] {
  const left = new Set(activities.map((activity) => activity.id));
  const inner = links.filter((link) => left.has(link.from.activityId) && left.has(link.to.activityId));
  const ordered: string[] = [];
  while (left.size > 0) {
    const waits = (id: string) => inner.some((link) => link.to.activityId === id && left.has(link.from.activityId));
    const ready = [...left].filter((id) => !waits(id));
    for (const id of ready.length > 0 ? ready : left) {
      left.delete(id);
      ordered.push(id);
    }
  }
  return ordered;
}

function firstPlace(activity: Activity, week: Week, fromMinute: number): Placement | null {
  const taken = occupationsByUnit(week.activities, week);
  const places = activity.modes.flatMap((mode) => {
    const ready = Math.max(fromMinute, activity.earliestStart, readyByLinks(activity, mode, week));
    const start = firstFree(mode, ready, taken.get(mode.unitId) ?? [], week);
    return start === null ? [] : [{ placement: { unitId: mode.unitId, start }, end: start + mode.minutes }];
  });
  return places.sort((a, b) => a.end - b.end)[0]?.placement ?? null;
}

function readyByLinks(activity: Activity, mode: Mode, week: Week): number {
  const { activities } = indexOf(week);
  return week.links
    .filter((link) => link.to.activityId === activity.id)
    .reduce((ready, link) => {
      const from = activities.get(link.from.activityId);
      const own = from && occupation({ ...from, occupiesUntil: 'end' }, week);
      if (!own) return ready;
      const moment = (link.from.anchor === 'end' ? own.to : own.from) + link.from.offsetMin + link.leastMin;
      return Math.max(ready, moment - link.to.offsetMin - (link.to.anchor === 'end' ? mode.minutes : 0));
    }, -Infinity);
}

function firstFree(mode: Mode, ready: number, taken: readonly Interval[], week: Week): number | null {
  const open = openSpansOf(week, mode.unitId) ?? [{ from: 0, to: week.horizonMin }];
  const starts = [ready, ...open.map((span) => span.from), ...taken.map((span) => span.to)];
  const fits = (start: number) => {
    const span = { from: start, to: start + mode.minutes };
    return open.some((o) => contains(o, span)) && taken.every((t) => t.to <= span.from || span.to <= t.from);
  };
  const free = starts.filter((start) => start >= ready && fits(start));
  return free.length === 0 ? null : Math.min(...free);
}
