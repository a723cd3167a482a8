import { useLayoutEffect, useRef } from 'react';
import { phasesKg, phasesPeakKgPerH } from '../../core/demand/activityLoad';
import { drawnMode, type Activity } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';
import { breachSentence, type Names } from '../../core/schedule/sentences';
import type { WeekEvaluation } from '../../core/pipeline';
import type { Week } from '../../core/schedule/week';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import { gapReason, warmWords } from './gapWords';
import { ROW_PX, type Rows } from './rows';
import { useStore, type Store } from './store';
import { xOf, type TimeScale } from './timeScale';
import { FIXING_WORDS, NEVER_MOVED, placeText } from './words';

interface Props {
  readonly hovered: Store<string | null>;
  readonly drawn: readonly Activity[];
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  readonly rows: Rows;
  readonly scale: TimeScale;
  readonly clock: Clock;
  readonly breaches: ReadonlyMap<string, readonly Breach[]>;
  readonly names: Names;
}

/** All about a block that the pointer rests on or the keys have reached, where its own width leaves no room. */
export function HoverCard({ hovered, drawn, week, evaluation, rows, scale, clock, breaches, names }: Props) {
  const id = useStore(hovered, (h) => h);
  const units = useUnits();
  const card = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => keepInSight(card.current), [id, scale]);
  const activity = id === null ? undefined : drawn.find((a) => a.id === id);
  const mode = activity && drawnMode(activity);
  const top = activity?.placement ? rows.topOfUnit.get(activity.placement.unitId) : undefined;
  if (!activity?.placement || !mode || top === undefined) return null;
  const left = xOf(scale, activity.placement.start);
  const above = top > 150;
  const peak = phasesPeakKgPerH(mode.phases);
  const wrong = breaches.get(activity.id) ?? [];
  const why = gapReason(activity, evaluation.gapDraws, drawn, week.plant) ?? warmWords(activity, week.activities);
  return (
    <div
      ref={card}
      className="float pointer-events-none absolute z-[9] w-64 px-2.5 py-1.5 text-xs"
      aria-hidden="true"
      style={{
        left: `calc(var(--label-w) + ${Math.min(left, scale.widthPx - 262)}px)`,
        top: above ? top : top + ROW_PX,
        transform: above ? 'translateY(-100%)' : '',
      }}
    >
      <p className="font-semibold">
        {activity.title}{' '}
        {activity.title.includes(activity.code) ? null : (
          <span className="font-normal text-ink-muted">{activity.code}</span>
        )}
      </p>
      <p>
        {placeText(activity.placement, week.plant, clock)} to {clock.time(activity.placement.start + mode.minutes)}
      </p>
      <p className="text-ink-muted">
        {peak > 0 ? `${units.mass(phasesKg(mode.phases))} of steam, peak ${units.rate(peak)}` : 'draws no steam'}
        {activity.fixing === 'free' ? '' : `, ${FIXING_WORDS[activity.fixing]}`}
      </p>
      {why ? <p className="mt-0.5 leading-4">{why}</p> : null}
      {mode.neverMoved ? <p className="text-ink-muted">moved {NEVER_MOVED}</p> : null}
      {wrong.slice(0, 2).map((breach) => (
        <p key={breach.id} className="mt-0.5 flex gap-1.5 leading-4 text-over">
          <span className="hatch-over w-1 shrink-0 rounded-sm" />
          {breachSentence(breach, names, clock.time).title}
        </p>
      ))}
      {wrong.length > 2 ? <p className="text-ink-muted">and {wrong.length - 2} more to put right</p> : null}
    </div>
  );
}

/** Pulls the card left where the board's right edge would cut it off. */
function keepInSight(card: HTMLElement | null): void {
  const board = card?.closest('.board-scroll');
  if (!card || !board) return;
  card.style.marginLeft = '';
  const beyond = card.getBoundingClientRect().right + 8 - board.getBoundingClientRect().right;
  if (beyond > 0) card.style.marginLeft = `${-beyond}px`;
}
