import { subWeeks } from 'date-fns';
import type { RecordedStarts } from '@/contracts/spread';
import { GREATEST_DEVIATION_MIN, recordedSpread } from '@/core/header/spread/startSpread';
import type { Db } from '@/db/client';
import { now } from '../clock';
import { weekTimeOf } from '../weeks/weekTime';
import { deviationMin, type RecordedStart } from './deviations';
import { issuedActivities, startEventRows, type StartEventRow } from './spread.repo';

/** Weeks back that recorded starts are taken from. */
export const RECORDED_WEEKS = 8;

/** By unit id, how late (less than 0: early) runs were begun in the last weeks, against what the floor was told. [min] */
export async function recordedDeviations(
  tx: Db,
  plantId: string,
  timeZone: string,
): Promise<ReadonlyMap<string, readonly number[]>> {
  const byUnit = new Map<string, number[]>();
  const rows = await startEventRows(tx, plantId, subWeeks(now(), RECORDED_WEEKS));
  for (const [issueId, ofIssue] of groupedBy(rows, (row) => row.issueId)) {
    const time = weekTimeOf(ofIssue[0]?.weekStart ?? '', timeZone);
    const issued = new Map((await issuedActivities(tx, plantId, issueId)).map((activity) => [activity.id, activity]));
    for (const [activityId, recorded] of groupedBy(ofIssue, (row) => row.activityId)) {
      const activity = issued.get(activityId);
      const minutes = activity && deviationMin(activity, recorded as readonly RecordedStart[], time);
      const unitId = activity?.placement?.unitId;
      if (minutes === undefined || minutes === null || unitId === undefined) continue;
      byUnit.set(unitId, [...(byUnit.get(unitId) ?? []), minutes]);
    }
  }
  return byUnit;
}

/** Recorded deviations counted by whole minutes; those of more than a day are left out. */
export function recordedStarts(deviationsMin: readonly number[]): RecordedStarts {
  const counted = deviationsMin.filter((minutes) => Math.abs(minutes) <= GREATEST_DEVIATION_MIN);
  const spread = recordedSpread(counted);
  return {
    count: counted.length,
    leftOut: deviationsMin.length - counted.length,
    outcomes: spread.ok ? spread.value.outcomes : [],
  };
}

function groupedBy(rows: readonly StartEventRow[], key: (row: StartEventRow) => string): Map<string, StartEventRow[]> {
  const groups = new Map<string, StartEventRow[]>();
  for (const row of rows) {
    const group = groups.get(key(row));
    if (group) group.push(row);
    else groups.set(key(row), [row]);
  }
  return groups;
}
