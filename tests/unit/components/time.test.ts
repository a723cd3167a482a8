import { describe, expect, it } from 'vitest';
import { groupDigits, makeClock, spanText } from '@/components/time';

const berlin = (firstInstant: string) => makeClock({ firstInstant, timeZone: 'Europe/Berlin' });

describe('makeClock', () => {
  it('should show minutes in the plant zone', () => {
    const clock = berlin('2026-11-29T23:00:00Z');
    expect(clock.time(400)).toBe('06:40');
    expect(clock.dayTime(1440 + 400)).toBe('Tue 06:40');
    expect(clock.day(1440)).toBe('Tue 1 Dec');
    expect(clock.date(1440)).toBe('2026-12-01');
  });

  it('should skip the hour that a week in spring leaves out', () => {
    const clock = berlin('2026-03-22T23:00:00Z');
    const sunday = 6 * 1440;
    expect(clock.dayTime(sunday + 119)).toBe('Sun 01:59');
    expect(clock.dayTime(sunday + 120)).toBe('Sun 03:00');
  });

  it('should repeat the hour that a week in autumn has twice', () => {
    const clock = berlin('2026-10-18T22:00:00Z');
    const sunday = 6 * 1440;
    expect(clock.time(sunday + 150)).toBe('02:30');
    expect(clock.time(sunday + 210)).toBe('02:30');
  });

  it('should count whole minutes to an instant', () => {
    const clock = berlin('2026-11-29T23:00:00Z');
    expect(clock.minuteOf('2026-11-30T00:00:59Z')).toBe(60);
    expect(clock.instantDayTime('2026-12-01T04:40:00Z')).toBe('Tue 05:40');
  });
});

describe('spanText', () => {
  it.each([
    [38, '38 min'],
    [119, '119 min'],
    [125, '2 h 05'],
    [21 * 60, '21 h'],
    [48 * 60, '2 d'],
    [3 * 1440 - 1, '3 d'],
    [3 * 1440 + 240, '3 d 4 h'],
    [-35, '35 min'],
  ])('should say %d minutes as %s', (minutes, text) => expect(spanText(minutes)).toBe(text));
});

describe('numbers on screens', () => {
  it('should group thousands with thin spaces', () => expect(groupDigits(1234567)).toBe('1\u2009234\u2009567'));
});
