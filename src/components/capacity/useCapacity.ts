import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { CapacityDto } from '@/contracts/capacity';
import type { PlantNotice, WeekDto } from '@/contracts/week';
import { api } from '../query/api';
import { usePlantEvents } from '../query/usePlantEvents';
import type { Draft } from './draft';

/** The request that sets a draft. */
function requestOf(draft: Draft, reason: string): { readonly path: string; readonly body: unknown } {
  const { subject, fromMin, toMin, value } = draft;
  return subject.kind === 'limit'
    ? { path: 'limits', body: { headerId: subject.headerId, fromMin, toMin, limitKgPerH: value, reason } }
    : { path: 'firings', body: { boilerId: subject.boilerId, fromMin, toMin, share: value, reason } };
}

/** The week's capacity and plan, kept fresh by the plant's notices, and the way to set a span. */
export function useCapacity(first: { readonly capacity: CapacityDto; readonly week: WeekDto }) {
  const client = useQueryClient();
  const address = `/api/weeks/${first.capacity.weekStart}`;
  const capacityKey = ['capacity', first.capacity.weekStart];
  const weekKey = ['week', first.capacity.weekStart];
  const capacity = useQuery({
    queryKey: capacityKey,
    queryFn: ({ signal }) => api<CapacityDto>(`${address}/capacity`, { signal }),
    initialData: first.capacity,
  });
  const week = useQuery({
    queryKey: weekKey,
    queryFn: ({ signal }) => api<WeekDto>(address, { signal }),
    initialData: first.week,
  });

  const connected = usePlantEvents((notice: PlantNotice | null) => {
    if (notice === null || notice.kind === 'capacity') void client.invalidateQueries({ queryKey: capacityKey });
    if (notice === null || notice.kind === 'plan') void client.invalidateQueries({ queryKey: weekKey });
  });

  const save = useMutation({
    mutationFn: ({ draft, reason }: { readonly draft: Draft; readonly reason: string }) => {
      const { path, body } = requestOf(draft, reason);
      return api<CapacityDto>(`${address}/${path}`, { method: 'POST', body });
    },
    onSuccess: (saved) => client.setQueryData(capacityKey, saved),
  });

  return { capacity: capacity.data, week: week.data, connected, save };
}
