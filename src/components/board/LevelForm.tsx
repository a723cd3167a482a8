import { useState } from 'react';
import type { LevellingRequest } from '../../contracts/levelling';
import { Button } from '../ui/Button';
import { SelectField } from '../ui/Field';
import { spanText } from '../time';
import { daysOf } from './SlipDialog';
import type { BoardModel } from './useBoard';

const FARTHEST = [15, 30, 60, 120, 240, 720, 1440];
const SECONDS = [5, 15, 30, 60, 120];

/** What may move, how far, and how long to look. */
export function LevelForm({ model }: { readonly model: BoardModel }) {
  const { clock, dto, nowMin, levelling } = model;
  const { horizonMin } = dto.week;
  const inWeek = nowMin >= 0 && nowMin < horizonMin;
  const days = daysOf(clock, horizonMin);
  const [span, setSpan] = useState(inWeek ? 'now' : 'week');
  const [farthest, setFarthest] = useState(720);
  const [mayChangeUnit, setMayChangeUnit] = useState(true);
  const [seconds, setSeconds] = useState(15);

  const spanOf = (): Pick<LevellingRequest, 'fromMin' | 'toMin'> => {
    if (span === 'week') return { fromMin: 0, toMin: horizonMin };
    if (span === 'now') return { fromMin: Math.max(0, nowMin), toMin: horizonMin };
    const from = Number(span);
    const next = days.find((day) => day > from) ?? horizonMin;
    return { fromMin: Math.max(from, inWeek ? nowMin : 0), toMin: next };
  };
  return (
    <form
      className="flex flex-col"
      onSubmit={(event) => {
        event.preventDefault();
        const planRevision = dto.planRevision;
        levelling.start({ planRevision, ...spanOf(), mayChangeUnit, greatestShiftMin: farthest, seconds });
      }}
    >
      <p className="mb-3 text-sm text-ink-muted">
        Looks for the smallest moves that bring the steam load under its limit. Fixed and running batches stay; process
        limits are kept.
      </p>
      <SelectField label="Which starts may move" value={span} onChange={(e) => setSpan(e.target.value)}>
        {inWeek ? <option value="now">From now on</option> : null}
        <option value="week">The whole week</option>
        {days
          .filter((_, i) => (days[i + 1] ?? horizonMin) > (inWeek ? nowMin : 0))
          .map((day) => (
            <option key={day} value={day}>
              Only {clock.day(day)}
            </option>
          ))}
      </SelectField>
      <div className="grid grid-cols-2 gap-x-3">
        <SelectField label="No farther than" value={farthest} onChange={(e) => setFarthest(Number(e.target.value))}>
          {FARTHEST.map((minutes) => (
            <option key={minutes} value={minutes}>
              {spanText(minutes)}
            </option>
          ))}
        </SelectField>
        <SelectField label="Look for" value={seconds} onChange={(e) => setSeconds(Number(e.target.value))}>
          {SECONDS.map((s) => (
            <option key={s} value={s}>
              {s} s
            </option>
          ))}
        </SelectField>
      </div>
      <label className="mb-4 flex items-center gap-2 text-sm">
        <input
          type="checkbox"
          className="size-4 accent-room"
          checked={mayChangeUnit}
          onChange={(e) => setMayChangeUnit(e.target.checked)}
        />
        Batches may go to another unit
      </label>
      <div>
        <Button type="submit" look="main" busy={levelling.busy} disabled={model.saves.pending.length > 0}>
          Look for moves
        </Button>
      </div>
    </form>
  );
}
