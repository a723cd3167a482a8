import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { PeopleDto } from '../../contracts/people';
import { api } from '../query/api';
import { usePlantEvents } from '../query/usePlantEvents';

const KEY = ['people'];

export interface People {
  readonly data: PeopleDto;
  /** Asks for a change; what everybody is like then is shown at once. */
  readonly change: (path: string, body?: unknown, method?: 'POST' | 'DELETE') => Promise<PeopleDto>;
}

/** The plant's people, read anew whenever somebody changes them. */
export function usePeople(initial: PeopleDto): People {
  const client = useQueryClient();
  const { data } = useQuery({ queryKey: KEY, queryFn: () => api<PeopleDto>('/api/people'), initialData: initial });
  usePlantEvents((notice) => {
    if (notice === null || notice.kind === 'people') void client.invalidateQueries({ queryKey: KEY });
  });
  const change: People['change'] = async (path, body, method = 'POST') => {
    const next = await api<PeopleDto>(path, { method, ...(body === undefined ? {} : { body }) });
    client.setQueryData(KEY, next);
    return next;
  };
  return { data, change };
}
