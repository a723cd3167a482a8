import { and, eq, sql } from 'drizzle-orm';
import type { Fixing } from '@/core/plant/activity';
import type { Db } from '@/db/client';
import { activities, floorEvents, issues } from '@/db/schema/index';
import type { PlanRow } from '../plans/plans.repo';

/** True where the plan ever had an issue of that id. */
export async function isIssueOf(tx: Db, plan: PlanRow, issueId: string): Promise<boolean> {
  const mine = and(eq(issues.plantId, plan.plantId), eq(issues.planId, plan.id), eq(issues.id, issueId));
  return (await tx.select({ id: issues.id }).from(issues).where(mine)).length > 0;
}

/** Appends what happened on the floor. */
export async function insertFloorEvent(tx: Db, row: typeof floorEvents.$inferInsert) {
  const [written] = await tx.insert(floorEvents).values(row).returning();
  if (!written) throw new Error('a floor event was inserted and not returned');
  return written;
}

/** Sets how an activity is held, under its next revision; nobody has moved it. */
export async function setFixing(tx: Db, plan: PlanRow, activityId: string, fixing: Fixing): Promise<void> {
  await tx
    .update(activities)
    .set({ fixing, revision: sql`${activities.revision} + 1` })
    .where(and(eq(activities.plantId, plan.plantId), eq(activities.planId, plan.id), eq(activities.id, activityId)));
}
