import { memo, useMemo, type KeyboardEvent, type PointerEvent } from 'react';
import type { Header } from '../../core/plant/plant';
import { fromMinutes } from '../../core/time/stepFunction';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { areaPath, betweenPath, linePath, rateMarks, yOfRate, type StripScale } from './strip';
import { minuteAt, xOf, type TimeScale } from './timeScale';

const NO_LIMIT = 1e9;

interface Props {
  readonly header: Header;
  readonly strip: StripScale;
  readonly scale: TimeScale;
  readonly clock: Clock;
  readonly load: Float64Array;
  readonly before: Float64Array | null;
  readonly base: Float64Array | null;
  readonly limit: Float64Array | null;
  readonly carrying: boolean;
  readonly onPoint: (headerId: string, minute: number | null) => void;
  readonly pointedMin: number | null;
}

/** The drawn load. It takes the focus: arrow keys walk along the minutes and say what is drawn there. */
export const StripFace = memo(function StripFace(props: Props) {
  const { header, strip, scale, clock, load, limit, onPoint, pointedMin } = props;
  const units = useUnits();
  const at = pointedMin ?? Math.floor(scale.horizonMin / 2);
  const point = (event: PointerEvent<HTMLDivElement>): void => {
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    onPoint(header.id, Math.min(scale.horizonMin - 1, Math.floor(minuteAt(scale, x))));
  };
  const walk = (event: KeyboardEvent<HTMLDivElement>): void => {
    const by = { ArrowLeft: -1, ArrowRight: 1, PageUp: -60, PageDown: 60 }[event.key];
    if (event.key === 'Escape') return onPoint(header.id, null);
    if (by === undefined) return;
    event.preventDefault();
    const step = event.shiftKey ? by : by * (Math.abs(by) === 1 ? 5 : 1);
    onPoint(header.id, Math.max(0, Math.min(scale.horizonMin - 1, at + step)));
  };
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={`${header.name}, minute of the week`}
      aria-valuemin={0}
      aria-valuemax={scale.horizonMin - 1}
      aria-valuenow={at}
      aria-valuetext={valueText(at, load, limit, clock, units)}
      className="relative mt-1 mb-[3px] cursor-crosshair focus-visible:outline-offset-[-2px]"
      style={{ height: strip.heightPx }}
      onPointerMove={point}
      onPointerLeave={() => onPoint(header.id, null)}
      onKeyDown={walk}
      onBlur={() => onPoint(header.id, null)}
    >
      <Drawing {...props} />
      <LimitNames {...{ limit, strip, scale }} />
    </div>
  );
});

function valueText(minute: number, load: Float64Array, limit: Float64Array | null, clock: Clock, units: Units): string {
  const rate = load[minute] ?? 0;
  const bound = limit?.[minute] ?? NO_LIMIT;
  const judged = bound < NO_LIMIT ? `limit ${units.rate(bound)}` : 'not judged';
  const over = bound < NO_LIMIT && rate > bound ? `, over by ${units.rate(rate - bound)}` : '';
  return `${clock.dayTime(minute)}: ${units.rate(rate)}, ${judged}${over}`;
}

function Drawing({ strip, scale, load, before, base, limit, carrying }: Props) {
  const units = useUnits();
  const view = { from: 0, to: scale.horizonMin };
  const { pxPerMin, topKgPerH, heightPx } = strip;
  const still = useMemo(() => {
    const s = { pxPerMin, topKgPerH, heightPx };
    const v = { from: 0, to: scale.horizonMin };
    return {
      base: base ? areaPath(base, v, s) : '',
      limit: limit
        ? linePath(
            limit.map((l) => Math.min(l, topKgPerH * 2)),
            v,
            s,
          )
        : '',
      room: limit ? areaPath(limit, v, s) : '',
      marks: rateMarks(topKgPerH, units).map((mark) => yOfRate(s, mark)),
    };
  }, [pxPerMin, topKgPerH, heightPx, base, limit, scale.horizonMin, units]);
  return (
    <svg
      width={scale.widthPx}
      height={heightPx}
      className="absolute inset-0"
      aria-hidden="true"
      focusable="false"
      data-testid="strip"
    >
      <path d={still.room} className="fill-room-soft" />
      {still.marks.map((y) => (
        <path key={y} d={`M0 ${y}H${scale.widthPx}`} className="stroke-rule" strokeDasharray="1 5" />
      ))}
      <path d={areaPath(load, view, strip)} className="fill-steam" fillOpacity={0.55} />
      <path d={still.base} className="fill-steam" />
      {limit ? <path d={betweenPath(load, limit, view, strip)} fill="url(#board-hatch-over)" /> : null}
      <path d={linePath(load, view, strip)} className="fill-none stroke-steam" strokeWidth={1} />
      {before ? (
        <path
          d={linePath(before, view, strip)}
          className="fill-none stroke-ink-muted"
          strokeWidth={1}
          strokeDasharray={carrying ? '2 2' : undefined}
        />
      ) : null}
      <path d={still.limit} className="fill-none stroke-room" strokeWidth={2} />
    </svg>
  );
}

/** The limit's value stays in view along its span. */
function LimitNames({ limit, strip, scale }: Pick<Props, 'limit' | 'strip' | 'scale'>) {
  const units = useUnits();
  const spans = useMemo(() => (limit ? fromMinutes(limit) : []), [limit]);
  return spans.map((span, i) => {
    const to = spans[i + 1]?.from ?? scale.horizonMin;
    const width = xOf(scale, to - span.from);
    if (width < 78 || span.value >= NO_LIMIT || span.value <= 0) return null;
    const y = yOfRate(strip, span.value);
    return (
      <div
        key={span.from}
        className="pointer-events-none absolute text-2xs leading-[14px]"
        style={{ left: xOf(scale, span.from), width, top: y < 17 ? y + 2 : y - 16 }}
        aria-hidden="true"
      >
        <span className="strip-limit sticky left-[calc(var(--label-w)+8px)] ml-2 inline-block text-2xs leading-[14px] font-semibold text-room">
          {width > 150 ? `limit ${units.rate(span.value)}` : units.number('steamRate', span.value)}
        </span>
      </div>
    );
  });
}
