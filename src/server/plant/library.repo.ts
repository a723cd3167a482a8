import { and, asc, eq, max } from 'drizzle-orm';
import type { PlantLibraryDto, Thing, ThingKind, ThingValues, VentNumbersDto } from '@/contracts/plantLibrary';
import { ambientAtAltitude, STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import type { Db } from '@/db/client';
import { plants, ventGroups } from '@/db/schema/index';
import { newId } from '../id';
import { columnsOf, TABLES, thingOf } from './tables';

/** The tables share the columns that are used here: one stands for all of them. */
const tableOf = (kind: ThingKind): typeof TABLES.boilers => TABLES[kind] as unknown as typeof TABLES.boilers;

/** Things of one kind in the plant's order, what is retired last. */
async function thingsOf<K extends ThingKind>(tx: Db, plantId: string, kind: K): Promise<Thing<K>[]> {
  const table = tableOf(kind);
  const rows = await tx
    .select()
    .from(table)
    .where(eq(table.plantId, plantId))
    .orderBy(asc(table.position), asc(table.id));
  const things = rows.map((row) => thingOf(kind, row as unknown as (typeof TABLES)[K]['$inferSelect']));
  return [...things.filter((thing) => thing.retiredAt === null), ...things.filter((thing) => thing.retiredAt !== null)];
}

async function ventNumbers(tx: Db, plantId: string): Promise<Record<string, VentNumbersDto>> {
  const rows = await tx.select().from(ventGroups).where(eq(ventGroups.plantId, plantId));
  return Object.fromEntries(
    rows.map(({ id, name: _name, plantId: _plant, position: _position, retiredAt: _retired, ...numbers }) => [
      id,
      numbers,
    ]),
  );
}

/** All of a plant's library; null where there is no such plant. */
export async function readPlantLibrary(tx: Db, plantId: string): Promise<PlantLibraryDto | null> {
  const [plant] = await tx.select().from(plants).where(eq(plants.id, plantId));
  if (!plant) return null;
  const ambient = ambientAtAltitude(plant.altitudeM);
  return {
    ambientBarA: ambient.ok ? ambient.value : STANDARD_ATMOSPHERE,
    weekStartsOn: plant.weekStartsOn,
    things: {
      headers: await thingsOf(tx, plantId, 'headers'),
      boilers: await thingsOf(tx, plantId, 'boilers'),
      units: await thingsOf(tx, plantId, 'units'),
      ventGroups: await thingsOf(tx, plantId, 'ventGroups'),
      accumulators: await thingsOf(tx, plantId, 'accumulators'),
      sharedLimits: await thingsOf(tx, plantId, 'sharedLimits'),
      baseLoads: await thingsOf(tx, plantId, 'baseLoads'),
      lines: await thingsOf(tx, plantId, 'lines'),
    },
    ventNumbers: await ventNumbers(tx, plantId),
  };
}

/** Lets one change of a plant's library come after another: each is held against the plant as it then stands. */
export async function lockLibrary(tx: Db, plantId: string): Promise<void> {
  await tx.select({ id: plants.id }).from(plants).where(eq(plants.id, plantId)).for('no key update');
}

/** Adds a thing at the end of its kind's order; gives its id. */
export async function insertThing<K extends ThingKind>(tx: Db, plantId: string, kind: K, values: ThingValues<K>) {
  const table = tableOf(kind);
  const [last] = await tx
    .select({ position: max(table.position) })
    .from(table)
    .where(eq(table.plantId, plantId));
  const row = { ...columnsOf(kind, values, true), id: newId(), plantId, position: (last?.position ?? -1) + 1 };
  await tx.insert(table).values(row as unknown as typeof TABLES.boilers.$inferInsert);
  return row.id;
}

type Change = Partial<typeof TABLES.boilers.$inferInsert>;

async function update(tx: Db, plantId: string, kind: ThingKind, id: string, change: Change): Promise<void> {
  const table = tableOf(kind);
  await tx
    .update(table)
    .set(change)
    .where(and(eq(table.plantId, plantId), eq(table.id, id)));
}

/** Writes a form's values over a thing's. */
export function updateThing<K extends ThingKind>(tx: Db, plantId: string, kind: K, id: string, values: ThingValues<K>) {
  return update(tx, plantId, kind, id, columnsOf(kind, values, false));
}

/** Takes a thing out of use; it is kept for weeks that ended before. */
export function retireRow(tx: Db, plantId: string, kind: ThingKind, id: string, at: Date): Promise<void> {
  return update(tx, plantId, kind, id, { retiredAt: at });
}

/** Puts things in the order of their ids. */
export async function orderRows(tx: Db, plantId: string, kind: ThingKind, ids: readonly string[]): Promise<void> {
  for (const [position, id] of ids.entries()) await update(tx, plantId, kind, id, { position });
}
