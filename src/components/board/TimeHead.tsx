import { memo, type ReactNode } from 'react';
import type { ShiftSpan } from '../../contracts/week';
import type { Clock } from '../time';
import type { Tick } from './ticks';
import { xOf, type TimeScale } from './timeScale';

interface Props {
  readonly ticks: readonly Tick[];
  readonly shifts: readonly ShiftSpan[];
  readonly scale: TimeScale;
  readonly clock: Clock;
  readonly nowMin: number;
  readonly corner: ReactNode;
}

/** Days, hours and shifts along the top. A day's name stays in view as long as the day does. */
export const TimeHead = memo(function TimeHead({ ticks, shifts, scale, clock, nowMin, corner }: Props) {
  const days = ticks.filter((tick) => tick.isDay);
  const hours = ticks.filter((tick) => !tick.isDay);
  return (
    <div className="flex bg-paper">
      <div className="board-label flex items-end px-4 pb-1 max-sm:px-2">{corner}</div>
      <div className="board-track h-[58px] border-b border-rule" style={{ width: scale.widthPx }}>
        {days.map((day, i) => {
          const to = days[i + 1]?.minute ?? scale.horizonMin;
          return (
            <div
              key={day.minute}
              className="absolute top-0 h-full border-l border-edge"
              style={{ left: xOf(scale, day.minute), width: xOf(scale, to - day.minute) }}
            >
              <span className="sticky left-(--label-w) inline-block px-2 pt-1 text-xs font-semibold whitespace-nowrap">
                {xOf(scale, to - day.minute) > 84 ? day.label : day.label.slice(0, 3)}
              </span>
            </div>
          );
        })}
        {hours.map((hour) => (
          <span
            key={hour.minute}
            className="absolute top-[22px] h-[18px] border-l border-rule pl-1.5 text-2xs leading-[18px] text-ink-muted"
            style={{ left: xOf(scale, hour.minute) }}
          >
            {Math.abs(xOf(scale, hour.minute - nowMin) + 16) < 40 ? '' : hour.label}
          </span>
        ))}
        {shifts.map((shift) => (
          <ShiftName key={`${shift.shiftId} ${shift.from}`} shift={shift} scale={scale} />
        ))}
        {nowMin >= 0 && nowMin < scale.horizonMin ? (
          <span
            data-testid="now"
            className="absolute top-[23px] z-[1] -translate-x-1/2 rounded-sm bg-ink px-1.5 text-2xs leading-4 font-medium text-paper"
            style={{ left: xOf(scale, nowMin) }}
          >
            {clock.time(nowMin)}
          </span>
        ) : null}
      </div>
    </div>
  );
});

function ShiftName({ shift, scale }: { readonly shift: ShiftSpan; readonly scale: TimeScale }) {
  const width = xOf(scale, shift.to - shift.from);
  return (
    <div
      className="absolute bottom-0 h-[17px] overflow-clip border-l border-edge bg-sunken"
      style={{ left: xOf(scale, shift.from), width: Math.max(1, width - 1) }}
    >
      {width > 66 ? (
        <span className="sticky left-(--label-w) inline-block max-w-full truncate px-1.5 text-2xs leading-[17px] text-ink-muted">
          {shift.name}
        </span>
      ) : null}
    </div>
  );
}
