import type { KeyboardEvent, PointerEvent } from 'react';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Draft, Grip } from './draft';

interface Box {
  readonly left: number;
  readonly right: number;
  readonly level: number;
  readonly top: number;
  readonly bottom: number;
}

interface Props {
  readonly draft: Draft;
  readonly box: Box;
  readonly clock: Clock;
  readonly horizonMin: number;
  readonly topKgPerH: number;
  readonly onHold: (event: PointerEvent<Element>, grip: Grip) => void;
  readonly onKey: (event: KeyboardEvent, grip: Grip) => void;
}

const GRIP_PX = 16;

/** The span being set: its two ends and, for a limit, its level, each to be dragged or moved with the arrow keys. */
export function Grips({ draft, box, clock, horizonMin, topKgPerH, onHold, onKey }: Props) {
  const { left, right, level, top, bottom } = box;
  const units = useUnits();
  const ends = [
    { grip: 'from' as const, x: left, minute: draft.fromMin, name: 'From' },
    { grip: 'to' as const, x: right, minute: draft.toMin, name: 'To' },
  ];
  return (
    <g>
      <rect
        x={left}
        y={top}
        width={Math.max(1, right - left)}
        height={bottom - top}
        className="cursor-grab fill-focus-soft"
        onPointerDown={(event) => onHold(event, 'span')}
      />
      {ends.map(({ grip, x, minute, name }) => (
        <g
          key={grip}
          role="slider"
          tabIndex={0}
          aria-label={name}
          aria-valuemin={0}
          aria-valuemax={horizonMin}
          aria-valuenow={minute}
          aria-valuetext={clock.dayTime(minute)}
          className="cursor-ew-resize"
          onPointerDown={(event) => onHold(event, grip)}
          onKeyDown={(event) => onKey(event, grip)}
        >
          <rect x={x - GRIP_PX / 2} y={top} width={GRIP_PX} height={bottom - top} className="fill-transparent" />
          <line x1={x} x2={x} y1={top} y2={bottom} className="stroke-focus" strokeWidth={2} />
          <rect x={x - 4} y={bottom - 22} width={8} height={18} rx={3} className="fill-focus" />
        </g>
      ))}
      {draft.subject.kind === 'limit' && draft.value !== null ? (
        <g
          role="slider"
          tabIndex={0}
          aria-label="Steam limit"
          aria-orientation="vertical"
          aria-valuemin={0}
          aria-valuemax={topKgPerH}
          aria-valuenow={draft.value}
          aria-valuetext={units.rate(draft.value)}
          className="cursor-ns-resize"
          onPointerDown={(event) => onHold(event, 'level')}
          onKeyDown={(event) => onKey(event, 'level')}
        >
          <rect x={left} y={level - 10} width={Math.max(20, right - left)} height={20} className="fill-transparent" />
          <line x1={left} x2={right} y1={level} y2={level} className="stroke-surface" strokeWidth={7} />
          <line x1={left} x2={right} y1={level} y2={level} className="stroke-focus" strokeWidth={3} />
          <rect x={(left + right) / 2 - 13} y={level - 5} width={26} height={10} rx={4} className="fill-focus" />
          <path
            d={`M${(left + right) / 2 - 6} ${level}h12`}
            className="stroke-surface"
            strokeWidth={1.5}
            pointerEvents="none"
          />
        </g>
      ) : null}
    </g>
  );
}
