import { placedMode, type Activity } from '../plant/activity';
import type { HeaderCapacity, UnitCalendar } from '../plant/plant';
import type { Week } from '../schedule/week';
import { mergeIntervals, type Interval } from '../time/interval';
import { subtractIntervals } from '../time/spans';
import { combineSteps, stepsFromSpans } from '../time/stepMath';
import type { StepFunction } from '../time/stepFunction';

/** Something that the floor tells of a plan that is under way. Minutes from the week's first instant. */
export type FloorTrouble =
  | {
      readonly kind: 'boilerTripped';
      readonly headerId: string;
      /** Export that is gone. [kg/h] */
      readonly lostKgPerH: number;
      readonly span: Interval;
    }
  | { readonly kind: 'batchLate'; readonly activityId: string; readonly byMin: number }
  | { readonly kind: 'unitLost'; readonly unitId: string; readonly span: Interval };

/** The week as the trouble leaves it; nothing that could follow from it is moved yet. */
export function withTrouble(week: Week, trouble: FloorTrouble): Week {
  switch (trouble.kind) {
    case 'boilerTripped':
      return {
        ...week,
        capacities: week.capacities.map((c) => (c.headerId === trouble.headerId ? less(c, trouble) : c)),
      };
    case 'batchLate':
      return {
        ...week,
        activities: week.activities.map((a) => (a.id === trouble.activityId ? late(a, trouble.byMin) : a)),
      };
    case 'unitLost':
      return { ...week, calendars: withoutUnit(week, trouble.unitId, trouble.span) };
  }
}

function less(capacity: HeaderCapacity, trip: Extract<FloorTrouble, { kind: 'boilerTripped' }>): HeaderCapacity {
  const lost = stepsFromSpans([{ ...trip.span, value: trip.lostKgPerH }], 0);
  const minus = (fn: StepFunction | null): StepFunction | null =>
    fn && combineSteps([fn, lost], ([value = 0, gone = 0]) => Math.max(0, value - gone));
  return { ...capacity, exportKgPerH: minus(capacity.exportKgPerH), limitKgPerH: minus(capacity.limitKgPerH) };
}

/** It starts so much later; when is known, so nothing moves it any more. */
function late(activity: Activity, byMin: number): Activity {
  const { placement } = activity;
  if (!placement || activity.fixing === 'done') return activity;
  return { ...activity, placement: { ...placement, start: placement.start + byMin }, fixing: 'started' };
}

function withoutUnit(week: Week, unitId: string, span: Interval): UnitCalendar[] {
  const own = week.calendars.filter((c) => c.unitId === unitId).flatMap((c) => c.open);
  const open = mergeIntervals(own.length > 0 ? own : [{ from: 0, to: week.horizonMin }]);
  return [...week.calendars.filter((c) => c.unitId !== unitId), { unitId, open: subtractIntervals(open, [span]) }];
}

/** True where a placed activity lies within its unit's open spans. */
export function isCrewed(week: Week, activity: Activity): boolean {
  const { placement } = activity;
  const minutes = placedMode(activity)?.minutes ?? 0;
  if (!placement) return true;
  const calendars = week.calendars.filter((c) => c.unitId === placement.unitId);
  if (calendars.length === 0) return true;
  return mergeIntervals(calendars.flatMap((c) => c.open)).some(
    ({ from, to }) => from <= placement.start && placement.start + minutes <= to,
  );
}
