import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import type { Db } from '@/db/client';
import {
  cleaningRules,
  duties,
  families,
  headers,
  plants,
  processData,
  products,
  routeModes,
  units,
} from '@/db/schema/index';

export type DutyRow = typeof duties.$inferSelect;
export type HeaderRow = typeof headers.$inferSelect;

/** The plant's clock and altitude; null where there is no such plant. */
export async function plantPlace(tx: Db, plantId: string) {
  const [row] = await tx
    .select({ timeZone: plants.timeZone, altitudeM: plants.altitudeM })
    .from(plants)
    .where(eq(plants.id, plantId));
  return row ?? null;
}

/** The plant's duties, by name; retired ones last. */
export async function dutyRows(tx: Db, plantId: string): Promise<DutyRow[]> {
  return tx
    .select()
    .from(duties)
    .where(eq(duties.plantId, plantId))
    .orderBy(sql`${duties.retiredAt} is not null`, asc(duties.name), asc(duties.id));
}

/** One duty of the plant, locked until the end of the transaction; null where there is none. */
export async function lockDuty(tx: Db, plantId: string, id: string): Promise<DutyRow | null> {
  const owned = and(eq(duties.plantId, plantId), eq(duties.id, id));
  const [row] = await tx.select().from(duties).where(owned).for('update');
  return row ?? null;
}

/** Headers that are not retired, in the plant's order. */
export async function headerRows(tx: Db, plantId: string): Promise<HeaderRow[]> {
  return tx
    .select()
    .from(headers)
    .where(and(eq(headers.plantId, plantId), isNull(headers.retiredAt)))
    .orderBy(asc(headers.position), asc(headers.id));
}

/** Stages of products' routes that have a duty, with their unit. */
export async function routeUses(tx: Db, plantId: string) {
  return tx
    .select({
      dutyId: routeModes.dutyId,
      productId: products.id,
      productName: products.name,
      position: routeModes.position,
      stage: routeModes.stage,
      leadMin: routeModes.leadMin,
      afterMin: routeModes.afterMin,
      unitId: units.id,
      unitName: units.name,
      headerId: units.headerId,
    })
    .from(routeModes)
    .innerJoin(products, eq(products.id, routeModes.productId))
    .innerJoin(units, eq(units.id, routeModes.unitId))
    .where(and(eq(routeModes.plantId, plantId), isNull(products.retiredAt)))
    .orderBy(asc(products.name), asc(routeModes.position), asc(units.position));
}

/** Cleaning rules that have a duty. */
export async function cleaningUses(tx: Db, plantId: string) {
  return tx
    .select({
      id: cleaningRules.id,
      dutyId: cleaningRules.dutyId,
      unitKind: cleaningRules.unitKind,
      minutes: cleaningRules.minutes,
      phases: cleaningRules.phases,
    })
    .from(cleaningRules)
    .innerJoin(families, eq(families.id, cleaningRules.fromFamilyId))
    .where(eq(cleaningRules.plantId, plantId))
    .orderBy(asc(cleaningRules.id));
}

/** By kind of unit, the header that its first unit draws on. */
export async function headerOfKinds(tx: Db, plantId: string): Promise<ReadonlyMap<string, string>> {
  const rows = await tx
    .select({ kind: units.kind, headerId: units.headerId })
    .from(units)
    .where(and(eq(units.plantId, plantId), isNull(units.retiredAt)))
    .orderBy(asc(units.position), asc(units.id));
  const found = new Map<string, string>();
  for (const { kind, headerId } of rows) if (headerId !== null && !found.has(kind)) found.set(kind, headerId);
  return found;
}

/** How many activities, neither started nor done, are planned with each duty. */
export async function plannedUses(tx: Db, plantId: string): Promise<ReadonlyMap<string, number>> {
  const found = await tx.execute<{ duty_id: string; count: string }>(sql`
    select mode ->> 'dutyId' as duty_id, count(distinct a.id) as count
      from activities a, jsonb_array_elements(a.modes) as mode
     where a.plant_id = ${plantId} and a.fixing in ('free', 'fixed') and mode ->> 'dutyId' is not null
     group by 1`);
  return new Map(found.rows.map((row) => [row.duty_id, Number(row.count)]));
}

/** Process data in force or waiting for its release, newest first, by product. */
export async function processDataInForce(tx: Db, plantId: string) {
  return tx
    .select({
      productId: processData.productId,
      document: processData.document,
      issue: processData.issue,
      values: processData.values,
      releasedAt: processData.releasedAt,
      createdAt: processData.createdAt,
    })
    .from(processData)
    .where(and(eq(processData.plantId, plantId), isNull(processData.withdrawnAt)))
    .orderBy(sql`${processData.releasedAt} is null`, sql`${processData.createdAt} desc`);
}

/** Products that are not retired, by name. */
export async function productRows(tx: Db, plantId: string) {
  return tx
    .select()
    .from(products)
    .where(and(eq(products.plantId, plantId), isNull(products.retiredAt)))
    .orderBy(asc(products.name), asc(products.id));
}
