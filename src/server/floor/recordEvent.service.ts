import type { FloorEventRequest } from '@/contracts/floor';
import type { FloorEventDto } from '@/contracts/week';
import type { Activity, Placement } from '@/core/plant/activity';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { issueOnFloor, type IssueRow } from '../issues/issues.repo';
import { namesOf } from '../people/people.repo';
import { placementOfRow } from '../plans/activityOfRow';
import { insertEdit, writeStates } from '../plans/edits.repo';
import { floorEventRows, lockActivities, setPlanRevision, type ActivityRow, type PlanRow } from '../plans/plans.repo';
import { record } from '../record/record';
import { findWeek, planOf } from '../weeks/findWeek';
import { floorEventDto } from '../weeks/weekDtos';
import type { WeekTime } from '../weeks/weekTime';
import { eventProblem } from './eventProblem';
import { insertFloorEvent, isIssueOf, setFixing } from './floor.repo';

type Supervisor = Authorized<'floor.record'>;

interface OnFloor {
  readonly plan: PlanRow;
  readonly time: WeekTime;
  readonly issue: IssueRow;
  /** As issued. */
  readonly activity: Activity & { readonly placement: Placement };
  /** As planned by now. */
  readonly row: ActivityRow;
}

/** Records what happened on the floor to an activity of the issue that is on it. */
export async function recordEvent(
  actor: Supervisor,
  weekStart: string,
  request: FloorEventRequest,
): Promise<Result<FloorEventDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const found = await onFloor(tx, actor, weekStart, request);
    if (!found.ok) return found;
    const { plan, time, issue, activity } = found.value;
    const at = request.at === undefined ? now() : new Date(request.at);
    const recorded = (await floorEventRows(tx, plan)).filter(({ activityId }) => activityId === activity.id);
    const wrong = eventProblem({ activity, event: request.event, at, recorded, time, now: now() });
    if (wrong) return fail(wrong);
    const written = await insertFloorEvent(tx, {
      id: newId(),
      plantId: plan.plantId,
      planId: plan.id,
      issueId: issue.id,
      activityId: activity.id,
      event: request.event,
      happenedAt: at,
      authorId: actor.personId,
      createdAt: now(),
    });
    const revision = await carryToPlan(tx, actor, found.value, recorded.length === 0, request.event === 'empty');
    await notify(tx, plan.plantId, { kind: 'floor', planId: plan.id, revision });
    await record(tx, actor, `floor.${request.event}`, activity.id, { issue: issue.number, at: at.toISOString() });
    return ok(floorEventDto(written, time, await namesOf(tx, [actor.personId])));
  });
}

async function onFloor(
  tx: Db,
  actor: Supervisor,
  weekStart: string,
  { issueId, activityId }: FloorEventRequest,
): Promise<Result<OnFloor, HttpProblem>> {
  const week = await findWeek(actor, weekStart, tx);
  if (!week.ok) return week;
  const { time } = week.value;
  const plan = await planOf(tx, week.value, true);
  const issue = await issueOnFloor(tx, plan);
  if (!issue || !(await isIssueOf(tx, plan, issueId))) {
    return fail(notFound('That issue is not one of this week’s plan; nothing was recorded. Load the sheet again.'));
  }
  if (issue.id !== issueId) {
    const message = `Issue ${issue.number} has come to the floor since; nothing was recorded. Load the sheet again.`;
    return fail(conflict('ISSUE-CHANGED', message, { issueId: issue.id, number: issue.number }));
  }
  const activity = issue.week.activities.find(({ id }) => id === activityId);
  const [row] = await lockActivities(tx, plan, [activityId]);
  if (!activity?.placement || !row) {
    return fail(notFound(`Issue ${issue.number} has no such run or load; nothing was recorded.`));
  }
  return ok({ plan, time, issue, activity: { ...activity, placement: activity.placement }, row });
}

/**
 * The first event starts the activity where the issue has it, wherever the plan had moved it since; "empty" ends it.
 * Gives the plan's revision.
 */
async function carryToPlan(
  tx: Db,
  actor: Supervisor,
  { plan, time, activity, row }: OnFloor,
  first: boolean,
  ended: boolean,
): Promise<number> {
  const fixing = ended ? 'done' : 'started';
  if (!first && !ended) return plan.revision;
  const revision = plan.revision + 1;
  const before = { placement: placementOfRow(row, time), fixing: row.fixing };
  const after = { placement: activity.placement, fixing } as const;
  if (first && !samePlace(before.placement, after.placement)) {
    const change = { activityId: row.id, revision: row.revision, before, after };
    const at = now();
    await writeStates(tx, plan, [change], time, { personId: actor.personId, at });
    await insertEdit(tx, plan, { kind: 'move', changes: [change] }, actor, at, revision);
  } else {
    await setFixing(tx, plan, row.id, fixing);
  }
  await setPlanRevision(tx, plan, revision);
  return revision;
}

const samePlace = (a: Placement | null, b: Placement): boolean =>
  a !== null && a.unitId === b.unitId && a.start === b.start;
