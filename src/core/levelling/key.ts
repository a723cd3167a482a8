import type { State } from './state';

/**
 * What is compared between plans, in order: vents and steam-ons over their number; shared limits over by more than in
 * the planner's plan; steam over in kg; shared limits over; minutes made late that were not; minutes late times
 * weight; price of the changes.
 */
export interface Key {
  readonly process: number;
  readonly sharedWorse: number;
  readonly steamKg: number;
  readonly shared: number;
  readonly lateWorse: number;
  readonly late: number;
  readonly change: number;
}

const ORDER = ['process', 'sharedWorse', 'steamKg', 'shared', 'lateWorse', 'late', 'change'] as const;
const SAME = 1e-6;

/** True where `a` is better than `b`. */
export function isBetter(a: Key, b: Key): boolean {
  for (const part of ORDER) {
    if (a[part] < b[part] - SAME) return true;
    if (a[part] > b[part] + SAME) return false;
  }
  return false;
}

/** What the planner's plan has, for comparison. */
export interface Baseline {
  readonly shared: number;
  /** Minutes late by activity. */
  readonly late: Float64Array;
}

/** What a state passes and is late by before anything is moved. */
export function baselineOf(state: State): Baseline {
  const late = Float64Array.from(state.model.activities, (a) => Math.max(0, state.endOf(a.index) - a.due));
  return { shared: limitsOver(state).shared, late };
}

/** Sums over the limits: vents in counts times minutes, steam in kg, shared limits as shares of the limit times minutes. */
export function limitsOver(state: State): { process: number; steamKg: number; shared: number } {
  let process = 0;
  let steamKg = 0;
  let shared = 0;
  for (let r = 0; r < state.over.length; r++) {
    const over = state.over[r]! < SAME ? 0 : state.over[r]!;
    const of = state.model.resourceClass[r];
    if (of === 'process') process += over;
    else if (of === 'steam') steamKg += over / 60;
    else shared += over / state.model.scale[r]!;
  }
  return { process, steamKg, shared };
}

/** How good a state is, beside what stood at first. */
export function keyOf(state: State, baseline: Baseline): Key {
  const { process, steamKg, shared } = limitsOver(state);
  let lateWorse = 0;
  for (const a of state.model.activities) {
    const late = state.endOf(a.index) - a.due;
    if (late > 0) lateWorse += Math.max(0, late - baseline.late[a.index]!);
  }
  const sharedWorse = Math.max(0, shared - baseline.shared);
  return { process, sharedWorse, steamKg, shared, lateWorse, late: state.late, change: state.change };
}
