import { describe, expect, it } from 'vitest';
import { buildHeaderCapacity, type BoilerInForce } from '@/core/header/capacity';
import { judgeOrder } from '@/core/header/judge';
import { overLimit } from '@/core/header/over';
import { evaluateWeek } from '@/core/pipeline';
import { activity, capacity, flatMode, link, placedAt, unit, ventGroup, week, plant } from '../support/builders';
import {
  cannery,
  canneryWeek,
  KETTLE_PEAK_KG_PER_H,
  NET_EXPORT_KG_PER_H,
  retortLoad,
  STORED_KG_PER_BAR,
  TWO_BLANCHERS_KG_PER_H,
} from '../support/workedBatches';

const SIX = 360;

function loads(offsets: readonly number[]) {
  return offsets.map((offset, i) => retortLoad(`load${i + 1}`, `retort${i + 1}`, SIX + offset));
}

/** What the retorts alone draw when the last of them has steam on, and the minutes over. */
function judgedAt(offsets: readonly number[], reserve: number) {
  const { headers, over } = evaluateWeek(canneryWeek(loads(offsets), reserve));
  const load = headers[0]?.loadKgPerH[SIX + Math.max(...offsets)] ?? 0;
  return { atLastVent: load - TWO_BLANCHERS_KG_PER_H, overMinutes: over.minutes };
}

describe('worked retorts side by side (invented plant)', () => {
  it.each([
    // reserve, offsets, the retorts at the last vent, does it fit under 3546.94 (1 - r) - 1229.87
    [0, [0, 6], 1914.47, true],
    [0.1, [0, 6], 1914.47, true],
    [0.15, [0, 6], 1914.47, false],
    [0.15, [0, 12], 1772.44, true],
    [0.2, [0, 24], 1675.05, false],
    [0.2, [0, 50], 1555.24, true],
    [0.25, [0, 50], 1555.24, false],
    [0.25, [0], 1555.24, false],
    [0.1, [0, 6, 12], 2131.68, false],
    [0.1, [0, 6, 18], 1989.66, false],
    [0.1, [0, 6, 24], 1892.26, true],
    [0.1, [-6, 0, 18], 1892.26, true],
  ])('reserve %d, offsets %j: %d kg/h at the last vent, fits: %s', (reserve, offsets, kgPerH, fits) => {
    const judged = judgedAt(offsets, reserve);
    expect(judged.atLastVent).toBeCloseTo(kgPerH, 1);
    expect(judged.overMinutes === 0).toBe(fits);
  });

  it('counts vents at once with the margin kept clear after each', () => {
    const vents = (offset: number, marginMinutes: number) => {
      const plantWithMargin = cannery({ ventGroups: [ventGroup('manifold', { marginMinutes })] });
      const found = evaluateWeek(canneryWeek(loads([0, offset]), 0, { plant: plantWithMargin })).breaches;
      return found.filter((breach) => breach.code === 'ventsAtOnce').map(({ from, to }) => [from - SIX, to - SIX]);
    };
    expect(vents(5, 0)).toEqual([[5, 6]]);
    expect(vents(6, 0)).toEqual([]);
    // From 7 to 6 + 2.
    expect(vents(7, 2)).toEqual([[7, 8]]);
    expect(vents(8, 2)).toEqual([]);
  });
});

describe('two worked boilers, one out (invented plant)', () => {
  const all = [{ from: 0, to: 10_080 }];
  const boiler = (id: string, changes: Partial<BoilerInForce> = {}): BoilerInForce => ({
    id,
    exportKgPerH: NET_EXPORT_KG_PER_H,
    greatestRisePerMin: 0.1,
    waterTonnes: 8,
    storedKgPerBarAndTonne: 11.03,
    lit: all,
    outages: [],
    deratings: [],
    ...changes,
  });
  const house = (second: Partial<BoilerInForce>) =>
    buildHeaderCapacity({
      headerId: 'main',
      boilers: [boiler('one'), boiler('two', second)],
      reserveFraction: 0,
      setLimits: [],
      baseLoadKgPerH: [],
    });

  it('fits two vents, two blanchers and four kettles starting, and is over by 2157.15 kg/h with one out', () => {
    const units = [...cannery().units, unit('kettles', { kind: 'kettle' })];
    const kettles = activity('kettles', {
      modes: [flatMode('kettles', 6, 4 * KETTLE_PEAK_KG_PER_H)],
      placement: { unitId: 'kettles', start: SIX },
    });
    const judge = (second: Partial<BoilerInForce>) =>
      evaluateWeek(
        canneryWeek([...loads([0, 0]), kettles], 0, { plant: cannery({ units }), capacities: [house(second)] }),
      );
    const both = judge({});
    // 2 x 1555.237 + 1229.87 + 4 x 340.9365
    expect(both.headers[0]?.peak).toEqual({ kgPerH: expect.closeTo(5704.09, 1), minute: SIX });
    expect(both.over.minutes).toBe(0);
    expect(both.headers[0]?.leastSpare?.kgPerH).toBeCloseTo(7093.88 - 5704.09, 1);
    const one = judge({ outages: [{ from: 300, to: 420 }] });
    expect(one.over.peakOverKgPerH).toBeCloseTo(2157.15, 1);
    expect(one.headers[0]?.over?.spans.map(({ from, to }) => [from, to])).toEqual([[SIX, SIX + 6]]);
  });
});

describe('sag and step of the worked retort (invented plant)', () => {
  const boilerHouse = (risePerMin: number) =>
    capacity('main', NET_EXPORT_KG_PER_H, {
      greatestRiseKgPerHPerMin: [{ from: 0, value: risePerMin * NET_EXPORT_KG_PER_H }],
      storedKgPerBar: [{ from: 0, value: STORED_KG_PER_BAR }],
    });
  const judge = (offsets: readonly number[], risePerMin: number, sagToleranceBar = 0.5) => {
    const rules = { snapMinutes: 5, reserveFraction: 0, sagToleranceBar };
    return evaluateWeek(
      canneryWeek(loads(offsets), 0, { plant: cannery({ rules }), capacities: [boilerHouse(risePerMin)] }),
    );
  };

  it('two vents together are 79.3 kg over for 6 minutes: the header would fall by 0.90 bar', () => {
    const [span, ...more] = judge([0, 0], 1).headers[0]?.over?.spans ?? [];
    expect(more).toEqual([]);
    expect(span).toMatchObject({ from: SIX, to: SIX + 6 });
    // 3110.47 - 2317.07 = 793.40 kg/h; x 6 / 60 = 79.34 kg; / 88.24 kg/bar
    expect(span?.peakOverKgPerH).toBeCloseTo(793.4, 1);
    expect(span?.kg).toBeCloseTo(79.34, 2);
    expect(span?.worstDeficitKg).toBeCloseTo(79.34, 2);
    expect(span?.sagBar).toBeCloseTo(0.9, 2);
  });

  it('one vent is a step too steep at 10 % a minute: 56.8 kg short, 0.64 bar, until 4.38 minutes after', () => {
    const { breaches, over } = judge([0], 0.1);
    expect(over.minutes).toBe(0);
    const steps = breaches.filter((breach) => breach.code === 'stepTooSteep');
    // 0.5 x 1555.237 x (1555.237 / 354.694) / 60 = 56.83 kg
    expect(steps).toMatchObject([{ from: SIX, to: SIX + 5, activityIds: ['load1'] }]);
    expect(steps[0]).toMatchObject({ kg: expect.closeTo(56.8, 1), sagBar: expect.closeTo(0.644, 3) });
    expect(steps[0]).toMatchObject({ overKgPerH: expect.closeTo(1555.24, 2) });
  });

  it('at 20 % a minute it is 28.4 kg and 0.32 bar: listed only where the plant allows less', () => {
    const codes = (toleranceBar: number) => judge([0], 0.2, toleranceBar).breaches.map((breach) => breach.code);
    expect(codes(0.5)).toEqual([]);
    expect(codes(0.3)).toEqual(['stepTooSteep']);
    expect(judge([0], 0.2, 0.3).headers[0]?.steps[0]).toMatchObject({
      kg: expect.closeTo(28.4, 1),
      sagBar: expect.closeTo(0.322, 3),
    });
  });

  it('judges ten times 20 kg over, an hour apart, better than once 200 kg', () => {
    const limit = new Float64Array(720).fill(1000);
    // 20 kg: 1200 kg/h for a minute; 200 kg: ten such minutes on end.
    const ten = Float64Array.from({ length: 720 }, (_, t) => (t % 60 === 30 && t < 600 ? 2200 : 0));
    const once = Float64Array.from({ length: 720 }, (_, t) => (t >= 30 && t < 40 ? 2200 : 0));
    const [spread, together] = [overLimit(ten, limit, null), overLimit(once, limit, null)];
    expect(spread.kg).toBeCloseTo(200, 9);
    expect(together.kg).toBeCloseTo(200, 9);
    expect(spread.spans).toHaveLength(10);
    expect([spread.worstDeficitKg, together.worstDeficitKg]).toEqual([expect.closeTo(20, 9), expect.closeTo(200, 9)]);
    expect(judgeOrder(spread, together)).toBeLessThan(0);
    expect(judgeOrder(together, spread)).toBeGreaterThan(0);
  });
});

describe('the wait since the first container was closed (invented plant)', () => {
  // 1680 cans at 84 a minute: 20 min; first closed 05:00, last 05:20.
  const filling = activity('fill', {
    stage: 'fill',
    modes: [flatMode('unit1', 20, 0)],
    placement: { unitId: 'unit1', start: 300 },
  });
  const fromFirst = { from: { activityId: 'fill', anchor: 'start', offsetMin: 0 } } as const;
  const closing = link('closing', 'fill', 'load', {
    ...fromFirst,
    rule: 'sinceClosing',
    greatestMin: 120,
    greatestBreach: 'process',
  });
  const initial = link('initial', 'fill', 'load', {
    ...fromFirst,
    rule: 'initialTemperature',
    greatestMin: 45,
    greatestBreach: 'process',
  });
  const breaches = (steamOn: number, links: readonly (typeof closing)[]) =>
    evaluateWeek(
      week({
        plant: plant({ units: [unit('unit1'), unit('retort1', { kind: 'retort' })] }),
        capacities: [capacity('main', 5000)],
        activities: [filling, placedAt(retortLoad('load', 'retort1', 0), steamOn)],
        links,
      }),
    ).breaches;

  it('allows steam on at 07:00, not at 07:01 nor at 07:20', () => {
    expect(breaches(420, [closing])).toEqual([]);
    expect(breaches(421, [closing])).toMatchObject([
      { class: 'process', code: 'waitSinceClosing', found: 121, limit: 120, from: 420, to: 421 },
    ]);
    expect(breaches(440, [closing])).toMatchObject([{ code: 'waitSinceClosing', found: 140 }]);
  });

  it('the shorter limit rules: for the initial temperature 05:45', () => {
    expect(breaches(345, [closing, initial])).toEqual([]);
    expect(breaches(346, [closing, initial])).toMatchObject([{ code: 'initialTemperature', found: 46, limit: 45 }]);
  });
});
