import { problem, type Problem } from '../result';

/** The span in which a number makes sense, both ends included. */
export interface Range {
  /** As the sentence names it, capital first. */
  readonly name: string;
  readonly unit: string;
  readonly min: number;
  readonly max: number;
}

/** At most six significant digits, without trailing zeros: 0.35, 170.482, 1200. */
export const shortNumber = (value: number): string => String(Number(value.toPrecision(6)));

/**
 * {@link shortNumber} of an end of a range in other units, rounded into the range: what a person then types as the end is
 * inside.
 */
export function shortEnd(value: number, end: 'least' | 'most'): string {
  const near = Number(value.toPrecision(6));
  const slack = 1e-12 * Math.abs(value);
  if (value === 0 || (end === 'least' ? near >= value - slack : near <= value + slack)) return shortNumber(near);
  const step = 10 ** (Math.floor(Math.log10(Math.abs(value))) - 5);
  return shortNumber(end === 'least' ? near + step : near - step);
}

/**
 * Checks one number against its range; not-a-number is out of range.
 * @returns undefined when inside, else a problem naming the value and the range.
 */
export function checkRange(code: string, range: Range, value: number, field?: string): Problem | undefined {
  if (Number.isFinite(value) && value >= range.min && value <= range.max) return undefined;
  const unit = range.unit === '' ? '' : ` ${range.unit}`;
  const given = Number.isFinite(value) ? `${shortNumber(value)}${unit}` : 'not a number';
  const span = `${shortNumber(range.min)} to ${shortNumber(range.max)}${unit}`;
  return problem(code, `${range.name} is ${given}; it must be ${span}.`, field);
}
