import type { Clock } from '../time';
import { xOf, type DeskScale } from './scale';
import type { DayOfWeek } from './wallTime';

interface Props {
  readonly scale: DeskScale;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
}

const AXIS_HEIGHT = 34;

/** Hours to write for so many pixels an hour. */
function hourStep(scale: DeskScale): number {
  const pxPerHour = (scale.width / (scale.to - scale.from)) * 60;
  return [1, 2, 3, 4, 6, 12].find((hours) => hours * pxPerHour >= 44) ?? 24;
}

/** Full hours of a day by its clock, every so many; elapsed minutes, so a clock change is seen. */
export function hourMarks(scale: DeskScale, day: DayOfWeek, clock: Clock): { minute: number; text: string }[] {
  const step = hourStep(scale);
  const marks: { minute: number; text: string }[] = [];
  for (let minute = day.from; minute < day.to; minute += 60) {
    const text = clock.time(minute);
    if (text.endsWith(':00') && Number(text.slice(0, 2)) % step === 0) marks.push({ minute, text });
  }
  return marks.filter(({ minute }) => minute >= scale.from && minute < scale.to);
}

/** Days and hours over the desk. */
export function Axis({ scale, days, clock }: Props) {
  const shown = days.filter((day) => day.to > scale.from && day.from < scale.to);
  const wide = (scale.width / Math.max(1, shown.length)) * 1 >= 70;
  return (
    <svg width={scale.width} height={AXIS_HEIGHT} className="block" aria-hidden="true">
      {shown.map((day) => (
        <g key={day.date}>
          <line x1={xOf(scale, day.from)} x2={xOf(scale, day.from)} y1={0} y2={AXIS_HEIGHT} className="stroke-edge" />
          <text x={xOf(scale, day.from) + 5} y={12} className="fill-ink text-2xs font-semibold">
            {wide ? day.label : day.label.slice(0, 3)}
          </text>
          {hourMarks(scale, day, clock).map(({ minute, text }) => (
            <g key={minute}>
              <line
                x1={xOf(scale, minute)}
                x2={xOf(scale, minute)}
                y1={AXIS_HEIGHT - 14}
                y2={AXIS_HEIGHT}
                className="stroke-rule"
              />
              <text x={xOf(scale, minute) + 5} y={AXIS_HEIGHT - 5} className="fill-ink-muted text-2xs">
                {text.slice(0, scale.to - scale.from > 2_000 ? 2 : 5)}
              </text>
            </g>
          ))}
        </g>
      ))}
    </svg>
  );
}
