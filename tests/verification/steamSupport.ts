/** What the checks of steam and duty share. */
import { expect } from 'vitest';

export { failureOf, valueOf } from './outcome';

/** |value / expected - 1| is at most the tolerance. */
export function expectRelative(value: number, expected: number, tolerance: number): void {
  expect(Math.abs(value / expected - 1), `${value} for ${expected}`).toBeLessThanOrEqual(tolerance);
}
