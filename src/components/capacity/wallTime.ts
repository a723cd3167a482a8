import type { Clock } from '../time';

export interface DayOfWeek {
  /** '2026-12-01' */
  readonly date: string;
  /** 'Tue 1 Dec' */
  readonly label: string;
  readonly from: number;
  readonly to: number;
}

/** The days of the week with their first and last minutes; 23 or 25 hours long where the clocks change. */
export function daysOf(clock: Clock, horizonMin: number): DayOfWeek[] {
  const days: DayOfWeek[] = [];
  for (let from = 0; from < horizonMin;) {
    const date = clock.date(from);
    let to = Math.min(horizonMin, from + 22 * 60);
    while (to < horizonMin && clock.date(to) === date) to += 30;
    days.push({ date, label: clock.day(from), from, to });
    from = to;
  }
  return days;
}

/** '7', '07:5', '730', '07:30', '24:00' as hours and minutes; null where it is not a time. */
export function readTime(text: string): { readonly hours: number; readonly minutes: number } | null {
  const found = /^\s*(\d{1,2})(?:[:.h]?(\d{2}))?\s*$/.exec(text);
  if (!found) return null;
  const hours = Number(found[1]);
  const minutes = Number(found[2] ?? 0);
  const isTime = (hours < 24 && minutes < 60) || (hours === 24 && minutes === 0);
  return isTime ? { hours, minutes } : null;
}

/**
 * The minute of the week at which the plant's clock shows a time on a day; of one that comes twice the first. null for
 * a time that is none, or that the clock change leaves out.
 */
export function minuteOfWall(clock: Clock, day: DayOfWeek, text: string): number | null {
  const time = readTime(text);
  if (!time) return null;
  if (time.hours === 24) return day.to;
  const shown = `${String(time.hours).padStart(2, '0')}:${String(time.minutes).padStart(2, '0')}`;
  const guess = day.from + time.hours * 60 + time.minutes;
  const tries = [guess - 60, guess - 30, guess, guess + 30, guess + 60];
  return tries.find((minute) => minute >= day.from && minute < day.to && clock.time(minute) === shown) ?? null;
}

/** The day that a moment belongs to; an end at midnight belongs to the day that it ends. */
export function dayAt(days: readonly DayOfWeek[], minute: number, isEnd = false): DayOfWeek | undefined {
  return days.find((day) => (isEnd ? day.from < minute && minute <= day.to : day.from <= minute && minute < day.to));
}

/** 'HH:MM' of a moment on its day; the end of a day is 24:00. */
export function wallTime(clock: Clock, day: DayOfWeek, minute: number): string {
  return minute === day.to ? '24:00' : clock.time(minute);
}
