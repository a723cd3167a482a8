import type { LevellingRequest, LevellingRunDto } from '@/contracts/levelling';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { enqueueLevelling, readyToSend } from '../jobs/queue';
import { namesOf } from '../people/people.repo';
import type { PlanRow } from '../plans/plans.repo';
import { dayTime } from '../plans/words';
import { record } from '../record/record';
import { findWeek, planOf } from '../weeks/findWeek';
import { nameIn } from '../weeks/weekDtos';
import { minuteOf, type WeekTime } from '../weeks/weekTime';
import { reapLostRuns } from './reaper';
import { runDto } from './runDto';
import { insertRun, moveRun, openRuns } from './runs.repo';

/** Asks for a levelling of the week's plan from now on; a worker takes it up. One at a time for a plan. */
export async function startLevelling(
  actor: Authorized<'plan.level'>,
  weekStart: string,
  request: LevellingRequest,
): Promise<Result<LevellingRunDto, HttpProblem>> {
  const boss = await readyToSend();
  await reapLostRuns();
  return db.transaction(async (tx) => {
    const week = await findWeek(actor, weekStart, tx);
    if (!week.ok) return week;
    const { time } = week.value;
    const wrong = spanProblem(time, request);
    if (wrong) return fail(wrong);
    const plan = await planOf(tx, week.value, true);
    const refused = await notNow(tx, plan, time, request);
    if (refused) return fail(refused);
    for (const open of await openRuns(tx, plan.plantId, plan.id, ['proposed'])) {
      await moveRun(tx, open.id, ['proposed'], { state: 'discarded' }, now());
    }
    const { planRevision, ...options } = request;
    const owner = { plantId: plan.plantId, planId: plan.id, authorId: actor.personId };
    const state = { state: 'queued', revision: planRevision, options, createdAt: now() } as const;
    const run = await insertRun(tx, { id: newId(), ...owner, ...state });
    await enqueueLevelling(tx, boss, { runId: run.id });
    await notify(tx, plan.plantId, { kind: 'levelling', planId: plan.id, runId: run.id });
    await record(tx, actor, 'levelling.start', run.id, { planId: plan.id, ...request });
    return ok(runDto(run, nameOfActor(actor)));
  });
}

const nameOfActor = ({ personId, name }: Actor): ReadonlyMap<string, string> => new Map([[personId, name]]);

function spanProblem(time: WeekTime, { fromMin, toMin }: LevellingRequest): HttpProblem | null {
  const nowMinute = minuteOf(time, now());
  if (nowMinute >= time.horizonMin) {
    return conflict('WEEK-OVER', 'This week is over: nothing of it can be moved any more.');
  }
  const from = Math.max(nowMinute, fromMin ?? 0);
  const to = Math.min(time.horizonMin, toMin ?? time.horizonMin);
  if (from < to) return null;
  const message = 'No time is left in that span: it must end after it begins, and after now.';
  return badInput('LEVELLING-SPAN', message, 'toMin');
}

async function notNow(
  tx: Db,
  plan: PlanRow,
  time: WeekTime,
  { planRevision }: LevellingRequest,
): Promise<HttpProblem | null> {
  if (plan.revision !== planRevision) {
    const message =
      'The plan has been changed since you looked at it; levelling was not started. Look, then start again.';
    return conflict('PLAN-STALE', message, { planRevision: plan.revision, stale: [] });
  }
  const [open] = await openRuns(tx, plan.plantId, plan.id, ['queued', 'running']);
  if (!open) return null;
  const by = nameIn(await namesOf(tx, [open.authorId]), open.authorId);
  const since = dayTime(open.createdAt, time.timeZone, now());
  const message = `This week is being levelled already, by ${by} since ${since}. Wait for it, or cancel it.`;
  return conflict('LEVELLING-RUNNING', message, { runId: open.id });
}
