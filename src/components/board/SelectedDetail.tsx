import type { ReactNode } from 'react';
import { phasesKg, phasesPeakKgPerH } from '../../core/demand/activityLoad';
import { drawnMode, type Activity } from '../../core/plant/activity';
import type { WeekEvaluation } from '../../core/pipeline';
import type { Week } from '../../core/schedule/week';
import { Button } from '../ui/Button';
import { spanText, type Clock } from '../time';
import { useUnits } from '../ui/units';
import { canCarry, isPlanned } from './carry';
import { FixingMark } from './FixingMark';
import { gapReason, warmWords } from './gapWords';
import { usesOf } from './limits';
import { waitSinceClosing } from './threads';
import { FIXING_WORDS, NEVER_MOVED, unitName, whatWords } from './words';

interface Props {
  readonly activity: Activity;
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  readonly clock: Clock;
  readonly mayEdit: boolean;
  readonly moved: { readonly by: string; readonly at: string } | undefined;
  readonly onFix: () => void;
  readonly onTakeOff: () => void;
  readonly onRemove: (clean: Activity) => void;
  readonly isRemoving: boolean;
}

/** The selected activity: where and when, its steam, its due time, its wait. */
export function SelectedDetail(props: Props) {
  const { activity, week, evaluation, clock, mayEdit, moved, onFix, onTakeOff, onRemove, isRemoving } = props;
  const units = useUnits();
  const mode = drawnMode(activity);
  const planned = isPlanned(activity);
  const why = gapReason(activity, evaluation.gapDraws, evaluation.drawn, week.plant);
  const warm = warmWords(activity, week.activities);
  return (
    <section aria-label="Selected">
      <h2 className="text-base leading-5 font-semibold" data-testid="selected">
        {activity.title}
        {activity.title.includes(activity.code) ? '' : <span className="font-normal"> · {activity.code}</span>}
      </h2>
      <p className="flex items-center gap-1.5 text-xs text-ink-muted">
        <FixingMark fixing={activity.fixing} className="size-3 fill-ink" />
        {[whatWords(activity), FIXING_WORDS[activity.fixing]].slice(0, planned ? 2 : 1).join(', ')}
      </p>
      <dl className="mt-2 grid grid-cols-[6.5rem_1fr] gap-y-0.5 text-sm">
        <Place {...{ activity, week, clock }} />
        {mode ? (
          <Fact name="Steam">
            {phasesPeakKgPerH(mode.phases) > 0
              ? `${units.mass(phasesKg(mode.phases))}, peak ${units.rate(phasesPeakKgPerH(mode.phases))}`
              : 'none'}
            {warm ? <span className="block text-xs text-ink-muted">{warm}</span> : null}
          </Fact>
        ) : null}
        {why ? <Fact name="Why">{why}</Fact> : null}
        {mode?.neverMoved ? <Fact name="Moving">{NEVER_MOVED}</Fact> : null}
        {usesOf(activity, week.plant.sharedLimits, clock).map((use, i) => (
          <Fact key={use} name={i === 0 ? 'Uses' : ''}>
            {use}
          </Fact>
        ))}
        <Due {...{ activity, clock }} />
        <Closing {...{ activity, week }} />
        {moved ? (
          <Fact name="Changed by">
            {moved.by}, {clock.instantDayTime(moved.at)}
          </Fact>
        ) : null}
      </dl>
      <div className="mt-2.5 flex flex-wrap items-center gap-x-2 gap-y-2">
        {mayEdit && canCarry(activity) && activity.placement ? (
          <>
            <Button size="small" onClick={onFix}>
              {activity.fixing === 'fixed' ? 'Free it' : 'Fix it here'}
            </Button>
            <Button size="small" look="quiet" onClick={onTakeOff}>
              Take off
            </Button>
          </>
        ) : null}
        {mayEdit && planned && activity.kind === 'cleaning' && !activity.placement ? (
          <Button size="small" busy={isRemoving} onClick={() => onRemove(activity)}>
            Remove it
          </Button>
        ) : null}
        <a className="link text-sm" href={`/working/${encodeURIComponent(activity.id)}`}>
          Show the working
        </a>
      </div>
    </section>
  );
}

function Fact({ name, children }: { readonly name: string; readonly children: ReactNode }) {
  return (
    <>
      <dt className="text-ink-muted">{name}</dt>
      <dd>{children}</dd>
    </>
  );
}

function Place({ activity, week, clock }: Pick<Props, 'activity' | 'week' | 'clock'>) {
  const { placement } = activity;
  const mode = drawnMode(activity);
  if (!placement || !mode) return <Fact name="Place">not yet placed</Fact>;
  return (
    <Fact name={unitName(week.plant, placement.unitId)}>
      {clock.dayTime(placement.start)} to {clock.time(placement.start + mode.minutes)}, {spanText(mode.minutes)}
    </Fact>
  );
}

function Due({ activity, clock }: Pick<Props, 'activity' | 'clock'>) {
  const mode = drawnMode(activity);
  if (activity.due === null) return null;
  const end = activity.placement && mode ? activity.placement.start + mode.minutes : null;
  const hand = end === null ? null : activity.due - end;
  return (
    <Fact name="Due">
      {clock.dayTime(activity.due)}
      {hand === null ? '' : hand < 0 ? ', ' : `, ${spanText(hand)} in hand`}
      {hand !== null && hand < 0 ? <span className="font-medium text-over">late by {spanText(hand)}</span> : null}
    </Fact>
  );
}

function Closing({ activity, week }: Pick<Props, 'activity' | 'week'>) {
  const wait = waitSinceClosing(week.links, week.activities, activity.id);
  if (!wait) return null;
  const least = wait.greatestMin === null ? '' : ` of ${wait.greatestMin}`;
  return (
    <Fact name="Since closing">
      <span className={wait.broken ? 'font-medium text-over' : ''}>
        {wait.waitMin} min{least}
      </span>
    </Fact>
  );
}
