import type { StartOutcome } from '../../core/header/spread/startSpread';
import { barsOf, type SpreadSpan } from './histogram';

interface Props {
  readonly outcomes: readonly StartOutcome[];
  readonly span: SpreadSpan;
  readonly label: string;
  readonly heightPx: number;
  /** Minutes named below. */
  readonly withAxis?: boolean;
  readonly look?: 'steam' | 'quiet';
}

const WIDTH = 240;

/** How many starts were so early or so late; the line is the planned start. */
export function Histogram({ outcomes, span, label, heightPx, withAxis = false, look = 'steam' }: Props) {
  const { fromMin, toMin } = span;
  const x = (minutes: number): number => ((minutes - fromMin) / (toMin - fromMin)) * WIDTH;
  const bars = barsOf(outcomes, span);
  const most = bars.reduce((top, { chance }) => Math.max(top, chance), 0);
  return (
    <figure role="img" aria-label={label}>
      <svg
        viewBox={`0 0 ${WIDTH} ${heightPx}`}
        preserveAspectRatio="none"
        className="block w-full overflow-visible"
        style={{ height: heightPx }}
        aria-hidden="true"
      >
        {bars.map(({ fromMin: from, toMin: to, chance }) => {
          const tall = (chance / most) * (heightPx - 2);
          return (
            <rect
              key={from}
              x={x(from)}
              width={Math.max(0.5, x(to) - x(from) - 0.6)}
              y={heightPx - tall}
              height={tall}
              className={look === 'steam' ? 'fill-steam' : 'fill-ink-muted'}
            />
          );
        })}
        <path d={`M0 ${heightPx}H${WIDTH}`} className="stroke-edge" vectorEffect="non-scaling-stroke" />
        <path d={`M${x(0)} 0V${heightPx}`} className="stroke-ink" vectorEffect="non-scaling-stroke" />
      </svg>
      {withAxis ? (
        <figcaption className="relative mt-0.5 h-4 text-2xs text-ink-muted" aria-hidden="true">
          <span className="absolute left-0">{0 - fromMin} min early</span>
          <span className="absolute -translate-x-1/2 max-sm:hidden" style={{ left: `${(x(0) / WIDTH) * 100}%` }}>
            planned
          </span>
          <span className="absolute right-0">{toMin - 1} min late</span>
        </figcaption>
      ) : null}
    </figure>
  );
}
