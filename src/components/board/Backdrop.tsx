import { memo } from 'react';
import type { Interval } from '../../core/time/interval';
import type { Rows } from './rows';
import type { Tick } from './ticks';
import { xOf, type TimeScale } from './timeScale';

interface Props {
  readonly rows: Rows;
  readonly scale: TimeScale;
  readonly ticks: readonly Tick[];
  readonly closed: ReadonlyMap<string, readonly Interval[]>;
  /** Spans over a steam limit, carried down from the strips. */
  readonly over: readonly Interval[];
  readonly nowMin: number;
}

/** What lies behind the blocks: closed time, the hours, spans over the limit, and now. */
export const Backdrop = memo(function Backdrop({ rows, scale, ticks, closed, over, nowMin }: Props) {
  const height = rows.heightPx;
  return (
    <svg
      width={scale.widthPx}
      height={height}
      className="pointer-events-none absolute top-0 left-(--label-w)"
      aria-hidden="true"
      focusable="false"
    >
      {rows.rows.map((row) =>
        row.kind === 'unit'
          ? (closed.get(row.unit.id) ?? []).map((span) => (
              <rect
                key={`${row.unit.id} ${span.from}`}
                x={xOf(scale, span.from)}
                y={row.top}
                width={xOf(scale, span.to - span.from)}
                height={row.height - 1}
                className="fill-sunken"
              />
            ))
          : null,
      )}
      {ticks.map((tick) => (
        <path
          key={tick.minute}
          d={`M${xOf(scale, tick.minute)} 0V${height}`}
          className={tick.isDay ? 'stroke-edge' : 'stroke-rule'}
          strokeWidth={1}
        />
      ))}
      {over.map((span) => (
        <rect
          key={span.from}
          x={xOf(scale, span.from)}
          y={0}
          width={Math.max(1, xOf(scale, span.to - span.from))}
          height={height}
          className="fill-over-soft"
        />
      ))}
      {nowMin >= 0 && nowMin < scale.horizonMin ? (
        <path d={`M${xOf(scale, nowMin)} 0V${height}`} className="stroke-ink" strokeWidth={1.5} />
      ) : null}
    </svg>
  );
});
