import { levelWeek as levelWith, type LevellingEnv, type LevellingResult } from '../core/levelling/levelWeek';
import type { LevellingOptions } from '../core/levelling/options';
import type { Week } from '../core/schedule/week';
import { solveLp } from './lpSolver';

/** What a caller may hand in; the LP package and a clock are filled in. */
export type LevelWeekEnv = Partial<Omit<LevellingEnv, 'solveLp'>>;

/** Levels a week on this thread; it computes until the budget is used up or the cancel flag is seen. */
export function levelWeek(week: Week, options: LevellingOptions = {}, env: LevelWeekEnv = {}): LevellingResult {
  return levelWith(week, options, { now: () => performance.now(), ...env, solveLp });
}
