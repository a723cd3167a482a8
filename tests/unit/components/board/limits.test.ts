import { describe, expect, it } from 'vitest';
import { amountText, limitTop, limitWords, shownLimits, usesOf } from '@/components/board/limits';
import { makeClock } from '@/components/time';
import type { LimitUse } from '@/core/plant/activity';
import { activity, flatMode } from '../../../support/builders';

const clock = makeClock({ firstInstant: '2026-11-30T00:00:00Z', timeZone: 'Europe/London' });
const crates = { id: 'crates', name: 'Crates', unit: 'crates', capacity: [{ from: 0, value: 8 }] };
const run = (id: string, start: number | null, amount: number, uses: Partial<LimitUse> = {}) =>
  activity(id, {
    modes: [
      { ...flatMode('unit1', 60, 0), uses: [{ limitId: 'crates', offsetMin: 10, minutes: 30, amount, ...uses }] },
    ],
    placement: start === null ? null : { unitId: 'unit1', start },
  });
const shown = (...runs: ReturnType<typeof run>[]) => {
  const [one] = shownLimits([crates], runs, 1_000);
  if (!one) throw new Error('the limit is not shown');
  return one;
};

describe('a shared limit in words', () => {
  it('says what is used at most and when', () => {
    expect(limitWords(shown(run('a', 350, 4), run('b', 370, 3)), clock)).toEqual({
      isOver: false,
      figure: '7 of 8',
      line: 'at most, Mon 06:20',
    });
  });

  it('says by how much it is passed, from when, and for how long in all', () => {
    const words = limitWords(shown(run('a', 350, 6), run('b', 370, 5.5), run('c', 600, 9)), clock);
    expect(words).toEqual({ isOver: true, figure: '11.5 of 8', line: 'over by 3.5 from Mon 06:20, 40 min in all' });
  });

  it('says that nothing uses it', () => {
    expect(limitWords(shown(run('a', null, 6)), clock)).toEqual({ isOver: false, figure: 'not used', line: 'crates' });
  });

  it('follows the activities given, each limit with its own uses', () => {
    const water = { id: 'water', name: 'Cooling water', unit: 'm³/h', capacity: [{ from: 0, value: 20 }] };
    const both = shownLimits([crates, water], [run('a', 0, 2), run('b', 0, 7.5, { limitId: 'water' })], 100);
    expect(both.map(({ usage }) => usage.greatest?.amount)).toEqual([2, 7.5]);
    expect(shownLimits([], [run('a', 0, 2)], 100)).toEqual([]);
  });
});

it('the strip’s top is above what is used and what there is', () => {
  expect(limitTop(shown(run('a', 0, 2)).usage)).toBeGreaterThan(8);
  expect(limitTop(shown(run('a', 0, 20)).usage)).toBeGreaterThan(20);
});

it('an activity names its uses by the clock where it is placed', () => {
  expect(usesOf(run('a', 350, 4), [crates], clock)).toEqual(['4 crates, 06:00 to 06:30']);
  expect(usesOf(run('a', null, 4), [crates], clock)).toEqual(['4 crates, for 30 min']);
  expect(usesOf(run('a', 350, 4, { limitId: 'gone' }), [crates], clock)).toEqual([]);
});

it('amounts show no more digits than they have', () => {
  expect([4, 0.5, 1 / 3].map(amountText)).toEqual(['4', '0.5', '0.33']);
});
