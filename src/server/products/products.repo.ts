import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import type { Db } from '@/db/client';
import { cleaningRules, families, lines, products, routeModes, sharedLimits, units } from '@/db/schema/index';

export type ProductRow = typeof products.$inferSelect;
export type RouteRow = typeof routeModes.$inferSelect;
export type UnitRow = typeof units.$inferSelect;

/** The plant's products by name, retired ones last. */
export async function productRows(tx: Db, plantId: string): Promise<ProductRow[]> {
  return tx
    .select()
    .from(products)
    .where(eq(products.plantId, plantId))
    .orderBy(sql`${products.retiredAt} is not null`, asc(products.name), asc(products.id));
}

/** One product of the plant, locked until the end of the transaction; null where there is none. */
export async function lockProduct(tx: Db, plantId: string, id: string): Promise<ProductRow | null> {
  const owned = and(eq(products.plantId, plantId), eq(products.id, id));
  const [row] = await tx.select().from(products).where(owned).for('update');
  return row ?? null;
}

/** Rows of the routes of all products, or of one, in order. */
export async function routeRows(tx: Db, plantId: string, productId?: string): Promise<RouteRow[]> {
  const own = eq(routeModes.plantId, plantId);
  return tx
    .select()
    .from(routeModes)
    .where(productId === undefined ? own : and(own, eq(routeModes.productId, productId)))
    .orderBy(asc(routeModes.productId), asc(routeModes.position), asc(routeModes.id));
}

/** Units that are not retired, in the plant's order, with the line that they stand on. */
export async function unitRows(tx: Db, plantId: string) {
  return tx
    .select({ unit: units, lineName: lines.name })
    .from(units)
    .innerJoin(lines, eq(lines.id, units.lineId))
    .where(and(eq(units.plantId, plantId), isNull(units.retiredAt)))
    .orderBy(asc(units.position), asc(units.id));
}

/** Shared limits that are not retired. */
export async function limitRows(tx: Db, plantId: string) {
  return tx
    .select({ id: sharedLimits.id, name: sharedLimits.name, unit: sharedLimits.unit })
    .from(sharedLimits)
    .where(and(eq(sharedLimits.plantId, plantId), isNull(sharedLimits.retiredAt)))
    .orderBy(asc(sharedLimits.name), asc(sharedLimits.id));
}

/** Families that are not retired, with the number of their products that are made. */
export async function familyRows(tx: Db, plantId: string) {
  return tx
    .select({
      id: families.id,
      name: families.name,
      products: sql<number>`count(${products.id}) filter (where ${products.retiredAt} is null)`.mapWith(Number),
    })
    .from(families)
    .leftJoin(products, eq(products.familyId, families.id))
    .where(and(eq(families.plantId, plantId), isNull(families.retiredAt)))
    .groupBy(families.id)
    .orderBy(asc(families.name), asc(families.id));
}

/** Cleaning rules of the plant. */
export async function cleaningRows(tx: Db, plantId: string) {
  return tx.select().from(cleaningRules).where(eq(cleaningRules.plantId, plantId)).orderBy(asc(cleaningRules.id));
}

/** How many runs, neither started nor done, are planned of each product. */
export async function plannedRuns(tx: Db, plantId: string): Promise<ReadonlyMap<string, number>> {
  const found = await tx.execute<{ product_id: string; count: string }>(sql`
    select product_id, count(*) as count from activities
     where plant_id = ${plantId} and product_id is not null and fixing in ('free', 'fixed')
     group by 1`);
  return new Map(found.rows.map((row) => [row.product_id, Number(row.count)]));
}
