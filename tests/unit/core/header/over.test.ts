import { describe, expect, it } from 'vitest';
import { NOT_JUDGED_KG_PER_H } from '@/core/header/capacity';
import { judgeOrder, overTogether } from '@/core/header/judge';
import { NOTHING_OVER, overLimit } from '@/core/header/over';
import { leastSpare, loadFactor, loadKg, peakLoad, steamToSpare } from '@/core/header/spare';
import { steepSteps } from '@/core/header/steps';

const flat = (kgPerH: number, minutes = 10) => new Float64Array(minutes).fill(kgPerH);

describe('over the limit', () => {
  it('is nothing at exactly the limit, and a span one kg/h above', () => {
    expect(overLimit(flat(1000), flat(1000), null)).toEqual({
      ...NOTHING_OVER,
      spans: [],
      sagBar: null,
      judgedMinutes: 10,
    });
    const over = overLimit(flat(1001), flat(1000), null);
    expect(over.spans).toMatchObject([{ from: 0, to: 10, peakOverKgPerH: 1 }]);
    expect(over.kg).toBeCloseTo(10 / 60, 12);
  });

  it('recovers by what is to spare, down to 0', () => {
    // kg per minute over: +2, -1, +2, -5, +1: deficits 2, 1, 3, 0, 1.
    const load = [120, -60, 120, -300, 60];
    const over = overLimit(load, flat(0, 5), flat(2, 5));
    expect(over.spans.map((span) => span.worstDeficitKg)).toEqual([2, 3, 1]);
    expect(over).toMatchObject({ worstDeficitKg: 3, kg: 5, minutes: 3, peakOverKgPerH: 120, sagBar: 1.5 });
  });

  it('knows where a span is worst', () => {
    const over = overLimit([0, 50, 90, 70, 0], flat(40, 5), null);
    expect(over.spans).toMatchObject([{ from: 1, to: 4, peakMinute: 2, peakOverKgPerH: 50, sagBar: null }]);
  });

  it('judges only where there is a limit', () => {
    const over = overLimit(flat(1e6, 3), [NOT_JUDGED_KG_PER_H, 1e6, NOT_JUDGED_KG_PER_H], null);
    expect(over).toMatchObject({ judgedMinutes: 1, minutes: 0 });
  });

  it('closes a span at the end of the week', () => {
    expect(overLimit([0, 60], [0, 0], null).spans).toMatchObject([{ from: 1, to: 2, kg: 1 }]);
    expect(overLimit([], [], null).spans).toEqual([]);
  });
});

describe('which is judged better', () => {
  const measure = { worstDeficitKg: 10, kg: 20, minutes: 30, peakOverKgPerH: 40 };

  it('looks at the worst running deficit, then kg, minutes and peak', () => {
    const better = [
      { ...measure, worstDeficitKg: 9, kg: 99 },
      { ...measure, kg: 19, minutes: 99 },
      { ...measure, minutes: 29, peakOverKgPerH: 99 },
      { ...measure, peakOverKgPerH: 39 },
    ];
    expect(better.map((other) => Math.sign(judgeOrder(other, measure)))).toEqual([-1, -1, -1, -1]);
    expect(judgeOrder(measure, { ...measure, kg: 20 + 1e-9 })).toBe(0);
  });

  it('takes headers together', () => {
    expect(overTogether([measure, { worstDeficitKg: 3, kg: 1, minutes: 2, peakOverKgPerH: 70 }])).toEqual({
      worstDeficitKg: 10,
      kg: 21,
      minutes: 32,
      peakOverKgPerH: 70,
    });
    expect(overTogether([])).toEqual(NOTHING_OVER);
  });
});

describe('steps too steep', () => {
  const supply = (rise: number, minutes = 10) => ({
    exportKgPerH: null,
    greatestRiseKgPerHPerMin: flat(rise, minutes),
    storedKgPerBar: flat(1, minutes),
  });

  it('misses h^2 / (2 r) / 60 kg', () => {
    // 600 kg/h at 100 kg/h a minute: 6 min, 0.5 x 600 x 6 / 60 = 30 kg.
    const load = [0, ...flat(600, 9)];
    expect(steepSteps(load, supply(100), 0)).toEqual([
      { from: 1, to: 7, heightKgPerH: 600, kg: expect.closeTo(30, 9), sagBar: expect.closeTo(30, 9) },
    ]);
    expect(steepSteps(load, supply(100), 30)).toEqual([]);
  });

  it('ends with the load when that falls before the supply has caught up', () => {
    // (600 + 500) / 2 / 60 kg in the only minute.
    expect(steepSteps([0, 600, 0, 0], supply(100, 4), 0)).toMatchObject([
      { from: 1, to: 2, kg: expect.closeTo(550 / 60, 9) },
    ]);
  });

  it('does not follow the load beyond what the boilers can send', () => {
    const bound = { ...supply(100), exportKgPerH: flat(200) };
    // 0.5 x 200 x 2 / 60 kg
    expect(steepSteps([0, ...flat(600, 9)], bound, 0)).toMatchObject([
      { from: 1, to: 3, heightKgPerH: 200, kg: expect.closeTo(200 / 60, 9) },
    ]);
  });

  it('finds none in a falling load, nor where the stored steam is 0', () => {
    expect(steepSteps([600, 300, 0], supply(1, 3), 0)).toEqual([]);
    expect(steepSteps([0, 600], { ...supply(1, 2), storedKgPerBar: flat(0, 2) }, 0)).toEqual([]);
    expect(steepSteps([], supply(1, 0), 0)).toEqual([]);
  });

  it('counts a second step apart once the first has been followed', () => {
    const found = steepSteps([0, 100, 200, 200], supply(100, 4), 0);
    expect(found.map(({ from, to }) => [from, to])).toEqual([
      [1, 2],
      [2, 3],
    ]);
  });
});

describe('steam to spare and load factor', () => {
  const load = [100, 300, 200];

  it('is limit less load, and least where that is', () => {
    expect([...steamToSpare(load, flat(250, 3))]).toEqual([150, -50, 50]);
    expect(leastSpare(load, flat(250, 3))).toEqual({ kgPerH: -50, minute: 1 });
    expect(leastSpare(load, flat(NOT_JUDGED_KG_PER_H, 3))).toBeNull();
    expect(leastSpare([0, 300], [0, 400])).toEqual({ kgPerH: 100, minute: 1 });
    expect(leastSpare([0, 0], flat(400, 2))).toBeNull();
  });

  it('knows peak, kg and factors', () => {
    expect(peakLoad(load)).toEqual({ kgPerH: 300, minute: 1 });
    expect(loadKg(load)).toBe(10);
    expect(loadFactor(load, flat(400, 3))).toEqual({ meanOfLimit: 0.5, meanOfPeak: 200 / 300 });
    expect(loadFactor(load, null).meanOfLimit).toBeNull();
    expect(loadFactor([0, 0], flat(NOT_JUDGED_KG_PER_H, 2))).toEqual({ meanOfLimit: null, meanOfPeak: null });
  });
});
