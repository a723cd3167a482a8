import type { Activity } from '../plant/activity';
import type { Change, Edit, EditKind, PlanState } from './edit';
import type { Week } from './week';

/** What an edit can change of an activity, as it is. */
export function planStateOf(activity: Activity): PlanState {
  return { placement: activity.placement, fixing: activity.fixing };
}

/** A change of an activity as it was read. */
export function changeOf(activity: Activity, after: Partial<PlanState>): Change {
  const before = planStateOf(activity);
  return { activityId: activity.id, revision: activity.revision, before, after: { ...before, ...after } };
}

/** An edit without the changes that change nothing. */
export function editOf(kind: EditKind, changes: readonly Change[]): Edit {
  return { kind, changes: changes.filter((change) => !samePlan(change.before, change.after)) };
}

/**
 * The activities after an edit: each one changed has the state `after` and a revision one above the one read. Others are
 * the same values; changes of unknown activities are passed over. See {@link staleChanges} for what must be refused.
 */
export function applyEdit(activities: readonly Activity[], edit: Edit): Activity[] {
  const changes = new Map(edit.changes.map((change) => [change.activityId, change]));
  return activities.map((activity) => {
    const change = changes.get(activity.id);
    return change ? { ...activity, ...change.after, revision: change.revision + 1 } : activity;
  });
}

/** The week after an edit. */
export function editWeek(week: Week, edit: Edit): Week {
  return { ...week, activities: applyEdit(week.activities, edit) };
}

/** The changes that were read from another state than the activities have now, or whose activity is gone. */
export function staleChanges(activities: readonly Activity[], edit: Edit): Change[] {
  const byId = new Map(activities.map((activity) => [activity.id, activity]));
  return edit.changes.filter((change) => {
    const activity = byId.get(change.activityId);
    return !activity || activity.revision !== change.revision || !samePlan(planStateOf(activity), change.before);
  });
}

/** The edit that takes an applied edit back; it names the revisions that applying it made. */
export function reverseEdit(edit: Edit, kind: EditKind = 'undo'): Edit {
  const changes = edit.changes.map(({ activityId, revision, before, after }) => {
    return { activityId, revision: revision + 1, before: after, after: before };
  });
  return { kind, changes };
}

/** One edit instead of several not yet saved, in order: from each first state to the last; kind of the last. */
export function squashEdits(edits: readonly Edit[]): Edit {
  const squashed = new Map<string, Change>();
  for (const change of edits.flatMap((edit) => edit.changes)) {
    const first = squashed.get(change.activityId);
    squashed.set(change.activityId, first ? { ...first, after: change.after } : change);
  }
  return editOf(edits.at(-1)?.kind ?? 'move', [...squashed.values()]);
}

/** True where two states of an activity's plan are the same. */
export function samePlan(a: PlanState, b: PlanState): boolean {
  return (
    a.fixing === b.fixing &&
    a.placement?.unitId === b.placement?.unitId &&
    a.placement?.start === b.placement?.start &&
    (a.placement?.cleanAfterMin ?? 0) === (b.placement?.cleanAfterMin ?? 0)
  );
}
