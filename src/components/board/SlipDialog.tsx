import { useState } from 'react';
import { isNeverMoved, type Activity } from '../../core/plant/activity';
import type { Line } from '../../core/plant/plant';
import { slipLine } from '../../core/schedule/hand';
import type { Week } from '../../core/schedule/week';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { Field, SelectField } from '../ui/Field';
import type { Clock } from '../time';
import { activityName } from './words';

interface Props {
  readonly lines: readonly Line[];
  readonly lineId: string;
  readonly week: Week;
  readonly clock: Clock;
  readonly nowMin: number;
  readonly onClose: () => void;
  readonly onSlip: (lineId: string, fromMinute: number, byMinutes: number) => void;
}

/** Minute of the week of a day and a clock time; null where the time is none. A time that a day has twice is its first. */
export function minuteOfClock(clock: Clock, dayStart: number, time: string): number | null {
  if (!/^\d{2}:\d{2}$/.test(time)) return null;
  for (let minute = dayStart; minute < dayStart + 1560; minute++) if (clock.time(minute) === time) return minute;
  return null;
}

/** Moves everything of a line from a time on by so many minutes. */
export function SlipDialog({ lines, lineId, week, clock, nowMin, onClose, onSlip }: Props) {
  const days = daysOf(clock, week.horizonMin);
  const today = days.findLast((day) => day <= nowMin) ?? 0;
  const [line, setLine] = useState(lineId);
  const [day, setDay] = useState(today);
  const [time, setTime] = useState(nowMin >= 0 && nowMin < week.horizonMin ? clock.time(nowMin) : '06:00');
  const [by, setBy] = useState('15');
  const from = minuteOfClock(clock, day, time);
  const minutes = Number(by);
  const valid = from !== null && Number.isInteger(minutes) && minutes !== 0 && Math.abs(minutes) <= 2880;
  const count = valid ? slipLine(week, line, from, minutes).changes.length : 0;
  const steady = from === null ? [] : neverMovedOn(week, line, from);
  const submit = (): void => {
    if (!valid || count === 0) return;
    onSlip(line, from, minutes);
    onClose();
  };
  return (
    <Dialog
      open
      title="Slip a line"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Leave it</Button>
          <Button look="main" disabled={count === 0} onClick={submit}>
            {count === 0 ? 'Slip' : `Slip ${count}`}
          </Button>
        </>
      }
    >
      <form
        className="grid grid-cols-2 gap-x-3"
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <SelectField label="Line" className="col-span-2" value={line} onChange={(e) => setLine(e.target.value)}>
          {lines.map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
        </SelectField>
        <SelectField label="From" value={day} onChange={(e) => setDay(Number(e.target.value))}>
          {days.map((start) => (
            <option key={start} value={start}>
              {clock.day(start)}
            </option>
          ))}
        </SelectField>
        <Field label="At" type="time" value={time} onChange={(e) => setTime(e.target.value)} />
        <Field
          label="By"
          className="col-span-2"
          unit="min"
          inputMode="numeric"
          value={by}
          onChange={(e) => setBy(e.target.value)}
          hint={
            count === 0
              ? 'Nothing free starts there.'
              : `${count === 1 ? '1 start moves' : `${count} starts move`}; fixed and running ones stay.`
          }
          error={valid ? undefined : 'Whole minutes, less than 0 for earlier.'}
        />
        {steady.length > 0 ? (
          <p className="col-span-2 text-sm" data-testid="never-moved">
            {steady.map((one) => activityName(one)).join(', ')} {steady.length === 1 ? 'stays' : 'stay'} where the
            planner put {steady.length === 1 ? 'it' : 'them'}: hours of heating up, then a steady draw.
          </p>
        ) : null}
        <button type="submit" hidden />
      </form>
    </Dialog>
  );
}

/** What a line's slip would take along but for its being never moved. */
function neverMovedOn(week: Week, lineId: string, fromMinute: number): Activity[] {
  const units = new Set(week.plant.units.filter((unit) => unit.lineId === lineId).map(({ id }) => id));
  return week.activities.filter(
    (one) => isNeverMoved(one) && one.placement && units.has(one.placement.unitId) && one.placement.start >= fromMinute,
  );
}

/** First minutes of the week's days. */
export function daysOf(clock: Clock, horizonMin: number): number[] {
  const days: number[] = [];
  for (let minute = 0; minute < horizonMin; minute += 60) {
    if (minute === 0 || clock.time(minute) === '00:00') days.push(minute);
  }
  return days;
}
