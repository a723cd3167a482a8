import { useMutation, useMutationState, useQueryClient } from '@tanstack/react-query';
import { useCallback, useRef, useState } from 'react';
import type { EditResponse, WeekDto } from '../../contracts/week';
import type { Edit } from '../../core/schedule/edit';
import { api, messageOf } from '../query/api';
import { makeClock } from '../time';
import { EMPTY_HISTORY, forgetEdit, recordEdit, redoStep, undoStep, type History } from './history';
import type { BoardNotice } from './notices';
import { requestOf, staleOf, withStates } from './saving';
import { weekKey } from './useWeek';
import { staleSentences } from './words';

export interface Saves {
  /** Edits on their way to the server, in order. */
  readonly pending: readonly Edit[];
  readonly save: (edit: Edit) => void;
  /** An edit that the server has made already, such as accepted levelling. */
  readonly made: (edit: Edit) => void;
  readonly undo: () => Edit | null;
  readonly redo: () => Edit | null;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
}

const KIND_WORDS: Partial<Record<Edit['kind'], string>> = { undo: 'Undo', redo: 'Redo' };

/** Saves edits one after the other, shows them at once, and takes back those that the server refuses. */
export function useSaves(weekStart: string, tell: (notice: Omit<BoardNotice, 'id'>) => void): Saves {
  const client = useQueryClient();
  const key = weekKey(weekStart);
  const mutationKey = ['edit', weekStart];
  const [history, setHistory] = useState<History>(EMPTY_HISTORY);
  const latest = useRef(history);
  const change = (next: History): void => {
    latest.current = next;
    setHistory(next);
  };

  const refuse = (error: unknown, edit: Edit): void => {
    change(forgetEdit(latest.current, edit));
    const stale = staleOf(error);
    const what = KIND_WORDS[edit.kind] ?? 'The change';
    const dto = client.getQueryData<WeekDto>(key);
    if (!stale || !dto) return tell({ look: 'over', title: `${what} was not saved.`, lines: [messageOf(error)] });
    client.setQueryData<WeekDto>(key, withStates(dto, stale.planRevision, stale.stale));
    const lines = staleSentences(stale.stale, dto, makeClock(dto));
    tell({ look: 'over', title: `${what} was not saved: somebody else was faster.`, lines });
  };

  const mutation = useMutation({
    mutationKey,
    scope: { id: `week-${weekStart}` },
    mutationFn: (edit: Edit) =>
      api<EditResponse>(`/api/weeks/${weekStart}/edits`, { method: 'POST', body: requestOf(edit) }),
    onMutate: () => client.cancelQueries({ queryKey: key }),
    onSuccess: (answer) => {
      client.setQueryData<WeekDto>(key, (dto) => dto && withStates(dto, answer.planRevision, answer.activities));
    },
    onError: refuse,
    onSettled: () => {
      if (client.isMutating({ mutationKey }) === 1) void client.invalidateQueries({ queryKey: key });
    },
  });
  const pending = useMutationState({
    filters: { mutationKey, status: 'pending' },
    select: (one) => one.state.variables as Edit,
  });

  const { mutate } = mutation;
  const made = useCallback((edit: Edit) => change(recordEdit(latest.current, edit)), []);
  const save = useCallback(
    (edit: Edit) => {
      if (edit.changes.length === 0) return;
      made(edit);
      mutate(edit);
    },
    [made, mutate],
  );
  const step = useCallback(
    (take: typeof undoStep): Edit | null => {
      const next = take(latest.current);
      if (!next) return null;
      change(next.history);
      mutate(next.edit);
      return next.edit;
    },
    [mutate],
  );
  const undo = useCallback(() => step(undoStep), [step]);
  const redo = useCallback(() => step(redoStep), [step]);
  return { pending, save, made, undo, redo, canUndo: history.done.length > 0, canRedo: history.undone.length > 0 };
}
