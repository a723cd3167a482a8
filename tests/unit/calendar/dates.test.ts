import { describe, expect, it } from 'vitest';
import { daysAfter, firstDayOfWeek, isDate, isoWeek, weekdayOf, zonedText } from '@/calendar/dates';

describe('dates of the calendar', () => {
  it.each([
    ['2026-12-31', 1, '2027-01-01'],
    ['2028-02-28', 1, '2028-02-29'],
    ['2026-03-30', -7, '2026-03-23'],
    ['2026-10-19', 7, '2026-10-26'],
  ])('%s and %i days are %s, clock changes or not', (date, days, then) => expect(daysAfter(date, days)).toBe(then));

  it.each([
    ['2026-11-30', 49],
    ['2026-12-28', 53],
    ['2027-01-04', 1],
    ['2024-12-30', 1],
  ])('the week of %s has number %i', (date, week) => expect(isoWeek(date)).toBe(week));

  it('tells the day of the week and the first day of a week that begins on any day', () => {
    expect(weekdayOf('2026-11-29')).toBe(0);
    expect(weekdayOf('2026-12-05')).toBe(6);
    expect([0, 1, 3, 7].map((day) => firstDayOfWeek('2026-12-01', day))).toEqual([
      '2026-11-29',
      '2026-11-30',
      '2026-11-25',
      '2026-11-29',
    ]);
  });

  it('knows a date from what only looks like one', () => {
    expect(isDate('2028-02-29')).toBe(true);
    const others = ['2026-02-29', '2026-13-01', '20261130', '2026-11-30T00:00', ''];
    expect(others.filter(isDate)).toEqual([]);
  });

  it('writes an instant by the clock of a zone', () => {
    expect(zonedText(new Date('2026-12-01T23:30:00Z'), 'Europe/Berlin', 'EEE d MMM HH:mm')).toBe('Wed 2 Dec 00:30');
    expect(zonedText(new Date('2026-06-01T04:30:00Z'), 'America/Chicago', 'yyyy-MM-dd')).toBe('2026-05-31');
  });
});
