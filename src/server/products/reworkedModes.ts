/** What the library makes of a planned run's modes now. Pure. */
import { steamOfPhases } from '@/core/duty/duty';
import type { LimitUse, Mode, Stage } from '@/core/plant/activity';
import type { Result } from '@/core/result';
import type { StageOnUnit } from './stageModes';

/** A route's row, for one product. */
export interface RouteStage extends StageOnUnit {
  readonly stage: Stage;
}

export interface Reworked {
  readonly modes: readonly Mode[];
  readonly faults: readonly string[];
}

/** Rates worked out on the same figures differ by rounding alone. */
const RATE_TOLERANCE = 1e-9;

function same(a: unknown, b: unknown): boolean {
  if (typeof a === 'number' && typeof b === 'number') {
    return Math.abs(a - b) <= RATE_TOLERANCE * Math.max(1, Math.abs(a), Math.abs(b));
  }
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return a === b;
  const left = a as Record<string, unknown>;
  const right = b as Record<string, unknown>;
  return [...new Set([...Object.keys(left), ...Object.keys(right)])].every((key) => same(left[key], right[key]));
}

/** True where two lists of modes are the same but for rounding. */
export const sameModes = (a: readonly Mode[], b: readonly Mode[]): boolean => same(a, b);

/** A use that ran to the run's end runs to its new end; none runs beyond it. */
function usesWithin(uses: readonly LimitUse[], row: readonly LimitUse[], before: number, after: number): LimitUse[] {
  return row.flatMap((use, index): LimitUse[] => {
    const old = uses[index];
    const ranToEnd = old?.limitId === use.limitId && old.offsetMin + old.minutes === before;
    const to = ranToEnd ? after : Math.min(after, use.offsetMin + use.minutes);
    return to > use.offsetMin ? [{ ...use, minutes: to - use.offsetMin }] : [];
  });
}

const rowFor = (rows: readonly RouteStage[], mode: Mode): RouteStage | undefined =>
  rows.find((row) => row.unitId === mode.unitId && row.dutyId === mode.dutyId) ??
  rows.find((row) => row.unitId === mode.unitId);

/**
 * The modes of a run by the route as it is now. A stage without a duty keeps its length, which hangs on the quantity;
 * a unit that the route no longer names stays only while the run is placed on it; one that can't be worked out keeps
 * its mode, and says why.
 */
export function reworkedModes(
  run: { readonly modes: readonly Mode[]; readonly unitId: string | null },
  rows: readonly RouteStage[],
  modeOf: (stage: StageOnUnit) => Result<Mode>,
): Reworked {
  const faults: string[] = [];
  const sized = run.modes.find((mode) => mode.sized)?.sized;
  const worked = (row: StageOnUnit, kept: Mode | null): Mode[] => {
    const mode = modeOf(sized ? { ...row, sized } : row);
    if (!mode.ok) faults.push(mode.error.message);
    if (!mode.ok) return kept ? [kept] : [];
    const uses = kept ? usesWithin(kept.uses, row.uses, kept.minutes, mode.value.minutes) : mode.value.uses;
    return [{ ...mode.value, uses }];
  };
  const kept = run.modes.flatMap((mode): Mode[] => {
    const row = rowFor(rows, mode);
    if (row) return row.dutyId === null && mode.dutyId === null ? [mode] : worked(row, mode);
    return rows.length === 0 || mode.unitId === run.unitId ? [mode] : [];
  });
  const known = new Set(run.modes.map(({ unitId }) => unitId));
  const added = rows.filter((row) => row.dutyId !== null && !known.has(row.unitId)).flatMap((row) => worked(row, null));
  const modes = [...kept, ...added];
  return { modes: modes.length > 0 ? modes : run.modes, faults };
}

const peakOf = (mode: Mode): number => Math.max(0, ...mode.phases.map(({ steamKgPerH }) => steamKgPerH));

/** What changes on the unit that a run is placed on, else on its first. [min, kg/h, kg] */
export function changeWords(before: readonly Mode[], after: readonly Mode[], unitId: string | null): string {
  const of = (modes: readonly Mode[]) => modes.find((mode) => mode.unitId === unitId) ?? modes[0];
  const [old, now] = [of(before), of(after)];
  if (!old || !now) return 'other units';
  const changes = [
    change(old.minutes, now.minutes, 'min'),
    change(Math.round(peakOf(old)), Math.round(peakOf(now)), 'kg/h at most'),
    change(Math.round(steamOfPhases(old.phases)), Math.round(steamOfPhases(now.phases)), 'kg'),
  ].filter((words) => words !== '');
  if (changes.length > 0) return changes.join(', ');
  return before.length === after.length ? 'what is drawn before it or after short gaps' : 'the units that can do it';
}

const change = (before: number, after: number, unit: string): string =>
  before === after ? '' : `${before} to ${after} ${unit}`;
