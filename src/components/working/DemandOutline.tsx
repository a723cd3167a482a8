import type { Phase } from '@/core/plant/activity';
import { groupDigits } from '../time';
import { useUnits } from '../ui/units';
import { outlinePath, roundTicks } from './outlinePath';

interface Props {
  readonly grid: readonly Phase[];
  readonly minutes: number;
  /** Greatest value of the scale where several outlines are compared. [kg/h] */
  readonly topKgPerH?: number;
  /** Small, without a scale: in a row of a list. */
  readonly small?: boolean;
}

const WIDTH = 640;
const HEIGHT = 200;

/** A duty's draw on whole minutes: the outline that its batch has on the board. */
export function DemandOutline({ grid, minutes, topKgPerH, small = false }: Props) {
  const units = useUnits();
  const peak = Math.max(0, ...grid.map((phase) => phase.steamKgPerH));
  const ticks = roundTicks(units.shown('steamRate', Math.max(peak, topKgPerH ?? 0)));
  const top = units.inside('steamRate', ticks.at(-1) ?? 1);
  const box = { width: WIDTH, height: HEIGHT, minutes, top: small ? Math.max(peak, topKgPerH ?? 1e-9) : top };
  const label = `Draw over ${minutes} minutes, at most ${units.text('steamRate', peak)}`;
  const picture = (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      preserveAspectRatio="none"
      className="block size-full overflow-visible"
      role="img"
      aria-label={label}
    >
      {small ? null : ticks.map((tick) => <Line key={tick} share={tick / (ticks.at(-1) ?? 1)} />)}
      <path d={outlinePath(grid, box)} className="fill-steam" />
      <path d={`M0 ${HEIGHT}H${WIDTH}`} className="stroke-steam" vectorEffect="non-scaling-stroke" />
    </svg>
  );
  if (small) return <div className="h-8 w-24">{picture}</div>;
  return (
    <figure className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-2">
      <ol className="flex flex-col-reverse justify-between text-right text-2xs text-ink-muted" aria-hidden="true">
        {ticks.map((tick) => (
          <li key={tick} className="-my-2 leading-4">
            {groupDigits(tick)}
          </li>
        ))}
      </ol>
      <div className="h-48">{picture}</div>
      <figcaption className="col-start-2 mt-1.5 flex justify-between text-2xs text-ink-muted">
        <span>0 min</span>
        <span>{units.symbol('steamRate')} over minutes</span>
        <span>{minutes} min</span>
      </figcaption>
    </figure>
  );
}

function Line({ share }: { readonly share: number }) {
  const y = HEIGHT - share * HEIGHT;
  return <path d={`M0 ${y}H${WIDTH}`} className="stroke-rule" vectorEffect="non-scaling-stroke" />;
}
