/** What the checks of steam and duty share. */
import { expect } from 'vitest';
import type { Result } from '@/core/result';

/** The value of a result that must have succeeded. */
export function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.error.code}: ${result.error.message}`);
  return result.value;
}

/** The code and field of a result that must have failed. */
export function failureOf(result: Result<unknown>): { code: string; message: string; field: string | undefined } {
  if (result.ok) throw new Error('expected a problem, got a value');
  return { code: result.error.code, message: result.error.message, field: result.error.field };
}

/** Half a unit in the last printed place, with room for the rounding of the figure itself. */
function printedTolerance(printed: string): number {
  const decimals = printed.split('.')[1]?.length ?? 0;
  return 0.5 * 10 ** -decimals * 1.02;
}

/** Every value equals its figure as printed. */
export function expectPrinted(values: readonly number[], printed: readonly string[]): void {
  expect(values).toHaveLength(printed.length);
  for (const [index, figure] of printed.entries()) {
    const off = Math.abs((values[index] ?? Number.NaN) - Number(figure));
    expect(off, `${values[index]} for ${figure}`).toBeLessThanOrEqual(printedTolerance(figure));
  }
}

/** |value / expected - 1| is at most the tolerance. */
export function expectRelative(value: number, expected: number, tolerance: number): void {
  expect(Math.abs(value / expected - 1), `${value} for ${expected}`).toBeLessThanOrEqual(tolerance);
}
