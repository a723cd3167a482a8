import { describe, expect, it } from 'vitest';
import { fromMinutes, toMinutes, valueAt } from '@/core/time/stepFunction';
import { combineSteps, joinSteps, leastSteps, mapSteps, stepsFromSpans, sumSteps } from '@/core/time/stepMath';

const steps = (...pairs: [number, number][]) => pairs.map(([from, value]) => ({ from, value }));

describe('a step function', () => {
  it('holds from a step on, and is 0 before the first', () => {
    const fn = steps([10, 5], [20, 7]);
    expect([9, 10, 19, 20, 99].map((minute) => valueAt(fn, minute))).toEqual([0, 5, 5, 7, 7]);
    expect(valueAt([], 3)).toBe(0);
  });

  it.each([10_020, 10_080, 10_140])('spreads over a week of %d minutes and comes back the same', (horizonMin) => {
    const fn = steps([0, 1], [100, 2], [10_000, 3]);
    const values = toMinutes(fn, horizonMin);
    expect(values).toHaveLength(horizonMin);
    expect([values[99], values[100], values[horizonMin - 1]]).toEqual([1, 2, 3]);
    expect(fromMinutes(values)).toEqual(fn);
  });

  it('cuts what lies outside the week off', () => {
    expect([...toMinutes(steps([-5, 1], [2, 2], [9, 3]), 4)]).toEqual([1, 1, 2, 2]);
    expect(fromMinutes([])).toEqual([]);
  });
});

describe('arithmetic of step functions', () => {
  const a = steps([0, 1], [10, 2], [20, 1]);
  const b = steps([5, 10], [10, 9]);

  it('adds', () => {
    // 1, then 1 + 10, then 2 + 9: equal neighbours joined, then 1 + 9.
    expect(sumSteps([a, b])).toEqual(steps([0, 1], [5, 11], [20, 10]));
    expect(sumSteps([])).toEqual([]);
  });

  it('takes the least, with 0 before a first step', () => {
    expect(leastSteps([a, b])).toEqual(steps([0, 0], [5, 1], [10, 2], [20, 1]));
  });

  it('combines in the order given', () => {
    expect(combineSteps([a, b], ([x = 0, y = 0]) => x - y)).toEqual(steps([0, 1], [5, -9], [10, -7], [20, -8]));
  });

  it('maps and joins', () => {
    expect(mapSteps(a, (value) => Math.min(value, 1))).toEqual(steps([0, 1]));
    expect(joinSteps(steps([0, 1], [3, 1], [4, 2]))).toEqual(steps([0, 1], [4, 2]));
  });

  it('lets the later of overlapping spans hold', () => {
    const spans = [
      { from: 10, to: 30, value: 5 },
      { from: 20, to: 40, value: 7 },
      { from: 50, to: 50, value: 9 },
    ];
    expect(stepsFromSpans(spans, 1)).toEqual(steps([0, 1], [10, 5], [20, 7], [40, 1]));
    expect(stepsFromSpans([], 3)).toEqual(steps([0, 3]));
  });
});
