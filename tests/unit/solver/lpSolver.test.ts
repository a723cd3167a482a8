import { describe, expect, it } from 'vitest';
import { seededRandom, wholeBelow } from '@/core/levelling/random';
import type { LpModel, LpRow } from '@/core/levelling/solverPort';
import { solveLp } from '@/solver/lpSolver';

const SENSES: readonly LpRow['sense'][] = ['atLeast', 'atMost', 'equal'];

function randomModel(seed: number): LpModel {
  const random = seededRandom(seed);
  const variables = 2 + wholeBelow(random, 6);
  const rows = Array.from({ length: 1 + wholeBelow(random, 8) }, (): LpRow => {
    const terms = Array.from({ length: variables }, (_, i) => [i, wholeBelow(random, 7) - 3] as const);
    return {
      terms: terms.filter(([, coefficient]) => coefficient !== 0),
      sense: SENSES[wholeBelow(random, seed % 2 === 0 ? 3 : 2)] ?? 'atLeast',
      value: wholeBelow(random, 20) - 6,
    };
  });
  return { costs: Array.from({ length: variables }, () => 1 + wholeBelow(random, 9)), rows };
}

const sum = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0);

describe('solveLp', () => {
  it('names what is short of an optimum', () => {
    const rows: LpRow[] = [
      { terms: [[0, 1]], sense: 'atLeast', value: 4 },
      { terms: [[0, 1]], sense: 'atMost', value: 3 },
    ];
    expect(solveLp({ costs: [1], rows })).toEqual({ status: 'infeasible' });
    expect(solveLp({ costs: [-1], rows: [{ terms: [[0, 1]], sense: 'atLeast', value: 1 }] })).toEqual({
      status: 'unbounded',
    });
  });

  it('gives variables at zero, which the package leaves out', () => {
    const outcome = solveLp({
      costs: [1, 5],
      rows: [
        {
          terms: [
            [0, 1],
            [1, 1],
          ],
          sense: 'atLeast',
          value: 2,
        },
      ],
    });
    expect(outcome).toMatchObject({ status: 'optimal', values: [2, 0], objective: 2, duals: [1] });
  });

  it('keeps every row, and its duals prove the optimum, on random programs', () => {
    let optimal = 0;
    let withEquality = 0;
    for (let seed = 1; seed <= 300; seed++) {
      const model = randomModel(seed);
      const outcome = solveLp(model);
      if (outcome.status !== 'optimal') continue;
      optimal++;
      if (model.rows.some((r) => r.sense === 'equal')) withEquality++;
      const { values, duals, objective } = outcome;
      model.rows.forEach((row, i) => {
        const left = sum(row.terms.map(([v, c]) => c * (values[v] ?? 0)));
        if (row.sense !== 'atMost') expect(left).toBeGreaterThan(row.value - 1e-6);
        if (row.sense !== 'atLeast') expect(left).toBeLessThan(row.value + 1e-6);
        if (row.sense === 'atLeast') expect(duals[i]).toBeGreaterThanOrEqual(0);
        if (row.sense === 'atMost') expect(duals[i]).toBeLessThanOrEqual(0);
      });
      // Strong duality, and no reduced cost below zero.
      expect(sum(model.rows.map((row, i) => row.value * (duals[i] ?? 0)))).toBeCloseTo(objective, 6);
      model.costs.forEach((cost, v) => {
        const priced = model.rows.map((row, i) => {
          const coefficient = sum(row.terms.filter(([at]) => at === v).map(([, c]) => c));
          return coefficient * (duals[i] ?? 0);
        });
        expect(cost - sum(priced)).toBeGreaterThan(-1e-6);
      });
    }
    expect(optimal).toBeGreaterThan(100);
    expect(withEquality).toBeGreaterThan(20);
  });
});
