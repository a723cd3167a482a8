import { isNeverMoved, type Activity, type Fixing, type Placement } from '../plant/activity';
import { fail, ok, problem, type Result } from '../result';
import type { Edit } from './edit';
import { changeOf, editOf } from './edits';
import type { Week } from './week';
import { indexOf } from './weekIndex';

/**
 * Slips a line: every free activity on its units that starts at or after a time moves by so many minutes. Fixed and
 * running ones stay, machines that are never moved too, and so do linked activities on other lines.
 */
export function slipLine(week: Week, lineId: string, fromMinute: number, byMinutes: number): Edit {
  const { units } = indexOf(week);
  const slipped = week.activities.filter((activity) => {
    const { placement, fixing } = activity;
    if (!placement || fixing !== 'free' || isNeverMoved(activity)) return false;
    return units.get(placement.unitId)?.lineId === lineId && placement.start >= fromMinute;
  });
  return editOf(
    'slip',
    slipped.map((activity) => changeOf(activity, { placement: shifted(activity, byMinutes) })),
  );
}

/** Puts an activity on a unit at a start. One that the floor has started, or that is unknown, can't be moved. */
export function moveActivity(week: Week, activityId: string, to: Placement): Result<Edit> {
  const found = movable(week, activityId);
  if (!found.ok) return found;
  const kept = found.value.placement?.cleanAfterMin;
  const placement = kept === undefined || to.cleanAfterMin !== undefined ? to : { ...to, cleanAfterMin: kept };
  const kind = found.value.placement ? 'move' : 'place';
  return ok(editOf(kind, [changeOf(found.value, { placement })]));
}

/** Takes an activity off the board: not yet placed again, and free. */
export function takeOffActivity(week: Week, activityId: string): Result<Edit> {
  const found = movable(week, activityId);
  if (!found.ok) return found;
  return ok(editOf('takeOff', [changeOf(found.value, { placement: null, fixing: 'free' })]));
}

/** Fixes an activity where it stands, or frees it. */
export function fixActivity(week: Week, activityId: string, fixing: Extract<Fixing, 'free' | 'fixed'>): Result<Edit> {
  const found = movable(week, activityId);
  if (!found.ok) return found;
  return ok(editOf('fix', [changeOf(found.value, { fixing })]));
}

/** Moves all placed activities of a batch that the floor has not started by so many minutes, their waits kept. */
export function moveBatch(week: Week, batchId: string, byMinutes: number): Edit {
  const moved = week.activities.filter((activity) => {
    return activity.batchId === batchId && activity.placement !== null && isOpen(activity);
  });
  return editOf(
    'move',
    moved.map((activity) => changeOf(activity, { placement: shifted(activity, byMinutes) })),
  );
}

function shifted(activity: Activity, byMinutes: number): Placement | null {
  return activity.placement && { ...activity.placement, start: activity.placement.start + byMinutes };
}

function isOpen(activity: Activity): boolean {
  return activity.fixing === 'free' || activity.fixing === 'fixed';
}

function movable(week: Week, activityId: string): Result<Activity> {
  const activity = indexOf(week).activities.get(activityId);
  if (!activity)
    return fail(problem('EDIT_UNKNOWN_ACTIVITY', `There is no ${activityId} in this week. Reload the week.`));
  if (isOpen(activity)) return ok(activity);
  return fail(
    problem('EDIT_STARTED', `${activity.code} ${activity.title} has started on the floor and stays where it is.`),
  );
}
