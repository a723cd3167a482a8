import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { barsOf, evenMinutes, spanOf, spreadText } from '@/components/spread/histogram';
import { recordedSpread, type StartSpread } from '@/core/header/spread/startSpread';
import { uniform } from '../../../support/spreads';

const recorded = (...minutes: number[]): StartSpread => {
  const spread = recordedSpread(minutes);
  if (!spread.ok) throw new Error(spread.error.message);
  return spread.value;
};

describe('a spread in words', () => {
  it.each([
    [null, 'on time'],
    [uniform(0, 0), 'on time'],
    [uniform(3, 8), '3 min early to 8 min late'],
    [uniform(0, 8), 'on time to 8 min late'],
    [recorded(-5, -2), '5 min early to 2 min early'],
    [recorded(4, 4), 'always 4 min late'],
  ])('reads as people say it', (spread, text) => expect(spreadText(spread)).toBe(text));
});

describe('minutes that a spread was typed with', () => {
  it('come back from an even spread, and from no other', () => {
    expect(evenMinutes(uniform(3, 8))).toEqual({ earlyMin: 3, lateMin: 8 });
    expect(evenMinutes(uniform(0, 0))).toEqual({ earlyMin: 0, lateMin: 0 });
    expect(evenMinutes(null)).toBeNull();
    expect(evenMinutes(recorded(0, 0, 1))).toBeNull();
    expect(evenMinutes(recorded(0, 2))).toBeNull();
    expect(evenMinutes(recorded(2, 3))).toBeNull();
  });
});

describe('bars', () => {
  it('stand a minute each where the span is short', () => {
    const outcomes = recorded(-1, 0, 0, 3).outcomes;
    expect(barsOf(outcomes, spanOf([outcomes]))).toEqual([
      { fromMin: -1, toMin: 0, chance: 0.25 },
      { fromMin: 0, toMin: 1, chance: 0.5 },
      { fromMin: 3, toMin: 4, chance: 0.25 },
    ]);
  });

  it('hold every start once, within the span, however wide it is', () => {
    const minutes = fc.array(fc.integer({ min: -1_440, max: 1_440 }), { minLength: 1, maxLength: 40 });
    fc.assert(
      fc.property(minutes, (deviations) => {
        const { outcomes } = recorded(...deviations);
        const bars = barsOf(outcomes, spanOf([outcomes]));
        expect(bars.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 9);
        expect(bars.length).toBeLessThanOrEqual(62);
        for (const minute of deviations) {
          expect(bars.filter(({ fromMin, toMin }) => fromMin <= minute && minute < toMin)).toHaveLength(1);
        }
      }),
      { numRuns: 60 },
    );
  });
});
