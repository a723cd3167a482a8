import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useRef, useState } from 'react';
import type { CleaningPlanDto } from '../../contracts/cleanings';
import type { Activity } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';
import { cleanableUnits } from '../../core/schedule/plannedCleaning';
import { api, messageOf } from '../query/api';
import { cleanFor, type WantedClean } from './cleans';
import type { BoardModel } from './useBoard';
import type { BoardActions } from './useBoardActions';
import { weekKey } from './useWeek';

/** What the dialog is open for: a clean that puts something right, or any. */
type Asked = WantedClean | 'any';

/** Gives the focus to the card of a clean that waits, clear of what is docked below it. */
function showCard(id: string): void {
  const card = document.querySelector<HTMLElement>(`.board-panel [data-activity="${CSS.escape(id)}"]`);
  card?.focus({ preventScroll: true });
  card?.scrollIntoView({ block: 'center' });
}

/** Adding cleans to the week and removing those that wait. */
export function useCleans({ dto, byUnit, waiting, mayEdit, tell }: BoardModel, actions: BoardActions) {
  const client = useQueryClient();
  const [asked, setAsked] = useState<Asked | null>(null);
  const arriving = useRef<string | null>(null);
  const { plant } = dto.week;
  const cleanable = useMemo(() => cleanableUnits(plant), [plant]);
  const readAgain = () => client.invalidateQueries({ queryKey: weekKey(dto.weekStart) });

  const { setSelectedId, say } = actions;
  useEffect(() => {
    const clean = waiting.flatMap(({ activities }) => activities).find(({ id }) => id === arriving.current);
    if (!clean) return;
    arriving.current = null;
    setSelectedId(clean.id);
    say(`${clean.code} ${clean.title} waits for a place. Enter picks it up.`);
    requestAnimationFrame(() => showCard(clean.id));
  }, [waiting, setSelectedId, say]);

  const added = (clean: CleaningPlanDto): void => {
    if (asked && asked !== 'any') actions.liftLater(clean.activityId, asked.from);
    setAsked(null);
    arriving.current = clean.activityId;
    void readAgain();
  };

  const removal = useMutation({
    mutationFn: ({ id }: Activity) =>
      api<CleaningPlanDto>(`/api/weeks/${dto.weekStart}/cleanings/${encodeURIComponent(id)}`, { method: 'DELETE' }),
    onSuccess: (_, { title }) => {
      setSelectedId(null);
      say(`${title} is removed.`);
    },
    onError: (error) => tell({ look: 'over', title: 'The clean was not removed.', lines: [messageOf(error)] }),
    onSettled: readAgain,
  });

  return {
    mayAdd: mayEdit && cleanable.length > 0,
    asked,
    ask: setAsked,
    close: () => setAsked(null),
    added,
    remove: removal.mutate,
    isRemoving: removal.isPending,
    wantedFor: (breach: Breach): WantedClean | null => (mayEdit ? cleanFor(breach, byUnit, cleanable) : null),
  };
}

export type Cleans = ReturnType<typeof useCleans>;
