import type { WeekTime } from './weekTime';

/** Things of the plant that a week knows: what was retired is kept for weeks that had ended by then. */
export function inUseIn<T extends { readonly retiredAt: Date | null }>(time: WeekTime, rows: readonly T[]): T[] {
  return rows.filter(({ retiredAt }) => retiredAt === null || retiredAt >= time.endInstant);
}
