import type { AcceptRequest } from '@/contracts/levelling';
import type { EditResponse } from '@/contracts/week';
import type { LevellingProposal, ProposedMove } from '@/core/levelling/proposal';
import { fail, ok, type Result } from '@/core/result';
import { breachSentence, namesOf as breachNames } from '@/core/schedule/sentences';
import type { Week } from '@/core/schedule/week';
import { db, type Db } from '@/db/client';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { weekClock } from '../issues/judge';
import { applyChanges, checkChanges, type LockedPlan } from '../plans/edits.service';
import { lockPlanById } from '../plans/plans.repo';
import { activityName, someOf } from '../plans/words';
import { record } from '../record/record';
import { findWeek } from '../weeks/findWeek';
import { weekOfPlan } from '../weeks/weekOfPlan';
import { minuteOf, type WeekTime } from '../weeks/weekTime';
import { tryMoves } from './checkProposal';
import { findRun, moveRun } from './runs.repo';
import { unknownRun, wrongState } from './runs.service';

type Planner = Authorized<'plan.level'>;

/** Takes a proposal, whole or in part, if the plan as it is by now can still take it. */
export async function acceptRun(
  actor: Planner,
  runId: string,
  request: AcceptRequest,
): Promise<Result<EditResponse, HttpProblem>> {
  return db.transaction(async (tx) => {
    const known = await findRun(tx, actor.plantId, runId);
    const plan = known && (await lockPlanById(tx, actor.plantId, known.planId));
    const run = plan && (await findRun(tx, actor.plantId, runId, true));
    if (!run) return fail(unknownRun);
    if (run.state !== 'proposed') return fail(wrongState(run));
    const moves = chosenMoves(run.proposal as LevellingProposal, request);
    if (!moves) return fail(badInput('ACCEPT-UNKNOWN', 'The proposal has no such move.', 'activityIds'));
    const found = await findWeek(actor, plan.weekStart, tx);
    if (!found.ok) return found;
    const locked = { plan, time: found.value.time };
    const { week } = await weekOfPlan(tx, found.value, plan);
    const refused = await whyNot(tx, locked, week, moves);
    if (refused) return fail(refused);
    const saved = await applyChanges(tx, actor, locked, 'level', wantedOf(moves));
    if (!saved.ok) return saved;
    await moveRun(tx, run.id, ['proposed'], { state: 'accepted' }, now());
    await notify(tx, plan.plantId, { kind: 'levelling', planId: plan.id, runId: run.id });
    await record(tx, actor, 'levelling.accept', run.id, { planId: plan.id, moves: moves.length });
    return ok(saved.value);
  });
}

function chosenMoves(proposal: LevellingProposal, { activityIds }: AcceptRequest): readonly ProposedMove[] | null {
  if (activityIds === 'all') return proposal.moves;
  const wanted = new Set(activityIds);
  const chosen = proposal.moves.filter(({ activityId }) => wanted.has(activityId));
  return chosen.length === wanted.size ? chosen : null;
}

const wantedOf = (moves: readonly ProposedMove[]) =>
  moves.map(({ activityId, revision, to }) => ({ activityId, revision, placement: to }));

async function whyNot(
  tx: Db,
  locked: LockedPlan,
  week: Week,
  moves: readonly ProposedMove[],
): Promise<HttpProblem | null> {
  const checked = await checkChanges(tx, locked, 'level', wantedOf(moves));
  if (!checked.ok) return checked.error;
  return unknownUnit(week, moves) ?? tooLate(week, moves, locked.time) ?? breaksLimits(week, moves, locked.time);
}

function unknownUnit(week: Week, moves: readonly ProposedMove[]): HttpProblem | null {
  const known = new Set(week.plant.units.map(({ id }) => id));
  const gone = moves.some(({ to }) => !known.has(to.unitId));
  return gone ? notFound('A unit of the proposal is no longer there; nothing was moved. Level again.') : null;
}

function tooLate(week: Week, moves: readonly ProposedMove[], time: WeekTime): HttpProblem | null {
  const nowMinute = minuteOf(time, now());
  const past = new Set(
    moves.filter(({ from, to }) => Math.min(from.start, to.start) < nowMinute).map((m) => m.activityId),
  );
  if (past.size === 0) return null;
  const names = someOf(week.activities.filter(({ id }) => past.has(id)).map(activityName));
  const message = `The time for moving ${names} has passed; nothing was moved. Leave that out, or level again.`;
  return conflict('LEVELLING-PAST', message, { activityIds: [...past] });
}

function breaksLimits(week: Week, moves: readonly ProposedMove[], time: WeekTime): HttpProblem | null {
  const { week: moved, broken } = tryMoves(week, moves);
  if (broken.length === 0) return null;
  const names = breachNames(moved);
  const breaches = broken.map((breach) => breachSentence(breach, names, weekClock(time)));
  const named = someOf(breaches.map(({ title }) => title));
  const message = `With these moves the plan would break a limit: ${named}. Nothing was moved. Take more of the proposal, or level again.`;
  return conflict('OVER-PROCESS-LIMIT', message, { breaches });
}
