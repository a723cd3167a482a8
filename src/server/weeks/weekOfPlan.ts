import type { ProcessDataRef } from '@/core/plant/activity';
import type { Week } from '@/core/schedule/week';
import type { ShiftSpan } from '@/contracts/week';
import type { Db } from '@/db/client';
import { loadCapacity } from '../capacity/loadCapacity';
import { activityOfRow, linkOfRow } from '../plans/activityOfRow';
import { activityRows, linkRows, processDataRows, type ActivityRow, type PlanRow } from '../plans/plans.repo';
import { longestWaitsInForce } from '../practice/practice.repo';
import { keptWaits } from '../practice/waits';
import { expandShifts, unitCalendars } from './calendar';
import type { FoundWeek } from './findWeek';
import { plantModelOf } from './plantModel';
import { exceptionRows, plantParts, shiftRows } from './plantParts.repo';

/** A week to be judged, with the rows and shifts behind it. */
export interface LoadedWeek {
  readonly week: Week;
  readonly rows: readonly ActivityRow[];
  readonly shifts: readonly ShiftSpan[];
}

/** Reads all that a week is judged by: plant, calendars, capacity, activities, links. */
export async function weekOfPlan(tx: Db, { plant, time }: FoundWeek, plan: PlanRow): Promise<LoadedWeek> {
  const model = plantModelOf(plant, await plantParts(tx, plant.id), time);
  const shifts = expandShifts(time, await shiftRows(tx, plant.id));
  const rows = await activityRows(tx, plan);
  const processData = await processDataOf(tx, plan, rows);
  const week: Week = {
    horizonMin: time.horizonMin,
    plant: model,
    calendars: unitCalendars(time, model.units, shifts, await exceptionRows(tx, plant.id, time)),
    capacities: await loadCapacity(tx, plant.id, time),
    activities: rows.map((row) => activityOfRow(row, time, processData)),
    links: keptWaits((await linkRows(tx, plan)).map(linkOfRow), await longestWaitsInForce(tx, plan.plantId)),
  };
  return { week, rows, shifts };
}

async function processDataOf(
  tx: Db,
  plan: PlanRow,
  rows: readonly ActivityRow[],
): Promise<ReadonlyMap<string, ProcessDataRef>> {
  const ids = new Set(rows.flatMap((row) => (row.processDataId === null ? [] : [row.processDataId])));
  const found = await processDataRows(tx, plan.plantId, [...ids]);
  return new Map(
    found.map(({ id, document, issue, releasedAt, withdrawnAt }) => [
      id,
      { id, document, issue, released: releasedAt !== null && withdrawnAt === null },
    ]),
  );
}
