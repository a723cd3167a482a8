import { drawnMode, type Activity, type Link, type LinkEnd } from '../plant/activity';
import type { Unit } from '../plant/plant';
import { mergeIntervals, type Interval } from '../time/interval';
import type { Week } from './week';

/** A week's parts by id. */
export interface WeekIndex {
  readonly activities: ReadonlyMap<string, Activity>;
  readonly links: ReadonlyMap<string, Link>;
  readonly units: ReadonlyMap<string, Unit>;
  /** When each unit is crewed, touching spans joined; a unit without a calendar is missing: always open. */
  readonly open: ReadonlyMap<string, readonly Interval[]>;
}

const indexByWeek = new WeakMap<Week, WeekIndex>();
const openByCalendars = new WeakMap<Week['calendars'], ReadonlyMap<string, readonly Interval[]>>();

/** The week's index, built once for each week value. */
export function indexOf(week: Week): WeekIndex {
  let index = indexByWeek.get(week);
  if (!index) {
    index = {
      activities: byId(week.activities),
      links: byId(week.links),
      units: byId(week.plant.units),
      open: openSpans(week.calendars),
    };
    indexByWeek.set(week, index);
  }
  return index;
}

/** When a unit is crewed, touching spans joined; null where it has no calendar: always open. */
export function openSpansOf(week: Week, unitId: string): readonly Interval[] | null {
  return indexOf(week).open.get(unitId) ?? null;
}

/** The minute of a link's end; null where its activity is unknown or not placed. */
export function momentOf(end: LinkEnd, week: Week): number | null {
  const activity = indexOf(week).activities.get(end.activityId);
  const mode = activity && drawnMode(activity);
  if (!activity?.placement || !mode) return null;
  return activity.placement.start + (end.anchor === 'end' ? mode.minutes : 0) + end.offsetMin;
}

function byId<T extends { readonly id: string }>(items: readonly T[]): ReadonlyMap<string, T> {
  return new Map(items.map((item) => [item.id, item]));
}

function openSpans(calendars: Week['calendars']): ReadonlyMap<string, readonly Interval[]> {
  let open = openByCalendars.get(calendars);
  if (!open) {
    const units = [...new Set(calendars.map((calendar) => calendar.unitId))];
    const spansOf = (unitId: string) => calendars.filter((c) => c.unitId === unitId).flatMap((c) => c.open);
    open = new Map(units.map((unitId) => [unitId, mergeIntervals(spansOf(unitId))]));
    openByCalendars.set(calendars, open);
  }
  return open;
}
