import type { LevellingProposal, ProposedMove } from '@/core/levelling/proposal';
import { plainNetwork } from '@/core/header/network';
import { evaluateWeek, withPlacements, type WeekEvaluation } from '@/core/pipeline';
import { newlyBroken, type HardBreach } from '@/core/schedule/newlyBroken';
import type { Week } from '@/core/schedule/week';

const KG_TOLERANCE = 0.5;
const KG_FRACTION = 1e-3;

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
