import type { Change, Edit } from '../../core/schedule/edit';
import { reverseEdit } from '../../core/schedule/edits';

/** Edits that can be taken back, and taken-back ones that can be made again; the newest last. */
export interface History {
  readonly done: readonly Edit[];
  readonly undone: readonly Edit[];
}

export const EMPTY_HISTORY: History = { done: [], undone: [] };
const LONGEST = 100;

/** A new edit: what had been taken back can't be made again after it. */
export function recordEdit(history: History, edit: Edit): History {
  return { done: [...history.done, edit].slice(-LONGEST), undone: [] };
}

export interface HistoryStep {
  readonly edit: Edit;
  readonly history: History;
}

/** The edit that takes the newest one back; null where there is nothing to undo. */
export function undoStep(history: History): HistoryStep | null {
  const last = history.done.at(-1);
  if (!last) return null;
  const edit = reverseEdit(last, 'undo');
  const { done, undone } = refresh({ done: history.done.slice(0, -1), undone: history.undone }, last, edit);
  return { edit, history: { done, undone: [...undone, edit] } };
}

/** The edit that makes the newest undone one again; null where there is none. */
export function redoStep(history: History): HistoryStep | null {
  const last = history.undone.at(-1);
  if (!last) return null;
  const edit = reverseEdit(last, 'redo');
  const { done, undone } = refresh({ done: history.done, undone: history.undone.slice(0, -1) }, last, edit);
  return { edit, history: { done: [...done, edit], undone } };
}

/**
 * After `back` has reversed `edit`, each activity is as it was when `edit` read it, under a newer revision: edits that
 * had left it in that state now name the newer one.
 */
function refresh(history: History, edit: Edit, back: Edit): History {
  const newer = new Map<string, number>();
  const read = new Map(edit.changes.map((change) => [change.activityId, change.revision]));
  for (const change of back.changes) newer.set(change.activityId, change.revision + 1);
  const renew = (change: Change): Change => {
    const now = newer.get(change.activityId);
    return now !== undefined && change.revision + 1 === read.get(change.activityId)
      ? { ...change, revision: now - 1 }
      : change;
  };
  const renewAll = (edits: readonly Edit[]): Edit[] => edits.map((e) => ({ ...e, changes: e.changes.map(renew) }));
  return { done: renewAll(history.done), undone: renewAll(history.undone) };
}

/** The history without what was refused: an edit, an undo or a redo. */
export function forgetEdit(history: History, refused: Edit): History {
  const same = (edit: Edit): boolean =>
    edit.changes.length === refused.changes.length &&
    edit.changes.every((change, i) => {
      const other = refused.changes[i];
      return other?.activityId === change.activityId && other.revision === change.revision;
    });
  return {
    done: history.done.filter((edit) => !same(edit)),
    undone: history.undone.filter((edit) => !same(edit)),
  };
}
