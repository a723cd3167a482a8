import { tz, TZDate } from '@date-fns/tz';
import { addDays, format, getDay, getISOWeek, isValid, parseISO, startOfWeek, type Day } from 'date-fns';

/**
 * Dates of the calendar, without a time: texts such as 2026-11-30. They are worked with in UTC, so that the zone of the
 * machine and its clock changes can't shift a day.
 */
const utc = tz('UTC');
const dayOf = (date: string): Date => parseISO(date, { in: utc });
const dateText = (day: Date): string => format(day, 'yyyy-MM-dd', { in: utc });

/** True for a date that the calendar has, written as 2026-11-30. */
export const isDate = (text: string): boolean => /^\d{4}-\d{2}-\d{2}$/.test(text) && isValid(dayOf(text));

/** The date so many days later. */
export const daysAfter = (date: string, days: number): string => dateText(addDays(dayOf(date), days));

/** The day of the week of a date: 0 is Sunday. */
export const weekdayOf = (date: string): number => getDay(dayOf(date), { in: utc });

/** The first day of the week that a date lies in; weeks begin on `weekStartsOn`: 1 is Monday, 7 (or 0) Sunday. */
export const firstDayOfWeek = (date: string, weekStartsOn: number): string =>
  dateText(startOfWeek(dayOf(date), { weekStartsOn: (weekStartsOn % 7) as Day, in: utc }));

/** Number of the week by ISO 8601: week 1 holds the year's first Thursday. */
export const isoWeek = (date: string): number => getISOWeek(dayOf(date), { in: utc });

/** An instant by a zone's clock, in a pattern of date-fns such as 'EEE HH:mm'. */
export const zonedText = (instant: Date, timeZone: string, pattern: string): string =>
  format(new TZDate(instant.getTime(), timeZone), pattern);
