import { describe, expect, it } from 'vitest';
import type { Draft } from '@/components/capacity/draft';
import { durationCurve, hoursAbove } from '@/components/capacity/durationCurve';
import { fireLitBy, limitWith, overWith } from '@/components/capacity/preview';
import type { BoilerDto } from '@/contracts/capacity';
import { firesOf, LOOK_BACK_MIN } from '@/core/house/readiness';
import type { HeaderCapacity } from '@/core/plant/plant';

const HORIZON = 240;
const times = { purgeMinutes: 5, warmReadyMinutes: 30, coldReadyMinutes: 120 };
const share = [{ from: -LOOK_BACK_MIN, value: 1 }];
const boiler = {
  ...{ id: 'b2', headerId: 'h', netKgPerH: 1_000, ...times },
  ...{ share, fires: firesOf(share, times, HORIZON) },
} as unknown as BoilerDto;
/** Two boilers of 1,000 kg/h, a tenth kept back; the lead has set 1,500 from 120 on. */
const capacity: HeaderCapacity = {
  headerId: 'h',
  exportKgPerH: [{ from: 0, value: 2_000 }],
  limitKgPerH: [
    { from: 0, value: 1_800 },
    { from: 120, value: 1_500 },
  ],
  baseLoadKgPerH: [],
  greatestRiseKgPerHPerMin: null,
  storedKgPerBar: null,
};
const input = {
  capacity,
  reserveFraction: 0.1,
  boilers: [boiler],
  loadKgPerH: new Float64Array(HORIZON).fill(1_400),
};
const limit = (fromMin: number, toMin: number, value: number | null): Draft => ({
  subject: { kind: 'limit', headerId: 'h' },
  fromMin,
  toMin,
  value,
});
const firing = (fromMin: number, toMin: number, value: number): Draft => ({
  subject: { kind: 'firing', boilerId: 'b2' },
  fromMin,
  toMin,
  value,
});

describe('fireLitBy', () => {
  it('is the fire lit after a shut span, warm so soon after, and none where it burns all along', () => {
    expect(fireLitBy(firing(60, 90, 0), boiler, HORIZON)).toMatchObject({ litMin: 90, readyMin: 125, start: 'warm' });
    expect(fireLitBy(firing(60, 90, 0.5), boiler, HORIZON)).toBeNull();
  });

  it('is the fire lit by the draft itself, cold after a long stop', () => {
    const cold = { ...boiler, share: [{ from: 0, value: 0 }], fires: [] };
    expect(fireLitBy(firing(60, 240, 1), cold, HORIZON)).toMatchObject({ litMin: 60, readyMin: 185, start: 'cold' });
  });
});

describe('limitWith', () => {
  it('sets the limit in the span and leaves the rest', () => {
    const values = limitWith(limit(60, 90, 1_200), input);
    expect([values?.[59], values?.[60], values?.[89], values?.[90]]).toEqual([1_800, 1_200, 1_200, 1_800]);
  });

  it('never lets a limit stand above net export less the reserve', () => {
    expect(limitWith(limit(60, 90, 5_000), input)?.[60]).toBe(1_800);
  });

  it('takes a set limit back to net export less the reserve', () => {
    expect(limitWith(limit(120, 240, null), input)?.[120]).toBe(1_800);
  });

  it('lowers the limit by a boiler that is shut, and no further where a set limit is lower already', () => {
    // It is lit again at 90: warm, 5 min purge and 30 min to pressure.
    const shut = limitWith(firing(60, 90, 0), input);
    expect([59, 60, 89, 90, 124, 125].map((t) => shut?.[t])).toEqual([1_800, 900, 900, 900, 900, 1_500]);
    // Two boilers at 75 % and 100 %: 1,750 less a tenth is 1,575, above the 1,500 that is set.
    expect(limitWith(firing(130, 140, 0.75), input)?.[130]).toBe(1_500);
  });

  it('is null where nothing is judged and a boiler changes', () => {
    const unknown = { ...input, capacity: { ...capacity, exportKgPerH: null, limitKgPerH: null } };
    expect(limitWith(firing(0, 60, 0), unknown)).toBeNull();
  });
});

describe('overWith', () => {
  it('counts the kg that the plan would be over by', () => {
    // 1,400 kg/h against 1,200 for 30 min: 100 kg in one place.
    const over = overWith(limit(60, 90, 1_200), input);
    expect(over?.kg).toBeCloseTo(100, 9);
    expect(over?.spans).toHaveLength(1);
    expect(overWith(limit(60, 90, 1_400), input)?.kg).toBe(0);
  });
});

describe('durationCurve', () => {
  const load = Float64Array.from({ length: 120 }, (_, t) => (t < 30 ? 500 : t < 90 ? 2_000 : 500));

  it('sorts the load down, a point where it changes and one at the end', () => {
    expect(durationCurve(load)).toEqual([
      { hours: 0, loadKgPerH: 2_000 },
      { hours: 1, loadKgPerH: 500 },
      { hours: 2, loadKgPerH: 500 },
    ]);
  });

  it('does not change the load that it was given, and takes an empty one', () => {
    const before = load.slice();
    durationCurve(load);
    expect(load).toEqual(before);
    expect(durationCurve(new Float64Array(0))).toEqual([]);
  });

  it('counts hours above a rate, not at it', () => {
    expect(hoursAbove(load, 1_999)).toBe(1);
    expect(hoursAbove(load, 2_000)).toBe(0);
  });
});
