import { and, asc, eq, gte, inArray, sql } from 'drizzle-orm';
import type { Stage } from '@/core/plant/activity';
import type { Db } from '@/db/client';
import { activities, floorEvents, links, orders, plans, processData } from '@/db/schema/index';
import type { PlanRow } from '../plans/plans.repo';

export type OrderRow = typeof orders.$inferSelect;
export type NewOrderRow = typeof orders.$inferInsert;

/** PostgreSQL takes 65,535 values in one statement. */
const CHUNK = 200;

const owned = (plantId: string, id: string) => and(eq(orders.plantId, plantId), eq(orders.id, id));

/** Orders due since an instant, by due time. */
export async function orderRows(tx: Db, plantId: string, since: Date): Promise<OrderRow[]> {
  const due = and(eq(orders.plantId, plantId), gte(orders.dueAt, since));
  return tx.select().from(orders).where(due).orderBy(asc(orders.dueAt), asc(orders.number), asc(orders.id));
}

/** One order of the plant, locked until the end of the transaction; null where there is none. */
export async function lockOrder(tx: Db, plantId: string, id: string): Promise<OrderRow | null> {
  const [row] = await tx.select().from(orders).where(owned(plantId, id)).for('update');
  return row ?? null;
}

export async function insertOrder(tx: Db, row: NewOrderRow): Promise<void> {
  await tx.insert(orders).values(row);
}

export async function writeOrder(tx: Db, row: OrderRow, values: Partial<NewOrderRow>): Promise<void> {
  await tx
    .update(orders)
    .set({ ...values, revision: row.revision + 1 })
    .where(owned(row.plantId, row.id));
}

export async function deleteOrder(tx: Db, row: OrderRow): Promise<void> {
  await tx.delete(orders).where(owned(row.plantId, row.id));
}

/** Numbers that begin alike. */
export async function numbersLike(tx: Db, plantId: string, number: string): Promise<string[]> {
  const rows = await tx
    .select({ number: orders.number })
    .from(orders)
    .where(and(eq(orders.plantId, plantId), sql`starts_with(${orders.number}, ${number})`));
  return rows.map((row) => row.number);
}

/** How far orders have got: by order, the plan's week, its activities, those placed and those started. */
export async function progressRows(tx: Db, plantId: string, orderId?: string) {
  const mine = and(eq(activities.plantId, plantId), sql`${activities.orderId} is not null`);
  return tx
    .select({
      orderId: sql<string>`${activities.orderId}`,
      planId: plans.id,
      weekStart: plans.weekStart,
      total: sql<number>`count(*)`.mapWith(Number),
      placed: sql<number>`count(${activities.unitId})`.mapWith(Number),
      started: sql<number>`count(*) filter (where ${activities.fixing} in ('started', 'done'))`.mapWith(Number),
    })
    .from(activities)
    .innerJoin(plans, eq(plans.id, activities.planId))
    .where(orderId === undefined ? mine : and(mine, eq(activities.orderId, orderId)))
    .groupBy(activities.orderId, plans.id);
}

/** Orders with a placed activity on the newest issue of its plan. */
export async function issuedOrders(tx: Db, plantId: string): Promise<ReadonlySet<string>> {
  const found = await tx.execute<{ order_id: string }>(sql`
    with newest as (
      select distinct on (plan_id) plan_id, week from issues where plant_id = ${plantId} order by plan_id, number desc
    ), placed as (
      select n.plan_id, a ->> 'id' as id from newest n, jsonb_array_elements(n.week -> 'activities') as a
       where jsonb_typeof(a -> 'placement') = 'object'
    )
    select distinct act.order_id from activities act
      join placed p on p.id = act.id and p.plan_id = act.plan_id
     where act.plant_id = ${plantId} and act.order_id is not null`);
  return new Set(found.rows.map((row) => row.order_id));
}

/** Thermal-process data of a product that is not withdrawn: released ones first, the newest first. */
export async function processDataOf(tx: Db, plantId: string, productId?: string) {
  const inUse = and(eq(processData.plantId, plantId), sql`${processData.withdrawnAt} is null`);
  return tx
    .select()
    .from(processData)
    .where(productId === undefined ? inUse : and(inUse, eq(processData.productId, productId)))
    .orderBy(sql`${processData.releasedAt} is null`, sql`${processData.createdAt} desc`);
}

/** Writes activities and links of an order's net. */
export async function insertNet(
  tx: Db,
  activityRows: readonly (typeof activities.$inferInsert)[],
  linkRows: readonly (typeof links.$inferInsert)[],
): Promise<void> {
  for (let i = 0; i < activityRows.length; i += CHUNK) {
    await tx.insert(activities).values(activityRows.slice(i, i + CHUNK));
  }
  for (let i = 0; i < linkRows.length; i += CHUNK) await tx.insert(links).values(linkRows.slice(i, i + CHUNK));
}

/** An order's activities in a plan, locked in the order of their ids. */
export async function lockNet(tx: Db, plan: PlanRow, orderId: string) {
  return tx
    .select()
    .from(activities)
    .where(and(eq(activities.planId, plan.id), eq(activities.plantId, plan.plantId), eq(activities.orderId, orderId)))
    .orderBy(asc(activities.id))
    .for('update');
}

/** Takes activities out of a plan, with every link from or to them. */
export async function deleteNet(tx: Db, plan: PlanRow, ids: readonly string[]): Promise<void> {
  const own = and(eq(activities.planId, plan.id), eq(activities.plantId, plan.plantId));
  const named = sql`(${links.from} ->> 'activityId' in ${[...ids]} or ${links.to} ->> 'activityId' in ${[...ids]})`;
  await tx.delete(links).where(and(eq(links.planId, plan.id), eq(links.plantId, plan.plantId), named));
  await tx.delete(activities).where(and(own, inArray(activities.id, [...ids])));
}

/** True where the floor has recorded something of one of them, taken back or not: that is kept. */
export async function anyRecorded(tx: Db, plan: PlanRow, ids: readonly string[]): Promise<boolean> {
  const mine = and(eq(floorEvents.plantId, plan.plantId), inArray(floorEvents.activityId, [...ids]));
  return (await tx.select({ id: floorEvents.id }).from(floorEvents).where(mine).limit(1)).length > 0;
}

/** Writes an order's times and weight onto its activities that have not started; `firstStage` must start by its latest. */
export async function retimeNet(tx: Db, plan: PlanRow, row: OrderRow, earliestAt: Date, firstStage: Stage | null) {
  const { dueAt, latestStartAt, priority, id } = row;
  const latest = sql`${latestStartAt?.toISOString() ?? null}::timestamptz`;
  await tx
    .update(activities)
    .set({
      earliestAt,
      weight: priority,
      revision: sql`${activities.revision} + 1`,
      dueAt: sql`case when ${activities.dueAt} is null then null else ${dueAt.toISOString()}::timestamptz end`,
      latestStartAt: sql`case when ${activities.stage} = ${firstStage} then ${latest} end`,
    })
    .where(
      and(
        eq(activities.planId, plan.id),
        eq(activities.plantId, plan.plantId),
        eq(activities.orderId, id),
        inArray(activities.fixing, ['free', 'fixed']),
      ),
    );
}
