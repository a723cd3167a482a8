import { describe, expect, it } from 'vitest';
import { convolveSpread } from '@/core/header/spread/convolution';
import { quantileFit } from '@/core/header/spread/quantileFit';
import { spreadHeader, type SpreadHeader } from '@/core/header/spread/spreadDraws';
import { seededRandom } from '@/core/levelling/random';
import { createSpreadEvaluator, spreadDraws } from '@/core/weekSpread';
import { activity, flatMode, week } from '../../../../support/builders';
import { uniform } from '../../../../support/spreads';

// Invented: one draw of 1,000 kg/h for 10 min, its start on any of 10 minutes with the same chance.
const lone = activity('a', { modes: [flatMode('unit1', 10, 1000)], placement: { unitId: 'unit1', start: 100 } });
const source = week({ horizonMin: 200, activities: [lone] });
const spreads = new Map([['unit1', uniform(0, 9)]]);
const header = spreadHeader(source, 'main');
const convolve = (of: SpreadHeader) =>
  convolveSpread(of, spreadDraws(source, 'main', spreads), { gridKgPerH: 1, confidence: 0.5 });
const loads = (at104: number) => header.baseKgPerH.map((kgPerH, t) => kgPerH + (t === 104 ? at104 : 0));

/** The chance by which a load at minute 104 misses a confidence; that minute alone is looked at. */
function missedAt104(kgPerH: number, confidence: number): number {
  const only = (chances: Float64Array | null) => chances && chances.slice(104, 105);
  const judged = quantileFit({ ...header, horizonMin: 1 }, loads(kgPerH), confidence, (of) => {
    const all = convolve({ ...of, horizonMin: 200 });
    return { ...all, leastOverChance: only(all.leastOverChance), greatestOverChance: only(all.greatestOverChance) };
  });
  return judged.greatestMissedChance;
}

describe('confident loads held against the distribution', () => {
  it('may be either side of a jump at the confidence itself', () => {
    // At minute 104 the draw is on in 5 of 10 starts: 0 up to one half of the weeks, 1,000 kg/h from there on.
    expect(missedAt104(0, 0.5)).toBeCloseTo(0, 9);
    expect(missedAt104(1000, 0.5)).toBeCloseTo(0, 9);
  });

  it('are missed by the chance that lies between where they are on the wrong side', () => {
    expect(missedAt104(0, 0.7)).toBeCloseTo(0.2, 9);
    expect(missedAt104(1000, 0.4)).toBeCloseTo(0.1, 9);
  });

  it('of the convolution itself fit, and of samples within four standard errors', () => {
    const own = convolve(header).confidentKgPerH;
    expect(quantileFit(header, own, 0.5, convolve).greatestMissedChance).toBeCloseTo(0, 9);
    const samples = 2000;
    const options = { samples, random: seededRandom(3), confidence: 0.5 };
    const { confidentKgPerH } = createSpreadEvaluator(source, 'main', spreads, options).asItStands;
    const { greatestMissedChance } = quantileFit(header, confidentKgPerH, 0.5, convolve);
    expect(greatestMissedChance).toBeLessThan(4 * Math.sqrt(0.25 / samples));
  });
});
