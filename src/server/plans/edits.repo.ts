import { sql } from 'drizzle-orm';
import type { Change, Edit } from '@/core/schedule/edit';
import type { Db } from '@/db/client';
import { edits } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import { newId } from '../id';
import type { WeekTime } from '../weeks/weekTime';
import { columnsOf } from './activityOfRow';
import type { PlanRow } from './plans.repo';

/** Writes the changes' states after the edit, each activity's next revision, and who moved it when. */
export async function writeStates(
  tx: Db,
  plan: PlanRow,
  changes: readonly Change[],
  time: WeekTime,
  by: { readonly personId: string; readonly at: Date },
): Promise<void> {
  const rows = changes.map(({ activityId, after }) => ({ id: activityId, ...columnsOf(after, time) }));
  await tx.execute(sql`
    update activities a
       set unit_id = v."unitId", start_at = v."startAt", clean_after_min = v."cleanAfterMin", fixing = v.fixing,
           revision = a.revision + 1, moved_by = ${by.personId}, moved_at = ${by.at.toISOString()}::timestamptz
      from jsonb_to_recordset(${JSON.stringify(rows)}::jsonb)
           as v(id text, "unitId" text, "startAt" timestamptz, "cleanAfterMin" int, fixing text)
     where a.id = v.id and a.plan_id = ${plan.id} and a.plant_id = ${plan.plantId}`);
}

/** Writes the modes of activities that were worked out anew, and each one's next revision. */
export async function writeModes(tx: Db, plan: PlanRow, changes: readonly Change[]): Promise<void> {
  const rows = changes.flatMap(({ activityId, modes }) => (modes ? [{ id: activityId, modes: modes.after }] : []));
  await tx.execute(sql`
    update activities a
       set modes = v.modes, revision = a.revision + 1
      from jsonb_to_recordset(${JSON.stringify(rows)}::jsonb) as v(id text, modes jsonb)
     where a.id = v.id and a.plan_id = ${plan.id} and a.plant_id = ${plan.plantId}`);
}

/** Appends an edit to the plan's history under the revision that it makes. */
export async function insertEdit(tx: Db, plan: PlanRow, edit: Edit, actor: Actor, at: Date, revision: number) {
  await tx.insert(edits).values({
    id: newId(),
    plantId: plan.plantId,
    planId: plan.id,
    revision,
    kind: edit.kind,
    changes: [...edit.changes],
    authorId: actor.personId,
    createdAt: at,
  });
}
