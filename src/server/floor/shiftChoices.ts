import type { ShiftSpan } from '@/contracts/week';
import { fail, ok, type Result } from '@/core/result';
import { db } from '@/db/client';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notFound, type HttpProblem } from '../http/problem';
import { expandShifts } from '../weeks/calendar';
import { findWeek } from '../weeks/findWeek';
import { plantParts, shiftRows } from '../weeks/plantParts.repo';
import { minuteOf } from '../weeks/weekTime';

/** The lines of the plant and the shifts of a line in a week, with the ones asked for or else the present ones. */
export interface ShiftChoices {
  readonly lines: readonly { readonly id: string; readonly name: string }[];
  readonly lineId: string;
  /** Of the line, that start in the week. */
  readonly shifts: readonly ShiftSpan[];
  readonly shift: ShiftSpan;
}

interface Asked {
  readonly line: string | null;
  readonly shift: string | null;
  readonly date: string | null;
}

/** What the shift page offers. Something asked for that is not there gives the present line or shift. */
export async function shiftChoices(
  actor: Authorized<'floor.read'>,
  weekStart: string,
  asked: Asked,
): Promise<Result<ShiftChoices, HttpProblem>> {
  const found = await findWeek(actor, weekStart);
  if (!found.ok) return found;
  const { plant, time } = found.value;
  const { lines } = await plantParts(db, plant.id);
  const line = lines.find(({ id }) => id === asked.line) ?? lines[0];
  if (!line) return fail(notFound(`${plant.name} has no line yet.`));
  const shifts = expandShifts(time, await shiftRows(db, plant.id)).filter(
    (span) => span.from >= 0 && (span.lineIds === null || span.lineIds.includes(line.id)),
  );
  const shift =
    shifts.find((span) => span.shiftId === asked.shift && span.date === asked.date) ??
    presentShift(shifts, minuteOf(time, now()));
  if (!shift) return fail(notFound(`${line.name} has no shift in this week.`));
  return ok({ lines: lines.map(({ id, name }) => ({ id, name })), lineId: line.id, shifts, shift });
}

/** The shift that runs at a minute, else the next one, else the last. */
export function presentShift(shifts: readonly ShiftSpan[], minute: number): ShiftSpan | undefined {
  return shifts.find((span) => minute < span.to) ?? shifts.at(-1);
}
