import { and, asc, eq, gt, lt } from 'drizzle-orm';
import type { Db } from '@/db/client';
import {
  accumulators,
  calendarExceptions,
  cleaningRules,
  families,
  headers,
  lines,
  plants,
  sharedLimits,
  shifts,
  units,
  ventGroups,
} from '@/db/schema/index';
import { cleanlinessInForce } from '../practice/practice.repo';
import type { WeekTime } from './weekTime';

export type PlantRow = typeof plants.$inferSelect;

/** The plant's own row; null where there is none. */
export async function plantRow(tx: Db, plantId: string): Promise<PlantRow | null> {
  const [row] = await tx.select().from(plants).where(eq(plants.id, plantId));
  return row ?? null;
}

/** The rows that a plant's model is made of, one query a table, in the plant's order. */
export async function plantParts(tx: Db, plantId: string) {
  return {
    lines: await tx.select().from(lines).where(eq(lines.plantId, plantId)).orderBy(asc(lines.position), asc(lines.id)),
    units: await tx.select().from(units).where(eq(units.plantId, plantId)).orderBy(asc(units.position), asc(units.id)),
    ventGroups: await tx
      .select()
      .from(ventGroups)
      .where(eq(ventGroups.plantId, plantId))
      .orderBy(asc(ventGroups.position), asc(ventGroups.id)),
    headers: await tx
      .select()
      .from(headers)
      .where(eq(headers.plantId, plantId))
      .orderBy(asc(headers.position), asc(headers.id)),
    accumulators: await tx
      .select()
      .from(accumulators)
      .where(eq(accumulators.plantId, plantId))
      .orderBy(asc(accumulators.position), asc(accumulators.id)),
    sharedLimits: await tx
      .select()
      .from(sharedLimits)
      .where(eq(sharedLimits.plantId, plantId))
      .orderBy(asc(sharedLimits.position), asc(sharedLimits.id)),
    cleaning: await tx
      .select()
      .from(cleaningRules)
      .where(eq(cleaningRules.plantId, plantId))
      .orderBy(asc(cleaningRules.id)),
    practice: await cleanlinessInForce(tx, plantId),
  };
}

export type PlantParts = Awaited<ReturnType<typeof plantParts>>;

/** The plant's shifts, in its order. */
export async function shiftRows(tx: Db, plantId: string) {
  return tx.select().from(shifts).where(eq(shifts.plantId, plantId)).orderBy(asc(shifts.position), asc(shifts.id));
}

/** Calendar exceptions that touch the week. */
export async function exceptionRows(tx: Db, plantId: string, time: WeekTime) {
  return tx
    .select()
    .from(calendarExceptions)
    .where(
      and(
        eq(calendarExceptions.plantId, plantId),
        lt(calendarExceptions.fromAt, time.endInstant),
        gt(calendarExceptions.toAt, time.firstInstant),
      ),
    );
}

/** Product families by name. */
export async function familyRows(tx: Db, plantId: string) {
  return tx
    .select({ id: families.id, name: families.name })
    .from(families)
    .where(eq(families.plantId, plantId))
    .orderBy(asc(families.name), asc(families.id));
}
