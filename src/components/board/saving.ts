import type { ActivityState, EditRequest, StaleResponse, WeekDto } from '../../contracts/week';
import type { Edit } from '../../core/schedule/edit';
import { applyEdit } from '../../core/schedule/edits';
import { ApiProblem } from '../query/api';

/** The week as people see it: what the server holds, and over it the edits that are on their way. */
export function withEdits(dto: WeekDto, edits: readonly Edit[]): WeekDto {
  if (edits.length === 0) return dto;
  const activities = edits.reduce((list, edit) => applyNewer(list, edit), dto.week.activities);
  return { ...dto, week: { ...dto.week, activities } };
}

/** An edit on its way, on activities that the server has not moved on from. */
function applyNewer(activities: WeekDto['week']['activities'], edit: Edit): WeekDto['week']['activities'] {
  const revisions = new Map(activities.map((activity) => [activity.id, activity.revision]));
  const changes = edit.changes.filter((change) => (revisions.get(change.activityId) ?? Infinity) <= change.revision);
  return applyEdit(activities, { ...edit, changes });
}

/** Takes over what the server says activities are now; older values than those held are left. */
export function withStates(dto: WeekDto, planRevision: number, states: readonly ActivityState[]): WeekDto {
  const byId = new Map(states.map((state) => [state.id, state]));
  const moved = { ...dto.moved };
  for (const state of states) {
    if (state.movedBy !== null && state.movedAt !== null) moved[state.id] = { by: state.movedBy, at: state.movedAt };
  }
  const activities = dto.week.activities.map((activity) => {
    const state = byId.get(activity.id);
    if (!state || state.revision < activity.revision) return activity;
    return { ...activity, placement: state.placement, fixing: state.fixing, revision: state.revision };
  });
  return {
    ...dto,
    planRevision: Math.max(planRevision, dto.planRevision),
    moved,
    agreement: planRevision > dto.planRevision ? null : dto.agreement,
    week: { ...dto.week, activities },
  };
}

/** The request that saves an edit. Levelled plans are saved by accepting them, reworked ones by the server. */
export function requestOf(edit: Edit): EditRequest {
  const kind = edit.kind === 'level' || edit.kind === 'rework' ? 'move' : edit.kind;
  return {
    kind,
    changes: edit.changes.map(({ activityId, revision, before, after }) => ({
      activityId,
      revision,
      placement: after.placement,
      ...(after.fixing !== before.fixing && (after.fixing === 'free' || after.fixing === 'fixed')
        ? { fixing: after.fixing }
        : {}),
    })),
  };
}

/** What a save was refused for, where another has changed the plan; null for any other failure. */
export function staleOf(error: unknown): StaleResponse | null {
  if (!(error instanceof ApiProblem) || error.status !== 409) return null;
  const body = error.body as Partial<StaleResponse> | null;
  return body?.code === 'PLAN-STALE' && Array.isArray(body.stale) ? (body as StaleResponse) : null;
}
