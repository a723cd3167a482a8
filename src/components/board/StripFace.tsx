import { memo, useMemo } from 'react';
import type { SampledSpread } from '../../core/header/spread/sampledLoads';
import type { Carried } from '../../core/header/carry';
import type { Header } from '../../core/plant/plant';
import { fromMinutes } from '../../core/time/stepFunction';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { percentText } from './chance';
import { minuteWalk } from './minuteWalk';
import { areaPath, betweenPath, linePath, rateMarks, yOfRate, type StripScale } from './strip';
import { xOf, type TimeScale } from './timeScale';

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
  /** Early and late starts; null where they are not shown. */
  readonly spread: SampledSpread | null;
  /** What accumulators carry here; null where none does. */
  readonly carried: Carried | null;
  readonly carrying: boolean;
  readonly onPoint: (headerId: string, minute: number | null) => void;
  readonly pointedMin: number | null;
}

/** The drawn load. It takes the focus: arrow keys walk along the minutes and say what is drawn there. */
export const StripFace = memo(function StripFace(props: Props) {
  const { header, strip, scale, clock, limit, onPoint, pointedMin } = props;
  const units = useUnits();
  const { at, props: walking } = minuteWalk({ scale, pointedMin, onPoint: (minute) => onPoint(header.id, minute) });
  return (
    <div
      {...walking}
      aria-label={`${header.name}, minute of the week`}
      aria-valuetext={valueText(at, props, clock, units)}
      className="relative mt-1 mb-[3px] cursor-crosshair focus-visible:outline-offset-[-2px]"
      style={{ height: strip.heightPx }}
    >
      <Drawing {...props} />
      <LimitNames {...{ limit, strip, scale }} />
    </div>
  );
});

function valueText(minute: number, { load, limit, spread }: Props, clock: Clock, units: Units): string {
  const rate = load[minute] ?? 0;
  const bound = limit?.[minute] ?? NO_LIMIT;
  const judged = bound < NO_LIMIT ? `limit ${units.rate(bound)}` : 'not judged';
  const over = bound < NO_LIMIT && rate > bound ? `, over by ${units.rate(rate - bound)}` : '';
  const chance = spread?.overChance?.[minute];
  const going = chance === undefined ? '' : `, chance of going over ${percentText(chance)}`;
  return `${clock.dayTime(minute)}: ${units.rate(rate)}, ${judged}${over}${going}`;
}

function Drawing({ strip, scale, load, before, base, limit, carrying, spread, carried }: Props) {
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
  const drawn = useMemo(() => {
    const s = { pxPerMin, topKgPerH, heightPx };
    const v = { from: 0, to: scale.horizonMin };
    return {
      area: areaPath(load, v, s),
      line: linePath(load, v, s),
      over: limit ? betweenPath(load, limit, v, s) : '',
    };
  }, [pxPerMin, topKgPerH, heightPx, load, limit, scale.horizonMin]);
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
      {spread ? <Confident {...{ spread, load, view, strip }} /> : null}
      {carried ? <CarriedFill {...{ carried, load, view, strip }} /> : null}
      <path d={drawn.area} className="fill-steam" fillOpacity={0.55} />
      <path d={still.base} className="fill-steam" />
      <path d={drawn.over} fill="url(#board-hatch-over)" />
      <path d={drawn.line} className="fill-none stroke-steam" strokeWidth={1} />
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

interface BesideLoad {
  readonly load: Float64Array;
  readonly view: { readonly from: number; readonly to: number };
  readonly strip: StripScale;
}

/** How far the load goes in all but the few weeks that the confidence leaves out. */
function Confident({ spread, load, view, strip }: BesideLoad & { readonly spread: SampledSpread }) {
  return (
    <path
      d={betweenPath(spread.confidentKgPerH, load, view, strip)}
      className="fill-steam"
      fillOpacity={0.2}
      data-testid="confident"
    />
  );
}

/** What accumulators give, on top of the load that is left to the boilers. */
function CarriedFill({ carried, load, view, strip }: BesideLoad & { readonly carried: Carried }) {
  const withCarried = useMemo(
    () => load.map((kgPerH, t) => kgPerH + (carried.dischargeKgPerH[t] as number)),
    [load, carried],
  );
  return (
    <path
      d={betweenPath(withCarried, load, view, strip)}
      className="fill-room stroke-room"
      fillOpacity={0.25}
      strokeWidth={1}
      data-testid="carried"
    />
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
