import { memo, useMemo } from 'react';
import type { WeekEvaluation } from '../../core/pipeline';
import type { Week } from '../../core/schedule/week';
import type { Clock } from '../time';
import { Fold } from './Fold';
import { amountText, limitTop, limitWords, shownLimits, type LimitWords, type ShownLimit } from './limits';
import { minuteWalk } from './minuteWalk';
import { useStore, type Store } from './store';
import { areaPath, betweenPath, linePath, type StripScale } from './strip';
import type { TimeScale } from './timeScale';
import type { Carrying } from './useCarry';

const FACE_PX = 40;

interface Props {
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  readonly carried: Store<Carrying | null>;
  readonly scale: TimeScale;
  readonly clock: Clock;
  readonly open: boolean;
  readonly onToggle: () => void;
  readonly onPoint: (limitId: string, minute: number | null) => void;
  readonly pointed: { readonly id: string; readonly minute: number } | null;
}

/** What is used of the limits that units share, below the headers; folded away it says where one is passed. */
export const LimitStrips = memo(function LimitStrips(props: Props) {
  const { week, evaluation, carried, scale, clock, open, onToggle, onPoint, pointed } = props;
  const live = useStore(carried, (c) => c?.preview?.evaluation.drawn) ?? null;
  const drawn = live ?? evaluation.drawn;
  const { sharedLimits } = week.plant;
  const limits = useMemo(
    () => shownLimits(sharedLimits, drawn, scale.horizonMin),
    [sharedLimits, drawn, scale.horizonMin],
  );
  if (limits.length === 0) return null;
  return (
    <section aria-label="Shared limits">
      <div className="flex border-b border-rule bg-surface">
        <div className="board-label !bg-surface px-4 py-1.5 max-sm:px-2" style={{ minHeight: 30 }}>
          <Fold name="Shared limits" {...{ open, onToggle }} />
        </div>
        <div className="board-track" style={{ width: scale.widthPx }}>
          <p className="sticky left-(--label-w) inline-block px-3 py-1.5 text-xs leading-4.5">
            {limits.map((one, i) => (
              <Summary key={one.limit.id} name={one.limit.name} words={limitWords(one, clock)} first={i === 0} />
            ))}
          </p>
        </div>
      </div>
      {open
        ? limits.map((one) => (
            <LimitStrip
              key={one.limit.id}
              shown={one}
              pointedMin={pointed?.id === one.limit.id ? pointed.minute : null}
              {...{ scale, clock, onPoint }}
            />
          ))
        : null}
    </section>
  );
});

function Summary({
  name,
  words,
  first,
}: {
  readonly name: string;
  readonly words: LimitWords;
  readonly first: boolean;
}) {
  return (
    <span className={first ? '' : 'ml-4'}>
      <span className="text-ink-muted">{name} </span>
      <span className={`font-medium ${words.isOver ? 'text-over' : 'text-room'}`}>{words.figure}</span>
      {words.isOver ? <span className="text-ink-muted">, {words.line}</span> : null}
    </span>
  );
}

interface StripProps extends Pick<Props, 'scale' | 'clock' | 'onPoint'> {
  readonly shown: ShownLimit;
  readonly pointedMin: number | null;
}

function LimitStrip({ shown, scale, clock, onPoint, pointedMin }: StripProps) {
  const { limit, usage } = shown;
  const words = limitWords(shown, clock);
  const { at, props: walking } = minuteWalk({ scale, pointedMin, onPoint: (minute) => onPoint(limit.id, minute) });
  const used = `${amountText(usage.used[at] ?? 0)} of ${amountText(usage.limit[at] ?? 0)} ${limit.unit}`;
  return (
    <div className="flex border-b border-rule bg-surface" data-testid={`limit-${limit.id}`}>
      <div className="board-label !bg-surface px-4 py-1 pl-7 max-sm:px-2" style={{ minHeight: FACE_PX + 8 }}>
        <h3 className="text-xs max-sm:line-clamp-2 sm:truncate leading-4 font-medium">{limit.name}</h3>
        <p className={`text-xs leading-4 font-semibold ${words.isOver ? 'text-over' : 'text-room'}`}>{words.figure}</p>
        <p className="line-clamp-1 text-2xs leading-3.5 text-ink-muted" title={words.line}>
          {words.line}
        </p>
      </div>
      <div className="board-track" style={{ width: scale.widthPx }}>
        <div
          {...walking}
          aria-label={`${limit.name} in use by minute of the week`}
          aria-valuetext={`${clock.dayTime(at)}: ${used}`}
          className="relative mt-1.5 cursor-crosshair focus-visible:outline-offset-[-2px]"
          style={{ height: FACE_PX }}
        >
          <LimitDrawing {...{ usage, scale }} />
        </div>
      </div>
    </div>
  );
}

function LimitDrawing({ usage, scale }: { readonly usage: ShownLimit['usage']; readonly scale: TimeScale }) {
  const { pxPerMin, horizonMin, widthPx } = scale;
  const paths = useMemo(() => {
    const strip: StripScale = { pxPerMin, topKgPerH: limitTop(usage), heightPx: FACE_PX };
    const view = { from: 0, to: horizonMin };
    return {
      used: areaPath(usage.used, view, strip),
      edge: linePath(usage.used, view, strip),
      over: betweenPath(usage.used, usage.limit, view, strip),
      limit: linePath(usage.limit, view, strip),
    };
  }, [usage, pxPerMin, horizonMin]);
  return (
    <svg width={widthPx} height={FACE_PX} className="absolute inset-0" aria-hidden="true" focusable="false">
      <path d={paths.used} className="fill-ink-muted" fillOpacity={0.3} />
      <path d={paths.over} fill="url(#board-hatch-over)" />
      <path d={paths.edge} className="fill-none stroke-ink-muted" strokeWidth={1} />
      <path d={paths.limit} className="fill-none stroke-room" strokeWidth={1.5} />
    </svg>
  );
}
