import { useDraggable } from '@dnd-kit/core';
import { memo } from 'react';
import { drawnMode, type Activity } from '../../core/plant/activity';
import type { Clock } from '../time';
import { Outline } from './Block';
import { STAGE_WORDS } from './words';

interface Props {
  readonly activities: readonly Activity[];
  readonly peak: number;
  readonly clock: Clock;
  readonly mayEdit: boolean;
  readonly selectedId: string | null;
  readonly onSelect: (id: string) => void;
  /** By keys: picks the activity up at its first unit. */
  readonly onLift: (activity: Activity) => void;
  readonly onPlaceBatch: (batchId: string) => void;
}

/** What still waits for a place, by due time. Cards are dragged onto the board, or picked up with Enter. */
export function Unplaced({ activities, onPlaceBatch, mayEdit, ...card }: Props) {
  const batches = byBatch(activities);
  return (
    <section aria-labelledby="not-yet-placed">
      <header className="flex items-baseline justify-between">
        <h2 id="not-yet-placed" className="text-base font-semibold">
          Not yet placed
        </h2>
        <span className="text-xs text-ink-muted">{activities.length > 0 ? 'by due time' : ''}</span>
      </header>
      {activities.length === 0 ? <p className="mt-1 text-sm text-ink-muted">Everything has a place.</p> : null}
      {batches.map((batch) => (
        <div key={batch.key} className="mt-2.5">
          <p className="flex items-baseline justify-between gap-2 text-xs">
            <span className="min-w-0 truncate font-medium">{batch.title}</span>
            <span className="shrink-0 text-ink-muted">
              {batch.due === null ? 'no due time' : `due ${card.clock.dayTime(batch.due)}`}
            </span>
          </p>
          <ul className="mt-1 flex flex-col gap-1">
            {batch.activities.map((activity) => (
              <li key={activity.id}>
                <Card activity={activity} mayEdit={mayEdit} {...card} />
              </li>
            ))}
          </ul>
          {mayEdit && batch.batchId !== null && batch.activities.length > 1 ? (
            <button type="button" className="link mt-1 text-xs" onClick={() => onPlaceBatch(batch.batchId as string)}>
              Place all {batch.activities.length} where there is room
            </button>
          ) : null}
        </div>
      ))}
    </section>
  );
}

interface BatchCards {
  readonly key: string;
  readonly batchId: string | null;
  readonly title: string;
  readonly due: number | null;
  readonly activities: readonly Activity[];
}

function byBatch(activities: readonly Activity[]): BatchCards[] {
  const groups = new Map<string, Activity[]>();
  for (const activity of activities) {
    const key = activity.batchId ?? activity.id;
    groups.set(key, [...(groups.get(key) ?? []), activity]);
  }
  return [...groups.entries()].map(([key, list]) => ({
    key,
    batchId: list[0]?.batchId ?? null,
    title: list[0]?.title ?? '',
    due: list.reduce<number | null>((due, a) => (a.due === null ? due : Math.max(due ?? 0, a.due)), null),
    activities: list,
  }));
}

const Card = memo(function Card({
  activity,
  peak,
  mayEdit,
  selectedId,
  onSelect,
  onLift,
}: Omit<Props, 'activities' | 'onPlaceBatch'> & { readonly activity: Activity }) {
  const { setNodeRef, listeners } = useDraggable({ id: activity.id, disabled: !mayEdit });
  const mode = drawnMode(activity);
  const stage = activity.stage ? STAGE_WORDS[activity.stage] : '';
  return (
    <button
      ref={setNodeRef}
      {...listeners}
      type="button"
      data-activity={activity.id}
      aria-pressed={selectedId === activity.id}
      onClick={() => onSelect(activity.id)}
      onKeyDown={(event) => {
        if (!mayEdit || (event.key !== 'Enter' && event.key !== 'm')) return;
        event.preventDefault();
        onLift(activity);
      }}
      className="flex w-full cursor-grab items-center gap-2.5 rounded-sm border border-rule bg-paper px-2 py-1.5 text-left hover:border-steam aria-pressed:border-focus aria-pressed:bg-focus-soft"
    >
      <span className="relative h-6 w-10 shrink-0 overflow-hidden [&>svg]:absolute [&>svg]:inset-0 [&>svg]:size-full [&>svg]:fill-steam">
        {mode ? <Outline mode={mode} peak={peak} /> : null}
      </span>
      <span className="min-w-0 flex-1 truncate text-xs">
        {activity.code} <span className="text-ink-muted">· {stage}</span>
      </span>
      <span className="text-2xs text-ink-muted">{mode?.minutes} min</span>
    </button>
  );
});
