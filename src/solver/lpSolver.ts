import solver from 'javascript-lp-solver';
import type { LpModel, LpOutcome } from '../core/levelling/solverPort';
import { readDuals, type Tableau } from './duals';

interface RawModel {
  optimize: string;
  opType: 'min';
  constraints: Record<string, Record<string, number>>;
  variables: Record<string, Record<string, number>>;
}

interface Solution {
  readonly feasible: boolean;
  readonly evaluation: number;
  readonly bounded: boolean;
  readonly solutionSet: Record<string, number>;
  readonly _tableau: Tableau;
}

/** The package's words. It scales nothing, so models should hold numbers of like size. */
const BOUND = { atLeast: 'min', atMost: 'max', equal: 'equal' } as const;

/** Solves a linear program with javascript-lp-solver. Variables at zero are missing from its answer. */
export function solveLp(model: LpModel): LpOutcome {
  const raw: RawModel = { optimize: 'cost', opType: 'min', constraints: {}, variables: {} };
  model.costs.forEach((cost, i) => (raw.variables[`x${i}`] = { cost }));
  model.rows.forEach((row, i) => {
    raw.constraints[`r${i}`] = { [BOUND[row.sense]]: row.value };
    for (const [variable, coefficient] of row.terms) {
      const column = raw.variables[`x${variable}`];
      if (column) column[`r${i}`] = (column[`r${i}`] ?? 0) + coefficient;
    }
  });
  const solution = solver.Solve(raw, undefined, true) as Solution;
  if (!solution.feasible) return { status: 'infeasible' };
  if (!solution.bounded) return { status: 'unbounded' };
  return {
    status: 'optimal',
    objective: solution.evaluation,
    values: model.costs.map((_, i) => solution.solutionSet[`x${i}`] ?? 0),
    duals: readDuals(model.rows, solution._tableau),
  };
}
