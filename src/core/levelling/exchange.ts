import type { Assignment } from './search';

/**
 * Two searches of one problem that tell each other the best plan that they have found. One starts from the planner's
 * plan, the other from nothing.
 */
export interface Exchange {
  readonly startsFrom: 'plan' | 'nothing';
  /** Tells the other search, and gives what it has told since, if anything. */
  meet(best: Assignment): Assignment | null;
  /** The last meeting: nothing more comes from this search. */
  close(best: Assignment): Assignment | null;
}

/** Iterations between two meetings. */
export const MEETING_EVERY = 1_024;
