import type { Interval } from './interval';
import type { Step, StepFunction } from './stepFunction';

/** A span with a value. */
export interface ValuedSpan extends Interval {
  readonly value: number;
}

/** The same function with equal neighbours joined. */
export function joinSteps(fn: StepFunction): Step[] {
  return fn.filter((step, i) => i === 0 || step.value !== (fn[i - 1] as Step).value);
}

/** One function out of several: `op` gets the values that they have at each moment, in the order given. */
export function combineSteps(fns: readonly StepFunction[], op: (values: readonly number[]) => number): Step[] {
  const moments = [...new Set(fns.flatMap((fn) => fn.map((step) => step.from)))].sort((a, b) => a - b);
  const next = fns.map(() => 0);
  const values = fns.map(() => 0);
  const steps = moments.map((from) => {
    fns.forEach((fn, k) => {
      for (let step = fn[next[k] as number]; step && step.from <= from; step = fn[next[k]]) {
        values[k] = step.value;
        next[k] = (next[k] as number) + 1;
      }
    });
    return { from, value: op(values) };
  });
  return joinSteps(steps);
}

/** The sum at each moment. */
export function sumSteps(fns: readonly StepFunction[]): Step[] {
  return combineSteps(fns, (values) => values.reduce((sum, value) => sum + value, 0));
}

/** The least at each moment. */
export function leastSteps(fns: readonly StepFunction[]): Step[] {
  return combineSteps(fns, (values) => Math.min(...values));
}

/** Every value changed by `op`. */
export function mapSteps(fn: StepFunction, op: (value: number) => number): Step[] {
  return joinSteps(fn.map(({ from, value }) => ({ from, value: op(value) })));
}

/** A function from spans over a ground value that holds from minute 0; where spans overlap, the later in the list holds. */
export function stepsFromSpans(spans: readonly ValuedSpan[], ground: number): Step[] {
  const real = spans.filter((span) => span.to > span.from);
  const moments = [...new Set([0, ...real.flatMap((span) => [span.from, span.to])])].sort((a, b) => a - b);
  const valueFrom = (minute: number) =>
    real.findLast((span) => span.from <= minute && minute < span.to)?.value ?? ground;
  return joinSteps(moments.map((from) => ({ from, value: valueFrom(from) })));
}
