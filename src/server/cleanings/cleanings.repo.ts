import { and, asc, eq, sql } from 'drizzle-orm';
import type { CleaningKind } from '@/core/plant/activity';
import type { UnitKind } from '@/core/plant/plant';
import type { Db } from '@/db/client';
import { activities, cleaningRules, floorEvents } from '@/db/schema/index';
import type { PlanRow } from '../plans/plans.repo';

export type NewActivityRow = typeof activities.$inferInsert;

/** The plant's rules for one kind of clean on a kind of unit. */
export async function rulesOf(tx: Db, plantId: string, unitKind: UnitKind, kind: CleaningKind) {
  const asked = and(eq(cleaningRules.unitKind, unitKind), eq(cleaningRules.kind, kind));
  return tx
    .select()
    .from(cleaningRules)
    .where(and(eq(cleaningRules.plantId, plantId), asked))
    .orderBy(asc(cleaningRules.id));
}

/** Codes of a plan's activities. */
export async function codesOf(tx: Db, plan: PlanRow): Promise<string[]> {
  const rows = await tx
    .select({ code: activities.code })
    .from(activities)
    .where(and(eq(activities.plantId, plan.plantId), eq(activities.planId, plan.id)));
  return rows.map(({ code }) => code);
}

export async function insertActivity(tx: Db, row: NewActivityRow): Promise<void> {
  await tx.insert(activities).values(row);
}

export async function deleteActivity(tx: Db, plan: PlanRow, id: string): Promise<void> {
  const own = and(eq(activities.plantId, plan.plantId), eq(activities.planId, plan.id));
  await tx.delete(activities).where(and(own, eq(activities.id, id)));
}

/** The newest issue of a plan that has the activity on a unit, by number; null where none has. */
export async function issueWith(tx: Db, plan: PlanRow, activityId: string): Promise<number | null> {
  const found = await tx.execute<{ number: number | null }>(sql`
    select max(i.number)::int as number
      from issues i, jsonb_array_elements(i.week -> 'activities') as a
     where i.plan_id = ${plan.id} and i.plant_id = ${plan.plantId}
       and a ->> 'id' = ${activityId} and jsonb_typeof(a -> 'placement') = 'object'`);
  return found.rows[0]?.number ?? null;
}

/** True where the floor has recorded something of an activity, taken back or not: that is kept. */
export async function isRecorded(tx: Db, plan: PlanRow, activityId: string): Promise<boolean> {
  const own = and(eq(floorEvents.plantId, plan.plantId), eq(floorEvents.activityId, activityId));
  return (await tx.select({ id: floorEvents.id }).from(floorEvents).where(own).limit(1)).length > 0;
}
