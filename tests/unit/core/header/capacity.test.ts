import { describe, expect, it } from 'vitest';
import {
  buildHeaderCapacity,
  NOT_JUDGED_KG_PER_H,
  type BoilerInForce,
  type HeaderCapacityInput,
} from '@/core/header/capacity';
import { valueAt } from '@/core/time/stepFunction';

const boiler = (id: string, changes: Partial<BoilerInForce> = {}): BoilerInForce => ({
  id,
  exportKgPerH: 3000,
  greatestRisePerMin: 0.1,
  waterTonnes: 8,
  storedKgPerBarAndTonne: 11,
  lit: [{ from: 0, to: 1000 }],
  outages: [],
  deratings: [],
  ...changes,
});

const build = (changes: Partial<HeaderCapacityInput> = {}) =>
  buildHeaderCapacity({
    headerId: 'main',
    boilers: [boiler('one')],
    reserveFraction: 0,
    setLimits: [],
    baseLoadKgPerH: [],
    ...changes,
  });

describe('what the boilers can send', () => {
  it('is the sum of those in fire', () => {
    const built = build({ boilers: [boiler('one'), boiler('two', { lit: [{ from: 500, to: 2000 }] })] });
    expect(built.exportKgPerH).toEqual([
      { from: 0, value: 3000 },
      { from: 500, value: 6000 },
      { from: 1000, value: 3000 },
      { from: 2000, value: 0 },
    ]);
    expect(valueAt(built.greatestRiseKgPerHPerMin ?? [], 700)).toBeCloseTo(600, 9);
    expect(valueAt(built.storedKgPerBar ?? [], 700)).toBe(176);
    expect(valueAt(built.storedKgPerBar ?? [], 1500)).toBe(88);
  });

  it('is nothing during an outage', () => {
    const built = build({ boilers: [boiler('one', { outages: [{ from: 100, to: 200 }] })] });
    expect([99, 100, 199, 200].map((t) => valueAt(built.exportKgPerH ?? [], t))).toEqual([3000, 0, 0, 3000]);
  });

  it('is the least part where deratings overlap', () => {
    const deratings = [
      { from: 100, to: 300, value: 0.5 },
      { from: 200, to: 400, value: 0.8 },
    ];
    const built = build({ boilers: [boiler('one', { deratings })] });
    expect([99, 100, 250, 300, 400].map((t) => valueAt(built.exportKgPerH ?? [], t))).toEqual([
      3000, 1500, 1500, 2400, 3000,
    ]);
    expect(valueAt(built.greatestRiseKgPerHPerMin ?? [], 100)).toBeCloseTo(150, 9);
  });
});

describe('the steam limit', () => {
  it('keeps the reserve back', () => {
    expect(valueAt(build({ reserveFraction: 0.1 }).limitKgPerH ?? [], 0)).toBeCloseTo(2700, 9);
  });

  it('is the set limit where that is lower, the later one where two overlap', () => {
    const setLimits = [
      { from: 100, to: 300, value: 2000 },
      { from: 200, to: 400, value: 2500 },
      { from: 500, to: 600, value: 9000 },
    ];
    const { limitKgPerH } = build({ setLimits });
    expect([99, 100, 199, 200, 399, 400, 550].map((t) => valueAt(limitKgPerH ?? [], t))).toEqual([
      3000, 2000, 2000, 2500, 2500, 3000, 3000,
    ]);
  });

  it('is not judged without boilers and set limits', () => {
    expect(build({ boilers: [] })).toMatchObject({ limitKgPerH: null, exportKgPerH: null, storedKgPerBar: null });
  });

  it('without boilers judges only where a limit is set', () => {
    const { limitKgPerH } = build({ boilers: [], setLimits: [{ from: 10, to: 20, value: 800 }] });
    expect([9, 10, 20].map((t) => valueAt(limitKgPerH ?? [], t))).toEqual([
      NOT_JUDGED_KG_PER_H,
      800,
      NOT_JUDGED_KG_PER_H,
    ]);
  });
});

it('knows no stored steam where a boiler has no water figure', () => {
  expect(build({ boilers: [boiler('one'), boiler('two', { waterTonnes: null })] }).storedKgPerBar).toBeNull();
});
