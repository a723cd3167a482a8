import { memo } from 'react';
import { ROW_PX, type Rows } from './rows';
import { threadPath, type Thread } from './threads';
import type { TimeScale } from './timeScale';

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
        const d = threadPath(thread, rows, scale.pxPerMin, ROW_PX - 4);
        if (!d) return null;
        return (
          <path
            key={thread.linkId}
            d={d}
            className={`fill-none ${thread.broken ? 'stroke-over' : 'stroke-focus'}`}
            strokeWidth={thread.broken ? 2 : 1.25}
            strokeDasharray={thread.broken ? '5 3' : undefined}
            strokeOpacity={thread.broken ? 1 : 0.75}
          />
        );
      })}
    </svg>
  );
});
