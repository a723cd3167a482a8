import { useDraggable } from '@dnd-kit/core';
import { memo, useMemo } from 'react';
import { drawnMode, type Activity, type Mode } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';
import type { FloorEventDto } from '../../contracts/week';
import { canCarry, isPlanned } from './carry';
import type { Drawn } from './drawn';
import { FixingMark } from './FixingMark';
import { fittingWords, outlinePath, spellsOf, titleSlot } from './outline';

export const OUTLINE_PX = 36;
/** Height that words take from the top of the outline. */
const WORDS_PX = 17;
const NARROW_PX = 18;

/** The outline of a mode's steam, stretched to whatever holds it. */
export const Outline = memo(function Outline({ mode, peak }: { readonly mode: Mode; readonly peak: number }) {
  const path = useMemo(() => outlinePath(spellsOf(mode.phases, mode.minutes), peak, OUTLINE_PX), [mode, peak]);
  return (
    <svg
      className="steam-outline"
      viewBox={`0 0 ${mode.minutes} ${OUTLINE_PX}`}
      preserveAspectRatio="none"
      aria-hidden="true"
      focusable="false"
    >
      <path d={path} />
    </svg>
  );
});

function Words({ activity, mode, peak, pxPerMin }: InsideProps & { readonly mode: Mode }) {
  const words = useMemo(() => {
    const spells = spellsOf(mode.phases, mode.minutes);
    const slot = titleSlot(spells, (peak * (OUTLINE_PX - WORDS_PX)) / OUTLINE_PX, pxPerMin);
    if (!slot) return null;
    const room = slot.widthPx - 8 - (activity.fixing === 'free' && !mode.neverMoved ? 0 : 12);
    const code = isPlanned(activity) ? activity.code : activity.title;
    const text = fittingWords(activity.title, code, room);
    return text === '' ? null : { text, left: slot.leftPx + 4, width: room + 2 };
  }, [activity, mode, peak, pxPerMin]);
  if (!words) return null;
  return (
    <span className="batch-words" style={{ left: words.left, width: words.width }}>
      {words.text}
    </span>
  );
}

interface InsideProps {
  readonly activity: Activity;
  readonly peak: number;
  readonly pxPerMin: number;
}

interface Props extends InsideProps {
  readonly drawn: Drawn;
  readonly label: string;
  readonly breaches: readonly Breach[] | undefined;
  readonly events: readonly FloorEventDto[] | undefined;
  readonly selected: boolean;
  readonly kin: boolean;
  readonly tabbable: boolean;
  readonly carried: boolean;
  readonly readOnly: boolean;
}

const Inside = memo(function Inside({ drawn, breaches, events, ...inside }: Omit<Props, 'label'>) {
  const { activity, peak, pxPerMin } = inside;
  const mode = drawnMode(activity);
  const width = drawn.minutes * pxPerMin;
  if (!mode) return null;
  return (
    <>
      <Outline mode={mode} peak={peak} />
      {(breaches ?? []).map((breach) =>
        breach.class === 'steam' ? <SteamBreachMark key={breach.id} {...{ breach, drawn, pxPerMin }} /> : null,
      )}
      <EdgeMark breaches={breaches ?? []} />
      {width > NARROW_PX * 1.5 ? <Words {...{ activity, mode, peak, pxPerMin }} /> : null}
      {width > NARROW_PX ? <FixingMark fixing={activity.fixing} neverMoved={mode.neverMoved === true} /> : null}
      {(width > NARROW_PX ? (events ?? []) : []).map((event) => (
        <svg
          key={event.id}
          className="batch-event"
          viewBox="0 0 8 8"
          style={{ left: (event.minute - drawn.start) * pxPerMin }}
          aria-hidden="true"
        >
          <path
            d={event.event === 'steamOn' ? 'M4 0 8 8H0Z' : event.event === 'empty' ? 'M0 0h8L4 8Z' : 'M3 0h2v8H3Z'}
          />
        </svg>
      ))}
    </>
  );
});

/** What is not a matter of a few minutes is marked at the block's edge; a process limit all around it. */
function EdgeMark({ breaches }: { readonly breaches: readonly Breach[] }) {
  const others = breaches.filter((breach) => breach.class !== 'steam');
  if (others.length === 0) return null;
  const process = others.some((breach) => breach.class === 'process');
  return <span className="batch-edge" data-process={process} aria-hidden="true" />;
}

/** Minutes in which too much steam is asked for, hatched where they fall within the block. */
function SteamBreachMark({ breach, drawn, pxPerMin }: { breach: Breach; drawn: Drawn; pxPerMin: number }) {
  const from = Math.max(drawn.start, Math.min(breach.from, drawn.start + drawn.minutes - 1));
  const to = Math.max(from + 1, Math.min(breach.to, drawn.start + drawn.minutes));
  return (
    <span
      className="batch-breach"
      data-narrow={drawn.minutes * pxPerMin < NARROW_PX * 1.5}
      style={{ left: (from - drawn.start) * pxPerMin, width: (to - from) * pxPerMin }}
      aria-hidden="true"
    />
  );
}

/** An activity on its unit. It can be dragged; keys and clicks are listened to above it. */
export const Block = memo(function Block({ label, ...inside }: Props) {
  const { drawn, activity, pxPerMin, selected, kin, tabbable, carried, readOnly } = inside;
  const still = readOnly || !canCarry(activity);
  const { setNodeRef, listeners } = useDraggable({ id: activity.id, disabled: still });
  return (
    <div
      ref={setNodeRef}
      {...listeners}
      role="button"
      tabIndex={tabbable ? 0 : -1}
      aria-label={label}
      aria-pressed={selected}
      className="batch"
      data-activity={activity.id}
      data-kin={kin}
      data-still={still}
      data-follows={!isPlanned(activity)}
      data-clean={activity.kind === 'cleaning'}
      data-gap={activity.kind === 'idle' || activity.kind === 'warmUp'}
      data-carried={carried}
      style={{ left: drawn.start * pxPerMin, width: Math.max(2, drawn.minutes * pxPerMin - 1) }}
    >
      <Inside {...inside} />
    </div>
  );
});
