import type { AgreementDto, FloorEventDto, IssueDto, WeekDto } from '@/contracts/week';
import { ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import { now } from '../clock';
import type { HttpProblem } from '../http/problem';
import { runDto } from '../levelling/runDto';
import { namesOf } from '../people/people.repo';
import {
  agreementRows,
  floorEventRows,
  latestIssueRow,
  liveRunRow,
  type ActivityRow,
  type PlanRow,
} from '../plans/plans.repo';
import { findWeek, planOf, type FoundWeek } from './findWeek';
import { familyRows } from './plantParts.repo';
import { minuteOf, type WeekTime } from './weekTime';
import { weekOfPlan } from './weekOfPlan';

type Names = ReadonlyMap<string, string>;

/** All that the board needs of one week of the actor's plant, read at one moment. Makes the plan of a week without one. */
export async function loadWeek(
  actor: Pick<Actor, 'plantId'>,
  weekStart: string,
): Promise<Result<WeekDto, HttpProblem>> {
  const found = await findWeek(actor, weekStart);
  if (!found.ok) return found;
  await planOf(db, found.value);
  const read = (tx: Db): Promise<WeekDto> => readWeek(tx, found.value);
  return ok(await db.transaction(read, { isolationLevel: 'repeatable read', accessMode: 'read only' }));
}

async function readWeek(tx: Db, found: FoundWeek): Promise<WeekDto> {
  const { plant, time } = found;
  const plan = await planOf(tx, found);
  const { week, rows, shifts } = await weekOfPlan(tx, found, plan);
  const events = await floorEventRows(tx, plan);
  const issue = await latestIssueRow(tx, plan);
  const agreements = await agreementRows(tx, plan, issue?.agreementId ?? null);
  const run = await liveRunRow(tx, plan);
  const people = [...rows.map((row) => row.movedBy), ...[...events, ...agreements].map((row) => row.authorId)];
  const names = await namesOf(
    tx,
    [...people, issue?.authorId, run?.authorId].filter((id) => typeof id === 'string'),
  );
  return {
    planId: plan.id,
    weekStart: plan.weekStart,
    planRevision: plan.revision,
    timeZone: plant.timeZone,
    firstInstant: time.firstInstant.toISOString(),
    now: now().toISOString(),
    week,
    shifts,
    moved: movedOf(rows, names),
    floorEvents: events.map((event) => floorEventDto(event, time, names)),
    issue: issue && issueDto(issue, agreements, names),
    agreement: presentAgreement(plan, agreements, names),
    levelling: run && runDto(run, names),
    families: await familyRows(tx, plant.id),
  };
}

function movedOf(rows: readonly ActivityRow[], names: Names): WeekDto['moved'] {
  const moved = rows.flatMap((row) =>
    row.movedBy !== null && row.movedAt !== null
      ? [[row.id, { by: nameIn(names, row.movedBy), at: row.movedAt.toISOString() }] as const]
      : [],
  );
  return Object.fromEntries(moved);
}

/** A person's name, or that the person is gone. */
export const nameIn = (names: Names, personId: string): string => names.get(personId) ?? 'someone no longer here';

type EventRow = Awaited<ReturnType<typeof floorEventRows>>[number];
type IssueRow = NonNullable<Awaited<ReturnType<typeof latestIssueRow>>>;
type AgreementRow = Awaited<ReturnType<typeof agreementRows>>[number];

/** A floor event as the board and the shift sheet show it. */
export function floorEventDto(row: EventRow, time: WeekTime, names: Names): FloorEventDto {
  const { id, activityId, event } = row;
  return { id, activityId, event, minute: minuteOf(time, row.happenedAt), by: nameIn(names, row.authorId) };
}

/** An issue without its copy of the week. */
export function issueDto(row: IssueRow, agreements: readonly AgreementRow[], names: Names): IssueDto {
  const agreement = agreements.find(({ id }) => id === row.agreementId);
  return {
    id: row.id,
    number: row.number,
    revision: row.revision,
    at: row.createdAt.toISOString(),
    by: nameIn(names, row.authorId),
    comment: row.comment,
    agreedBy: agreement ? nameIn(names, agreement.authorId) : null,
  };
}

/** A utilities lead's agreement. */
export function agreementDto(row: AgreementRow, names: Names): AgreementDto {
  const { revision, comment } = row;
  return { revision, at: row.createdAt.toISOString(), by: nameIn(names, row.authorId), comment };
}

function presentAgreement(plan: PlanRow, rows: readonly AgreementRow[], names: Names): AgreementDto | null {
  const row = rows.find(({ revision }) => revision === plan.revision);
  return row ? agreementDto(row, names) : null;
}
