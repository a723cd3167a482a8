import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { LevellingRequest, LevellingRunDto } from '../../contracts/levelling';
import type { EditResponse, WeekDto } from '../../contracts/week';
import type { ProposedMove } from '../../core/levelling/proposal';
import type { Edit } from '../../core/schedule/edit';
import { changeOf, editOf } from '../../core/schedule/edits';
import { api, messageOf } from '../query/api';
import { makeClock } from '../time';
import type { BoardNotice } from './notices';
import { staleOf, withStates } from './saving';
import { weekKey } from './useWeek';
import { staleSentences } from './words';

const POLL_MS = 700;
const MOVING: readonly LevellingRunDto['state'][] = ['queued', 'running'];
const OVER: readonly LevellingRunDto['state'][] = ['accepted', 'discarded', 'cancelled'];

export interface Levelling {
  readonly open: boolean;
  readonly setOpen: (open: boolean) => void;
  readonly run: LevellingRunDto | null;
  /** Moves of the proposal that are ticked; empty where there is no proposal. */
  readonly chosen: readonly ProposedMove[];
  readonly isChosen: (activityId: string) => boolean;
  readonly toggle: (activityId: string) => void;
  readonly busy: boolean;
  readonly problem: string | null;
  readonly start: (request: LevellingRequest) => void;
  readonly cancel: () => void;
  readonly accept: () => void;
  readonly discard: () => void;
  readonly forget: () => void;
}

interface Deps {
  readonly dto: WeekDto;
  readonly tell: (notice: Omit<BoardNotice, 'id'>) => void;
  readonly made: (edit: Edit) => void;
}

const post = <T>(path: string, body: unknown = {}): Promise<T> => api<T>(path, { method: 'POST', body });

/** A levelling run from the first question to what is made of its proposal. */
export function useLevelling({ dto, tell, made }: Deps): Levelling {
  const client = useQueryClient();
  const [open, setOpen] = useState(false);
  const [runId, setRunId] = useState(dto.levelling?.id ?? null);
  const [left, setLeft] = useState<ReadonlySet<string>>(new Set());
  const newest = dto.levelling?.id ?? null;
  const [seen, setSeen] = useState(newest);
  if (newest !== seen) {
    setSeen(newest);
    if (newest !== null) setRunId(newest);
  }

  const query = useQuery({
    queryKey: ['levelling', runId],
    queryFn: ({ signal }) => api<LevellingRunDto>(`/api/levelling/${runId}`, { signal }),
    enabled: runId !== null,
    initialData: dto.levelling?.id === runId ? dto.levelling : undefined,
    initialDataUpdatedAt: 0,
    refetchInterval: (q) => (q.state.data && MOVING.includes(q.state.data.state) ? POLL_MS : false),
  });
  const found = runId === null ? null : (query.data ?? null);
  const run = found && !OVER.includes(found.state) ? found : null;
  const moves = useMemo(() => (run?.state === 'proposed' ? (run.proposal?.moves ?? []) : []), [run]);
  const chosen = useMemo(() => moves.filter((move) => !left.has(move.activityId)), [moves, left]);

  const forget = (): void => {
    setRunId(null);
    setLeft(new Set());
  };
  const refuse = (error: unknown): void => {
    const stale = staleOf(error);
    const lines = stale ? staleSentences(stale.stale, dto, makeClock(dto)) : [messageOf(error)];
    if (stale) client.setQueryData<WeekDto>(weekKey(dto.weekStart), withStates(dto, stale.planRevision, stale.stale));
    tell({ look: 'over', title: stale ? 'The plan has changed since it was levelled.' : 'That did not work.', lines });
  };
  const start = useMutation({
    mutationFn: (request: LevellingRequest) => post<LevellingRunDto>(`/api/weeks/${dto.weekStart}/levelling`, request),
    onSuccess: (answer) => {
      setLeft(new Set());
      client.setQueryData(['levelling', answer.id], answer);
      setRunId(answer.id);
    },
  });
  const stop = useMutation({
    mutationFn: (how: 'cancel' | 'discard') => post<unknown>(`/api/levelling/${runId}/${how}`),
    onSuccess: forget,
    onError: refuse,
  });
  const take = useMutation({
    mutationFn: () => {
      const activityIds = left.size === 0 ? 'all' : chosen.map((move) => move.activityId);
      return post<EditResponse>(`/api/levelling/${runId}/accept`, { activityIds });
    },
    onSuccess: (answer) => {
      made(editOfMoves(dto, chosen));
      client.setQueryData<WeekDto>(
        weekKey(dto.weekStart),
        (d) => d && withStates(d, answer.planRevision, answer.activities),
      );
      void client.invalidateQueries({ queryKey: weekKey(dto.weekStart) });
      forget();
      setOpen(false);
      tell({ look: 'good', title: `${chosen.length} moves accepted.`, lines: ['Undo takes them back together.'] });
    },
    onError: refuse,
  });

  return {
    open,
    setOpen,
    run,
    chosen,
    isChosen: (id) => !left.has(id),
    toggle: (id) =>
      setLeft((now) => (now.has(id) ? new Set([...now].filter((one) => one !== id)) : new Set([...now, id]))),
    busy: start.isPending || stop.isPending || take.isPending,
    problem: start.error ? messageOf(start.error) : query.error ? messageOf(query.error) : null,
    start: start.mutate,
    cancel: () => stop.mutate('cancel'),
    accept: () => take.mutate(),
    discard: () => stop.mutate('discard'),
    forget,
  };
}

/** Accepted moves as an edit, so that undo takes them back. */
function editOfMoves(dto: WeekDto, moves: readonly ProposedMove[]): Edit {
  const byId = new Map(dto.week.activities.map((activity) => [activity.id, activity]));
  const changes = moves.flatMap((move) => {
    const activity = byId.get(move.activityId);
    return activity ? [changeOf(activity, { placement: move.to })] : [];
  });
  return editOf('level', changes);
}
