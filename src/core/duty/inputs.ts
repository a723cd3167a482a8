/** Checking what a duty is asked for, and gathering what it needs. */
import { checkRange, type Range } from '../quantity/range';
import { fail, ok, type Problem, type Result } from '../result';

/** Range of each numeric field of an input; forms read it too. */
export type InputRanges<Input> = {
  readonly [Field in keyof Input as Input[Field] extends number ? Field : never]: Range;
};

/** Shorthand for a table of ranges. */
export const range = (name: string, unit: string, min: number, max: number): Range => ({ name, unit, min, max });

export const DUTY_RANGE = 'DUTY-RANGE';

/** @returns the first field out of range as DUTY-RANGE, naming field, value and range; undefined when all are inside. */
export function checkInputs<Input extends object>(input: Input, ranges: InputRanges<Input>): Problem | undefined {
  const values = input as Readonly<Record<string, unknown>>;
  for (const [field, itsRange] of Object.entries<Range>(ranges)) {
    const bad = checkRange(DUTY_RANGE, itsRange, Number(values[field] ?? Number.NaN), field);
    if (bad) return bad;
  }
  return undefined;
}

/** All of several results, or the first problem among them. */
export function allOf<Values extends object>(results: {
  readonly [Name in keyof Values]: Result<Values[Name]>;
}): Result<Values> {
  const values: Record<string, unknown> = {};
  for (const [name, result] of Object.entries<Result<unknown>>(results)) {
    if (!result.ok) return fail(result.error);
    values[name] = result.value;
  }
  return ok(values as Values);
}
