/** One row of a linear program. Terms are pairs of a variable's position and its coefficient. */
export interface LpRow {
  readonly terms: readonly (readonly [number, number])[];
  readonly sense: 'atLeast' | 'atMost' | 'equal';
  readonly value: number;
}

/** Minimise the sum of costs times variables, all of them at least 0. */
export interface LpModel {
  readonly costs: readonly number[];
  readonly rows: readonly LpRow[];
}

/**
 * Numbers come only with an optimum. `duals[i]` is the change of the objective per unit of row i's value: at least 0 for
 * `atLeast`, at most 0 for `atMost`; their sum over the rows, each times its value, is the objective. Where several
 * sets of duals are right, any may be given.
 */
export type LpOutcome =
  | {
      readonly status: 'optimal';
      readonly objective: number;
      readonly values: readonly number[];
      readonly duals: readonly number[];
    }
  | { readonly status: 'infeasible' | 'unbounded' };

/** What levelling asks of a linear-programming package. */
export type SolveLp = (model: LpModel) => LpOutcome;
