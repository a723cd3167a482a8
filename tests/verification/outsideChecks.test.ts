/** Every figure from outside, one test each: the same table that `npm run verify` lists. */
import { describe, expect, it } from 'vitest';
import { ALL_CHECKS } from './checks';
import { carryOut } from './checks/check';

const groups = [...new Set(ALL_CHECKS.map(({ group }) => group))];

describe.each(groups)('%s', (group) => {
  it.each(ALL_CHECKS.filter((check) => check.group === group))('$what, $mark', (check) => {
    const row = carryOut(check);
    expect(row.ok, `${row.computed} ${row.unit} for ${row.expected}, ${row.source}`).toBe(true);
  });
});

describe('the table of checks', () => {
  it('names every row once, by group, figure and source', () => {
    const names = ALL_CHECKS.map(({ group, what, unit, source, expected }) =>
      [group, what, unit, source, expected].join(),
    );
    expect(new Set(names).size).toBe(names.length);
  });

  it('gives every row a source, a mark and a tolerance no wider than 4 % or the printed digit asks for', () => {
    for (const { source, tolerance, expected, what } of ALL_CHECKS) {
      expect(source).not.toBe('');
      expect(Number.isFinite(expected), what).toBe(true);
      const width = tolerance.kind === 'relative' ? tolerance.value : tolerance.value / Math.abs(expected);
      expect(width, what).toBeGreaterThan(0);
      expect(width, what).toBeLessThanOrEqual(0.04);
    }
  });

  it('counts what is from memory apart, and it is the smallest part', () => {
    const count = (mark: string) => ALL_CHECKS.filter((check) => check.mark === mark).length;
    expect(count('published') + count('independent') + count('memory')).toBe(ALL_CHECKS.length);
    expect(count('memory')).toBeGreaterThan(0);
    expect(count('memory')).toBeLessThan(count('published'));
  });

  it('fails on a figure that is wrong by five times its tolerance', () => {
    for (const check of ALL_CHECKS) {
      const { kind, value } = check.tolerance;
      const off = 5 * (kind === 'absolute' ? value : value * Math.abs(check.expected));
      expect(carryOut({ ...check, expected: check.expected + off }).ok, check.what).toBe(false);
    }
  });
});
