import type { WeekDto } from '@/contracts/week';
import { ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import { now } from '../clock';
import type { HttpProblem } from '../http/problem';
import { agreementInForce } from '../issues/agreementInForce';
import { agreementById } from '../issues/issues.repo';
import { reapLostRuns } from '../levelling/reaper';
import { runDto } from '../levelling/runDto';
import { namesOf } from '../people/people.repo';
import { floorEventRows, latestIssueRow, liveRunRow, type ActivityRow } from '../plans/plans.repo';
import { spreadsOf } from '../spread/spread.repo';
import { findWeek, planOf, type FoundWeek } from './findWeek';
import { familyRows } from './plantParts.repo';
import { agreementDto, floorEventDto, issueDto, nameIn } from './weekDtos';
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
  await reapLostRuns();
  const read = (tx: Db): Promise<WeekDto> => readWeek(tx, found.value);
  return ok(await db.transaction(read, { isolationLevel: 'repeatable read', accessMode: 'read only' }));
}

async function readWeek(tx: Db, found: FoundWeek): Promise<WeekDto> {
  const { plant, time } = found;
  const plan = await planOf(tx, found);
  const { week, rows, shifts } = await weekOfPlan(tx, found, plan);
  const events = await floorEventRows(tx, plan);
  const issue = await latestIssueRow(tx, plan);
  const issuedUnder = await agreementById(tx, plan, issue?.agreementId ?? null);
  const agreement = await agreementInForce(tx, plan, time);
  const run = await liveRunRow(tx, plan);
  const authors = [...events, issue, issuedUnder, agreement, run].flatMap((row) => row?.authorId ?? []);
  const names = await namesOf(tx, [...authors, ...rows.flatMap((row) => row.movedBy ?? [])]);
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
    issue: issue && issueDto(issue, issuedUnder, names),
    agreement: agreement && agreementDto(agreement, names),
    levelling: run && runDto(run, names),
    families: await familyRows(tx, plant.id),
    startSpreads: await spreadsOf(tx, plant.id),
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
