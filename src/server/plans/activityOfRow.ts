import type { Activity, Link, Placement, ProcessDataRef } from '@/core/plant/activity';
import type { PlanState } from '@/core/schedule/edit';
import { ceilMinuteOf, instantOf, minuteOf, type WeekTime } from '../weeks/weekTime';
import type { ActivityRow, LinkRow } from './plans.repo';

/** A row's place on the board, in minutes of its week. */
export function placementOfRow(row: ActivityRow, time: WeekTime): Placement | null {
  if (row.unitId === null || row.startAt === null) return null;
  const place = { unitId: row.unitId, start: minuteOf(time, row.startAt) };
  return row.cleanAfterMin > 0 ? { ...place, cleanAfterMin: row.cleanAfterMin } : place;
}

/** What an edit can change of a row, as it is. */
export function planStateOfRow(row: ActivityRow, time: WeekTime): PlanState {
  return { placement: placementOfRow(row, time), fixing: row.fixing };
}

/** The columns that hold what an edit changes. */
export function columnsOf({ placement, fixing }: PlanState, time: WeekTime) {
  return {
    unitId: placement?.unitId ?? null,
    startAt: placement ? instantOf(time, placement.start) : null,
    cleanAfterMin: placement?.cleanAfterMin ?? 0,
    fixing,
  };
}

/** An activity as core knows it: instants become minutes of the week. */
export function activityOfRow(
  row: ActivityRow,
  time: WeekTime,
  processData: ReadonlyMap<string, ProcessDataRef>,
): Activity {
  return {
    id: row.id,
    kind: row.kind,
    stage: row.stage,
    ...(row.cleaning === null ? {} : { cleaning: row.cleaning }),
    batchId: row.batchId,
    code: row.code,
    title: row.title,
    productId: row.productId,
    familyId: row.familyId,
    modes: row.modes,
    placement: placementOfRow(row, time),
    fixing: row.fixing,
    occupiesUntil: row.occupiesUntilLinkId === null ? 'end' : { linkId: row.occupiesUntilLinkId },
    earliestStart: ceilMinuteOf(time, row.earliestAt),
    latestStart: row.latestStartAt && minuteOf(time, row.latestStartAt),
    due: row.dueAt && minuteOf(time, row.dueAt),
    weight: row.weight,
    processData: row.processDataId === null ? null : (processData.get(row.processDataId) ?? null),
    revision: row.revision,
  };
}

/** A link as core knows it. */
export function linkOfRow({ plantId: _plant, planId: _plan, ...link }: LinkRow): Link {
  return link;
}
