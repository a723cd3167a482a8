import { describe, expect, it } from 'vitest';
import { partsOf } from '@/components/capacity/boilerParts';
import { betweenPath } from '@/components/capacity/chartPaths';
import { firesOf } from '@/core/house/readiness';

const scale = { from: 0, to: 100, width: 100, height: 100, topKgPerH: 100 };

describe('what stands over another line', () => {
  it('is drawn between the two, and nowhere else', () => {
    const load = [
      { from: 0, value: 40 },
      { from: 50, value: 80 },
    ];
    expect(betweenPath(scale, load, [{ from: 0, value: 60 }])).toBe('M50.0 20.0H100.0V40.0H50.0Z');
    expect(betweenPath(scale, load, [{ from: 0, value: 80 }])).toBe('');
  });

  it('is wide enough to be seen', () => {
    const spike = [
      { from: 0, value: 0 },
      { from: 10, value: 50 },
      { from: 11, value: 0 },
    ];
    const narrow = { ...scale, width: 10 };
    expect(betweenPath(narrow, spike, [{ from: 0, value: 0 }])).toBe('M1.0 50.0H1.8V100.0H1.0Z');
  });
});

describe('a boiler’s bar', () => {
  const times = { purgeMinutes: 5, warmReadyMinutes: 30, coldReadyMinutes: 120 };
  const share = [
    { from: 0, value: 0 },
    { from: 240, value: 1 },
    { from: 900, value: 0.5 },
    { from: 1_000, value: 0 },
  ];
  const boiler = { share, fires: firesOf(share, times, 2_000) };

  it('is shut, comes up, is lit and derated, in that order', () => {
    expect(partsOf(boiler, 0, 2_000).map((p) => [p.from, p.to, p.value, p.isComingUp])).toEqual([
      [0, 240, 0, false],
      [240, 365, 0, true],
      [365, 900, 1, false],
      [900, 1_000, 0.5, false],
      [1_000, 2_000, 0, false],
    ]);
  });

  it('is cut to what is shown', () => {
    expect(partsOf(boiler, 300, 400).map((p) => [p.from, p.to, p.isComingUp])).toEqual([
      [300, 365, true],
      [365, 400, false],
    ]);
  });
});
