import type { LevellingProgressDto } from '../../contracts/levelling';
import { useUnits } from '../ui/units';
import { progressPath } from './progress';

const [WIDTH, HEIGHT] = [276, 84];

interface Props {
  readonly progress: readonly LevellingProgressDto[];
  readonly seconds: number;
}

/** What was over the limit as the search went on, from its first figure down. */
export function LevelProgress({ progress, seconds }: Props) {
  const units = useUnits();
  const most = progress[0]?.overKg ?? 0;
  const path = progressPath(progress, { widthPx: WIDTH, heightPx: HEIGHT, seconds, most });
  return (
    <svg
      viewBox={`0 -14 ${WIDTH} ${HEIGHT + 16}`}
      className="w-full"
      role="img"
      aria-label={`Over the limit: ${units.mass(progress.at(-1)?.overKg ?? 0)} now, ${units.mass(most)} at first`}
    >
      <path d={`M0 ${HEIGHT}H${WIDTH}`} className="stroke-room" strokeWidth="2" />
      <path d={`M0 0H${WIDTH}`} className="stroke-rule" strokeDasharray="1 5" />
      <text x="0" y="-4" className="fill-ink-muted text-2xs">
        {most > 0 ? `${units.mass(most)} over the limit` : ''}
      </text>
      {path ? (
        <>
          <path d={`${path.line}V${HEIGHT}H0Z`} className="fill-over-soft" />
          <path d={path.line} className="fill-none stroke-over" strokeWidth="1.75" />
        </>
      ) : null}
    </svg>
  );
}
