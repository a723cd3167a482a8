import type { ShiftRowDto } from '@/contracts/floor';
import { placedPhases } from '@/core/demand/activityLoad';
import type { RowEvent } from './rows';

interface Props {
  readonly row: ShiftRowDto;
  readonly events: readonly RowEvent[];
  readonly nowMin: number;
  /** All outlines of the sheet share one height of kg/h. */
  readonly topKgPerH: number;
}

const WIDTH = 600;
const HEIGHT = 64;

/** The steam of a row over its time: what is past is solid, what comes is light, events stand as ticks. */
export function OutlineTime({ row, events, nowMin, topKgPerH }: Props) {
  const x = (minute: number): number =>
    Math.max(0, Math.min(WIDTH, ((minute - row.start) / Math.max(1, row.end - row.start)) * WIDTH));
  const y = (kgPerH: number): number => HEIGHT - (kgPerH / Math.max(1, topKgPerH)) * (HEIGHT - 4);
  const tops = placedPhases(row.activity)
    .map((p) => `M${x(p.from).toFixed(1)} ${HEIGHT}V${y(p.steamKgPerH).toFixed(1)}H${x(p.to).toFixed(1)}V${HEIGHT}Z`)
    .join('');
  const clip = `past-${row.activity.id}`;
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} preserveAspectRatio="none" className="block h-16 w-full" aria-hidden="true">
      <defs>
        <clipPath id={clip}>
          <rect width={x(nowMin)} height={HEIGHT} />
        </clipPath>
      </defs>
      <path d={tops} className="fill-steam opacity-45" />
      <path d={tops} className="fill-steam" clipPath={`url(#${clip})`} />
      <path d={`M0 ${HEIGHT - 0.5}H${WIDTH}`} className="stroke-steam" vectorEffect="non-scaling-stroke" />
      {events.map((event) => (
        <path
          key={event.kind}
          d={`M${x(event.plannedMin).toFixed(1)} 0V${HEIGHT}`}
          className="stroke-edge"
          strokeDasharray="2 3"
          vectorEffect="non-scaling-stroke"
        />
      ))}
      {nowMin > row.start && nowMin < row.end ? (
        <path
          d={`M${x(nowMin).toFixed(1)} 0V${HEIGHT}`}
          className="stroke-ink"
          strokeWidth={2.5}
          vectorEffect="non-scaling-stroke"
        />
      ) : null}
    </svg>
  );
}
