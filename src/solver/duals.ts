import type { LpRow } from '../core/levelling/solverPort';

/** The part of the package's final tableau that duals are read from; undocumented, so the package is pinned. */
export interface Tableau {
  readonly matrix: ArrayLike<number>;
  readonly width: number;
  readonly costRowIndex: number;
  /** Column of a variable that is not in the basis, by its index; -1 where it is in the basis. */
  readonly colByVarIndex: ArrayLike<number>;
}

/**
 * Dual values of the rows in javascript-lp-solver 1.0.3's final tableau. Slack variables are numbered from 0 in the
 * order of the constraints; an equality takes two, one for each direction. The reduced cost of a slack in the cost row
 * is its row's multiplier, 0 while the slack is in the basis.
 */
export function readDuals(rows: readonly LpRow[], tableau: Tableau): number[] {
  let slack = 0;
  return rows.map((row) => {
    if (row.sense === 'equal') {
      slack += 2;
      return reducedCost(tableau, slack - 1) - reducedCost(tableau, slack - 2);
    }
    slack += 1;
    const multiplier = Math.abs(reducedCost(tableau, slack - 1));
    return row.sense === 'atLeast' ? multiplier : -multiplier;
  });
}

function reducedCost({ matrix, width, costRowIndex, colByVarIndex }: Tableau, variable: number): number {
  const column = colByVarIndex[variable] ?? -1;
  return column < 0 ? 0 : (matrix[costRowIndex * width + column] ?? 0);
}
