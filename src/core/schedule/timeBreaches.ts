import { ownSpan } from '../demand/activityLoad';
import { placedMode, type Activity } from '../plant/activity';
import { contains, type Interval } from '../time/interval';
import type { TimeBreach } from './breach';
import type { JudgedWeek } from './judged';
import { occupation, type Occupation } from './occupation';
import { indexOf, openSpansOf } from './weekIndex';

/** Matters of time and place; waits are judged with the links. */
export function timeBreaches(judged: JudgedWeek): TimeBreach[] {
  return [
    ...judged.week.activities.flatMap((activity) => placeBreaches(activity, judged)),
    ...unitClashes(judged),
    ...cleaningClashes(judged),
    ...cleaningTooShort(judged),
  ];
}

/** How late an activity ends; 0 where it is in time, has no due time or is not placed. [min] */
export function lateMinutesOf(activity: Activity): number {
  const span = ownSpan(activity);
  return span && activity.due !== null ? Math.max(0, span.to - activity.due) : 0;
}

type Bounds = Pick<TimeBreach, 'found' | 'limit'>;

function breach(code: TimeBreach['code'], activity: Activity, span: Interval, bounds: Bounds): TimeBreach {
  const unitId = activity.placement?.unitId ?? null;
  const { from, to } = span;
  return { id: `${code}:${activity.id}`, class: 'time', code, from, to, activityIds: [activity.id], unitId, ...bounds };
}

function placeBreaches(activity: Activity, judged: JudgedWeek): TimeBreach[] {
  const taken = occupation(activity, judged.week);
  if (!taken) return [];
  const found: TimeBreach[] = [];
  if (!placedMode(activity)) found.push(breach('unitNotEligible', activity, taken, { found: null, limit: null }));
  const outside = outsideShift(taken, judged);
  if (outside) found.push(breach('outsideShift', activity, outside, { found: null, limit: null }));
  return [...found, ...startBreaches(activity, taken.from), ...lateBreach(activity)];
}

function startBreaches(activity: Activity, start: number): TimeBreach[] {
  const { earliestStart, latestStart } = activity;
  if (start < earliestStart) {
    const bounds = { found: earliestStart - start, limit: 0 };
    return [breach('beforeEarliest', activity, { from: start, to: earliestStart }, bounds)];
  }
  if (latestStart === null || start <= latestStart) return [];
  return [breach('afterLatest', activity, { from: latestStart, to: start }, { found: start - latestStart, limit: 0 })];
}

function lateBreach(activity: Activity): TimeBreach[] {
  const late = lateMinutesOf(activity);
  if (late === 0 || activity.due === null) return [];
  return [breach('late', activity, { from: activity.due, to: activity.due + late }, { found: late, limit: 0 })];
}

/** The part of an occupation that no one open span covers; null where one covers it or the unit has no calendar. */
function outsideShift(taken: Occupation, judged: JudgedWeek): Interval | null {
  const open = openSpansOf(judged.week, taken.unitId);
  if (!open || open.some((span) => contains(span, taken))) return null;
  const startsIn = open.find((span) => span.from <= taken.from && taken.from < span.to);
  if (startsIn) return { from: startsIn.to, to: taken.to };
  const endsIn = open.find((span) => span.from < taken.to && taken.to <= span.to);
  return { from: taken.from, to: endsIn ? Math.max(endsIn.from, taken.from) : taken.to };
}

function unitClashes(judged: JudgedWeek): TimeBreach[] {
  const clashes: TimeBreach[] = [];
  for (const taken of judged.occupations.values()) {
    taken.forEach((later, i) => {
      for (const earlier of taken.slice(0, i)) if (earlier.to > later.from) clashes.push(clash(earlier, later));
    });
  }
  return clashes;
}

/** Derived cleanings against what is no product run; against the next run they are too short instead. */
function cleaningClashes(judged: JudgedWeek): TimeBreach[] {
  const { activities } = indexOf(judged.week);
  return judged.changeovers.flatMap(({ cleaning, unitId, from, rule }) => {
    const span = { activityId: cleaning.id, unitId, from, to: from + rule.minutes };
    return (judged.occupations.get(unitId) ?? [])
      .filter((taken) => activities.get(taken.activityId)?.kind !== 'stage')
      .filter((taken) => taken.from < span.to && span.from < taken.to)
      .map((taken) => (taken.from < span.from ? clash(taken, span) : clash(span, taken)));
  });
}

function clash(earlier: Occupation, later: Occupation): TimeBreach {
  return {
    id: `unitClash:${earlier.activityId}:${later.activityId}`,
    class: 'time',
    code: 'unitClash',
    from: later.from,
    to: Math.min(earlier.to, later.to),
    activityIds: [later.activityId, earlier.activityId],
    unitId: later.unitId,
    found: Math.min(earlier.to, later.to) - later.from,
    limit: 0,
  };
}

function cleaningTooShort(judged: JudgedWeek): TimeBreach[] {
  return judged.changeovers
    .filter(({ rule, availableMin }) => rule.kind !== 'allergen' && availableMin < rule.minutes)
    .map(({ rule, from, availableMin, previousId, nextId, cleaning, unitId }) => ({
      id: `cleaningTooShort:${previousId}`,
      class: 'time',
      code: 'cleaningTooShort',
      from,
      to: from + rule.minutes,
      activityIds: [nextId, previousId, cleaning.id],
      unitId,
      found: Math.max(0, availableMin),
      limit: rule.minutes,
    }));
}
