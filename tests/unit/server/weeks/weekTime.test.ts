import { describe, expect, it } from 'vitest';
import {
  instantOf,
  isWeekStart,
  localDate,
  minuteOf,
  wallMinute,
  weekStartOf,
  weekTimeOf,
} from '@/server/weeks/weekTime';

const BERLIN = 'Europe/Berlin';

describe('a week in the plant’s zone', () => {
  it.each([
    ['2026-11-30', BERLIN, 10_080, '2026-11-29T23:00:00.000Z', '2026-12-06T23:00:00.000Z'],
    ['2026-03-23', BERLIN, 10_020, '2026-03-22T23:00:00.000Z', '2026-03-29T22:00:00.000Z'],
    ['2026-10-19', BERLIN, 10_140, '2026-10-18T22:00:00.000Z', '2026-10-25T23:00:00.000Z'],
    ['2026-03-08', 'America/Chicago', 10_020, '2026-03-08T06:00:00.000Z', '2026-03-15T05:00:00.000Z'],
    ['2026-11-01', 'America/Chicago', 10_140, '2026-11-01T05:00:00.000Z', '2026-11-08T06:00:00.000Z'],
    ['2026-09-28', 'Australia/Lord_Howe', 10_050, '2026-09-27T13:30:00.000Z', '2026-10-04T13:00:00.000Z'],
  ])('%s in %s has %i minutes', (weekStart, zone, minutes, first, end) => {
    const time = weekTimeOf(weekStart, zone);
    expect(time.horizonMin).toBe(minutes);
    expect(time.firstInstant.toISOString()).toBe(first);
    expect(time.endInstant.toISOString()).toBe(end);
  });

  it('counts elapsed minutes across both clock changes', () => {
    const spring = weekTimeOf('2026-03-23', BERLIN);
    expect(wallMinute(spring, '2026-03-29', 60)).toBe(6 * 1440 + 60);
    expect(wallMinute(spring, '2026-03-29', 4 * 60)).toBe(6 * 1440 + 180);
    const autumn = weekTimeOf('2026-10-19', BERLIN);
    expect(wallMinute(autumn, '2026-10-25', 60)).toBe(6 * 1440 + 60);
    expect(wallMinute(autumn, '2026-10-25', 4 * 60)).toBe(6 * 1440 + 300);
  });

  it('takes a time that the clocks leave out as much later, and the first of one that comes twice', () => {
    expect(wallMinute(weekTimeOf('2026-03-23', BERLIN), '2026-03-29', 150)).toBe(6 * 1440 + 150);
    expect(wallMinute(weekTimeOf('2026-10-19', BERLIN), '2026-10-25', 150)).toBe(6 * 1440 + 150);
    expect(wallMinute(weekTimeOf('2026-11-01', 'America/Chicago'), '2026-11-01', 60)).toBe(60);
  });

  it('takes minutes to instants and back in every kind of week', () => {
    let cases = 0;
    for (const weekStart of ['2026-03-23', '2026-10-19', '2026-11-30']) {
      const time = weekTimeOf(weekStart, BERLIN);
      for (let minute = 0; minute <= time.horizonMin; minute += 7) {
        expect(minuteOf(time, instantOf(time, minute))).toBe(minute);
        cases++;
      }
    }
    expect(cases).toBeGreaterThan(4_000);
    const time = weekTimeOf('2026-11-30', BERLIN);
    expect(minuteOf(time, new Date('2026-11-29T23:00:59.999Z'))).toBe(0);
    expect(minuteOf(time, new Date('2026-11-29T22:59:59.999Z'))).toBe(-1);
  });

  it('finds the week of an instant by the plant’s clocks, whatever day its weeks begin on', () => {
    const monday = { timeZone: BERLIN, weekStartsOn: 1 };
    expect(weekStartOf(new Date('2026-11-29T22:59:59Z'), monday)).toBe('2026-11-23');
    expect(weekStartOf(new Date('2026-11-29T23:00:00Z'), monday)).toBe('2026-11-30');
    expect(weekStartOf(new Date('2026-12-06T22:59:59Z'), monday)).toBe('2026-11-30');
    expect(weekStartOf(new Date('2026-12-01T12:00:00Z'), { timeZone: BERLIN, weekStartsOn: 7 })).toBe('2026-11-29');
    expect(weekStartOf(new Date('2026-12-01T12:00:00Z'), { timeZone: BERLIN, weekStartsOn: 0 })).toBe('2026-11-29');
    expect(weekStartOf(new Date('2026-12-01T12:00:00Z'), { timeZone: BERLIN, weekStartsOn: 3 })).toBe('2026-11-25');
    expect(localDate(new Date('2026-12-01T23:30:00Z'), BERLIN)).toBe('2026-12-02');
  });

  it('knows which dates begin a week', () => {
    expect(isWeekStart('2026-11-30', 1)).toBe(true);
    expect(isWeekStart('2026-12-01', 1)).toBe(false);
    expect(isWeekStart('2026-11-29', 7)).toBe(true);
    for (const text of ['2026-02-30', '2026-13-01', 'Monday', '', '2026-11-30T00:00', '20261130']) {
      expect(isWeekStart(text, 1)).toBe(false);
    }
  });
});
