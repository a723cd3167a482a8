import fc from 'fast-check';
import { expect, it } from 'vitest';
import { limitUsage, usesByLimit, whoUses } from '@/core/schedule/limitUse';
import { activity, flatMode } from '../support/builders';

const HORIZON = 300;
const use = fc.record({
  limitId: fc.constantFrom('crates', 'water'),
  offsetMin: fc.integer({ min: 0, max: 60 }),
  minutes: fc.integer({ min: 0, max: 90 }),
  amount: fc.integer({ min: 0, max: 8 }).map((eighths) => eighths / 8),
});
const placed = fc.record({
  start: fc.option(fc.integer({ min: -20, max: 280 }), { freq: 5 }),
  uses: fc.array(use, { maxLength: 4 }),
});
const steps = fc
  .uniqueArray(fc.integer({ min: 0, max: HORIZON - 1 }), { minLength: 1, maxLength: 4 })
  .chain((froms) =>
    fc
      .array(fc.integer({ min: 0, max: 16 }), { minLength: froms.length, maxLength: froms.length })
      .map((values) => [...froms].sort((a, b) => a - b).map((from, i) => ({ from, value: (values[i] as number) / 4 }))),
  );

const activitiesOf = (
  rows: readonly {
    start: number | null;
    uses: readonly { limitId: string; offsetMin: number; minutes: number; amount: number }[];
  }[],
) =>
  rows.map(({ start, uses }, i) =>
    activity(`a${i}`, {
      modes: [{ ...flatMode('unit1', 100, 0), uses }],
      placement: start === null ? null : { unitId: 'unit1', start },
    }),
  );

it('the use of a limit is the sum of its users at every minute, and over exactly where its spans say', () => {
  let overMinutes = 0;
  fc.assert(
    fc.property(fc.array(placed, { maxLength: 8 }), steps, (rows, capacity) => {
      const uses = usesByLimit(activitiesOf(rows)).get('crates') ?? [];
      const usage = limitUsage({ id: 'crates', name: 'Crates', unit: 'crates', capacity }, uses, HORIZON);
      for (let t = 0; t < HORIZON; t++) {
        const used = usage.used[t] as number;
        expect(used).toBe(whoUses(uses, t).reduce((sum, { amount }) => sum + amount, 0));
        const over = usage.over.some(({ from, to }) => from <= t && t < to);
        expect(over).toBe(used > (usage.limit[t] as number) + 1e-9);
        if (over) overMinutes++;
      }
      const total = uses.reduce((sum, { from, to, amount }) => {
        return sum + amount * Math.max(0, Math.min(HORIZON, to) - Math.max(0, from));
      }, 0);
      expect(usage.used.reduce((sum, amount) => sum + amount, 0)).toBeCloseTo(total, 9);
      const most = usage.used.reduce((a, b) => Math.max(a, b), 0);
      expect(usage.greatest?.amount ?? 0).toBe(most);
      if (usage.greatest) expect(usage.used.indexOf(most)).toBe(usage.greatest.minute);
    }),
    { numRuns: 200 },
  );
  expect(overMinutes).toBeGreaterThan(100);
});

it('what is not placed uses nothing, and one limit says nothing of another', () => {
  fc.assert(
    fc.property(fc.array(placed, { minLength: 1, maxLength: 6 }), (rows) => {
      const off = usesByLimit(activitiesOf(rows.map((row) => ({ ...row, start: null }))));
      expect(off.size).toBe(0);
      const crates = rows.map((row) => ({ ...row, uses: row.uses.filter(({ limitId }) => limitId === 'crates') }));
      const both = usesByLimit(activitiesOf(rows)).get('crates') ?? [];
      expect(usesByLimit(activitiesOf(crates)).get('crates') ?? []).toEqual(both);
    }),
    { numRuns: 60 },
  );
});
