import { describe, expect, it } from 'vitest';
import { overlapChance } from '@/core/header/spread/startSpread';
import { seededRandom } from '@/core/levelling/random';
import { createSpreadEvaluator, spreadByConvolution } from '@/core/weekSpread';
import { activity, capacity, phase, plant, unit, week } from '../support/builders';
import { uniform } from '../support/spreads';

const VENT_MIN = 6;
const VENT_KG_PER_H = 1555.24;
const SAMPLES = 4000;
const START = 100;

/**
 * Two vents of 6 min (invented plant, worked batch A's retort) planned d apart, starts uniform on -s ... s, independent.
 * The difference of two such starts is triangular, P(k) = (n - |k|) / n^2 with n = 2 s + 1; they share a minute where
 * |d + k| < 6. For d >= 6 the k from -2 s to 5 - d have chances 1, 2, ..., m over n^2 with m = 2 s + 6 - d, together
 * m (m + 1) / 2 / n^2; less those to -6 - d, where the second vent closes before the first opens: the same with
 * m = 2 s - 5 - d. Nothing from d = 2 s + 6 on.
 */
function exactOverlap(d: number, s: number): number {
  const n = 2 * s + 1;
  if (d >= VENT_MIN) {
    const upTo = (m: number) => (Math.max(0, m) * (Math.max(0, m) + 1)) / 2 / n ** 2;
    return upTo(2 * s + VENT_MIN - d) - upTo(2 * s + 1 - VENT_MIN - d);
  }
  let chance = 0;
  for (let k = -2 * s; k <= 2 * s; k++) if (Math.abs(d + k) < VENT_MIN) chance += (n - Math.abs(k)) / n ** 2;
  return chance;
}

/** Part of the starts with which a vent planned at `from` is open at minute t. */
function openChance(from: number, t: number, s: number): number {
  let open = 0;
  for (let x = -s; x <= s; x++) if (from + x <= t && t < from + x + VENT_MIN) open++;
  return open / (2 * s + 1);
}

function ventWeek(d: number) {
  const vent = (id: string, start: number) =>
    activity(id, {
      modes: [
        { unitId: id, minutes: VENT_MIN, phases: [phase(0, VENT_MIN, VENT_KG_PER_H, 'vent')], uses: [], dutyId: null },
      ],
      placement: { unitId: id, start },
    });
  return week({
    horizonMin: 260,
    plant: plant({ units: [unit('r1'), unit('r2')] }),
    capacities: [capacity('main', 2317.07)],
    activities: [vent('r1', START), vent('r2', START + d)],
  });
}

const CASES = [0, 2, 5, 8].flatMap((s) => [0, 3, 6, 8, 12, 2 * s + 5, 2 * s + 6, 40].map((d) => ({ d, s })));

describe.each(CASES)('two vents planned $d min apart, starts within $s min of the plan', ({ d, s }) => {
  const spread = uniform(s, s);
  const spreads = new Map(['r1', 'r2'].map((id) => [id, spread]));

  it('overlap by convolution with the exact chance', () => {
    const chance = overlapChance(
      { from: START, minutes: VENT_MIN, spread },
      { from: START + d, minutes: VENT_MIN, spread },
    );
    expect(Math.abs(chance - exactOverlap(d, s))).toBeLessThan(1e-9);
  });

  it('are over the limit minute by minute as the product of the two chances of being open', () => {
    const { overChance, leastOverChance, greatestOverChance } = spreadByConvolution(ventWeek(d), 'main', spreads, {
      gridKgPerH: 1,
      confidence: 0.95,
    });
    for (let t = 0; t < 260; t++) {
      const exact = openChance(START, t, s) * openChance(START + d, t, s);
      for (const found of [overChance, leastOverChance, greatestOverChance]) {
        expect(Math.abs((found?.[t] as number) - exact)).toBeLessThan(1e-9);
      }
    }
  });

  it('overlap in the sampled weeks within four standard errors', () => {
    const random = seededRandom(100 * d + s);
    const { asItStands } = createSpreadEvaluator(ventWeek(d), 'main', spreads, { samples: SAMPLES, random });
    const near = (found: number, exact: number) =>
      expect(Math.abs(found - exact)).toBeLessThanOrEqual(4 * Math.sqrt((exact * (1 - exact)) / SAMPLES) + 1e-12);
    near(asItStands.anyOverChance as number, Math.min(1, exactOverlap(d, s)));
    for (const t of [START + d, START + d + 3]) {
      near(asItStands.overChance?.[t] as number, openChance(START, t, s) * openChance(START + d, t, s));
    }
  });
});

it('the curve falls from near one half at 6 min apart to nothing at 2 s + 6', () => {
  // At 6 apart, s < 6: one half less half the chance of equal starts, 1 / (2 n).
  expect(exactOverlap(6, 5)).toBeCloseTo(0.5 - 0.5 / 11, 12);
  const curve = Array.from({ length: 13 }, (_, i) => exactOverlap(6 + i, 5));
  curve.slice(1).forEach((chance, i) => expect(chance).toBeLessThanOrEqual(curve[i] as number));
  expect(curve[9]).toBeGreaterThan(0);
  expect(curve[10]).toBe(0);
});
