import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { ShiftSheetDto } from '@/contracts/floor';
import type { FloorEventDto, IssueDto } from '@/contracts/week';
import { db } from '@/db/client';
import { activities, edits, floorEvents } from '@/db/schema/index';
import { POST as EDIT } from '@/pages/api/weeks/[week]/edits';
import { POST as EVENT } from '@/pages/api/weeks/[week]/floor-events';
import { POST as ISSUE } from '@/pages/api/weeks/[week]/issues';
import { GET as SHEET } from '@/pages/api/weeks/[week]/shift-sheet';
import { loadWeek } from '@/server/weeks/loadWeek';
import { instantOf } from '@/server/weeks/weekTime';
import { callApi, outcome } from '../support/api';
import {
  activityIn,
  everySession,
  openPlant,
  planContents,
  resetPlan,
  setClock,
  time,
  WEEK,
  type Person,
} from '../support/fixturePlant';

let close: () => Promise<void>;
let issueId: string;
let sessions: Readonly<Record<Person, string>>;
beforeAll(async () => {
  close = await openPlant();
  sessions = await everySession();
});
afterAll(() => close());
beforeEach(async () => {
  setClock(360);
  await resetPlan();
  issueId = (await issue(0)).id;
  setClock(601);
});

async function issue(planRevision: number): Promise<IssueDto> {
  const body = { planRevision, comment: 'this week' };
  const response = await callApi(ISSUE, { session: sessions.kim, params: { week: WEEK }, body });
  expect(response.status).toBe(201);
  return (await response.json()) as IssueDto;
}
const post = (body: unknown, person: Person = 'sam', week = WEEK) =>
  callApi(EVENT, { session: sessions[person], params: { week }, body });
const at = (minute: number): string => instantOf(time, minute).toISOString();
async function happened(event: string, minute?: number, activityId = 'A107'): Promise<FloorEventDto> {
  const response = await post({ activityId, event, issueId, ...(minute === undefined ? {} : { at: at(minute) }) });
  expect(response.status).toBe(201);
  return (await response.json()) as FloorEventDto;
}
async function refused(event: string, minute: number, activityId = 'A107') {
  return outcome(await post({ activityId, event, issueId, at: at(minute) }));
}
async function load() {
  const week = await loadWeek({ plantId: 'quay' }, WEEK);
  if (!week.ok) throw new Error(week.error.message);
  return week.value;
}
async function moveInPlan(placement: { unitId: string; start: number } | null): Promise<void> {
  const body = { kind: 'move', changes: [{ activityId: 'A107', revision: 0, placement }] };
  const response = await callApi(EDIT, { session: sessions.kim, params: { week: WEEK }, body });
  expect(response.status).toBe(200);
}

describe('recording what happens on the floor', () => {
  it('starts the activity with the first event and ends it with “empty”', async () => {
    const event = await happened('steamOn', 600);
    expect(event).toMatchObject({ activityId: 'A107', event: 'steamOn', minute: 600, by: 'Sam Example' });
    let dto = await load();
    expect(dto).toMatchObject({ planRevision: 1, floorEvents: [event], moved: {} });
    expect(activityIn(dto, 'A107')).toMatchObject({ fixing: 'started', revision: 1, placement: { start: 600 } });
    await happened('ventsClosed', 601);
    expect((await load()).planRevision).toBe(1);
    setClock(690);
    await happened('steamOff', 665);
    await happened('empty');
    dto = await load();
    expect(dto.planRevision).toBe(2);
    expect(activityIn(dto, 'A107')).toMatchObject({ fixing: 'done', revision: 2 });
    expect(dto.floorEvents.map(({ event, minute }) => [event, minute])).toEqual([
      ['steamOn', 600],
      ['ventsClosed', 601],
      ['steamOff', 665],
      ['empty', 690],
    ]);
  });

  it('takes a retort’s events in the order of its cycle only', async () => {
    expect(await refused('ventsClosed', 600)).toEqual({ status: 409, code: 'EVENT-ORDER' });
    await happened('cratesIn', 590);
    expect(await refused('empty', 600)).toEqual({ status: 409, code: 'EVENT-ORDER' });
    await happened('steamOn', 595);
    expect(await refused('steamOn', 596)).toEqual({ status: 409, code: 'EVENT-ORDER' });
    await happened('timingStarted', 600);
    const before = await planContents();
    expect(await refused('ventsClosed', 601)).toEqual({ status: 409, code: 'EVENT-ORDER' });
    expect(await planContents()).toEqual(before);
  });

  it('takes times up to a minute ahead, never before the previous event or the week', async () => {
    expect(await refused('steamOn', 603)).toEqual({ status: 400, code: 'EVENT-TIME' });
    expect(await refused('steamOn', -1)).toEqual({ status: 400, code: 'EVENT-TIME' });
    await happened('steamOn', 602);
    expect(await refused('ventsClosed', 600)).toEqual({ status: 400, code: 'EVENT-TIME' });
    await happened('ventsClosed', 602);
  });

  it('knows that a kettle has no vents', async () => {
    expect(await refused('ventsClosed', 600, 'K7')).toEqual({ status: 400, code: 'EVENT-KIND' });
    await happened('cratesIn', 480, 'K7');
    await happened('empty', 545, 'K7');
    expect(activityIn(await load(), 'K7').fixing).toBe('done');
  });

  it('starts it where the issue has it, wherever the plan moved it since', async () => {
    await moveInPlan({ unitId: 'R2', start: 900 });
    await happened('steamOn', 600);
    const dto = await load();
    expect(activityIn(dto, 'A107')).toMatchObject({ fixing: 'started', placement: { unitId: 'R1', start: 600 } });
    expect(dto.moved.A107?.by).toBe('Sam Example');
    const written = await db.select().from(edits).where(eq(edits.authorId, 'sam'));
    expect(written).toEqual([
      expect.objectContaining({
        revision: 2,
        changes: [expect.objectContaining({ before: { placement: { unitId: 'R2', start: 900 }, fixing: 'free' } })],
      }),
    ]);
  });

  it('starts what the plan had taken off the board', async () => {
    await moveInPlan(null);
    await happened('steamOn', 600);
    expect(activityIn(await load(), 'A107').placement).toEqual({ unitId: 'R1', start: 600 });
  });

  it('counts a double tap once', async () => {
    const answers = await Promise.all([1, 2, 3].map(() => post({ activityId: 'A107', event: 'steamOn', issueId })));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    expect(await db.select().from(floorEvents)).toHaveLength(1);
    expect(activityIn(await load(), 'A107').revision).toBe(1);
  });
});

describe('only what is on the floor', () => {
  it('refuses an issue that another has replaced', async () => {
    const second = await issue(0);
    const response = await post({ activityId: 'A107', event: 'steamOn', issueId });
    expect(response.status).toBe(409);
    expect(await response.json()).toMatchObject({ code: 'ISSUE-CHANGED', issueId: second.id, number: 2 });
    expect(await db.select().from(floorEvents)).toEqual([]);
  });

  it.each<[string, Record<string, unknown>, number, string]>([
    ['an activity that the issue has not placed', { activityId: 'A110' }, 404, 'NOT-FOUND'],
    ['an unknown activity', { activityId: 'nope' }, 404, 'NOT-FOUND'],
    ['an unknown issue', { issueId: 'nope' }, 404, 'NOT-FOUND'],
    ['an unknown event', { event: 'doorOpen' }, 400, 'INPUT'],
    ['a time that is none', { at: 'ten to six' }, 400, 'INPUT'],
    ['a time without a zone', { at: '2026-11-30T09:00:00' }, 400, 'INPUT'],
    ['no activity', { activityId: undefined }, 400, 'INPUT'],
  ])('refuses %s', async (_name, more, status, code) => {
    const before = await planContents();
    expect(await outcome(await post({ activityId: 'A107', event: 'steamOn', issueId, ...more }))).toEqual({
      status,
      code,
    });
    expect(await planContents()).toEqual(before);
  });

  it('refuses other roles, another plant, another week, and anybody before an issue', async () => {
    const body = { activityId: 'A107', event: 'steamOn', issueId };
    expect(await outcome(await post(body, 'kim'))).toEqual({ status: 403, code: 'ROLE' });
    expect(await outcome(await post(body, 'uli'))).toEqual({ status: 403, code: 'ROLE' });
    expect(await outcome(await post(body, 'hal'))).toEqual({ status: 404, code: 'NOT-FOUND' });
    expect(await outcome(await post(body, 'sam', '2026-12-07'))).toEqual({ status: 404, code: 'NOT-FOUND' });
    expect((await callApi(EVENT, { params: { week: WEEK }, body })).status).toBe(401);
    expect(await db.select().from(floorEvents)).toEqual([]);
    await resetPlan();
    expect(await outcome(await post(body))).toEqual({ status: 404, code: 'NOT-FOUND' });
  });
});

async function sheet(shift: string, date: string, line = 'l1', person: Person = 'sam', week = WEEK): Promise<Response> {
  const path = `/api/weeks/${week}/shift-sheet?${new URLSearchParams({ line, shift, date }).toString()}`;
  return callApi(SHEET, { session: sessions[person], params: { week }, path });
}
async function read(...args: Parameters<typeof sheet>): Promise<ShiftSheetDto> {
  const response = await sheet(...args);
  expect(response.status).toBe(200);
  return (await response.json()) as ShiftSheetDto;
}
const codes = (dto: ShiftSheetDto) => dto.rows.map(({ activity }) => activity.code);

describe('the shift sheet', () => {
  it('shows the line’s rows by start, with what was recorded', async () => {
    const event = await happened('steamOn', 600);
    const dto = await read('early', '2026-11-30');
    expect(dto).toMatchObject({ plantName: 'quay works', line: { name: 'Line 1' }, issue: { number: 1 } });
    expect(dto.shift).toMatchObject({ name: 'early', from: 360, to: 840 });
    expect(codes(dto)).toEqual(['K7', 'A107', 'A108']);
    expect(dto.rows[1]).toMatchObject({ unitName: 'R1', start: 600, end: 680, events: [event] });
    expect(codes(await read('early', '2026-11-30', 'l2'))).toEqual([]);
  });

  it('runs across midnight: the night shift has what begins before and after', async () => {
    await db
      .update(activities)
      .set({ startAt: instantOf(time, 1_500) })
      .where(eq(activities.id, 'A108'));
    await issue(0);
    const night = await read('night', '2026-11-30');
    expect(night.shift).toMatchObject({ date: '2026-11-30', from: 1_320, to: 1_800 });
    expect(codes(night)).toEqual(['A109', 'A108']);
    expect(codes(await read('early', '2026-12-01'))).toEqual([]);
  });

  it('reads the issue, not the plan', async () => {
    await moveInPlan({ unitId: 'R1', start: 3_000 });
    expect(codes(await read('early', '2026-11-30'))).toContain('A107');
  });

  it('says that nothing is on the floor yet', async () => {
    await resetPlan();
    expect(await read('early', '2026-11-30')).toMatchObject({ issue: null, rows: [] });
  });

  it.each<[string, Parameters<typeof sheet>, number, string]>([
    ['an unknown line', ['early', '2026-11-30', 'nope'], 404, 'NOT-FOUND'],
    ['another plant’s line', ['early', '2026-11-30', 'hill-l1'], 404, 'NOT-FOUND'],
    ['an unknown shift', ['dawn', '2026-11-30'], 404, 'NOT-FOUND'],
    ['another week’s day', ['early', '2026-12-09'], 404, 'NOT-FOUND'],
    ['a day that is none', ['early', '2026-11-31'], 400, 'INPUT'],
    ['no line', ['early', '2026-11-30', ''], 400, 'INPUT'],
    ['a day that begins no week', ['early', '2026-11-30', 'l1', 'sam', '2026-12-02'], 404, 'NOT-FOUND'],
  ])('refuses %s', async (_name, args, status, code) => {
    expect(await outcome(await sheet(...args))).toEqual({ status, code });
  });
});
