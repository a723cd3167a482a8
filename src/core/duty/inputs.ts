/** Checking what a duty is asked for, and gathering what it needs. */
import { checkRange, shortNumber, type Range } from '../quantity/range';
import { fail, ok, problem, type Problem, type Result } from '../result';

/** Range of each numeric field of an input; forms read it too. */
export type InputRanges<Input> = {
  readonly [Field in keyof Input as Input[Field] extends number ? Field : never]: Range;
};

/** Shorthand for a table of ranges. */
export const range = (name: string, unit: string, min: number, max: number): Range => ({ name, unit, min, max });

export const DUTY_RANGE = 'DUTY-RANGE';

/** A shorter spell is a slip; 0 leaves a phase out. */
const LEAST_LENGTH_MIN = 0.01;

function checkLength(itsRange: Range, value: number, field: string): Problem | undefined {
  if (itsRange.unit !== 'min' || value === 0 || value >= LEAST_LENGTH_MIN) return undefined;
  const span = `0 or ${LEAST_LENGTH_MIN} to ${shortNumber(itsRange.max)} min`;
  return problem(DUTY_RANGE, `${itsRange.name} is ${shortNumber(value)} min; it must be ${span}.`, field);
}

/**
 * A length of time [min] is 0, where its range holds 0, or at least 0.01.
 * @returns the first field out of range as DUTY-RANGE, naming field, value and range; undefined when all are inside.
 */
export function checkInputs<Input extends object>(input: Input, ranges: InputRanges<Input>): Problem | undefined {
  const values = input as Readonly<Record<string, unknown>>;
  for (const [field, itsRange] of Object.entries<Range>(ranges)) {
    const bad = checkNumber(itsRange, Number(values[field] ?? Number.NaN), field);
    if (bad) return bad;
  }
  return undefined;
}

/** @returns DUTY-RANGE for one number outside its range, or a length of time that is neither 0 nor 0.01 min or more. */
export const checkNumber = (itsRange: Range, value: number, field: string): Problem | undefined =>
  checkRange(DUTY_RANGE, itsRange, value, field) ?? checkLength(itsRange, value, field);

/** Values that may only rise, each with its field. */
export type Ladder = readonly (readonly [name: string, field: string, value: number])[];

/** @returns the first value [degC] below the one before it as DUTY-ORDER, naming both; undefined when none falls. */
export function checkRising(ladder: Ladder): Problem | undefined {
  for (const [index, [name, field, value]] of ladder.entries()) {
    const below = ladder[index - 1];
    if (below && value < below[2]) {
      const text = `${name} is ${value} °C; it must be at least ${below[2]} °C (${below[0].toLowerCase()}).`;
      return problem('DUTY-ORDER', text, field);
    }
  }
  return undefined;
}

/** @returns DUTY-ORDER where what warms up from cold is cold above the temperature it comes to. [degC] */
export const checkCold = (coldC: number, name: string, field: string, hotC: number): Problem | undefined =>
  checkRising([
    ['Temperature when cold', 'coldC', coldC],
    [name, field, hotC],
  ]);

/** @returns the first problem in a list, checked as {@link checkInputs}, under `list.index.field`. */
export function checkEach<Item extends object>(
  list: string,
  items: readonly Item[],
  ranges: InputRanges<Item>,
): Problem | undefined {
  for (const [index, item] of items.entries()) {
    const bad = checkInputs(item, ranges);
    if (bad) return problem(bad.code, bad.message, `${list}.${index}.${bad.field}`);
  }
  return undefined;
}

/** Figures a form starts from; each stands for a plant that nobody has measured, and is marked so. */
export interface InputDefaults<Input> {
  readonly mark: typeof PLANT_SPECIFIC;
  readonly values: Partial<Input>;
}

export const PLANT_SPECIFIC = 'plant-specific default';

/** Marks a table of defaults; a field that is left out must be entered. */
export const plantDefaults = <Input>(values: Partial<Input>): InputDefaults<Input> => ({
  mark: PLANT_SPECIFIC,
  values,
});

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
