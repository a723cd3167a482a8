import { daysAfter, isoWeek } from '../../calendar/dates';
import type { WeekDto } from '../../contracts/week';
import { makeClock } from '../time';
import type { WeekWords } from './BoardBar';

/** A week's name, its days, and its neighbours. */
export function weekWords(dto: Pick<WeekDto, 'weekStart' | 'firstInstant' | 'timeZone' | 'now' | 'week'>): WeekWords {
  const clock = makeClock(dto);
  const nowMin = clock.minuteOf(dto.now);
  const strip = (day: string): string => day.replace(/^\S+ /, '');
  return {
    title: `Week ${isoWeek(dto.weekStart)}`,
    span: `${strip(clock.day(0))} to ${strip(clock.day(dto.week.horizonMin - 1))} ${dto.weekStart.slice(0, 4)}`,
    previous: daysAfter(dto.weekStart, -7),
    next: daysAfter(dto.weekStart, 7),
    isThisWeek: nowMin >= 0 && nowMin < dto.week.horizonMin,
  };
}
