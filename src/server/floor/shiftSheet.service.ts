import { z } from 'zod';
import type { ShiftRowDto, ShiftSheetDto } from '@/contracts/floor';
import type { FloorEventDto, ShiftSpan } from '@/contracts/week';
import type { Week } from '@/core/schedule/week';
import { drawnActivities } from '@/core/schedule/judged';
import { shiftSequence } from '@/core/shift/sequence';
import { steamOnBy } from '@/core/shift/steamOnBy';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notFound, type HttpProblem } from '../http/problem';
import { agreementById, issueOnFloor } from '../issues/issues.repo';
import { namesOf } from '../people/people.repo';
import { floorEventRows } from '../plans/plans.repo';
import { expandShifts } from '../weeks/calendar';
import { findWeek, planOf, type FoundWeek } from '../weeks/findWeek';
import { plantParts, shiftRows } from '../weeks/plantParts.repo';
import { floorEventDto, issueDto } from '../weeks/weekDtos';

/** Which sheet: a line's shift, by the date on which the shift starts. */
export const shiftSheetQuerySchema = z.object({
  line: z.string().min(1, 'Name the line.').max(80),
  shift: z.string().min(1, 'Name the shift.').max(80),
  date: z.iso.date('Name the day on which the shift starts, such as 2026-12-01.'),
});
export type ShiftSheetQuery = z.infer<typeof shiftSheetQuerySchema>;

/** What a line has to do in a shift, from the issue on the floor, with what was recorded. */
export async function readShiftSheet(
  actor: Authorized<'floor.read'>,
  weekStart: string,
  query: ShiftSheetQuery,
): Promise<Result<ShiftSheetDto, HttpProblem>> {
  const found = await findWeek(actor, weekStart);
  if (!found.ok) return found;
  await planOf(db, found.value);
  const read = (tx: Db) => sheetOf(tx, found.value, query);
  return db.transaction(read, { isolationLevel: 'repeatable read', accessMode: 'read only' });
}

async function sheetOf(tx: Db, found: FoundWeek, query: ShiftSheetQuery): Promise<Result<ShiftSheetDto, HttpProblem>> {
  const { plant, time } = found;
  const line = (await plantParts(tx, plant.id)).lines.find(({ id }) => id === query.line);
  if (!line) return fail(notFound(`${plant.name} has no such line.`));
  const shift = expandShifts(time, await shiftRows(tx, plant.id)).find((span) => isAsked(span, query));
  if (!shift) return fail(notFound(`${line.name} has no such shift on ${query.date} in this week.`));
  const plan = await planOf(tx, found);
  const issue = await issueOnFloor(tx, plan);
  const agreement = await agreementById(tx, plan, issue?.agreementId ?? null);
  const events = await floorEventRows(tx, plan);
  const names = await namesOf(
    tx,
    [...events, issue, agreement].flatMap((row) => row?.authorId ?? []),
  );
  const recorded = events.map((event) => floorEventDto(event, time, names));
  return ok({
    weekStart: plan.weekStart,
    timeZone: plant.timeZone,
    firstInstant: time.firstInstant.toISOString(),
    now: now().toISOString(),
    plantName: plant.name,
    isDemo: plant.isDemo,
    line: { id: line.id, name: line.name },
    shift,
    issue: issue && issueDto(issue, agreement, names),
    rows: issue ? rowsOf(issue.week, line.id, shift, recorded) : [],
  });
}

const isAsked = (span: ShiftSpan, { line, shift, date }: ShiftSheetQuery): boolean =>
  span.shiftId === shift && span.date === date && (span.lineIds === null || span.lineIds.includes(line));

function rowsOf(week: Week, lineId: string, shift: ShiftSpan, events: readonly FloorEventDto[]): ShiftRowDto[] {
  const drawn = new Map(drawnActivities(week).map((activity) => [activity.id, activity]));
  return shiftSequence(week, lineId, shift).flatMap((row) => {
    const activity = drawn.get(row.activityId);
    const own = events.filter(({ activityId }) => activityId === row.activityId);
    if (!activity) return [];
    const { unitName, from: start, to: end, events: planned } = row;
    return [{ activity, unitName, start, end, planned, steamOnBy: steamOnBy(week, activity.id), events: own }];
  });
}
