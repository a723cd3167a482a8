import type { CleaningKind } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';
import type { CleanableUnit } from '../../core/schedule/plannedCleaning';
import type { Drawn } from './drawn';

/** A clean that would put something right: of which unit, and from when it is of use. */
export interface WantedClean {
  readonly unitId: string;
  /** Minutes since the week's first instant. */
  readonly from: number;
}

export const CLEAN_WORDS: Readonly<Record<CleaningKind, string>> = {
  rinse: 'rinse',
  wash: 'wash',
  allergen: 'allergen clean',
};

/** The clean that cures a unit's running or standing too long; null for what no clean cures. */
export function cleanFor(
  breach: Breach,
  byUnit: ReadonlyMap<string, readonly Drawn[]>,
  cleanable: readonly CleanableUnit[],
): WantedClean | null {
  if (breach.class !== 'process' || (breach.code !== 'runningTooLong' && breach.code !== 'standingDirty')) return null;
  const runId = breach.activityIds[0] ?? '';
  const taken = [...byUnit.values()].find((drawn) => drawn.some(({ activity }) => activity.id === runId));
  const run = taken?.find(({ activity }) => activity.id === runId);
  if (!taken || !run || !fullCleanOf(cleanable, run.unitId)) return null;
  const { unitId, start, minutes } = run;
  if (breach.code === 'standingDirty')
    return { unitId, from: Math.max(start + minutes, breach.from - (breach.limit ?? 0)) };
  const free = taken.map((one) => one.start + one.minutes).filter((end) => end <= start);
  return { unitId, from: free.length > 0 ? Math.max(...free) : start + minutes };
}

/** The least full clean that a unit has a rule for; undefined where only rinses or none. */
export function fullCleanOf(cleanable: readonly CleanableUnit[], unitId: string): CleaningKind | undefined {
  return kindsOf(cleanable, unitId).find((kind) => kind !== 'rinse');
}

/** The kinds of clean that a unit has a rule for, least first. */
export function kindsOf(cleanable: readonly CleanableUnit[], unitId: string): readonly CleaningKind[] {
  return cleanable.find(({ unit }) => unit.id === unitId)?.kinds ?? [];
}
