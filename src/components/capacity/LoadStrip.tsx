import { useMemo, type PointerEvent } from 'react';
import type { HeaderJudgement } from '@/core/header/judgement';
import type { HeaderCapacity } from '@/core/plant/plant';
import { fromMinutes, valueAt, type StepFunction } from '@/core/time/stepFunction';
import { Hatch } from '../ui/Hatch';
import { groupDigits } from '../time';
import { useUnits } from '../ui/units';
import { betweenPath } from './chartPaths';
import { Dots } from './Dots';
import type { Draft } from './draft';
import type { DeskPart } from './deskPart';
import { Grips } from './Grips';
import { areaPath, limitSnap, linePath, minuteAtX, rateTicks, xOf, yOf, type DeskScale } from './scale';

interface Props extends DeskPart {
  readonly capacity: HeaderCapacity | undefined;
  readonly judged: HeaderJudgement;
  /** The limit with the largest boiler out; null: not known. */
  readonly largestOutLimit: StepFunction | null;
}

const NONE: StepFunction = [];

/** The load with what accumulators carry put back on top; null where none does. */
function withCarried({ loadKgPerH, carried }: HeaderJudgement): StepFunction | null {
  if (!carried) return null;
  return fromMinutes(loadKgPerH.map((kgPerH, t) => kgPerH + (carried.dischargeKgPerH[t] ?? 0)));
}

/** The plan's load under its limit; the limit is a line that one can take hold of. */
export function LoadStrip(props: Props) {
  const { scale, days, clock, capacity, nowMin, draft, canSet, horizonMin, judged, largestOutLimit } = props;
  const units = useUnits();
  const load = useMemo(() => fromMinutes(judged.loadKgPerH), [judged.loadKgPerH]);
  const carried = useMemo(() => withCarried(judged), [judged]);
  const limit = capacity?.limitKgPerH ?? null;
  const base = capacity?.baseLoadKgPerH ?? NONE;
  const sent = capacity?.exportKgPerH ?? null;
  const paths = useMemo(
    () => ({
      load: areaPath(scale, load),
      outline: linePath(scale, load),
      base: areaPath(scale, base),
      room: limit && areaPath(scale, limit),
      limit: limit && linePath(scale, limit),
      sent: sent && linePath(scale, sent),
      over: limit && betweenPath(scale, load, limit),
      carried: carried && betweenPath(scale, carried, load),
      largestOut: largestOutLimit && linePath(scale, largestOutLimit),
    }),
    [scale, load, base, limit, sent, carried, largestOutLimit],
  );
  const shown = draft?.subject.kind === 'limit' && draft.subject.headerId === capacity?.headerId ? draft : null;

  const drawFrom = (event: PointerEvent<SVGRectElement>): void => {
    if (!canSet || !capacity) return;
    const minute = minuteAtX(scale, event.clientX - event.currentTarget.getBoundingClientRect().left);
    const snapped = Math.round(minute / 5) * 5;
    const snap = limitSnap(units);
    const now = limit ? valueAt(limit, Math.min(snapped, horizonMin - 1)) : scale.topKgPerH / 2;
    const value = Math.round(now / snap) * snap;
    const start = { subject: { kind: 'limit', headerId: capacity.headerId }, fromMin: snapped, toMin: snapped, value };
    props.onHold(event, start as Draft, 'draw');
  };

  return (
    <svg
      width={scale.width}
      height={scale.height}
      className={`block touch-pan-y overflow-hidden select-none ${canSet ? 'cursor-crosshair' : ''}`}
      role="group"
      aria-label="The plan's steam load against the limit"
      onPointerMove={props.onMove}
      onPointerUp={props.onRelease}
      onPointerCancel={props.onRelease}
    >
      <defs>
        <Hatch id="desk-over" />
        <Dots id="desk-carried" />
      </defs>
      <rect width={scale.width} height={scale.height} className="fill-surface" />
      {paths.room ? <path d={paths.room} className="fill-room-soft" /> : null}
      {days.map((day) => (
        <line
          key={day.date}
          x1={xOf(scale, day.from)}
          x2={xOf(scale, day.from)}
          y2={scale.height}
          className="stroke-rule"
        />
      ))}
      {rateTicks(scale.topKgPerH, units).map((rate) => (
        <line
          key={rate}
          x2={scale.width}
          y1={yOf(scale, rate)}
          y2={yOf(scale, rate)}
          className="stroke-rule"
          strokeDasharray="1 4"
        />
      ))}
      <path d={paths.load} className="fill-steam opacity-45" />
      <path d={paths.base} className="fill-steam opacity-70" />
      <path
        d={paths.outline}
        className="fill-none stroke-steam"
        strokeWidth={scale.to - scale.from > 2_000 ? 0.75 : 1.25}
      />
      {paths.carried ? (
        <path d={paths.carried} fill="url(#desk-carried)" className="stroke-steam-deep" strokeWidth={0.5} />
      ) : null}
      {paths.over ? <path d={paths.over} fill="url(#desk-over)" /> : null}
      {paths.largestOut ? (
        <path d={paths.largestOut} className="fill-none stroke-ink-muted" strokeWidth={1.25} strokeDasharray="1 3" />
      ) : null}
      {paths.sent ? (
        <path d={paths.sent} className="fill-none stroke-room" strokeWidth={1.25} strokeDasharray="5 4" />
      ) : null}
      {paths.limit ? (
        <>
          <path d={paths.limit} className="fill-none stroke-surface" strokeWidth={5.5} />
          <path d={paths.limit} className="fill-none stroke-room" strokeWidth={2.5} />
        </>
      ) : null}
      <rect
        width={scale.width}
        height={scale.height}
        className="fill-transparent"
        onPointerDown={drawFrom}
        aria-hidden="true"
      />
      {nowMin > scale.from && nowMin < scale.to ? (
        <g pointerEvents="none">
          <line
            x1={xOf(scale, nowMin)}
            x2={xOf(scale, nowMin)}
            y2={scale.height}
            className="stroke-ink"
            strokeWidth={1.5}
          />
          <text x={xOf(scale, nowMin) + 5} y={14} className="fill-ink text-2xs font-semibold">
            now
          </text>
        </g>
      ) : null}
      {shown ? (
        <Grips
          draft={shown}
          clock={clock}
          horizonMin={horizonMin}
          topKgPerH={scale.topKgPerH}
          box={{
            left: xOf(scale, shown.fromMin),
            right: xOf(scale, shown.toMin),
            level: yOf(scale, shown.value ?? 0),
            top: 0,
            bottom: scale.height,
          }}
          onHold={(event, grip) => props.onHold(event, shown, grip)}
          onKey={(event, grip) => props.onKey(event, shown, grip)}
        />
      ) : null}
    </svg>
  );
}

/** Rates at the side of the strip. */
export function RateLabels({ scale }: { readonly scale: DeskScale }) {
  const units = useUnits();
  return (
    <svg width={72} height={scale.height} className="block overflow-visible" aria-hidden="true">
      {rateTicks(scale.topKgPerH, units).map((rate) => (
        <text key={rate} x={66} y={yOf(scale, rate) + 4} textAnchor="end" className="fill-ink-muted text-2xs">
          {groupDigits(units.shown('steamRate', rate))}
        </text>
      ))}
      <text x={66} y={scale.height - 4} textAnchor="end" className="fill-ink-muted text-2xs">
        {units.symbol('steamRate')}
      </text>
      <title>{`Up to ${units.rate(scale.topKgPerH)}`}</title>
    </svg>
  );
}
