import type { OutOfDateDto, ReworkedDto, ReworkRequest } from '@/contracts/rework';
import type { Mode } from '@/core/plant/activity';
import { fail, ok, type Result } from '@/core/result';
import type { Change } from '@/core/schedule/edit';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { cleaningMode } from '../cleanings/cleaningMode';
import { refreshCleaning } from '../duties/refreshCleaning';
import { notify } from '../events/notify';
import { notFound, type HttpProblem } from '../http/problem';
import { planStateOfRow } from '../plans/activityOfRow';
import { insertEdit, writeModes } from '../plans/edits.repo';
import { activityRows, lockActivities, setPlanRevision, type ActivityRow, type PlanRow } from '../plans/plans.repo';
import { record } from '../record/record';
import { findWeek, planOf } from '../weeks/findWeek';
import { routeRows, unitRows } from './products.repo';
import { changeWords, reworkedModes, sameModes } from './reworkedModes';
import { stageModes } from './stageModes';

interface OutOfDate {
  readonly row: ActivityRow;
  readonly modes: readonly Mode[];
}

/** Which runs, not yet started, the library would draw otherwise than they were planned. */
export async function listOutOfDate(
  actor: Authorized<'plan.read'>,
  weekStart: string,
): Promise<Result<OutOfDateDto, HttpProblem>> {
  const week = await findWeek(actor, weekStart);
  if (!week.ok) return week;
  const plan = await planOf(db, week.value);
  const { found, faults } = await outOfDate(db, actor, await activityRows(db, plan));
  const activities = found.map(({ row, modes }) => {
    const { id, code, title } = row;
    return { id, code, title, change: changeWords(row.modes, modes, row.unitId) };
  });
  return ok({ planRevision: plan.revision, activities, faults });
}

/**
 * Works runs out anew from the library as it is: an edit of its own kind that keeps the modes before and after. What has
 * started stays; runs that are not out of date are left as they are. The steam of cleanings follows.
 */
export function rework(
  actor: Authorized<'plan.edit'>,
  weekStart: string,
  { activityIds }: ReworkRequest,
): Promise<Result<ReworkedDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const week = await findWeek(actor, weekStart, tx);
    if (!week.ok) return week;
    const plan = await planOf(tx, week.value, true);
    const all = (await activityRows(tx, plan)).map(({ id }) => id);
    if (activityIds !== 'all' && activityIds.some((id) => !all.includes(id))) {
      return fail(notFound('An activity named here is not in this week’s plan; nothing was changed.'));
    }
    await refreshCleaning(tx, actor.plantId);
    const rows = await lockActivities(tx, plan, activityIds === 'all' ? all : activityIds);
    const { found } = await outOfDate(tx, actor, rows);
    if (found.length === 0) return ok({ planRevision: plan.revision, reworked: 0 });
    const changes = found.map(({ row, modes }): Change => {
      const state = planStateOfRow(row, week.value.time);
      const { id: activityId, revision } = row;
      return { activityId, revision, before: state, after: state, modes: { before: row.modes, after: modes } };
    });
    return ok(await save(tx, actor, plan, changes));
  });
}

async function save(tx: Db, actor: Actor, plan: PlanRow, changes: readonly Change[]): Promise<ReworkedDto> {
  const revision = plan.revision + 1;
  await writeModes(tx, plan, changes);
  await insertEdit(tx, plan, { kind: 'rework', changes }, actor, now(), revision);
  await setPlanRevision(tx, plan, revision);
  await record(tx, actor, 'plan.rework', plan.id, { revision, activities: changes.length });
  await notify(tx, plan.plantId, { kind: 'plan', planId: plan.id, revision });
  return { planRevision: revision, reworked: changes.length };
}

async function outOfDate(tx: Db, actor: Pick<Actor, 'plantId'>, rows: readonly ActivityRow[]) {
  const routes = await routeRows(tx, actor.plantId);
  const modeOf = await stageModes(tx, actor.plantId);
  const faults = new Set<string>();
  const planned = rows.filter(({ fixing }) => fixing === 'free' || fixing === 'fixed');
  const found = planned.flatMap((row): OutOfDate[] => {
    if (row.kind !== 'stage' || row.productId === null) return [];
    const stages = routes.filter(({ productId, stage }) => productId === row.productId && stage === row.stage);
    const reworked = reworkedModes(row, stages, modeOf);
    reworked.faults.forEach((fault) => faults.add(`${row.title}: ${fault}`));
    return sameModes(row.modes, reworked.modes) ? [] : [{ row, modes: reworked.modes }];
  });
  return { found: [...found, ...(await cleansOutOfDate(tx, actor, planned))], faults: [...faults] };
}

/** Planned cleans that the plant's rules would draw otherwise; one without a rule or a unit any more keeps its draws. */
async function cleansOutOfDate(
  tx: Db,
  { plantId }: Pick<Actor, 'plantId'>,
  rows: readonly ActivityRow[],
): Promise<OutOfDate[]> {
  const cleans = rows.filter(({ kind, cleaning }) => kind === 'cleaning' && cleaning !== null);
  if (cleans.length === 0) return [];
  const units = new Map((await unitRows(tx, plantId)).map(({ unit }) => [unit.id, unit]));
  const worked = new Map<string, Awaited<ReturnType<typeof cleaningMode>>>();
  const found: OutOfDate[] = [];
  for (const row of cleans) {
    const unit = units.get(row.modes[0]?.unitId ?? '');
    if (!unit || !row.cleaning) continue;
    const key = `${unit.id} ${row.cleaning}`;
    const mode = worked.get(key) ?? (await cleaningMode(tx, unit, row.cleaning));
    worked.set(key, mode);
    if (mode.ok && !sameModes(row.modes, [mode.value])) found.push({ row, modes: [mode.value] });
  }
  return found;
}
