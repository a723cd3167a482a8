import { useId, type PointerEvent } from 'react';
import type { BoilerDto } from '@/contracts/capacity';
import { valueAt } from '@/core/time/stepFunction';
import { partsOf, type BoilerPart } from './boilerParts';
import type { DeskPart } from './deskPart';
import { Grips } from './Grips';
import { minuteAtX, xOf } from './scale';

/** The scale runs across as that of the strip above; its height is this row's. */
interface Props extends DeskPart {
  readonly boiler: BoilerDto;
}

const PAD = 7;

/** 'lit', 'shut', 'at 70 %' */
export function shareText(share: number): string {
  if (share <= 0) return 'shut';
  return share >= 1 ? 'lit' : `at ${Math.round(share * 100)} %`;
}

const partText = (part: BoilerPart): string => (part.isComingUp ? 'coming up' : shareText(part.value));

/**
 * A boiler over the week as a bar: full where it is ready, lower where it is derated, hatched while it comes up, a gap
 * where it is shut.
 */
export function BoilerRow(props: Props) {
  const { boiler, scale, days, clock, draft, canSet } = props;
  const hatch = useId();
  const parts = partsOf(boiler, scale.from, scale.to);
  const inner = scale.height - 2 * PAD;
  const shown = draft?.subject.kind === 'firing' && draft.subject.boilerId === boiler.id ? draft : null;

  const drawFrom = (event: PointerEvent<SVGRectElement>): void => {
    if (!canSet) return;
    const minute = minuteAtX(scale, event.clientX - event.currentTarget.getBoundingClientRect().left);
    const snapped = Math.round(minute / 5) * 5;
    const value = valueAt(boiler.share, Math.min(snapped, props.horizonMin - 1)) > 0 ? 0 : 1;
    props.onHold(
      event,
      { subject: { kind: 'firing', boilerId: boiler.id }, fromMin: snapped, toMin: snapped, value },
      'draw',
    );
  };

  return (
    <svg
      width={scale.width}
      height={scale.height}
      className={`block touch-pan-y select-none ${canSet ? 'cursor-crosshair' : ''}`}
      role="group"
      aria-label={`${boiler.name}: ${parts.map((p) => `${partText(p)} ${clock.dayTime(p.from)} to ${clock.dayTime(p.to)}`).join(', ')}`}
      onPointerMove={props.onMove}
      onPointerUp={props.onRelease}
      onPointerCancel={props.onRelease}
    >
      <defs>
        <pattern id={hatch} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="1.8" height="6" className="fill-room" />
        </pattern>
      </defs>
      {days.map((day) => (
        <line
          key={day.date}
          x1={xOf(scale, day.from)}
          x2={xOf(scale, day.from)}
          y2={scale.height}
          className="stroke-rule"
        />
      ))}
      {parts.map((part) => {
        const x = xOf(scale, part.from);
        const width = Math.max(1, xOf(scale, part.to) - x);
        const height = inner * part.value;
        return (
          <g key={part.from} aria-hidden="true">
            <rect x={x} y={PAD} width={width} height={inner} className="fill-sunken stroke-rule" />
            <rect x={x} y={PAD + inner - height} width={width} height={height} className="fill-room opacity-75" />
            {part.isComingUp ? (
              <rect x={x} y={PAD} width={width} height={inner} fill={`url(#${hatch})`} className="stroke-room" />
            ) : null}
            {width > 62 ? (
              <text
                x={x + 8}
                y={scale.height / 2 + 4}
                className={`text-2xs font-medium ${part.value > 0.55 ? 'fill-on-room' : 'fill-ink'} ${part.isComingUp ? 'stroke-surface' : ''}`}
                strokeWidth={part.isComingUp ? 4 : 0}
                paintOrder="stroke"
              >
                {partText(part)}
              </text>
            ) : null}
          </g>
        );
      })}
      <rect
        width={scale.width}
        height={scale.height}
        className="fill-transparent"
        onPointerDown={drawFrom}
        aria-hidden="true"
      />
      {props.nowMin > scale.from && props.nowMin < scale.to ? (
        <line
          x1={xOf(scale, props.nowMin)}
          x2={xOf(scale, props.nowMin)}
          y2={scale.height}
          className="stroke-ink"
          strokeWidth={1.5}
          pointerEvents="none"
        />
      ) : null}
      {shown ? (
        <Grips
          draft={shown}
          clock={clock}
          horizonMin={props.horizonMin}
          topKgPerH={1}
          box={{
            left: xOf(scale, shown.fromMin),
            right: xOf(scale, shown.toMin),
            level: 0,
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
