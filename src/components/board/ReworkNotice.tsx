import { keepPreviousData, useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { OutOfDateDto, ReworkedDto } from '../../contracts/rework';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';

interface Props {
  readonly weekStart: string;
  /** Changes whenever the week was read again. */
  readonly readAt: string;
  readonly mayEdit: boolean;
}

const SHOWN = 6;

/** Says which runs the library would draw otherwise than they were planned, and takes its draws over. */
export function ReworkNotice({ weekStart, readAt, mayEdit }: Props) {
  const units = useUnits();
  const [open, setOpen] = useState(false);
  const path = `/api/weeks/${weekStart}/rework`;
  const query = useQuery({
    queryKey: ['rework', weekStart, readAt],
    queryFn: ({ signal }) => api<OutOfDateDto>(path, { signal }),
    placeholderData: keepPreviousData,
  });
  const take = useMutation({
    mutationFn: () => api<ReworkedDto>(path, { method: 'POST', body: { activityIds: 'all' } }),
    onSuccess: () => query.refetch(),
  });
  const { activities = [], faults = [] } = query.data ?? {};
  if (activities.length === 0 && faults.length === 0) return null;
  const runs = activities.length === 1 ? 'One run was' : `${activities.length} runs were`;
  return (
    <div className="px-5 py-4">
      <Notice
        title={
          activities.length > 0 ? `${runs} planned with an older duty or route` : 'The library can’t be worked out'
        }
        actions={
          activities.length > 0 ? (
            <>
              {mayEdit ? (
                <Button size="small" busy={take.isPending} onClick={() => take.mutate()}>
                  Take the library’s demand
                </Button>
              ) : null}
              <Button look="quiet" size="small" aria-expanded={open} onClick={() => setOpen(!open)}>
                {open ? 'Fold' : 'Which'}
              </Button>
            </>
          ) : null
        }
      >
        {activities.length > 0
          ? 'Their duty or route has changed since. They keep their draws until they are worked out anew.'
          : ''}
        {faults.map((fault) => (
          <p key={fault}>{units.sentence(fault)}</p>
        ))}
        {take.isError ? <p className="text-over">{messageOf(take.error)}</p> : null}
        {open ? (
          <ul className="mt-2 space-y-0.5">
            {activities.slice(0, SHOWN).map(({ id, code, change }) => (
              <li key={id}>
                <span className="font-medium text-ink">{code}</span> {units.sentence(change)}
              </li>
            ))}
            {activities.length > SHOWN ? <li>and {activities.length - SHOWN} more</li> : null}
          </ul>
        ) : null}
      </Notice>
    </div>
  );
}
