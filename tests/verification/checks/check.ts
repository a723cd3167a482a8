/** One figure from outside, held against what the product works out. */

/**
 * Where the expected figure is from: `published`, seen in a source; `independent`, computed with another implementation
 * of the same formulas; `memory`, known but not looked up, so counted apart.
 */
export type Mark = 'published' | 'independent' | 'memory';

export interface Tolerance {
  readonly kind: 'relative' | 'absolute';
  readonly value: number;
}

export interface Check {
  readonly group: string;
  readonly what: string;
  readonly unit: string;
  readonly source: string;
  readonly mark: Mark;
  readonly expected: number;
  readonly tolerance: Tolerance;
  readonly computed: () => number;
}

/** A check carried out; plain data. */
export interface CheckRow extends Omit<Check, 'computed'> {
  readonly computed: number;
  /** |computed / expected - 1|; null where 0 is expected. */
  readonly relativeError: number | null;
  readonly ok: boolean;
}

export function carryOut({ computed, ...check }: Check): CheckRow {
  const value = computed();
  const off = Math.abs(value - check.expected);
  const relativeError = check.expected === 0 ? null : off / Math.abs(check.expected);
  const measure = check.tolerance.kind === 'absolute' ? off : (relativeError ?? Number.NaN);
  return { ...check, computed: value, relativeError, ok: measure <= check.tolerance.value };
}

export const relative = (value: number): Tolerance => ({ kind: 'relative', value });
export const absolute = (value: number): Tolerance => ({ kind: 'absolute', value });

/** Half a unit of the last printed digit, with room for the rounding of the figure itself. */
export function asPrinted(figure: string): Tolerance {
  const decimals = figure.split('.')[1]?.length ?? 0;
  return absolute(0.5 * 10 ** -decimals * 1.02);
}

/** What the checks of a table share. */
export interface Table {
  readonly group: string;
  readonly source: string;
  readonly mark: Mark;
}

/** A figure as it stands printed, held to its last digit. */
export function printed(table: Table, what: string, unit: string, figure: string, computed: () => number): Check {
  return { ...table, what, unit, expected: Number(figure), tolerance: asPrinted(figure), computed };
}

/** A figure with a tolerance of its own. */
export function within(
  table: Table,
  what: string,
  unit: string,
  expected: number,
  tolerance: Tolerance,
  computed: () => number,
): Check {
  return { ...table, what, unit, expected, tolerance, computed };
}
