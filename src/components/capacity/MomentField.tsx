import { useState } from 'react';
import { Field, SelectField } from '../ui/Field';
import type { Clock } from '../time';
import { dayAt, minuteOfWall, wallTime, type DayOfWeek } from './wallTime';

interface Props {
  readonly label: string;
  readonly minute: number;
  /** A moment that ends a span may be 24:00. */
  readonly isEnd?: boolean;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
  readonly error?: string | undefined;
  readonly onChange: (minute: number) => void;
}

/** A moment of the week by day and clock; what is half typed stays as typed until it is a time. */
export function MomentField({ label, minute, isEnd = false, days, clock, error, onChange }: Props) {
  const day = dayAt(days, minute, isEnd) ?? days[isEnd ? days.length - 1 : 0];
  const [typed, setTyped] = useState<string | null>(null);
  if (!day) return null;
  const shown = wallTime(clock, day, minute);
  const wrong = typed !== null && minuteOfWall(clock, day, typed) === null ? 'A time such as 07:30.' : undefined;

  const changeDay = (date: string): void => {
    const next = days.find((d) => d.date === date);
    const found = next && minuteOfWall(clock, next, shown);
    if (next) onChange(found ?? next.from);
  };
  const changeTime = (text: string): void => {
    setTyped(text);
    const found = minuteOfWall(clock, day, text);
    if (found !== null && found !== undefined && text.length >= 4) onChange(found);
  };
  const settle = (): void => {
    const found = typed === null ? null : minuteOfWall(clock, day, typed);
    if (typed !== null && found === null) return;
    if (found !== null) onChange(found);
    setTyped(null);
  };

  return (
    <div className="grid grid-cols-[1fr_6.5rem] gap-2">
      <SelectField label={label} value={day.date} error={error} onChange={(event) => changeDay(event.target.value)}>
        {days.map((d) => (
          <option key={d.date} value={d.date}>
            {d.label}
          </option>
        ))}
      </SelectField>
      <Field
        label="at"
        aria-label={`${label}, time`}
        inputMode="numeric"
        autoComplete="off"
        value={typed ?? shown}
        error={wrong}
        data-unread={wrong ? '' : undefined}
        onChange={(event) => changeTime(event.target.value)}
        onBlur={settle}
      />
    </div>
  );
}
