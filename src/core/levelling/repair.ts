import { evaluateWeek, withPlacements, type WeekEvaluation } from '../pipeline';
import type { Placement } from '../plant/activity';
import type { Week } from '../schedule/week';
import type { Interval } from '../time/interval';
import { levelWeek, type LevellingEnv } from './levelWeek';
import type { Budget, LevellingOptions } from './options';
import type { LevellingProposal } from './proposal';
import { pushOn } from './pushOn';
import { withTrouble, type FloorTrouble } from './trouble';

/** What a repair may do: only what has not started and starts within the rest of the shift moves. */
export interface RepairOptions {
  readonly span: Interval;
  readonly seed?: number;
  readonly budget: Budget;
}

export interface RepairMove {
  readonly activityId: string;
  readonly from: Placement;
  readonly to: Placement;
  /** `pushed`: it could not stay where it was; `steam`: it makes room under the limits. */
  readonly why: 'pushed' | 'steam';
}

export interface Repair {
  /** Against the plan on the floor. */
  readonly moves: readonly RepairMove[];
  /** The plan on the floor with the trouble in it, and the repaired one. */
  readonly troubled: WeekEvaluation;
  readonly repaired: WeekEvaluation;
  readonly week: Week;
  /** What stays over the limit and why. */
  readonly unresolved: LevellingProposal['unresolved'];
}

/** A change on the floor costs people more than its minutes: few batches, and each in its own machine. */
const FLOOR_PRICES: NonNullable<LevellingOptions['prices']> = { batchMoved: 60, minuteMoved: 1, unitChanged: 60 };

/**
 * The least change of a plan under way that takes the trouble in: what can't stay is pushed on, then starts are
 * levelled under the limits that are left. Temperatures and times of processes stay as they are.
 */
export function repairWeek(week: Week, trouble: FloorTrouble, options: RepairOptions, env: LevellingEnv): Repair {
  const { span, seed, budget } = options;
  const troubled = withTrouble(week, trouble);
  const pushed = pushOn(troubled, span.from);
  const { proposal } = levelWeek(
    pushed,
    {
      span,
      greatestShiftMin: span.to - span.from,
      prices: FLOOR_PRICES,
      budget,
      ...(seed === undefined ? {} : { seed }),
    },
    env,
  );
  const repaired = withPlacements(
    pushed,
    proposal.moves.map(({ activityId, to }) => ({ activityId, placement: to })),
  );
  const levelled = new Set(proposal.moves.map((move) => move.activityId));
  return {
    moves: movesBetween(troubled, repaired, levelled),
    troubled: evaluateWeek(troubled),
    repaired: evaluateWeek(repaired),
    week: repaired,
    unresolved: proposal.unresolved,
  };
}

function movesBetween(before: Week, after: Week, levelled: ReadonlySet<string>): RepairMove[] {
  const placed = new Map(after.activities.map((a) => [a.id, a.placement]));
  return before.activities.flatMap(({ id, placement: from }): RepairMove[] => {
    const to = placed.get(id);
    if (!from || !to || (from.start === to.start && from.unitId === to.unitId)) return [];
    return [{ activityId: id, from, to, why: levelled.has(id) ? 'steam' : 'pushed' }];
  });
}
