import { and, asc, desc, eq, inArray, isNull } from 'drizzle-orm';
import type { Db } from '@/db/client';
import { activities, floorEvents, issues, levellingRuns, links, plans, processData } from '@/db/schema/index';
import { newId } from '../id';

export type PlanRow = typeof plans.$inferSelect;
export type ActivityRow = typeof activities.$inferSelect;
export type LinkRow = typeof links.$inferSelect;

const ofPlan = (plantId: string, weekStart: string) => and(eq(plans.plantId, plantId), eq(plans.weekStart, weekStart));

/** The plan of a plant's week; null where there is none. `lock` keeps others from changing it until the end. */
export async function findPlan(tx: Db, plantId: string, weekStart: string, lock = false): Promise<PlanRow | null> {
  const query = tx.select().from(plans).where(ofPlan(plantId, weekStart));
  const [row] = lock ? await query.for('update') : await query;
  return row ?? null;
}

/** The plan by its id, locked until the end of the transaction; null where the plant has none of that id. */
export async function lockPlanById(tx: Db, plantId: string, planId: string): Promise<PlanRow | null> {
  const mine = and(eq(plans.plantId, plantId), eq(plans.id, planId));
  const [row] = await tx.select().from(plans).where(mine).for('update');
  return row ?? null;
}

/** Makes the plan of a week unless it is there: a week without work is a week too. */
export async function ensurePlan(tx: Db, plantId: string, weekStart: string): Promise<void> {
  await tx.insert(plans).values({ id: newId(), plantId, weekStart }).onConflictDoNothing();
}

/** Writes the plan's next revision. */
export async function setPlanRevision(tx: Db, plan: PlanRow, revision: number): Promise<void> {
  await tx
    .update(plans)
    .set({ revision })
    .where(and(eq(plans.plantId, plan.plantId), eq(plans.id, plan.id)));
}

/** Every activity of a plan, by start, the not yet placed last. */
export async function activityRows(tx: Db, plan: PlanRow): Promise<ActivityRow[]> {
  return tx
    .select()
    .from(activities)
    .where(and(eq(activities.plantId, plan.plantId), eq(activities.planId, plan.id)))
    .orderBy(asc(activities.startAt), asc(activities.id));
}

/** Some activities of a plan, locked in the order of their ids so that two edits never wait for each other. */
export async function lockActivities(tx: Db, plan: PlanRow, ids: readonly string[]): Promise<ActivityRow[]> {
  if (ids.length === 0) return [];
  return tx
    .select()
    .from(activities)
    .where(and(eq(activities.plantId, plan.plantId), eq(activities.planId, plan.id), inArray(activities.id, [...ids])))
    .orderBy(asc(activities.id))
    .for('update');
}

/** The links between a plan's activities. */
export async function linkRows(tx: Db, plan: PlanRow): Promise<LinkRow[]> {
  return tx
    .select()
    .from(links)
    .where(and(eq(links.plantId, plan.plantId), eq(links.planId, plan.id)))
    .orderBy(asc(links.id));
}

/** Thermal-process data by id. */
export async function processDataRows(tx: Db, plantId: string, ids: readonly string[]) {
  if (ids.length === 0) return [];
  return tx
    .select({
      id: processData.id,
      document: processData.document,
      issue: processData.issue,
      releasedAt: processData.releasedAt,
      withdrawnAt: processData.withdrawnAt,
    })
    .from(processData)
    .where(and(eq(processData.plantId, plantId), inArray(processData.id, [...ids])));
}

/** What the floor has recorded of a plan and not taken back, in order of time. */
export async function floorEventRows(tx: Db, plan: PlanRow) {
  return tx
    .select()
    .from(floorEvents)
    .where(
      and(eq(floorEvents.plantId, plan.plantId), eq(floorEvents.planId, plan.id), isNull(floorEvents.takenBackById)),
    )
    .orderBy(asc(floorEvents.happenedAt), asc(floorEvents.createdAt), asc(floorEvents.id));
}

/** The newest issue of a plan without its copy of the week; null where nothing is on the floor. */
export async function latestIssueRow(tx: Db, plan: PlanRow) {
  const [row] = await tx
    .select({
      id: issues.id,
      number: issues.number,
      revision: issues.revision,
      comment: issues.comment,
      agreementId: issues.agreementId,
      authorId: issues.authorId,
      createdAt: issues.createdAt,
    })
    .from(issues)
    .where(and(eq(issues.plantId, plan.plantId), eq(issues.planId, plan.id)))
    .orderBy(desc(issues.number))
    .limit(1);
  return row ?? null;
}

/** The newest levelling run of a plan that waits, runs or has proposed; null where there is none. */
export async function liveRunRow(tx: Db, plan: PlanRow) {
  const live = inArray(levellingRuns.state, ['queued', 'running', 'proposed']);
  const [row] = await tx
    .select()
    .from(levellingRuns)
    .where(and(eq(levellingRuns.plantId, plan.plantId), eq(levellingRuns.planId, plan.id), live))
    .orderBy(desc(levellingRuns.createdAt), desc(levellingRuns.id))
    .limit(1);
  return row ?? null;
}
