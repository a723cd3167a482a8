/** From `from` (whole minutes since the week's first instant) on, the function has `value`. */
export interface Step {
  readonly from: number;
  readonly value: number;
}

/** A right-continuous step function: ascending in `from`; before the first step it is 0. */
export type StepFunction = readonly Step[];

/** The function's value at a minute. */
export function valueAt(fn: StepFunction, minute: number): number {
  let low = 0;
  let high = fn.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((fn[middle] as Step).from <= minute) low = middle + 1;
    else high = middle;
  }
  return low === 0 ? 0 : (fn[low - 1] as Step).value;
}

/** One value per minute of [0, horizonMin). */
export function toMinutes(fn: StepFunction, horizonMin: number): Float64Array {
  const values = new Float64Array(horizonMin);
  fn.forEach((step, i) => {
    const to = Math.min(horizonMin, fn[i + 1]?.from ?? horizonMin);
    if (to > Math.max(0, step.from)) values.fill(step.value, Math.max(0, step.from), to);
  });
  return values;
}

/** The shortest step function with these values per minute; equal neighbours are joined. */
export function fromMinutes(values: ArrayLike<number>): Step[] {
  const steps: Step[] = [];
  for (let t = 0; t < values.length; t++) {
    const value = values[t] as number;
    if (steps.length === 0 || (steps[steps.length - 1] as Step).value !== value) steps.push({ from: t, value });
  }
  return steps;
}
