import { and, asc, eq, gte, inArray, isNotNull, isNull } from 'drizzle-orm';
import type { StartSpread } from '@/core/header/spread/startSpread';
import type { Activity } from '@/core/plant/activity';
import type { Db } from '@/db/client';
import { floorEvents, issues, lines, plans, plants, units } from '@/db/schema/index';

/** The start spreads of a plant by unit id, units without one left out. */
export async function spreadsOf(tx: Db, plantId: string): Promise<Record<string, StartSpread>> {
  const rows = await tx
    .select({ id: units.id, spread: units.startSpread })
    .from(units)
    .where(and(eq(units.plantId, plantId), isNotNull(units.startSpread)));
  return Object.fromEntries(rows.flatMap(({ id, spread }) => (spread ? [[id, spread]] : [])));
}

/** The units in use with their spreads, by line and in the plant's order; `unitId` for one of them, locked. */
export async function unitSpreadRows(tx: Db, plantId: string, unitId?: string) {
  const own = and(eq(units.plantId, plantId), isNull(units.retiredAt));
  const query = tx
    .select({ unit: units, lineName: lines.name })
    .from(units)
    .innerJoin(lines, eq(lines.id, units.lineId))
    .where(unitId === undefined ? own : and(own, eq(units.id, unitId)))
    .orderBy(asc(lines.position), asc(units.position), asc(units.id));
  return unitId === undefined ? query : query.for('update', { of: units });
}

export type UnitSpreadRow = Awaited<ReturnType<typeof unitSpreadRows>>[number];

/** Writes a unit's spread and where it is from. */
export async function writeSpread(
  tx: Db,
  plantId: string,
  unitId: string,
  startSpread: StartSpread | null,
  startSpreadSource: string | null,
): Promise<void> {
  await tx
    .update(units)
    .set({ startSpread, startSpreadSource })
    .where(and(eq(units.plantId, plantId), eq(units.id, unitId)));
}

/** The plant's time zone; null where there is no such plant. */
export async function timeZoneOf(tx: Db, plantId: string): Promise<string | null> {
  const [row] = await tx.select({ timeZone: plants.timeZone }).from(plants).where(eq(plants.id, plantId));
  return row?.timeZone ?? null;
}

/** Crates in and steam on as recorded since an instant and not taken back, with the week that they were planned in. */
export async function startEventRows(tx: Db, plantId: string, since: Date) {
  return tx
    .select({
      activityId: floorEvents.activityId,
      issueId: floorEvents.issueId,
      event: floorEvents.event,
      happenedAt: floorEvents.happenedAt,
      weekStart: plans.weekStart,
    })
    .from(floorEvents)
    .innerJoin(plans, eq(plans.id, floorEvents.planId))
    .where(
      and(
        eq(floorEvents.plantId, plantId),
        gte(floorEvents.happenedAt, since),
        isNull(floorEvents.takenBackById),
        inArray(floorEvents.event, ['cratesIn', 'steamOn']),
      ),
    )
    .orderBy(asc(floorEvents.happenedAt), asc(floorEvents.id));
}

export type StartEventRow = Awaited<ReturnType<typeof startEventRows>>[number];

/** The activities of an issue as they were put on the floor. */
export async function issuedActivities(tx: Db, plantId: string, issueId: string): Promise<readonly Activity[]> {
  const [row] = await tx
    .select({ week: issues.week })
    .from(issues)
    .where(and(eq(issues.plantId, plantId), eq(issues.id, issueId)));
  return row?.week.activities ?? [];
}
