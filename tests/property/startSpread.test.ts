import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { UnitSpreads } from '@/core/header/spread/spreadDraws';
import { recordedSpread } from '@/core/header/spread/startSpread';
import { seededRandom } from '@/core/levelling/random';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import { OVER_TOLERANCE_KG_PER_H } from '@/core/header/over';
import { convolveSpread } from '@/core/header/spread/convolution';
import { quantileFit } from '@/core/header/spread/quantileFit';
import { spreadHeader } from '@/core/header/spread/spreadDraws';
import { createSpreadEvaluator, spreadByConvolution, spreadDraws } from '@/core/weekSpread';
import { placement, weeks } from '../support/arbitraryWeeks';
import { activity, flatMode, week } from '../support/builders';
import { uniform } from '../support/spreads';

const UNITS = ['r1', 'r2', 'r3', 'k1', 'k2', 'low1'];
const GRID = { gridKgPerH: 25, confidence: 0.9 };

const spreads: fc.Arbitrary<UnitSpreads> = fc
  .array(fc.array(fc.integer({ min: -20, max: 20 }), { minLength: 1, maxLength: 5 }), { minLength: 6, maxLength: 6 })
  .map((records) => {
    const entries = records.map((minutes, i) => {
      const spread = recordedSpread(minutes);
      if (!spread.ok) throw new Error(spread.error.message);
      return [UNITS[i] as string, spread.value] as const;
    });
    return new Map(entries);
  });

it('without spread both methods say what the ordinary judgement says', () => {
  fc.assert(
    fc.property(weeks, (source) => {
      const header = evaluateWeek(source).headers[0];
      const sampled = createSpreadEvaluator(source, 'main', new Map(), { samples: 2, random: seededRandom(1) });
      const convolved = spreadByConvolution(source, 'main', new Map(), GRID);
      const over = Array.from(header?.loadKgPerH ?? [], (kgPerH) => (kgPerH - 1500 > OVER_TOLERANCE_KG_PER_H ? 1 : 0));
      expect([...(sampled.asItStands.overChance ?? [])]).toEqual(over);
      expect([...(convolved.overChance ?? [])]).toEqual(over);
      expect([...sampled.asItStands.confidentKgPerH]).toEqual([...(header?.loadKgPerH ?? [])]);
      expect([...convolved.confidentKgPerH]).toEqual([...(header?.loadKgPerH ?? [])]);
      expect(sampled.asItStands.expectedOverMin).toBe(header?.over?.minutes);
    }),
    { numRuns: 25 },
  );
});

it('chances lie between 0 and 1, least below greatest, and the sampler lies within what the grid allows', () => {
  const samples = 400;
  fc.assert(
    fc.property(weeks, spreads, fc.nat(), (source, spread, seed) => {
      const convolved = spreadByConvolution(source, 'main', spread, GRID);
      const { asItStands } = createSpreadEvaluator(source, 'main', spread, { samples, random: seededRandom(seed) });
      for (let t = 0; t < source.horizonMin; t++) {
        const [least, chance, greatest] = [
          convolved.leastOverChance?.[t] as number,
          convolved.overChance?.[t] as number,
          convolved.greatestOverChance?.[t] as number,
        ];
        const found = asItStands.overChance?.[t] as number;
        expect(least >= 0 && least <= chance + 1e-12 && chance <= greatest + 1e-12 && greatest <= 1).toBe(true);
        // Hoeffding: a mean of 400 is 0.2 out with a chance of less than 2 exp(-32).
        expect(found > least - 0.2 && found < greatest + 0.2).toBe(true);
      }
    }),
    { numRuns: 20 },
  );
});

it('sampled confident loads lie where the distribution passes the confidence', () => {
  const [samples, confidence] = [400, 0.9];
  fc.assert(
    fc.property(weeks, spreads, fc.nat(), (source, spread, seed) => {
      const options = { samples, random: seededRandom(seed), confidence };
      const { confidentKgPerH } = createSpreadEvaluator(source, 'main', spread, options).asItStands;
      const draws = spreadDraws(source, 'main', spread);
      const fit = quantileFit(spreadHeader(source, 'main'), confidentKgPerH, confidence, (of) =>
        convolveSpread(of, draws, { gridKgPerH: GRID.gridKgPerH, confidence }),
      );
      // Hoeffding: a share of 400 is 0.2 out with a chance of less than 2 exp(-32).
      expect(fit.greatestMissedChance).toBeLessThan(0.2);
    }),
    { numRuns: 15 },
  );
});

it('a preview is what an evaluator built anew says, and leaves the week as it stands', () => {
  fc.assert(
    fc.property(weeks, spreads, fc.nat(), fc.option(placement), (source, spread, pick, to) => {
      const options = () => ({ samples: 20, random: seededRandom(5) });
      const evaluator = createSpreadEvaluator(source, 'main', spread, options());
      const id = source.activities[pick % Math.max(1, source.activities.length)]?.id ?? 'none';
      const changes = [{ activityId: id, placement: to }];
      const anew = createSpreadEvaluator(withPlacements(source, changes), 'main', spread, options());
      expect(evaluator.preview(changes)).toEqual(anew.asItStands);
      expect(evaluator.preview([])).toEqual(evaluator.asItStands);
    }),
    { numRuns: 40 },
  );
});

it('a wider spread of a lone activity leaves the kg expected of it', () => {
  const minutes = fc.integer({ min: 0, max: 60 });
  fc.assert(
    fc.property(minutes, minutes, fc.integer({ min: 1, max: 90 }), (early, late, length) => {
      const lone = activity('a', {
        modes: [flatMode('unit1', length, 321)],
        placement: { unitId: 'unit1', start: 100 },
      });
      const source = week({ horizonMin: 400, activities: [lone] });
      const spread = new Map([['unit1', uniform(early, late)]]);
      const convolved = spreadByConvolution(source, 'main', spread, GRID);
      const { asItStands } = createSpreadEvaluator(source, 'main', spread, { samples: 9, random: seededRandom(early) });
      for (const { expectedKgPerH } of [convolved, asItStands]) {
        expect(expectedKgPerH.reduce((sum, kgPerH) => sum + kgPerH, 0) / 60).toBeCloseTo((321 * length) / 60, 6);
      }
    }),
    { numRuns: 60 },
  );
});

it('more samples come nearer to the convolution', () => {
  const runs = [100, 110, 120].map((start, i) =>
    activity(`a${i}`, { modes: [flatMode('unit1', 20, 400)], placement: { unitId: 'unit1', start } }),
  );
  const source = week({ horizonMin: 300, activities: runs });
  const spread = new Map([['unit1', uniform(15, 15)]]);
  const exact = spreadByConvolution(source, 'main', spread, { gridKgPerH: 400, confidence: 0.9 }).overChance ?? [];
  const meanSquare = (samples: number) => {
    const errors = Array.from({ length: 8 }, (_, seed) => {
      const options = { samples, random: seededRandom(seed) };
      const found = createSpreadEvaluator(source, 'main', spread, options).asItStands.overChance ?? [];
      return Array.from(found, (value, t) => (value - (exact[t] as number)) ** 2).reduce((a, b) => a + b, 0);
    });
    return errors.reduce((a, b) => a + b, 0) / errors.length;
  };
  const [few, some, many] = [25, 400, 6400].map(meanSquare) as [number, number, number];
  // Sixteen times the samples, a sixteenth of the squared error on average.
  expect(some).toBeLessThan(few / 4);
  expect(many).toBeLessThan(some / 4);
});
