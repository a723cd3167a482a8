import { and, eq, inArray, sql } from 'drizzle-orm';
import type { LevellingProgressDto, LevellingState } from '@/contracts/levelling';
import type { Db } from '@/db/client';
import { levellingRuns, plans } from '@/db/schema/index';
import type { RunRow } from './runDto';

/** Heartbeats are told and judged by the database's clock: processes need not agree on the time to notice a dead one. */
const databaseNow = sql`now()`;
export const DEAD_AFTER_SECONDS = 20;
export const UNTAKEN_AFTER_SECONDS = 600;

/** A plant's run; null where it has none of that id. `lock` keeps others from changing it. */
export async function findRun(tx: Db, plantId: string, runId: string, lock = false): Promise<RunRow | null> {
  const query = tx
    .select()
    .from(levellingRuns)
    .where(and(eq(levellingRuns.plantId, plantId), eq(levellingRuns.id, runId)));
  const [row] = lock ? await query.for('update') : await query;
  return row ?? null;
}

/** Writes a run that waits for a worker. */
export async function insertRun(tx: Db, row: typeof levellingRuns.$inferInsert): Promise<RunRow> {
  const [written] = await tx
    .insert(levellingRuns)
    .values({ ...row, heartbeatAt: databaseNow })
    .returning();
  if (!written) throw new Error('a levelling run was inserted and not returned');
  return written;
}

/** Takes a waiting run for this worker; null where another has, or it was cancelled. */
export async function takeRun(tx: Db, runId: string): Promise<(RunRow & { readonly weekStart: string }) | null> {
  const [taken] = await tx
    .update(levellingRuns)
    .set({ state: 'running', heartbeatAt: databaseNow })
    .where(and(eq(levellingRuns.id, runId), eq(levellingRuns.state, 'queued')))
    .returning();
  if (!taken) return null;
  const [plan] = await tx.select({ weekStart: plans.weekStart }).from(plans).where(eq(plans.id, taken.planId));
  return plan ? { ...taken, weekStart: plan.weekStart } : null;
}

/** Notes the plan's revision that a run was worked out from. */
export async function setRunRevision(tx: Db, runId: string, revision: number): Promise<void> {
  await tx.update(levellingRuns).set({ revision }).where(eq(levellingRuns.id, runId));
}

/** Says that the worker lives and how far it is; tells whether to go on: null where the run is no longer its own. */
export async function beat(
  tx: Db,
  runId: string,
  progress: readonly LevellingProgressDto[],
): Promise<{ readonly cancelAsked: boolean } | null> {
  const [row] = await tx
    .update(levellingRuns)
    .set({ heartbeatAt: databaseNow, progress: [...progress] })
    .where(and(eq(levellingRuns.id, runId), eq(levellingRuns.state, 'running')))
    .returning({ cancelAsked: levellingRuns.cancelAsked });
  return row ?? null;
}

export interface RunEnd {
  readonly state: Exclude<LevellingState, 'queued' | 'running'>;
  readonly proposal?: unknown;
  readonly failure?: string;
}

/** Takes a run from one of some states to its next; false where it is in none of them. */
export async function moveRun(
  tx: Db,
  runId: string,
  from: readonly LevellingState[],
  end: RunEnd,
  at: Date,
): Promise<boolean> {
  const moved = await tx
    .update(levellingRuns)
    .set({ ...end, endedAt: at })
    .where(and(eq(levellingRuns.id, runId), inArray(levellingRuns.state, [...from])))
    .returning({ id: levellingRuns.id });
  return moved.length > 0;
}

/** Puts a running run back into the queue's hands. */
export async function giveBackRun(tx: Db, runId: string): Promise<boolean> {
  const given = await tx
    .update(levellingRuns)
    .set({ state: 'queued', progress: [], heartbeatAt: databaseNow })
    .where(and(eq(levellingRuns.id, runId), eq(levellingRuns.state, 'running')))
    .returning({ id: levellingRuns.id });
  return given.length > 0;
}

/** Flags a running run to be stopped. */
export async function askToCancel(tx: Db, runId: string): Promise<void> {
  await tx.update(levellingRuns).set({ cancelAsked: true }).where(eq(levellingRuns.id, runId));
}

/** Runs of a plan that wait or run. */
export async function openRuns(tx: Db, plantId: string, planId: string, states: readonly LevellingState[]) {
  return tx
    .select()
    .from(levellingRuns)
    .where(
      and(
        eq(levellingRuns.plantId, plantId),
        eq(levellingRuns.planId, planId),
        inArray(levellingRuns.state, [...states]),
      ),
    );
}

/** Fails the runs whose worker has gone silent, and those that no worker ever took; gives those it failed. */
export async function failLostRuns(tx: Db, at: Date) {
  const silent = 'The process that was levelling has stopped answering; nothing was changed. Level again.';
  const untaken =
    'No levelling process has taken this up for ten minutes; nothing was changed. Tell your administrator.';
  const failed = [];
  for (const [state, seconds, failure] of [
    ['running', DEAD_AFTER_SECONDS, silent],
    ['queued', UNTAKEN_AFTER_SECONDS, untaken],
  ] as const) {
    const lost = sql`${levellingRuns.heartbeatAt} < now() - make_interval(secs => ${seconds})`;
    const rows = await tx
      .update(levellingRuns)
      .set({ state: 'failed', failure, endedAt: at })
      .where(and(eq(levellingRuns.state, state), lost))
      .returning({ id: levellingRuns.id, plantId: levellingRuns.plantId, planId: levellingRuns.planId });
    failed.push(...rows);
  }
  return failed;
}
