import { TZDate } from '@date-fns/tz';
import { addMinutes, differenceInMinutes, subMinutes } from 'date-fns';
import { daysAfter, firstDayOfWeek, isDate, weekdayOf, zonedText } from '@/calendar/dates';

/** A planning week on the clock: minutes are elapsed minutes since its first instant. */
export interface WeekTime {
  /** First day in the plant's zone, such as 2026-11-30. */
  readonly weekStart: string;
  readonly timeZone: string;
  readonly firstInstant: Date;
  /** The first instant of the next week. */
  readonly endInstant: Date;
  /** 10,080; 10,020 or 10,140 where the clocks change by an hour. */
  readonly horizonMin: number;
}

/** What a plant's weeks depend on. */
export interface WeekRule {
  readonly timeZone: string;
  /** 1 is Monday, 7 (or 0) Sunday. */
  readonly weekStartsOn: number;
}

/** The week that begins on a date, in a zone. */
export function weekTimeOf(weekStart: string, timeZone: string): WeekTime {
  const firstInstant = wallInstant(weekStart, 0, timeZone);
  const endInstant = wallInstant(daysAfter(weekStart, 7), 0, timeZone);
  return { weekStart, timeZone, firstInstant, endInstant, horizonMin: differenceInMinutes(endInstant, firstInstant) };
}

/** The elapsed minute of the week that an instant lies in; negative before the week. */
export function minuteOf(time: WeekTime, instant: Date): number {
  return differenceInMinutes(instant, time.firstInstant, { roundingMethod: 'floor' });
}

/** The first elapsed minute of the week that begins at or after an instant. */
export function ceilMinuteOf(time: WeekTime, instant: Date): number {
  return differenceInMinutes(instant, time.firstInstant, { roundingMethod: 'ceil' });
}

/** The instant at which an elapsed minute of the week begins. */
export function instantOf(time: WeekTime, minute: number): Date {
  return addMinutes(time.firstInstant, minute);
}

/** The elapsed minute at a wall-clock time of a date in the plant's zone. [min after midnight] */
export function wallMinute(time: WeekTime, date: string, minutesAfterMidnight: number): number {
  return minuteOf(time, wallInstant(date, minutesAfterMidnight, time.timeZone));
}

/** The first day of the week that an instant lies in, in the plant's zone. */
export function weekStartOf(instant: Date, rule: WeekRule): string {
  return firstDayOfWeek(localDate(instant, rule.timeZone), rule.weekStartsOn);
}

/** True where the plant's weeks begin on that date; false for what is not a date. */
export function isWeekStart(date: string, weekStartsOn: number): boolean {
  return isDate(date) && weekdayOf(date) === weekStartsOn % 7;
}

/** The date in the plant's zone at an instant, such as 2026-12-01. */
export function localDate(instant: Date, timeZone: string): string {
  return zonedText(instant, timeZone, 'yyyy-MM-dd');
}

/**
 * The instant at which the clocks of a zone show a time. A time that a clock change leaves out is taken as much later;
 * of one that comes twice, the first.
 */
function wallInstant(date: string, minutesAfterMidnight: number, timeZone: string): Date {
  const [year, month, day] = date.split('-').map(Number) as [number, number, number];
  const hours = Math.floor(minutesAfterMidnight / 60);
  const shown = new TZDate(year, month - 1, day, hours, minutesAfterMidnight % 60, timeZone);
  for (const earlierMin of [60, 30]) {
    const earlier = subMinutes(shown, earlierMin);
    if (sameWall(earlier, shown)) return new Date(earlier.getTime());
  }
  return new Date(shown.getTime());
}

const sameWall = (a: TZDate, b: TZDate): boolean =>
  a.getDate() === b.getDate() && a.getHours() === b.getHours() && a.getMinutes() === b.getMinutes();
