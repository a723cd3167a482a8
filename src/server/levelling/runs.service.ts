import type { LevellingRunDto, LevellingState } from '@/contracts/levelling';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { conflict, notFound, type HttpProblem } from '../http/problem';
import { namesOf } from '../people/people.repo';
import { record } from '../record/record';
import { reapLostRuns } from './reaper';
import { runDto, type RunRow } from './runDto';
import { askToCancel, findRun, moveRun } from './runs.repo';

type Answer = Promise<Result<LevellingRunDto, HttpProblem>>;

/** A levelling run of the actor's plant as it is. */
export async function readRun(actor: Authorized<'plan.read'>, runId: string): Answer {
  await reapLostRuns();
  const run = await findRun(db, actor.plantId, runId);
  return run ? ok(await withName(db, run)) : fail(unknownRun);
}

/** Stops a run: at once where it still waits, else its worker is asked to. */
export async function cancelRun(actor: Authorized<'plan.level'>, runId: string): Answer {
  return changeRun(actor, runId, 'cancel', ['queued', 'running'], async (tx, run) => {
    if (run.state === 'running') await askToCancel(tx, run.id);
    else await moveRun(tx, run.id, ['queued'], { state: 'cancelled' }, now());
  });
}

/** Puts a proposal away. */
export async function discardRun(actor: Authorized<'plan.level'>, runId: string): Answer {
  return changeRun(actor, runId, 'discard', ['proposed'], async (tx, run) => {
    await moveRun(tx, run.id, ['proposed'], { state: 'discarded' }, now());
  });
}

async function changeRun(
  actor: Authorized<'plan.level'>,
  runId: string,
  what: 'cancel' | 'discard',
  allowed: readonly LevellingState[],
  change: (tx: Db, run: RunRow) => Promise<void>,
): Answer {
  return db.transaction(async (tx) => {
    const run = await findRun(tx, actor.plantId, runId, true);
    if (!run) return fail(unknownRun);
    if (!allowed.includes(run.state)) return fail(wrongState(run));
    await change(tx, run);
    await notify(tx, run.plantId, { kind: 'levelling', planId: run.planId, runId: run.id });
    await record(tx, actor, `levelling.${what}`, run.id, { planId: run.planId });
    return ok(await withName(tx, (await findRun(tx, actor.plantId, runId)) ?? run));
  });
}

async function withName(tx: Db, run: RunRow): Promise<LevellingRunDto> {
  return runDto(run, await namesOf(tx, [run.authorId]));
}

export const unknownRun = notFound('Your plant has no such levelling.');

const STATE_WORDS: Readonly<Record<LevellingState, string>> = {
  queued: 'still waits to be worked on',
  running: 'is still being worked on',
  proposed: 'has already brought its proposal',
  accepted: 'was already accepted',
  discarded: 'was discarded',
  cancelled: 'was cancelled',
  failed: 'failed',
};

/** Refuses what a run's state does not allow. */
export function wrongState(run: RunRow): HttpProblem {
  return conflict('LEVELLING-STATE', `That levelling ${STATE_WORDS[run.state]}; nothing was changed.`, {
    state: run.state,
  });
}
