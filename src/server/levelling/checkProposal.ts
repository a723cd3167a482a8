import type { LevellingProposal, ProposedMove } from '@/core/levelling/proposal';
import { plainNetwork } from '@/core/header/network';
import { evaluateWeek, withPlacements, type WeekEvaluation } from '@/core/pipeline';
import type { Breach } from '@/core/schedule/breach';
import type { Week } from '@/core/schedule/week';

const KG_TOLERANCE = 0.5;
const KG_FRACTION = 1e-3;

/** Limits that no move may break: process limits and shared limits. */
export type HardBreach = Extract<Breach, { readonly class: 'process' | 'shared' }>;

/** A week with moves taken, judged from scratch. */
export interface CheckedMoves {
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  /** Process and shared limits that the week as it stood kept, and these moves would break. */
  readonly broken: readonly HardBreach[];
}

/** Judges a week with some moves taken. */
export function tryMoves(week: Week, moves: readonly ProposedMove[]): CheckedMoves {
  const moved = withPlacements(
    week,
    moves.map(({ activityId, to }) => ({ activityId, placement: to })),
  );
  const evaluation = evaluateWeek(moved);
  return { week: moved, evaluation, broken: newlyBroken(evaluateWeek(week).breaches, evaluation.breaches) };
}

/**
 * What the solver says of its proposal and judging does not bear out; null where they agree. The solver knows neither
 * flash steam nor accumulators, which only take off the load, so that the two are held together without them.
 */
export function disagreement(week: Week, proposal: LevellingProposal): string | null {
  const { evaluation, broken } = tryMoves({ ...week, plant: plainNetwork(week.plant) }, proposal.moves);
  if (broken.length > 0) return `breaks ${broken.map(({ id }) => id).join(', ')}`;
  const kg = overKgOf(evaluation);
  const said = proposal.after.overKg;
  if (Math.abs(kg - said) > Math.max(KG_TOLERANCE, KG_FRACTION * Math.max(kg, said))) {
    return `${kg.toFixed(2)} kg over the limit, ${said.toFixed(2)} kg said`;
  }
  if (evaluation.lateMinutes !== proposal.after.lateMinutes) {
    return `${evaluation.lateMinutes} min late, ${proposal.after.lateMinutes} min said`;
  }
  return null;
}

/** Steam over limits and letdowns, all headers. [kg] */
export function overKgOf({ headers }: WeekEvaluation): number {
  return headers.reduce((kg, { over, letdown }) => kg + (over?.kg ?? 0) + (letdown?.kg ?? 0), 0);
}

/** Breaches of hard limits that are new or worse: the same limit passed by the same activities no further is neither. */
function newlyBroken(before: readonly Breach[], after: readonly Breach[]): HardBreach[] {
  const known = new Map<string, number>();
  for (const breach of before.filter(isHard)) {
    const key = keyOf(breach);
    known.set(key, Math.max(known.get(key) ?? 0, sizeOf(breach)));
  }
  return after.filter(isHard).filter((breach) => sizeOf(breach) > (known.get(keyOf(breach)) ?? -1));
}

const isHard = (breach: Breach): breach is HardBreach => breach.class === 'process' || breach.class === 'shared';

function keyOf(breach: HardBreach): string {
  const place = breach.class === 'shared' ? breach.limitId : (breach.ventGroupId ?? '');
  return JSON.stringify([breach.code, place, [...breach.activityIds].sort()]);
}

/** How far a breach goes: the excess over its limit, over its time. */
function sizeOf(breach: HardBreach): number {
  const minutes = breach.to - breach.from;
  return breach.found === null || breach.limit === null ? minutes : Math.abs(breach.found - breach.limit) * minutes;
}
