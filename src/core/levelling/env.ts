import type { Exchange } from './exchange';
import type { Plan } from './problem';
import type { SolveLp } from './solverPort';

/** How far a run has come. */
export interface LevellingProgress {
  readonly ms: number;
  readonly iterations: number;
  readonly overKg: number;
  readonly lateMin: number;
  readonly movedMin: number;
  /** Vents, steam-ons and shared limits over, counts and shares times minutes. */
  readonly limitsOver: number;
}

/** What a run needs from outside; core has no clock and no package of its own. */
export interface LevellingEnv {
  readonly solveLp: SolveLp;
  /** Milliseconds of any clock that only goes forward; needed for a budget in ms. */
  readonly now?: () => number;
  readonly cancelled?: () => boolean;
  /** Called now and then, at whole numbers of iterations. */
  readonly onProgress?: (progress: LevellingProgress) => void;
  /** Another search of the same problem on another thread; left out: this one alone. */
  readonly exchange?: Exchange;
}

/** A plan for a problem, and how it was found. */
export interface Solved {
  readonly plan: Plan;
  readonly iterations: number;
  readonly cancelled: boolean;
  readonly withheld: boolean;
}
