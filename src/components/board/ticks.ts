import type { ShiftSpan } from '../../contracts/week';
import type { Interval } from '../../core/time/interval';
import type { Clock } from '../time';

export interface Tick {
  readonly minute: number;
  readonly label: string;
  readonly isDay: boolean;
}

/** Hours between ticks that leave a label its room. */
function hoursBetween(pxPerMin: number): number {
  return [1, 2, 3, 6, 12].find((hours) => hours * 60 * pxPerMin >= 46) ?? 24;
}

/** Ticks on the plant's clock: days, and hours as far as there is room. An hour that a clock change repeats has two. */
export function ticksOf(clock: Clock, horizonMin: number, pxPerMin: number): Tick[] {
  const every = hoursBetween(pxPerMin);
  const ticks: Tick[] = [];
  for (let minute = 0; minute < horizonMin; minute += 60) {
    const hour = Number(clock.time(minute).slice(0, 2));
    const isDay = hour === 0 || minute === 0;
    if (isDay) ticks.push({ minute, label: clock.day(minute), isDay });
    else if (every < 24 && hour % every === 0) ticks.push({ minute, label: clock.time(minute), isDay });
  }
  return ticks;
}

/** One entry for each spell of a shift by name, lines that share it joined. */
export function shiftSpells(shifts: readonly ShiftSpan[]): ShiftSpan[] {
  const seen = new Map<string, ShiftSpan>();
  for (const shift of shifts) {
    const key = `${shift.name} ${shift.from}`;
    const known = seen.get(key);
    if (!known || known.to < shift.to) seen.set(key, shift);
  }
  return [...seen.values()].sort((a, b) => a.from - b.from);
}

/** What lies between the open spans. */
export function closedSpans(open: readonly Interval[], horizonMin: number): Interval[] {
  const closed: Interval[] = [];
  let at = 0;
  for (const span of [...open].sort((a, b) => a.from - b.from)) {
    if (span.from > at) closed.push({ from: at, to: Math.min(span.from, horizonMin) });
    at = Math.max(at, span.to);
  }
  if (at < horizonMin) closed.push({ from: at, to: horizonMin });
  return closed;
}
