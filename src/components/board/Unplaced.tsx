import { useDraggable } from '@dnd-kit/core';
import { memo } from 'react';
import { drawnMode, type Activity } from '../../core/plant/activity';
import type { Clock } from '../time';
import type { WaitingGroup } from './drawn';
import { Outline } from './Block';
import { whatWords } from './words';

interface Props {
  readonly groups: readonly WaitingGroup[];
  /** The week holds no batches at all. */
  readonly nothingPlanned: boolean;
  readonly peak: number;
  readonly clock: Clock;
  readonly mayEdit: boolean;
  readonly selectedId: string | null;
  readonly onSelect: (id: string) => void;
  /** By keys: picks the activity up at its first unit. */
  readonly onLift: (activity: Activity) => void;
  readonly onPlaceAll: (group: WaitingGroup) => void;
  /** null: the plant cleans nothing, or it is not this person's to do. */
  readonly onAddClean: (() => void) | null;
}

/** What still waits for a place, by due time. Cards are dragged onto the board, or picked up with Enter. */
export function Unplaced({ groups, nothingPlanned, onPlaceAll, onAddClean, mayEdit, ...card }: Props) {
  const count = groups.reduce((sum, group) => sum + group.activities.length, 0);
  return (
    <section aria-labelledby="not-yet-placed">
      <header className="flex items-baseline justify-between">
        <h2 id="not-yet-placed" className="text-base font-semibold">
          Not yet placed
        </h2>
        <span className="flex items-baseline gap-3">
          {onAddClean ? (
            <button type="button" className="link text-xs" onClick={onAddClean}>
              Add a clean…
            </button>
          ) : null}
          <span className="text-sm text-ink-muted" data-testid="unplaced-count">
            {count}
          </span>
        </span>
      </header>
      {count === 0 ? (
        <p className="mt-1 text-sm text-ink-muted">
          {nothingPlanned ? 'No batches are in this week yet.' : 'Everything has a place.'}
        </p>
      ) : null}
      {groups.map((group) => (
        <section key={group.key} className="mt-3" aria-label={group.title}>
          <h3 className="flex items-baseline justify-between gap-2 text-sm">
            <span className="min-w-0 truncate font-medium">{group.title}</span>
            <span className="shrink-0 text-xs text-ink-muted">
              {group.due === null ? 'no due time' : `due ${card.clock.dayTime(group.due)}`}
            </span>
          </h3>
          <ul className="mt-1 grid grid-cols-2 gap-1">
            {group.activities.map((activity) => (
              <li key={activity.id} className="min-w-0">
                <Card activity={activity} mayEdit={mayEdit} {...card} />
              </li>
            ))}
          </ul>
          {mayEdit ? (
            <button type="button" className="link mt-1 text-xs" onClick={() => onPlaceAll(group)}>
              {group.activities.length === 1 ? 'Place it' : `Place all ${group.activities.length}`} where there is room
            </button>
          ) : null}
        </section>
      ))}
    </section>
  );
}

const Card = memo(function Card({
  activity,
  peak,
  mayEdit,
  selectedId,
  onSelect,
  onLift,
}: Omit<Props, 'groups' | 'nothingPlanned' | 'onPlaceAll' | 'onAddClean'> & { readonly activity: Activity }) {
  const { setNodeRef, listeners } = useDraggable({ id: activity.id, disabled: !mayEdit });
  const mode = drawnMode(activity);
  const stage = whatWords(activity);
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
      className="flex w-full cursor-grab items-center gap-2 rounded-sm border border-rule bg-paper px-1.5 py-1 text-left hover:border-steam aria-pressed:border-focus aria-pressed:bg-focus-soft"
      aria-label={`${activity.code} ${activity.title}, ${stage}, ${mode?.minutes ?? 0} min, not yet placed`}
    >
      <span className="relative h-6 w-8 shrink-0 overflow-hidden bg-steam-soft [&>svg]:absolute [&>svg]:inset-0 [&>svg]:size-full [&>svg]:fill-steam">
        {mode ? <Outline mode={mode} peak={peak} /> : null}
      </span>
      <span className="min-w-0 flex-1 text-xs leading-3.5">
        <span className="block truncate font-medium">{activity.code}</span>
        <span className="block truncate text-2xs leading-3.5 text-ink-muted">{stage}</span>
      </span>
    </button>
  );
});
