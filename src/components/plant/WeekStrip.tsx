import { barsOf, daysFrom, hourText, type HourStep } from './hours';

interface Props {
  readonly steps: readonly HourStep[];
  readonly weekStartsOn: number;
  /** A value with its unit. */
  readonly text: (value: number) => string;
  readonly title: string;
}

const WIDTH = 336;
const HEIGHT = 72;

/** A value over the hours of the week, drawn small. */
export function WeekStrip({ steps, weekStartsOn, text, title }: Props) {
  const bars = barsOf(steps);
  const top = Math.max(0, ...bars.map(({ value }) => value));
  const y = (value: number): number => (top > 0 ? HEIGHT - (value / top) * (HEIGHT - 6) : HEIGHT);
  const said = bars.map(({ from, value }) => `${text(value)} from ${hourText(from, weekStartsOn)}`).join(', ');
  return (
    <figure>
      <figcaption className="flex justify-between text-xs text-ink-muted">
        <span>{title}</span>
        <span>at most {text(top)}</span>
      </figcaption>
      <svg
        viewBox={`0 0 ${WIDTH} ${HEIGHT + 1}`}
        className="mt-1 w-full"
        role="img"
        aria-label={`${title}: ${said || 'nothing'}`}
      >
        {bars.map(({ from, to, value }) => (
          <rect
            key={from}
            x={from * 2}
            y={y(value)}
            width={Math.max(0, (to - from) * 2)}
            height={HEIGHT - y(value)}
            className="fill-steam-soft stroke-steam"
            strokeWidth={1}
          />
        ))}
        <line x1={0} x2={WIDTH} y1={HEIGHT} y2={HEIGHT} className="stroke-edge" strokeWidth={1} />
        {daysFrom(weekStartsOn).map((day, i) => (
          <line key={day} x1={i * 48} x2={i * 48} y1={0} y2={HEIGHT} className="stroke-rule" strokeWidth={1} />
        ))}
      </svg>
      <div className="grid grid-cols-7 text-2xs text-ink-muted" aria-hidden="true">
        {daysFrom(weekStartsOn).map((day) => (
          <span key={day}>{day}</span>
        ))}
      </div>
    </figure>
  );
}
