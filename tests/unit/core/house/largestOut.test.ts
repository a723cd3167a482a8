import { describe, expect, it } from 'vitest';
import { buildHeaderCapacity, type BoilerInForce } from '@/core/header/capacity';
import { withoutLargest } from '@/core/house/largestOut';
import { valueAt } from '@/core/time/stepFunction';

const boiler = (id: string, exportKgPerH: number, changes: Partial<BoilerInForce> = {}): BoilerInForce => ({
  id,
  exportKgPerH,
  greatestRisePerMin: 0.1,
  waterTonnes: 8,
  storedKgPerBarAndTonne: 11,
  lit: [{ from: 0, to: 1_000 }],
  outages: [],
  deratings: [],
  ...changes,
});
const exportOf = (boilers: readonly BoilerInForce[], minute: number) => {
  const input = { headerId: 'main', reserveFraction: 0.1, setLimits: [], baseLoadKgPerH: [] };
  const built = buildHeaderCapacity({ ...input, boilers: withoutLargest(boilers) });
  expect(valueAt(built.limitKgPerH ?? [], minute)).toBeCloseTo(0.9 * valueAt(built.exportKgPerH ?? [], minute), 9);
  return valueAt(built.exportKgPerH ?? [], minute);
};

describe('the largest boiler out', () => {
  it('leaves the smaller one', () => {
    const pair = [boiler('large', 3_000), boiler('small', 2_000)];
    expect([0, 999, 1_000].map((t) => exportOf(pair, t))).toEqual([2_000, 2_000, 0]);
  });

  it('takes the one that exports most at each time: a derated large one stays', () => {
    const pair = [boiler('large', 3_000, { deratings: [{ from: 200, to: 300, value: 0.5 }] }), boiler('small', 2_000)];
    expect([199, 200, 299, 300].map((t) => exportOf(pair, t))).toEqual([2_000, 1_500, 1_500, 2_000]);
  });

  it('takes only one of two alike, and leaves nothing of a single one', () => {
    expect(exportOf([boiler('one', 2_000), boiler('two', 2_000)], 500)).toBe(2_000);
    expect(exportOf([boiler('one', 2_000)], 500)).toBe(0);
  });

  it('keeps outages that are set', () => {
    const three = [boiler('a', 3_000), boiler('b', 2_000, { outages: [{ from: 400, to: 500 }] }), boiler('c', 1_000)];
    expect([399, 400, 500].map((t) => exportOf(three, t))).toEqual([3_000, 1_000, 3_000]);
  });
});
