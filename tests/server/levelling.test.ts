import { eq, sql } from 'drizzle-orm';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import type { LevellingRunDto } from '@/contracts/levelling';
import type { EditResponse, StaleResponse } from '@/contracts/week';
import type { LevellingResult } from '@/core/levelling/levelWeek';
import type { LevellingProposal } from '@/core/levelling/proposal';
import { evaluateWeek } from '@/core/pipeline';
import { db } from '@/db/client';
import { activities, edits, levellingRuns, record } from '@/db/schema/index';
import { POST as ACCEPT } from '@/pages/api/levelling/[run]/accept';
import { POST as CANCEL } from '@/pages/api/levelling/[run]/cancel';
import { POST as DISCARD } from '@/pages/api/levelling/[run]/discard';
import { GET as READ } from '@/pages/api/levelling/[run]/index';
import { POST as EDIT } from '@/pages/api/weeks/[week]/edits';
import { POST as START } from '@/pages/api/weeks/[week]/levelling';
import { closeQueue, openQueue } from '@/server/jobs/queue';
import { reapLostRuns } from '@/server/levelling/reaper';
import { workOnRun, type StartThread } from '@/server/levelling/runner';
import { loadWeek } from '@/server/weeks/loadWeek';
import { callApi, outcome } from '../support/api';
import {
  activityIn,
  everySession,
  openPlant,
  planContents,
  resetPlan,
  setClock,
  WEEK,
  type Person,
} from '../support/fixturePlant';
import { startSourceThread as startThread } from '../support/sourceThread';
import { startWorker, type WorkerProcess } from '../support/levellingWorker';

let close: () => Promise<void>;
let worker: WorkerProcess | undefined;
let sessions: Readonly<Record<Person, string>>;
beforeAll(async () => {
  close = await openPlant();
  sessions = await everySession();
});
afterAll(async () => {
  await closeQueue();
  await close();
});
beforeEach(async () => {
  setClock(360);
  await resetPlan();
  // Two loads that vent together, over the steam limit and over the vent group.
  await db
    .update(activities)
    .set({ startAt: new Date('2026-11-30T09:02:00Z') })
    .where(eq(activities.id, 'A108'));
});
afterEach(async () => {
  await worker?.kill();
  worker = undefined;
});

const quick = { planRevision: 0, seconds: 1 };

const start = (body: unknown = quick, person: Person = 'kim', week = WEEK) =>
  callApi(START, { session: sessions[person], params: { week }, body });
async function started(body: unknown = quick): Promise<LevellingRunDto> {
  const response = await start(body);
  expect(response.status).toBe(202);
  return (await response.json()) as LevellingRunDto;
}
const on = (route: typeof READ, run: string, person: Person = 'kim', body?: unknown) => {
  const method = route === READ ? 'GET' : 'POST';
  return callApi(route, {
    method,
    session: sessions[person],
    params: { run },
    ...(body === undefined ? {} : { body }),
  });
};
async function read(run: string): Promise<LevellingRunDto> {
  const response = await on(READ, run);
  expect(response.status).toBe(200);
  return (await response.json()) as LevellingRunDto;
}
async function until(run: string, wanted: (dto: LevellingRunDto) => boolean): Promise<LevellingRunDto> {
  for (;;) {
    const dto = await read(run);
    if (wanted(dto)) return dto;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}
const ended = (dto: LevellingRunDto) => dto.state !== 'queued' && dto.state !== 'running';
async function proposed(): Promise<LevellingRunDto & { proposal: LevellingProposal }> {
  const { id } = await started();
  await workOnRun(id, { startThread });
  const run = await read(id);
  expect(run).toMatchObject({ state: 'proposed', failure: null });
  return run as LevellingRunDto & { proposal: LevellingProposal };
}
async function load() {
  const week = await loadWeek({ plantId: 'quay' }, WEEK);
  if (!week.ok) throw new Error(week.error.message);
  return week.value;
}
const hard = (week: Awaited<ReturnType<typeof load>>['week']) =>
  evaluateWeek(week).breaches.filter((breach) => breach.class === 'process' || breach.class === 'steam');

describe('levelling by a worker process', () => {
  it('takes the run from the queue, reports, and brings a proposal that is accepted whole', async () => {
    expect(hard((await load()).week)).not.toEqual([]);
    worker = await startWorker();
    const { id, state } = await started();
    expect(state).toBe('queued');
    const run = await until(id, ended);
    expect(run).toMatchObject({ state: 'proposed', planRevision: 0, by: 'Kim Example', seconds: 1, failure: null });
    expect(run.progress.length).toBeGreaterThan(0);
    expect(run.proposal?.before.overKg).toBeGreaterThan(0);
    expect(run.proposal?.after).toMatchObject({ overKg: 0, processBreaches: 0 });
    expect((await load()).levelling?.id).toBe(id);
    const response = await on(ACCEPT, id, 'kim', { activityIds: 'all' });
    expect(response.status).toBe(200);
    const saved = (await response.json()) as EditResponse;
    expect(saved).toMatchObject({ planRevision: 1 });
    expect(saved.activities.map((a) => a.id).sort()).toEqual(run.proposal?.moves.map((m) => m.activityId).sort());
    const dto = await load();
    expect(hard(dto.week)).toEqual([]);
    expect(dto.levelling).toBeNull();
    expect(await read(id)).toMatchObject({ state: 'accepted' });
    expect(await db.select().from(edits)).toEqual([expect.objectContaining({ kind: 'level', authorId: 'kim' })]);
  });

  it('is stopped when somebody cancels', async () => {
    worker = await startWorker();
    const { id } = await started({ planRevision: 0, seconds: 120 });
    await until(id, (dto) => dto.state === 'running' && dto.progress.length > 0);
    expect((await on(CANCEL, id)).status).toBe(200);
    expect(await until(id, ended)).toMatchObject({ state: 'cancelled', proposal: null });
    expect(activityIn(await load(), 'A108').revision).toBe(0);
  });

  it('goes back to the queue when the worker is told to stop, and another finishes it', async () => {
    worker = await startWorker();
    const { id } = await started({ planRevision: 0, seconds: 3 });
    await until(id, (dto) => dto.state === 'running' && dto.progress.length > 0);
    await worker.stop();
    expect(await read(id)).toMatchObject({ state: 'queued', progress: [] });
    worker = await startWorker();
    expect(await until(id, ended)).toMatchObject({ state: 'proposed' });
  });

  it('fails in clear words when the worker is killed, and the week can be levelled again', async () => {
    worker = await startWorker();
    const { id } = await started({ planRevision: 0, seconds: 120 });
    await until(id, (dto) => dto.state === 'running');
    await worker.kill();
    expect(await reapLostRuns()).toBe(0);
    await db.execute(sql`update levelling_runs set heartbeat_at = now() - interval '19 seconds' where id = ${id}`);
    expect(await read(id)).toMatchObject({ state: 'running' });
    await db.execute(sql`update levelling_runs set heartbeat_at = now() - interval '21 seconds' where id = ${id}`);
    const run = await read(id);
    expect(run).toMatchObject({ state: 'failed', proposal: null });
    expect(run.failure).toContain('has stopped answering; nothing was changed');
    expect((await start()).status).toBe(202);
  });

  it('never lets a worker that was given up for dead write over the verdict', async () => {
    const { id } = await started({ planRevision: 0, seconds: 60 });
    const working = workOnRun(id, { startThread });
    await until(id, (dto) => dto.state === 'running' && dto.progress.length > 0);
    await db.update(levellingRuns).set({ state: 'failed', failure: 'given up' }).where(eq(levellingRuns.id, id));
    await working;
    expect(await read(id)).toMatchObject({ state: 'failed', failure: 'given up', proposal: null });
  });
});

/** A thread that answers with a proposal of the tests' making. */
function answering(change: (honest: LevellingResult) => Partial<LevellingResult>): StartThread {
  return (job) => {
    const honest = startThread(job);
    return { ...honest, result: honest.result.then((result) => ({ ...result, ...change(result) })) };
  };
}

describe('a proposal that does not stand up to the check', () => {
  const figures = { overKg: 12 };
  const clash = { unitId: 'R2', start: 602 };
  it.each<[string, (honest: LevellingResult) => Partial<LevellingResult>, string]>([
    ['other steam', (r) => ({ proposal: { ...r.proposal, after: { ...r.proposal.after, ...figures } } }), 'kg said'],
    [
      'other lateness',
      (r) => ({ proposal: { ...r.proposal, after: { ...r.proposal.after, lateMinutes: 3 } } }),
      'min said',
    ],
    [
      'a process limit newly broken',
      ({ proposal }) => {
        const [move] = proposal.moves;
        const bad = move ? [{ ...move, activityId: 'A109', from: { unitId: 'R1', start: 1_320 }, to: clash }] : [];
        return { proposal: { ...proposal, moves: bad, after: proposal.before } };
      },
      'breaks ventsAtOnce',
    ],
    ['a plan withheld by the solver itself', () => ({ withheld: true }), 'withheld'],
  ])('is put away with a fault logged: %s', async (_name, change, logged) => {
    const fault = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    const { id } = await started();
    await workOnRun(id, { startThread: answering(change) });
    const said = fault.mock.calls.flat().join(' ');
    fault.mockRestore();
    expect(said).toContain('put away');
    expect(said).toContain(logged);
    const run = await read(id);
    expect(run).toMatchObject({ state: 'failed', proposal: null });
    expect(run.failure).toContain('nothing was changed');
    expect((await load()).planRevision).toBe(0);
  });
});

describe('asking for a levelling', () => {
  it('is one at a time for a plan, however many ask at once', async () => {
    const answers = await Promise.all([start(), start(quick, 'ola'), start()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([202, 409, 409]);
    const refused = answers.find(({ status }) => status === 409);
    expect(await refused?.json()).toMatchObject({
      code: 'LEVELLING-RUNNING',
      message: expect.stringMatching(
        /^This week is being levelled already, by (Kim|Ola) Example since Mon 06:00\./,
      ) as string,
    });
    expect(await db.select().from(levellingRuns)).toHaveLength(1);
  });

  it('puts the job and its row down together', async () => {
    const { id } = await started();
    const jobs = await db.execute(sql`select state, retry_limit from pgboss.job where data->>'runId' = ${id}`);
    expect(jobs.rows).toEqual([{ state: 'created', retry_limit: 0 }]);
    const boss = await openQueue(false);
    expect(await boss.getQueue('levelling')).toMatchObject({ name: 'levelling' });
    await boss.stop({ graceful: false });
  });

  it('puts away a proposal that nobody took', async () => {
    const run = await proposed();
    const { id } = await started();
    expect(await read(run.id)).toMatchObject({ state: 'discarded' });
    expect((await load()).levelling?.id).toBe(id);
  });

  it('cancels at once what still waits, and no worker takes it', async () => {
    const { id } = await started();
    expect(await (await on(CANCEL, id)).json()).toMatchObject({ state: 'cancelled' });
    await workOnRun(id, { startThread });
    expect(await read(id)).toMatchObject({ state: 'cancelled', proposal: null });
  });

  it('fails what no worker ever takes', async () => {
    const { id } = await started();
    await db.execute(sql`update levelling_runs set heartbeat_at = now() - interval '11 minutes' where id = ${id}`);
    expect(await read(id)).toMatchObject({
      state: 'failed',
      failure: expect.stringContaining('ten minutes') as string,
    });
  });

  it('moves nothing that starts before now, whatever the solver would like', async () => {
    setClock(605);
    const run = await proposed();
    expect(run.proposal.moves.every(({ from, to }) => from.start > 605 && to.start > 605)).toBe(true);
    setClock(360);
    const early = await proposed();
    expect(early.proposal.moves.length).toBeGreaterThan(0);
  });

  it('refuses a week that is over, a span that is, and a plan that has changed', async () => {
    expect(await outcome(await start({ ...quick, fromMin: 500, toMin: 400 }))).toEqual({
      status: 400,
      code: 'LEVELLING-SPAN',
    });
    expect(await outcome(await start({ ...quick, toMin: 300 }))).toEqual({ status: 400, code: 'LEVELLING-SPAN' });
    expect(await outcome(await start({ ...quick, planRevision: 3 }))).toEqual({ status: 409, code: 'PLAN-STALE' });
    setClock(10_080);
    expect(await outcome(await start())).toEqual({ status: 409, code: 'WEEK-OVER' });
    expect(await db.select().from(levellingRuns)).toEqual([]);
  });
});

describe('a proposal and the plan as it is by then', () => {
  it('is refused where an activity has moved since, with the current values', async () => {
    const run = await proposed();
    const moved = run.proposal.moves[0]?.activityId ?? '';
    const body = {
      kind: 'move',
      changes: [{ activityId: moved, revision: 0, placement: { unitId: 'R2', start: 900 } }],
    };
    expect((await callApi(EDIT, { session: sessions.ola, params: { week: WEEK }, body })).status).toBe(200);
    const before = await planContents();
    const response = await on(ACCEPT, run.id, 'kim', { activityIds: 'all' });
    expect(response.status).toBe(409);
    const stale = (await response.json()) as StaleResponse;
    expect(stale).toMatchObject({
      code: 'PLAN-STALE',
      message: expect.stringMatching(/was moved by Ola Example at Mon 06:00; nothing was saved\.$/) as string,
      stale: [{ id: moved, placement: { unitId: 'R2', start: 900 }, revision: 1 }],
    });
    expect(await planContents()).toEqual(before);
  });

  it('is refused where taking it, or a part of it, would break a process limit by now', async () => {
    const run = await proposed();
    // As if the solver had moved the next load out of the way too: taking one without the other brings them together.
    const move = run.proposal.moves[0];
    if (!move) throw new Error('nothing proposed');
    const part = {
      ...move,
      activityId: 'A109',
      from: { unitId: 'R1', start: 1_320 },
      to: { unitId: 'R1', start: 598 },
    };
    const clash = { ...part, to: { unitId: 'R2', start: 602 } };
    await db
      .update(levellingRuns)
      .set({ proposal: { ...run.proposal, moves: [...run.proposal.moves, clash] } })
      .where(eq(levellingRuns.id, run.id));
    const before = await planContents();
    const response = await on(ACCEPT, run.id, 'kim', { activityIds: ['A109'] });
    expect(response.status).toBe(409);
    expect(await response.json()).toMatchObject({
      code: 'OVER-PROCESS-LIMIT',
      message: expect.stringContaining('3 vents at once') as string,
    });
    expect(await planContents()).toEqual(before);
    const rest = run.proposal.moves.map(({ activityId }) => activityId);
    expect((await on(ACCEPT, run.id, 'kim', { activityIds: rest })).status).toBe(200);
  });

  it('is refused once the time for a move has passed', async () => {
    const run = await proposed();
    setClock(700);
    const response = await on(ACCEPT, run.id, 'kim', { activityIds: 'all' });
    expect(await outcome(response)).toEqual({ status: 409, code: 'LEVELLING-PAST' });
  });

  it('is taken once, by one of two', async () => {
    const run = await proposed();
    const answers = await Promise.all(
      (['kim', 'ola'] as const).map((person) => on(ACCEPT, run.id, person, { activityIds: 'all' })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await db.select().from(edits)).toHaveLength(1);
  });

  it('can be discarded, and then not taken', async () => {
    const run = await proposed();
    expect(await (await on(DISCARD, run.id)).json()).toMatchObject({ state: 'discarded' });
    expect(await outcome(await on(ACCEPT, run.id, 'kim', { activityIds: 'all' }))).toEqual({
      status: 409,
      code: 'LEVELLING-STATE',
    });
    expect(await outcome(await on(CANCEL, run.id))).toEqual({ status: 409, code: 'LEVELLING-STATE' });
    expect(await outcome(await on(DISCARD, run.id))).toEqual({ status: 409, code: 'LEVELLING-STATE' });
  });
});

describe('a bad request changes nothing', () => {
  it.each<[string, unknown]>([
    ['no revision', { seconds: 1 }],
    ['a search of no time', { ...quick, seconds: 0 }],
    ['a search without end', { ...quick, seconds: 1e9 }],
    ['a shift of half a minute', { ...quick, greatestShiftMin: 0.5 }],
    ['a word for yes', { ...quick, mayChangeUnit: 'yes' }],
    ['a list', []],
  ])('starting with %s', async (_name, body) => {
    expect(await outcome(await start(body))).toEqual({ status: 400, code: 'INPUT' });
    expect(await db.select().from(levellingRuns)).toEqual([]);
    expect(await db.select().from(record)).toEqual([]);
  });

  it('starting in another week, role or plant', async () => {
    expect(await outcome(await start(quick, 'kim', '2026-12-01'))).toEqual({ status: 404, code: 'NOT-FOUND' });
    expect(await outcome(await start(quick, 'kim', 'week'))).toEqual({ status: 400, code: 'INPUT-WEEK' });
    for (const person of ['uli', 'sam'] as const) {
      expect(await outcome(await start(quick, person))).toEqual({ status: 403, code: 'ROLE' });
    }
    // The other plant has a week of its own on that day; this one's revision is not its.
    expect(await outcome(await start({ ...quick, planRevision: 7 }, 'hal'))).toEqual({
      status: 409,
      code: 'PLAN-STALE',
    });
    expect((await callApi(START, { params: { week: WEEK }, body: quick })).status).toBe(401);
    expect(await db.select().from(levellingRuns)).toEqual([]);
  });

  it('taking, stopping or reading what is another’s, unknown or not allowed', async () => {
    const run = await proposed();
    const before = await planContents();
    const all = { activityIds: 'all' };
    for (const [route, body] of [
      [READ, undefined],
      [CANCEL, undefined],
      [DISCARD, undefined],
      [ACCEPT, all],
    ] as const) {
      expect(await outcome(await on(route, run.id, 'hal', body))).toEqual({ status: 404, code: 'NOT-FOUND' });
      expect(await outcome(await on(route, 'nope', 'kim', body))).toEqual({ status: 404, code: 'NOT-FOUND' });
      if (route === READ) continue;
      expect(await outcome(await on(route, run.id, 'uli', body))).toEqual({ status: 403, code: 'ROLE' });
      expect(await outcome(await on(route, run.id, 'sam', body))).toEqual({ status: 403, code: 'ROLE' });
    }
    for (const [body, code] of [
      [{}, 'INPUT'],
      [{ activityIds: [] }, 'INPUT'],
      [{ activityIds: 'some' }, 'INPUT'],
      [{ activityIds: ['A107', 'nope'] }, 'ACCEPT-UNKNOWN'],
    ] as const) {
      expect(await outcome(await on(ACCEPT, run.id, 'kim', body))).toEqual({ status: 400, code });
    }
    expect(await planContents()).toEqual(before);
  });
});
