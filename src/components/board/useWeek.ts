import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import type { PlantNotice, WeekDto } from '../../contracts/week';
import { api } from '../query/api';
import { usePlantEvents } from '../query/usePlantEvents';

export const weekKey = (weekStart: string): readonly string[] => ['week', weekStart];

export interface WeekState {
  readonly dto: WeekDto;
  /** Reading the week anew failed; what is shown may be old. */
  readonly readError: unknown;
  readonly connected: boolean;
  readonly readAgain: () => void;
}

/** The week as the server holds it, read again whenever a notice says that something in it changed. */
export function useWeek(initial: WeekDto): WeekState {
  const client = useQueryClient();
  const { weekStart, planId } = initial;
  const query = useQuery({
    queryKey: weekKey(weekStart),
    queryFn: ({ signal }) => api<WeekDto>(`/api/weeks/${weekStart}`, { signal }),
    initialData: initial,
  });
  const readAgain = useCallback(() => {
    void client.invalidateQueries({ queryKey: weekKey(weekStart) });
  }, [client, weekStart]);
  const connected = usePlantEvents((notice: PlantNotice | null) => {
    if (notice?.planId !== undefined && notice.planId !== planId) return;
    const known = client.getQueryData<WeekDto>(weekKey(weekStart));
    if (notice?.kind === 'plan' && notice.revision !== undefined && known && known.planRevision >= notice.revision)
      return;
    readAgain();
  });
  return { dto: query.data, readError: query.error, connected, readAgain };
}
