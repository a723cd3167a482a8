import type { ActivityState, StaleResponse } from '@/contracts/week';
import type { EditKind } from '@/core/schedule/edit';
import type { Db } from '@/db/client';
import { now } from '../clock';
import { conflict, type HttpProblem } from '../http/problem';
import { namesOf } from '../people/people.repo';
import type { WeekTime } from '../weeks/weekTime';
import { planStateOfRow } from './activityOfRow';
import type { ActivityRow, PlanRow } from './plans.repo';
import { activityName, dayTime, someOf } from './words';

/** Activities as they are now, with who moved them last. */
export async function activityStates(tx: Db, rows: readonly ActivityRow[], time: WeekTime): Promise<ActivityState[]> {
  const names = await namesOf(
    tx,
    rows.flatMap((row) => row.movedBy ?? []),
  );
  return rows.map((row) => ({
    id: row.id,
    ...planStateOfRow(row, time),
    revision: row.revision,
    movedBy: row.movedBy === null ? null : (names.get(row.movedBy) ?? 'someone no longer here'),
    movedAt: row.movedAt?.toISOString() ?? null,
  }));
}

/** Refuses because others have changed activities since they were read; carries their current values. */
export async function staleRefusal(
  tx: Db,
  plan: PlanRow,
  rows: readonly ActivityRow[],
  time: WeekTime,
  kind: EditKind,
): Promise<HttpProblem> {
  const stale = await activityStates(tx, rows, time);
  const extra: Omit<StaleResponse, 'code' | 'message'> = { planRevision: plan.revision, stale };
  return conflict('PLAN-STALE', `${changedSentence(rows, stale, time)}; nothing was ${doneWord(kind)}.`, { ...extra });
}

function changedSentence(rows: readonly ActivityRow[], states: readonly ActivityState[], time: WeekTime): string {
  const [row] = rows;
  const [state] = states;
  if (!row || !state) return 'The plan has been changed';
  const more = rows.length > 1 ? ` (and ${rows.length - 1} more ${rows.length > 2 ? 'have' : 'has'} been changed)` : '';
  if (state.movedBy === null || row.movedAt === null) return `${activityName(row)} has been changed since${more}`;
  const at = dayTime(row.movedAt, time.timeZone, now());
  return `${activityName(row)} was moved by ${state.movedBy} at ${at}${more}`;
}

/** Refuses to move what the floor has started. */
export async function onFloorRefusal(
  tx: Db,
  plan: PlanRow,
  rows: readonly ActivityRow[],
  time: WeekTime,
  kind: EditKind,
): Promise<HttpProblem> {
  const names = someOf(rows.map(activityName));
  const has = rows.length > 1 ? 'have' : 'has';
  const message = `${names} ${has} been started on the floor and can't be moved; nothing was ${doneWord(kind)}.`;
  return conflict('ON-FLOOR', message, {
    planRevision: plan.revision,
    stale: await activityStates(tx, rows, time),
  });
}

const doneWord = (kind: EditKind): string => (kind === 'undo' ? 'undone' : kind === 'redo' ? 'redone' : 'saved');
