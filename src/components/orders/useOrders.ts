import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { OrdersDto } from '../../contracts/orders';
import { api, type ApiInit } from '../query/api';
import { usePlantEvents } from '../query/usePlantEvents';

const KEY = ['orders'];
const FOLLOWED: ReadonlySet<string> = new Set(['orders', 'plan', 'issue', 'floor', 'plant', 'processData']);

export interface Orders {
  readonly data: OrdersDto;
  /** Asks for a change, then reads the list anew. */
  readonly change: <T>(path: string, init: ApiInit) => Promise<T>;
}

/** The plant's orders, read anew whenever somebody changes them or what is planned of them. */
export function useOrders(initial: OrdersDto): Orders {
  const client = useQueryClient();
  const { data } = useQuery({ queryKey: KEY, queryFn: () => api<OrdersDto>('/api/orders'), initialData: initial });
  const again = (): Promise<void> => client.invalidateQueries({ queryKey: KEY });
  usePlantEvents((notice) => {
    if (notice === null || FOLLOWED.has(notice.kind)) void again();
  });
  return {
    data,
    change: async <T>(path: string, init: ApiInit) => {
      const answer = await api<T>(path, init);
      await again();
      return answer;
    },
  };
}
