import type { CleaningPlanDto, CleaningPlanRequest } from '@/contracts/cleanings';
import { fail, ok, type Result } from '@/core/result';
import { nextCleaningCode, plannedCleaningTitle } from '@/core/schedule/plannedCleaning';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { notify } from '../events/notify';
import { conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { activityStates } from '../plans/stale';
import { lockActivities, setPlanRevision, type ActivityRow, type PlanRow } from '../plans/plans.repo';
import { activityName } from '../plans/words';
import { unitRows } from '../products/products.repo';
import { record } from '../record/record';
import { findWeek, planOf } from '../weeks/findWeek';
import type { WeekTime } from '../weeks/weekTime';
import { cleaningMode } from './cleaningMode';
import { codesOf, deleteActivity, insertActivity, isRecorded, issueWith } from './cleanings.repo';

/**
 * Adds a clean of one unit to a week, not yet placed: as long as the plant's longest rule of the kind, its steam worked
 * out on the unit's own header. From then on it is an activity like any other.
 */
export function addCleaning(
  actor: Authorized<'plan.edit'>,
  weekStart: string,
  { unitId, kind }: CleaningPlanRequest,
): Promise<Result<CleaningPlanDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const week = await findWeek(actor, weekStart, tx);
    if (!week.ok) return week;
    const unit = (await unitRows(tx, actor.plantId)).find((row) => row.unit.id === unitId)?.unit;
    if (!unit) return fail(notFound(`${actor.plantName} has no such unit; nothing was added.`));
    const mode = await cleaningMode(tx, unit, kind);
    if (!mode.ok) return mode;
    const plan = await planOf(tx, week.value, true);
    const id = newId();
    const code = nextCleaningCode(await codesOf(tx, plan));
    await insertActivity(tx, {
      ...{ id, plantId: plan.plantId, planId: plan.id, kind: 'cleaning', cleaning: kind, code },
      title: plannedCleaningTitle(kind, unit.name),
      modes: [mode.value],
      earliestAt: week.value.time.firstInstant,
    });
    const planRevision = await changed(tx, actor, plan, 'plan.addCleaning', { code, activityId: id, unitId, kind });
    return ok({ activityId: id, code, planRevision });
  });
}

/** Removes a planned clean that stands on no unit and on no issue. */
export function removeCleaning(
  actor: Authorized<'plan.edit'>,
  weekStart: string,
  activityId: string,
): Promise<Result<CleaningPlanDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const week = await findWeek(actor, weekStart, tx);
    if (!week.ok) return week;
    const plan = await planOf(tx, week.value, true);
    const [row] = await lockActivities(tx, plan, [activityId]);
    if (row?.kind !== 'cleaning') return fail(notFound('There is no such planned clean in this week.'));
    const refused = await whyKept(tx, plan, row, week.value.time);
    if (refused) return fail(refused);
    await deleteActivity(tx, plan, activityId);
    const { code, title } = row;
    const planRevision = await changed(tx, actor, plan, 'plan.removeCleaning', { code, activityId, title });
    return ok({ activityId, code, planRevision });
  });
}

async function whyKept(tx: Db, plan: PlanRow, row: ActivityRow, time: WeekTime): Promise<HttpProblem | null> {
  const name = activityName(row);
  if (row.unitId !== null) {
    const stale = await activityStates(tx, [row], time);
    const message = `${name} has a place on the board; take it off first. Nothing was removed.`;
    return conflict('CLEANING-PLACED', message, { planRevision: plan.revision, stale });
  }
  const number = await issueWith(tx, plan, row.id);
  if (number !== null) {
    return conflict('CLEANING-ISSUED', `${name} is on issue ${number} on the floor and is kept. Nothing was removed.`);
  }
  if (await isRecorded(tx, plan, row.id)) {
    return conflict('CLEANING-ISSUED', `The floor has recorded something of ${name}; it is kept. Nothing was removed.`);
  }
  return null;
}

/** Counts the plan's next revision, says so to open boards and keeps who did it. */
async function changed(
  tx: Db,
  actor: Actor,
  plan: PlanRow,
  action: string,
  details: Readonly<Record<string, unknown>>,
): Promise<number> {
  const revision = plan.revision + 1;
  await setPlanRevision(tx, plan, revision);
  await notify(tx, plan.plantId, { kind: 'plan', planId: plan.id, revision });
  await record(tx, actor, action, plan.id, { revision, ...details });
  return revision;
}
