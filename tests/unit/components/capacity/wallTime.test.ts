import { describe, expect, it } from 'vitest';
import { dayAt, daysOf, minuteOfWall, readTime, wallTime } from '@/components/capacity/wallTime';
import { makeClock } from '@/components/time';

const london = (firstInstant: string) => makeClock({ firstInstant, timeZone: 'Europe/London' });
const plain = london('2026-11-30T00:00:00Z');
/** Clocks go back on Sunday 25 October 2026, forward on Sunday 28 March 2027. */
const back = london('2026-10-18T23:00:00Z');
const forward = london('2027-03-22T00:00:00Z');

describe('readTime', () => {
  it('takes times as people type them', () => {
    expect(readTime('7')).toEqual({ hours: 7, minutes: 0 });
    expect(readTime(' 07:30 ')).toEqual({ hours: 7, minutes: 30 });
    expect(readTime('0730')).toEqual({ hours: 7, minutes: 30 });
    expect(readTime('24:00')).toEqual({ hours: 24, minutes: 0 });
  });

  it.each(['', 'noon', '25:00', '24:01', '12:60', '1:2:3', '-1'])('is null for %s', (text) => {
    expect(readTime(text)).toBeNull();
  });
});

describe('daysOf', () => {
  it('gives seven days of 24 hours', () => {
    expect(daysOf(plain, 10_080).map((day) => day.to - day.from)).toEqual(Array.from({ length: 7 }, () => 1_440));
    expect(daysOf(plain, 10_080)[1]).toMatchObject({ date: '2026-12-01', label: 'Tue 1 Dec', from: 1_440 });
  });

  it('gives 25 and 23 hours on the days of a clock change', () => {
    expect(daysOf(back, 10_140).at(-1)).toMatchObject({ date: '2026-10-25', from: 8_640, to: 10_140 });
    expect(daysOf(forward, 10_020).at(-1)).toMatchObject({ date: '2027-03-28', from: 8_640, to: 10_020 });
  });
});

describe('minuteOfWall', () => {
  it('finds the minute that the clock shows, back and forth', () => {
    for (const day of daysOf(plain, 10_080))
      for (const text of ['00:00', '06:40', '23:59', '24:00']) {
        const minute = minuteOfWall(plain, day, text) as number;
        expect(wallTime(plain, day, minute)).toBe(text);
        expect(dayAt(daysOf(plain, 10_080), minute, text === '24:00')).toEqual(day);
      }
  });

  it('finds times after a clock change', () => {
    const autumn = daysOf(back, 10_140).at(-1) as ReturnType<typeof daysOf>[number];
    const spring = daysOf(forward, 10_020).at(-1) as ReturnType<typeof daysOf>[number];
    expect(minuteOfWall(back, autumn, '06:00')).toBe(8_640 + 7 * 60);
    expect(minuteOfWall(forward, spring, '06:00')).toBe(8_640 + 5 * 60);
  });

  it('takes the first of a time that comes twice and refuses one that is left out', () => {
    const autumn = daysOf(back, 10_140).at(-1) as ReturnType<typeof daysOf>[number];
    const spring = daysOf(forward, 10_020).at(-1) as ReturnType<typeof daysOf>[number];
    expect(minuteOfWall(back, autumn, '01:30')).toBe(8_640 + 90);
    expect(minuteOfWall(forward, spring, '01:30')).toBeNull();
  });
});
