import { describe, expect, it } from 'vitest';
import { nthSmallest } from '@/core/header/spread/nthSmallest';
import {
  deviationAt,
  meanDeviationMin,
  overlapChance,
  recordedSpread,
  uniformSpread,
} from '@/core/header/spread/startSpread';
import { seededRandom } from '@/core/levelling/random';
import { createSpreadEvaluator, spreadByConvolution } from '@/core/weekSpread';
import { activity, capacity, flatMode, plant, unit, week } from '../../../support/builders';
import { uniform } from '../../../support/spreads';

describe('a spread of starts', () => {
  it('is uniform on whole minutes', () => {
    expect(uniform(1, 2).outcomes).toEqual([-1, 0, 1, 2].map((deviationMin) => ({ deviationMin, chance: 0.25 })));
    expect(meanDeviationMin(uniform(1, 2))).toBe(0.5);
  });

  it('counts recorded starts, rounded to whole minutes', () => {
    const recorded = recordedSpread([3, -0.2, 2.6, 7]);
    expect(recorded).toEqual({
      ok: true,
      value: {
        outcomes: [
          { deviationMin: 0, chance: 0.25 },
          { deviationMin: 3, chance: 0.5 },
          { deviationMin: 7, chance: 0.25 },
        ],
      },
    });
  });

  it.each([
    ['a half minute', uniformSpread(0.5, 1)],
    ['a negative', uniformSpread(-1, 1)],
    ['more than a day', uniformSpread(0, 1441)],
    ['no number', uniformSpread(NaN, 1)],
    ['no records', recordedSpread([])],
    ['a record two days out', recordedSpread([2880])],
    ['a record that is no number', recordedSpread([NaN])],
  ])('refuses %s', (_, result) => {
    expect(result).toMatchObject({ ok: false, error: { code: 'INPUT-SPREAD' } });
  });

  it('gives every part of the numbers from 0 to 1 its minute', () => {
    const at = [0, 0.24, 0.25, 0.74, 0.75, 0.999].map((u) => deviationAt(uniform(1, 2), u));
    expect(at).toEqual([-1, -1, 0, 1, 2, 2]);
  });

  it('finds the chance that two spans meet', () => {
    const spread = uniform(1, 1);
    // Of nine pairs of deviations, only +1 and -1 bring spans that stand one minute apart together.
    const chance = overlapChance({ from: 0, minutes: 6, spread }, { from: 7, minutes: 6, spread });
    expect(chance).toBeCloseTo(1 / 9, 12);
  });
});

it('the value of a rank is that of the sorted list', () => {
  const random = seededRandom(3);
  for (let round = 0; round < 50; round++) {
    const values = Float64Array.from({ length: 1 + (round % 17) }, () => Math.floor(random() * 9));
    const rank = Math.floor(random() * values.length);
    expect(nthSmallest(values.slice(), rank)).toBe(values.slice().sort()[rank]);
  }
});

describe('a header under spread starts', () => {
  const twoUnits = plant({ units: [unit('r1'), unit('r2')] });
  const run = (
    id: string,
    unitId: string,
    start: number,
    batchId: string | null = null,
    fixing: 'free' | 'started' = 'free',
  ) => activity(id, { batchId, fixing, modes: [flatMode(unitId, 10, 60)], placement: { unitId, start } });
  const spreads = new Map(['r1', 'r2'].map((id) => [id, uniform(5, 5)]));
  const spreadOf = (activities: ReturnType<typeof run>[]) =>
    spreadByConvolution(
      week({ horizonMin: 200, plant: twoUnits, capacities: [capacity('main', 100)], activities }),
      'main',
      spreads,
      { gridKgPerH: 1, confidence: 0.9 },
    );
  const sum = (values: Float64Array | null) => Array.from(values ?? []).reduce((total, value) => total + value, 0);

  it('keeps the runs of one batch apart as planned, and lets two batches meet', () => {
    expect(sum(spreadOf([run('a', 'r1', 50, 'b1'), run('b', 'r2', 60, 'b1')]).overChance)).toBe(0);
    expect(sum(spreadOf([run('a', 'r1', 50, 'b1'), run('b', 'r2', 60, 'b2')]).overChance)).toBeGreaterThan(0.5);
  });

  it('leaves what has started where it is', () => {
    const { overChance, expectedKgPerH } = spreadOf([run('a', 'r1', 50, null, 'started'), run('b', 'r2', 70)]);
    expect(sum(overChance)).toBe(0);
    expect([...expectedKgPerH.slice(49, 61)]).toEqual([0, ...Array<number>(10).fill(60), 0]);
  });

  it('reads the load at a confidence', () => {
    const alone = spreadOf([run('a', 'r1', 50)]);
    // From 50 on, 6 of 11 starts have begun; from 54 on, 10 of 11 have begun, which is more than nine in ten.
    expect([44, 45, 46, 47, 54].map((t) => alone.confidentKgPerH[t])).toEqual([0, 0, 60, 60, 60]);
    expect(alone.expectedKgPerH[50]).toBeCloseTo((60 * 6) / 11, 9);
  });

  it('says what the grid can have put wrong', () => {
    const source = week({
      horizonMin: 200,
      plant: twoUnits,
      capacities: [capacity('main', 119)],
      activities: [run('a', 'r1', 50), run('b', 'r2', 50)],
    });
    const rough = spreadByConvolution(source, 'main', spreads, { gridKgPerH: 50, confidence: 0.9 });
    const fine = spreadByConvolution(source, 'main', spreads, { gridKgPerH: 1, confidence: 0.9 });
    expect(rough.gridErrorKgPerH[50]).toBe(20);
    expect(rough.overChance?.[50]).toBe(0);
    expect(rough.leastOverChance?.[50]).toBe(0);
    expect(rough.greatestOverChance?.[50]).toBeGreaterThanOrEqual(fine.overChance?.[50] as number);
    expect(fine.overChance?.[50]).toBeCloseTo((6 / 11) ** 2, 12);
    expect(fine.gridErrorKgPerH[50]).toBe(0);
  });

  it('does not judge a header without a limit', () => {
    const source = week({ horizonMin: 60, capacities: [] });
    const { asItStands } = createSpreadEvaluator(source, 'main', spreads, { samples: 3, random: seededRandom(1) });
    expect(asItStands).toMatchObject({ overChance: null, anyOverChance: null, expectedOverMin: null });
    const convolved = spreadByConvolution(source, 'main', spreads, { gridKgPerH: 1, confidence: 0.9 });
    expect(convolved.overChance).toBeNull();
  });
});
