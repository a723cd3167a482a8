import { memo } from 'react';
import type { ProposedMove } from '../../core/levelling/proposal';
import type { Week } from '../../core/schedule/week';
import { modeOn } from './carry';
import type { Rows } from './rows';
import { xOf, type TimeScale } from './timeScale';

interface Props {
  readonly moves: readonly ProposedMove[];
  readonly week: Week;
  readonly rows: Rows;
  readonly scale: TimeScale;
}

/** Where proposed moves come from: empty outlines, and a line to where they go. */
export const Ghosts = memo(function Ghosts({ moves, week, rows, scale }: Props) {
  if (moves.length === 0) return null;
  const byId = new Map(week.activities.map((activity) => [activity.id, activity]));
  return (
    <div className="pointer-events-none absolute top-0 left-(--label-w) z-[2]" aria-hidden="true">
      {moves.map((move) => {
        const activity = byId.get(move.activityId);
        const mode = activity && (modeOn(activity, move.from.unitId) ?? activity.modes[0]);
        const top = rows.topOfUnit.get(move.from.unitId);
        if (!mode || top === undefined) return null;
        const [left, width] = [xOf(scale, move.from.start), Math.max(2, xOf(scale, mode.minutes))];
        return <span key={move.activityId} className="ghost" style={{ top: top + 4, left, width }} />;
      })}
      <svg width={scale.widthPx} height={rows.heightPx} className="absolute top-0 left-0">
        {moves.map((move) => {
          const [y0, y1] = [rows.topOfUnit.get(move.from.unitId), rows.topOfUnit.get(move.to.unitId)];
          if (y0 === undefined || y1 === undefined) return null;
          const d = `M${xOf(scale, move.from.start)} ${y0 + 43}L${xOf(scale, move.to.start)} ${y1 + 43}`;
          return <path key={move.activityId} d={d} className="stroke-ink" strokeWidth={1.5} />;
        })}
      </svg>
    </div>
  );
});
