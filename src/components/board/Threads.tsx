import { memo } from 'react';
import { ROW_PX, type Rows } from './rows';
import { threadPath, type Thread } from './threads';
import { xOf, type TimeScale } from './timeScale';

const FOOT_PX = ROW_PX - 4;

interface Props {
  readonly threads: readonly Thread[];
  readonly rows: Rows;
  readonly scale: TimeScale;
}

/** The waits between linked stages of the selected batch. A broken wait is dashed and red. */
export const Threads = memo(function Threads({ threads, rows, scale }: Props) {
  if (threads.length === 0) return null;
  return (
    <svg
      width={scale.widthPx}
      height={rows.heightPx}
      className="pointer-events-none absolute top-0 left-(--label-w) z-[3]"
      aria-hidden="true"
      focusable="false"
    >
      {threads.map((thread) => {
        const d = threadPath(thread, rows, scale.pxPerMin, FOOT_PX);
        if (!d) return null;
        const [x0, x1] = [xOf(scale, thread.fromMinute), xOf(scale, thread.toMinute)];
        const [y0, y1] = [rows.topOfUnit.get(thread.fromUnitId) ?? 0, rows.topOfUnit.get(thread.toUnitId) ?? 0];
        const paint = thread.broken ? 'fill-over' : 'fill-focus';
        return (
          <g key={thread.linkId}>
            <circle cx={x0} cy={y0 + FOOT_PX} r={2.5} className={paint} />
            <circle cx={x1} cy={y1 + FOOT_PX} r={2.5} className={paint} />
            <path
              d={d}
              className={`fill-none ${thread.broken ? 'stroke-over' : 'stroke-focus'}`}
              strokeWidth={thread.broken ? 2 : 1.25}
              strokeDasharray={thread.broken ? '5 3' : undefined}
              strokeOpacity={thread.broken ? 1 : 0.75}
            />
          </g>
        );
      })}
    </svg>
  );
});
