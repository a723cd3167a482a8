import type { UnitCalendar } from '@/core/plant/plant';
import { mergeIntervals, type Interval } from '@/core/time/interval';
import type { ShiftSpan } from '@/contracts/week';
import { daysAfter, weekdayOf } from '@/calendar/dates';
import { ceilMinuteOf, minuteOf, wallMinute, type WeekTime } from './weekTime';

/** A shift as the plant sets it; one that ends at or before its start runs past midnight. */
export interface ShiftRow {
  readonly id: string;
  readonly name: string;
  /** 1 is Monday, 7 (or 0) Sunday. */
  readonly days: readonly number[];
  /** Wall clock in the plant's zone, "06:00". */
  readonly startsAt: string;
  readonly endsAt: string;
  readonly lineIds: readonly string[] | null;
}

/** A span that differs from the shifts; `unitId` null: every unit. */
export interface ExceptionRow {
  readonly unitId: string | null;
  readonly fromAt: Date;
  readonly toAt: Date;
  readonly open: boolean;
}

/**
 * The shifts that touch a week, by start. The one that runs in from the day before has a negative start and the last
 * one may end after the week: a shift is never cut.
 */
export function expandShifts(time: WeekTime, shifts: readonly ShiftRow[]): ShiftSpan[] {
  const dates = Array.from({ length: 8 }, (_, day) => daysAfter(time.weekStart, day - 1));
  return dates
    .flatMap((date) => shifts.filter((shift) => runsOn(shift, date)).map((shift) => spanOf(time, shift, date)))
    .filter((span) => span.to > 0 && span.from < time.horizonMin && span.to > span.from)
    .sort((a, b) => a.from - b.from || a.name.localeCompare(b.name, 'en'));
}

/**
 * When each unit is crewed within the week: the shifts of its line, then the plant's exceptions, then the unit's own;
 * of two exceptions of one kind the closing one holds.
 */
export function unitCalendars(
  time: WeekTime,
  units: readonly { readonly id: string; readonly lineId: string }[],
  shifts: readonly ShiftSpan[],
  exceptions: readonly ExceptionRow[],
): UnitCalendar[] {
  return units.map((unit) => {
    const crewed = shifts.filter(({ lineIds }) => lineIds === null || lineIds.includes(unit.lineId));
    const plantWide = withExceptions(
      time,
      mergeIntervals(crewed),
      exceptions.filter((e) => e.unitId === null),
    );
    const own = withExceptions(
      time,
      plantWide,
      exceptions.filter((e) => e.unitId === unit.id),
    );
    return { unitId: unit.id, open: clip(own, { from: 0, to: time.horizonMin }) };
  });
}

function withExceptions(time: WeekTime, open: readonly Interval[], exceptions: readonly ExceptionRow[]): Interval[] {
  const spans = (wanted: boolean): Interval[] =>
    exceptions
      .filter((e) => e.open === wanted)
      .map((e) => ({ from: minuteOf(time, e.fromAt), to: ceilMinuteOf(time, e.toAt) }));
  return subtract(mergeIntervals([...open, ...spans(true)]), mergeIntervals(spans(false)));
}

function subtract(spans: readonly Interval[], taken: readonly Interval[]): Interval[] {
  return taken.reduce<Interval[]>(
    (left, hole) =>
      left.flatMap((span) =>
        [
          { from: span.from, to: Math.min(span.to, hole.from) },
          { from: Math.max(span.from, hole.to), to: span.to },
        ].filter((part) => part.to > part.from),
      ),
    [...spans],
  );
}

const clip = (spans: readonly Interval[], to: Interval): Interval[] =>
  spans
    .map((span) => ({ from: Math.max(span.from, to.from), to: Math.min(span.to, to.to) }))
    .filter((span) => span.to > span.from);

const runsOn = (shift: ShiftRow, date: string): boolean => shift.days.some((day) => day % 7 === weekdayOf(date));

function spanOf(time: WeekTime, shift: ShiftRow, date: string): ShiftSpan {
  const startsAt = minutesOfClock(shift.startsAt);
  const endsAt = minutesOfClock(shift.endsAt);
  const lastDate = endsAt <= startsAt ? daysAfter(date, 1) : date;
  return {
    shiftId: shift.id,
    name: shift.name,
    date,
    lineIds: shift.lineIds,
    from: wallMinute(time, date, startsAt),
    to: wallMinute(time, lastDate, endsAt),
  };
}

/** Minutes after midnight of "06:30". */
export function minutesOfClock(clock: string): number {
  const [hours, minutes] = clock.split(':').map(Number);
  return (hours ?? 0) * 60 + (minutes ?? 0);
}
