import type { WeekDto } from '../../contracts/week';
import { makeClock } from '../time';
import type { WeekWords } from './BoardBar';

const MS_PER_DAY = 86_400_000;

function dayAfter(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * MS_PER_DAY).toISOString().slice(0, 10);
}

/** Number of the week by ISO 8601: week 1 holds the year's first Thursday. */
export function isoWeek(date: string): number {
  const day = Date.parse(`${date}T00:00:00Z`);
  const weekday = (new Date(day).getUTCDay() + 6) % 7;
  const thursday = new Date(day + (3 - weekday) * MS_PER_DAY);
  const firstOfYear = Date.UTC(thursday.getUTCFullYear(), 0, 1);
  return 1 + Math.floor((thursday.getTime() - firstOfYear) / (7 * MS_PER_DAY));
}

/** A week's name, its days, and its neighbours. */
export function weekWords(dto: Pick<WeekDto, 'weekStart' | 'firstInstant' | 'timeZone' | 'now' | 'week'>): WeekWords {
  const clock = makeClock(dto);
  const nowMin = clock.minuteOf(dto.now);
  const strip = (day: string): string => day.replace(/^\S+ /, '');
  return {
    title: `Week ${isoWeek(dto.weekStart)}`,
    span: `${strip(clock.day(0))} to ${strip(clock.day(dto.week.horizonMin - 1))} ${dto.weekStart.slice(0, 4)}`,
    previous: dayAfter(dto.weekStart, -7),
    next: dayAfter(dto.weekStart, 7),
    isThisWeek: nowMin >= 0 && nowMin < dto.week.horizonMin,
  };
}
