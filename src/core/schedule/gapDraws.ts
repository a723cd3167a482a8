/**
 * What a unit draws for the sake of its next run: kept hot over a short gap, warmed up before it after a long one or
 * as the first of the week; and a run that takes less because its machine is still warm.
 */
import { drawnMode, type Activity, type BetweenDraws, type Mode, type Phase } from '../plant/activity';
import { releaseAfterMin } from '../plant/plant';
import type { Changeover } from './changeovers';
import { derivedActivity } from './derived';
import type { Occupation } from './occupation';
import type { Week } from './week';
import { indexOf } from './weekIndex';

/** The time before a run on its unit. Whole minutes; less than 0 where the two overlap. */
export interface RunGap {
  readonly run: Activity;
  readonly unitId: string;
  readonly mode: Mode;
  readonly start: number;
  /** Since the unit was free of the run before; null: the first run of the week. */
  readonly sinceRunMin: number | null;
  /** Since it was free and clean: the cleaning between the two done and released, whether it follows or is stored. */
  readonly sinceReadyMin: number;
}

/** An idle spell or a warm-up, and the run that it is for. */
export interface GapDraw {
  readonly activity: Activity;
  readonly runId: string;
}

/** The gaps before runs whose draws hang on them, in order of unit and time. */
export function runGaps(
  week: Week,
  occupations: ReadonlyMap<string, readonly Occupation[]>,
  found: readonly Changeover[],
): RunGap[] {
  const cleanAt = new Map(
    found.map(({ nextId, from, rule }) => [nextId, from + rule.minutes + releaseAfterMin(week.plant, rule)] as const),
  );
  return [...occupations.keys()].sort().flatMap((unitId) => unitGaps(week, occupations.get(unitId) ?? [], cleanAt));
}

function unitGaps(week: Week, taken: readonly Occupation[], cleanAt: ReadonlyMap<string, number>): RunGap[] {
  const { activities } = indexOf(week);
  const gaps: RunGap[] = [];
  let freeOfRun: number | null = null;
  let free = 0;
  for (const { activityId, unitId, from, to } of taken) {
    const run = activities.get(activityId) as Activity;
    const mode = drawnMode(run);
    if (mode && (mode.between || mode.warm)) {
      const sinceRunMin = freeOfRun === null ? null : from - freeOfRun;
      const ready = Math.max(free, cleanAt.get(run.id) ?? free);
      gaps.push({ run, unitId, mode, start: from, sinceRunMin, sinceReadyMin: from - ready });
    }
    if (run.kind !== 'cleaning') freeOfRun = to;
    free = to;
  }
  return gaps;
}

/** Kept hot, warmed up, or nothing before a run; a first run is warmed up. */
export function choiceBefore(
  between: Pick<BetweenDraws, 'idleUpToMin'>,
  sinceRunMin: number | null,
  sinceReadyMin: number,
): 'idle' | 'warmUp' | 'none' {
  if (sinceRunMin === null) return 'warmUp';
  if (sinceReadyMin <= 0) return 'none';
  return sinceReadyMin <= between.idleUpToMin ? 'idle' : 'warmUp';
}

/** A run's phases by the time since the run before; those of the cold machine where none is said or it is too long ago. */
export function phasesAfter(mode: Pick<Mode, 'phases' | 'warm'>, sinceRunMin: number | null): readonly Phase[] {
  if (sinceRunMin === null || sinceRunMin < 0) return mode.phases;
  return mode.warm?.find(({ gapUpToMin }) => sinceRunMin <= gapUpToMin)?.phases ?? mode.phases;
}

/** The idle spells and warm-ups of a week. */
export function gapDraws(gaps: readonly RunGap[]): GapDraw[] {
  return gaps.flatMap((gap) => {
    const { between } = gap.mode;
    const choice = between ? choiceBefore(between, gap.sinceRunMin, gap.sinceReadyMin) : 'none';
    if (!between || choice === 'none') return [];
    const activity = remembered(gap, choice, () =>
      choice === 'idle' ? idleSpell(gap, between.idleKgPerH) : warmUp(gap, between.warmUp),
    );
    return [{ activity, runId: gap.run.id }];
  });
}

/** The runs that draw other phases than those of their mode, by id: the same value for the same run and gap. */
export function warmRuns(gaps: readonly RunGap[]): Map<string, Activity> {
  const found = new Map<string, Activity>();
  for (const { run, mode, sinceRunMin } of gaps) {
    const phases = phasesAfter(mode, sinceRunMin);
    if (phases !== mode.phases) found.set(run.id, withPhases(run, mode, phases));
  }
  return found;
}

const runsByPhases = new WeakMap<Activity, Map<readonly Phase[], Activity>>();

function withPhases(run: Activity, mode: Mode, phases: readonly Phase[]): Activity {
  const known = runsByPhases.get(run) ?? new Map<readonly Phase[], Activity>();
  runsByPhases.set(run, known);
  const warm = known.get(phases) ?? {
    ...run,
    modes: run.modes.map((one) => (one === mode ? { ...mode, phases } : one)),
  };
  known.set(phases, warm);
  return warm;
}

const spellsByRun = new WeakMap<Activity, { readonly key: string; readonly activity: Activity }>();

/** The spell of the last time where nothing has changed, so that a hand that drags changes no more than it must. */
function remembered({ run, start, sinceReadyMin }: RunGap, choice: string, make: () => Activity): Activity {
  const key = choice === 'idle' ? `idle ${start} ${sinceReadyMin}` : `${choice} ${start}`;
  const last = spellsByRun.get(run);
  if (last?.key === key) return last.activity;
  const activity = make();
  spellsByRun.set(run, { key, activity });
  return activity;
}

function idleSpell({ run, unitId, mode, start, sinceReadyMin }: RunGap, idleKgPerH: number): Activity {
  const phases: Phase[] = [{ kind: 'idle', offsetMin: 0, minutes: sinceReadyMin, steamKgPerH: idleKgPerH }];
  const title = `Kept hot for ${run.code}`;
  const spell = { unitId, start: start - sinceReadyMin, minutes: sinceReadyMin, phases, uses: [], dutyId: mode.dutyId };
  return derivedActivity({ id: `idle:${run.id}`, kind: 'idle', run, title, ...spell });
}

function warmUp({ run, unitId, mode, start }: RunGap, phases: readonly Phase[]): Activity {
  const minutes = warmUpMinutes(phases);
  const title = `Warm-up for ${run.code}`;
  const spell = { unitId, start: start - minutes, minutes, phases, uses: [], dutyId: mode.dutyId };
  return derivedActivity({ id: `warm:${run.id}`, kind: 'warmUp', run, title, ...spell });
}

/** How long before the run a warm-up begins. [min] */
const warmUpMinutes = (phases: readonly Phase[]): number =>
  phases.reduce((end, phase) => Math.max(end, phase.offsetMin + phase.minutes), 0);
