import { eq } from 'drizzle-orm';
import type { EditRequest, EditResponse } from '@/contracts/week';
import { fail, ok, type Result } from '@/core/result';
import type { Change, EditKind } from '@/core/schedule/edit';
import { editOf } from '@/core/schedule/edits';
import { db, type Db } from '@/db/client';
import { units } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, notFound, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { findWeek, planOf } from '../weeks/findWeek';
import type { WeekTime } from '../weeks/weekTime';
import { planStateOfRow } from './activityOfRow';
import { insertEdit, writeStates } from './edits.repo';
import { lockActivities, setPlanRevision, type ActivityRow, type PlanRow } from './plans.repo';
import { activityStates, onFloorRefusal, staleRefusal } from './stale';

type Wanted = EditRequest['changes'][number];

/** A plan under the transaction's lock, with the clock of its week. */
export interface LockedPlan {
  readonly plan: PlanRow;
  readonly time: WeekTime;
}

/** Saves a planner's edit whole or not at all: one stale, started or impossible change refuses all of it. */
export async function saveEdit(
  actor: Authorized<'plan.edit'>,
  weekStart: string,
  request: EditRequest,
): Promise<Result<EditResponse, HttpProblem>> {
  return db.transaction(async (tx) => {
    const week = await findWeek(actor, weekStart, tx);
    if (!week.ok) return week;
    const { time } = week.value;
    const wrong = (await misplaced(tx, actor, time, request.changes)) ?? namedTwice(request.changes);
    if (wrong) return fail(wrong);
    return applyChanges(tx, actor, { plan: await planOf(tx, week.value, true), time }, request.kind, request.changes);
  });
}

/** The rows of the activities to change, locked; or why the plan as it is can't take the changes. */
export async function checkChanges(
  tx: Db,
  locked: LockedPlan,
  kind: EditKind,
  wanted: readonly Wanted[],
): Promise<Result<ActivityRow[], HttpProblem>> {
  const rows = await lockActivities(tx, locked.plan, idsOf(wanted));
  const refused = await refusal(tx, locked, kind, wanted, rows);
  return refused ? fail(refused) : ok(rows);
}

/** Checks changes against the locked plan as it is and writes them; the caller has checked the units. */
export async function applyChanges(
  tx: Db,
  actor: Actor,
  { plan, time }: LockedPlan,
  kind: EditKind,
  wanted: readonly Wanted[],
): Promise<Result<EditResponse, HttpProblem>> {
  const checked = await checkChanges(tx, { plan, time }, kind, wanted);
  if (!checked.ok) return checked;
  const byId = new Map(checked.value.map((row) => [row.id, row]));
  const edit = editOf(
    kind,
    wanted.map((change) => changeOfRow(change, byId.get(change.activityId) as ActivityRow, time)),
  );
  const revision = edit.changes.length > 0 ? plan.revision + 1 : plan.revision;
  if (edit.changes.length > 0) {
    const at = now();
    await writeStates(tx, plan, edit.changes, time, { personId: actor.personId, at });
    await insertEdit(tx, plan, edit, actor, at, revision);
    await setPlanRevision(tx, plan, revision);
    await notify(tx, plan.plantId, { kind: 'plan', planId: plan.id, revision });
    await record(tx, actor, `plan.${kind}`, plan.id, { revision, activities: edit.changes.length });
  }
  const rows = await lockActivities(tx, plan, idsOf(wanted));
  return ok({ planRevision: revision, activities: await activityStates(tx, rows, time) });
}

const idsOf = (wanted: readonly Wanted[]): string[] => wanted.map(({ activityId }) => activityId);

async function refusal(
  tx: Db,
  { plan, time }: LockedPlan,
  kind: EditKind,
  wanted: readonly Wanted[],
  rows: readonly ActivityRow[],
): Promise<HttpProblem | null> {
  const byId = new Map(rows.map((row) => [row.id, row]));
  if (wanted.some(({ activityId }) => !byId.has(activityId))) {
    return notFound('An activity named here is not in this week’s plan; nothing was saved. Load the week again.');
  }
  const started = rows.filter(({ fixing }) => fixing === 'started' || fixing === 'done');
  if (started.length > 0) return onFloorRefusal(tx, plan, started, time, kind);
  const stale = wanted.flatMap((change) => {
    const row = byId.get(change.activityId);
    return row && row.revision !== change.revision ? [row] : [];
  });
  return stale.length > 0 ? staleRefusal(tx, plan, stale, time, kind) : null;
}

function changeOfRow(wanted: Wanted, row: ActivityRow, time: WeekTime): Change {
  const before = planStateOfRow(row, time);
  const after = { placement: wanted.placement, fixing: wanted.fixing ?? before.fixing };
  return { activityId: row.id, revision: row.revision, before, after };
}

function namedTwice(changes: readonly Wanted[]): HttpProblem | null {
  const ids = changes.map(({ activityId }) => activityId);
  const twice = ids.findIndex((id, i) => ids.indexOf(id) !== i);
  const message = 'The edit changes an activity twice; nothing was saved.';
  return twice < 0 ? null : badInput('EDIT-TWICE', message, `changes.${twice}.activityId`);
}

/** A start after the week, or a unit that the plant does not have. A unit that is not eligible is a breach, not this. */
async function misplaced(
  tx: Db,
  actor: Actor,
  time: WeekTime,
  changes: readonly Wanted[],
): Promise<HttpProblem | null> {
  const late = changes.findIndex(({ placement }) => placement !== null && placement.start >= time.horizonMin);
  if (late >= 0) {
    const message = `The week has ${time.horizonMin} minutes; a start must lie before its end. Nothing was saved.`;
    return badInput('EDIT-START', message, `changes.${late}.placement.start`);
  }
  const rows = await tx.select({ id: units.id }).from(units).where(eq(units.plantId, actor.plantId));
  const known = new Set(rows.map(({ id }) => id));
  const foreign = changes.some(({ placement }) => placement !== null && !known.has(placement.unitId));
  return foreign ? notFound(`${actor.plantName} has no such unit; nothing was saved.`) : null;
}
