import { describe, expect, it } from 'vitest';
import { contains, mergeIntervals, overlapMinutes } from '@/core/time/interval';
import { shiftIntervals, spanAt, subtractIntervals } from '@/core/time/spans';

const span = (from: number, to: number) => ({ from, to });

describe('spans are half-open', () => {
  it('shares nothing where they only touch', () => {
    expect(overlapMinutes(span(0, 10), span(10, 20))).toBe(0);
    expect(overlapMinutes(span(0, 11), span(10, 20))).toBe(1);
    expect(overlapMinutes(span(0, 5), span(10, 20))).toBe(0);
  });

  it('is within itself', () => {
    expect(contains(span(0, 10), span(0, 10))).toBe(true);
    expect(contains(span(0, 10), span(0, 11))).toBe(false);
  });

  it('lies in a span from its first minute to the one before its end', () => {
    const spans = [span(0, 10), span(10, 20)];
    expect(spanAt(spans, 9)).toEqual(span(0, 10));
    expect(spanAt(spans, 10)).toEqual(span(10, 20));
    expect(spanAt(spans, 20)).toBeUndefined();
  });
});

describe('sets of spans', () => {
  it('joins what touches or overlaps, drops the empty, and leaves its input alone', () => {
    const spans = Object.freeze([span(20, 30), span(0, 10), span(10, 12), span(5, 6), span(40, 40)]);
    expect(mergeIntervals(spans)).toEqual([span(0, 12), span(20, 30)]);
  });

  it('cuts spans out of spans', () => {
    expect(subtractIntervals([span(0, 10), span(20, 30)], [span(5, 25)])).toEqual([span(0, 5), span(25, 30)]);
    expect(subtractIntervals([span(0, 10)], [span(2, 3), span(3, 4)])).toEqual([span(0, 2), span(4, 10)]);
    expect(subtractIntervals([span(0, 10)], [span(0, 10)])).toEqual([]);
    expect(subtractIntervals([span(0, 10)], [span(10, 20)])).toEqual([span(0, 10)]);
  });

  it('moves spans', () => {
    expect(shiftIntervals([span(0, 10)], -5)).toEqual([span(-5, 5)]);
  });
});
