/** The one way from a duty's data to a mode that a run is planned in: phases on the grid, and what goes before them. */
import { betweenRatesOf } from '../duty/betweenRuns';
import { steamOfPhases, type Duty, type DutyPhase, type SteamSupply } from '../duty/duty';
import { workOut, type DutyModel } from '../duty/model';
import type { BetweenDraws, LimitUse, Mode, Phase } from '../plant/activity';
import { fail, ok, problem, type Result } from '../result';
import { toGrid } from './grid';
import { warmDuties } from './warmShell';

export interface WorkModeInput {
  readonly unitId: string;
  readonly dutyId: string | null;
  /** null: the stage draws no steam. */
  readonly duty: DutyModel | null;
  /** Steam of the unit's header; null: the unit has none, which only a typed profile gets by with. */
  readonly supply: SteamSupply | null;
  /** From the run's start to steam on: charging, loading. Whole. [min] */
  readonly leadMin: number;
  /** From the last phase's end to the unit's being free: unloading. Whole. [min] */
  readonly afterMin: number;
  /** The run takes at least this. Whole. [min] */
  readonly minutes: number;
  readonly uses: readonly LimitUse[];
}

/** A machine whose idling takes nothing is kept hot over any gap of a week. [min] */
const ANY_GAP_MIN = 10_080;

/** Gaps stand on whole minutes; a break-even this near above one is that one. [min] */
const WHOLE_MINUTE_TOLERANCE = 1e-9;

/**
 * Works a duty out and puts it on the grid. A machine that can idle warms up before the run and idles between runs, so
 * neither is a part of the run; a retort's shell is still warm after a short gap.
 * @returns the duty's own problems; MODE-SUPPLY where steam is drawn on a unit without a header; MODE-MINUTES for
 * lengths that are not whole or less than 0.
 */
export function workMode(input: WorkModeInput): Result<Mode> {
  const { unitId, dutyId, duty, supply, leadMin, afterMin, uses } = input;
  for (const field of ['leadMin', 'afterMin', 'minutes'] as const) {
    if (Number.isInteger(input[field]) && input[field] >= 0) continue;
    return fail(problem('MODE-MINUTES', `${input[field]} min: enter whole minutes, 0 or more.`, field));
  }
  const plain = { unitId, minutes: input.minutes, uses, dutyId, phases: [] };
  if (duty === null) return ok(plain);
  if (supply === null && duty.model !== 'typed') {
    return fail(problem('MODE-SUPPLY', 'The unit has no header to draw on; choose its header first.', 'headerId'));
  }
  const worked = workOut(duty, supply as SteamSupply);
  if (!worked.ok) return worked;
  const between = duty.model === 'typed' ? null : betweenDraws(worked.value);
  const onGrid = (phases: readonly DutyPhase[]): Phase[] =>
    toGrid(phases).map((phase) => ({ ...phase, offsetMin: phase.offsetMin + leadMin }));
  const phases = onGrid(between ? runOf(worked.value) : worked.value.phases);
  const warm = supply === null ? [] : warmDuties(duty, supply, { leadMin, afterMin });
  return ok({
    ...plain,
    phases,
    minutes: Math.max(input.minutes, (phases.at(-1) ? endOf(phases) : leadMin) + afterMin),
    ...(between ? { between } : {}),
    ...(warm.length > 0
      ? { warm: warm.map(({ gapUpToMin, phases: drawn }) => ({ gapUpToMin, phases: onGrid(drawn) })) }
      : {}),
    ...(worked.value.neverMoved ? { neverMoved: true } : {}),
  });
}

const endOf = (phases: readonly Phase[]): number => Math.max(...phases.map((p) => p.offsetMin + p.minutes));

/** What the machine draws before a run; null where its duty has no idling or no warming up. */
function betweenDraws(duty: Duty): BetweenDraws | null {
  const rates = betweenRatesOf(duty);
  if (!rates.ok) return null;
  const { idleKgPerH, warmUp } = rates.value;
  const phases = toGrid(warmUp);
  return { idleKgPerH, warmUp: phases, idleUpToMin: idleUpTo(idleKgPerH, warmUp, endOf(phases)) };
}

/** The longest whole gap that is idled: up to the break-even, and while there is no time to warm up again. */
function idleUpTo(idleKgPerH: number, warmUp: readonly DutyPhase[], warmUpMin: number): number {
  if (idleKgPerH === 0) return ANY_GAP_MIN;
  const breakEvenMin = (60 * steamOfPhases(warmUp)) / idleKgPerH;
  return Math.min(ANY_GAP_MIN, Math.max(warmUpMin - 1, Math.floor(breakEvenMin + WHOLE_MINUTE_TOLERANCE)));
}

/** The run's own phases: neither the warming up before it nor the idling after it. */
const runOf = ({ phases }: Duty): DutyPhase[] => phases.filter(({ kind }) => !BEFORE_OR_AFTER.has(kind));

const BEFORE_OR_AFTER: ReadonlySet<string> = new Set(['warmUp', 'heatUp', 'idle']);
