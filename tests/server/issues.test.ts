import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { AgreementDto, IssueDto } from '@/contracts/week';
import { db } from '@/db/client';
import { activities, issues, processData, record } from '@/db/schema/index';
import { POST as AGREE } from '@/pages/api/weeks/[week]/agreements';
import { POST as EDIT } from '@/pages/api/weeks/[week]/edits';
import { POST as ISSUE } from '@/pages/api/weeks/[week]/issues';
import { loadWeek } from '@/server/weeks/loadWeek';
import { callApi, outcome } from '../support/api';
import {
  everySession,
  openPlant,
  planContents,
  resetPlan,
  setClock,
  setLimit,
  WEEK,
  type Person,
} from '../support/fixturePlant';

let close: () => Promise<void>;
let sessions: Readonly<Record<Person, string>>;
beforeAll(async () => {
  close = await openPlant();
  sessions = await everySession();
});
afterAll(() => close());
beforeEach(async () => {
  setClock(360);
  await resetPlan();
});

const comment = 'the harvest will not wait';
const call = (route: typeof ISSUE, person: Person, body: unknown, week = WEEK) =>
  callApi(route, { session: sessions[person], params: { week }, body });
const issue = (planRevision = 0) => call(ISSUE, 'kim', { planRevision, comment });
const agree = (planRevision = 0) => call(AGREE, 'uli', { planRevision, comment });
async function moveTo(activityId: string, start: number, revision = 0, unitId = 'R2'): Promise<void> {
  const changes = [{ activityId, revision, placement: { unitId, start } }];
  expect((await call(EDIT, 'kim', { kind: 'move', changes })).status).toBe(200);
}
async function load() {
  const week = await loadWeek({ plantId: 'quay' }, WEEK);
  if (!week.ok) throw new Error(week.error.message);
  return week.value;
}
async function refusedWith(response: Response, code: string): Promise<string> {
  const body = (await response.json()) as { code: string; message: string };
  expect({ status: response.status, code: body.code }).toEqual({ status: 409, code });
  return body.message;
}

describe('putting a plan on the floor', () => {
  it('keeps an immutable copy under the next number', async () => {
    const response = await issue();
    expect(response.status).toBe(201);
    expect(await response.json()).toMatchObject({
      number: 1,
      revision: 0,
      by: 'Kim Example',
      comment,
      agreedBy: null,
    } satisfies Partial<IssueDto>);
    const judged = (await load()).week;
    await moveTo('A107', 640, 0, 'R1');
    const second = (await (await issue(1)).json()) as IssueDto;
    expect(second).toMatchObject({ number: 2, revision: 1 });
    const [first] = await db.select().from(issues).where(eq(issues.number, 1));
    expect(first?.week).toEqual(judged);
    expect((await load()).issue).toEqual(second);
    const recorded = await db.select().from(record).where(eq(record.action, 'plan.issue'));
    expect(recorded.map(({ details }) => details.number)).toEqual([1, 2]);
  });

  it('takes one number each when two ask at once', async () => {
    const answers = await Promise.all([issue(), issue(), issue()]);
    const numbers = await Promise.all(answers.map(async (answer) => ((await answer.json()) as IssueDto).number));
    expect(numbers.sort()).toEqual([1, 2, 3]);
  });

  it('refuses a plan that has changed since it was looked at', async () => {
    await moveTo('A107', 640, 0, 'R1');
    const before = await planContents();
    await refusedWith(await issue(0), 'PLAN-STALE');
    await refusedWith(await agree(0), 'PLAN-STALE');
    expect(await planContents()).toEqual(before);
  });
});

describe('a process limit', () => {
  it('stands, whoever agrees, and is named', async () => {
    await setLimit(1_000);
    await moveTo('A108', 603);
    expect((await agree(1)).status).toBe(201);
    const before = await planContents();
    const message = await refusedWith(await issue(1), 'OVER-PROCESS-LIMIT');
    expect(message).toContain('2 vents at once, Mon 10:08 to Mon 10:13');
    expect(message).toContain('Nobody can agree to a process limit');
    expect(await planContents()).toEqual(before);
  });

  it('covers process data that is not released, or was withdrawn', async () => {
    await db.update(activities).set({ processDataId: 'unreleased' }).where(eq(activities.id, 'A108'));
    const message = await refusedWith(await issue(), 'OVER-PROCESS-LIMIT');
    expect(message).toContain('Process data not released: A108');
    await db.update(activities).set({ processDataId: 'released' }).where(eq(activities.id, 'A108'));
    const withdrawn = (withdrawnAt: Date | null) =>
      db.update(processData).set({ withdrawnAt }).where(eq(processData.id, 'released'));
    await withdrawn(new Date('2026-11-29T12:00:00Z'));
    await refusedWith(await issue(), 'OVER-PROCESS-LIMIT');
    await db.update(activities).set({ fixing: 'done' }).where(eq(activities.planId, 'quay-plan'));
    expect((await issue()).status).toBe(201);
    await withdrawn(null);
  });
});

describe('steam over the limit', () => {
  beforeEach(() => setLimit(1_800));

  it('needs a utilities lead’s agreement to this revision', async () => {
    const message = await refusedWith(await issue(), 'NEEDS-AGREEMENT');
    expect(message).toContain('Over the steam limit by 200 kg/h, Mon 10:05 to Mon 10:13');
    const agreed = (await (await agree()).json()) as AgreementDto;
    expect(agreed).toMatchObject({ revision: 0, by: 'Uli Example', comment });
    expect((await load()).agreement).toEqual(agreed);
    expect(await (await issue()).json()).toMatchObject({ number: 1, agreedBy: 'Uli Example' });
    expect((await load()).issue?.agreedBy).toBe('Uli Example');
  });

  it('loses the agreement with the next change of the plan', async () => {
    await agree();
    await moveTo('A109', 1_400, 0, 'R1');
    expect((await load()).agreement).toBeNull();
    await refusedWith(await issue(1), 'NEEDS-AGREEMENT');
  });

  it('loses the agreement when the limit is set anew', async () => {
    await agree();
    await setLimit(1_200, 'lower');
    expect((await load()).agreement).toBeNull();
    await refusedWith(await issue(), 'NEEDS-AGREEMENT');
  });

  it('can’t be agreed to where there is none', async () => {
    await setLimit(5_000);
    const before = await planContents();
    await refusedWith(await agree(), 'NOTHING-OVER');
    expect(await planContents()).toEqual(before);
  });
});

const BAD: readonly (readonly [string, unknown, number, string])[] = [
  ['no comment', { planRevision: 0 }, 400, 'INPUT'],
  ['a blank comment', { planRevision: 0, comment: '  ' }, 400, 'INPUT'],
  ['no revision', { comment }, 400, 'INPUT'],
  ['a revision as text', { planRevision: '0', comment }, 400, 'INPUT'],
  ['a revision below 0', { planRevision: -1, comment }, 400, 'INPUT'],
  ['a list', [], 400, 'INPUT'],
];

describe('a bad request changes nothing', () => {
  it.each(BAD)('%s', async (_name, body, status, code) => {
    const before = await planContents();
    expect(await outcome(await call(ISSUE, 'kim', body))).toEqual({ status, code });
    expect(await outcome(await call(AGREE, 'uli', body))).toEqual({ status, code });
    expect(await planContents()).toEqual(before);
  });

  it('wrong week, wrong role, nobody', async () => {
    await setLimit(1_800);
    const before = await planContents();
    const body = { planRevision: 0, comment };
    for (const [route, mine] of [
      [ISSUE, 'kim'],
      [AGREE, 'uli'],
    ] as const) {
      expect(await outcome(await call(route, mine, body, '2026-12-01'))).toEqual({ status: 404, code: 'NOT-FOUND' });
      expect(await outcome(await call(route, mine, body, '30.11.'))).toEqual({ status: 400, code: 'INPUT-WEEK' });
      const other = mine === 'kim' ? 'uli' : 'kim';
      expect(await outcome(await call(route, other, body))).toEqual({ status: 403, code: 'ROLE' });
      expect(await outcome(await call(route, 'sam', body))).toEqual({ status: 403, code: 'ROLE' });
      expect((await callApi(route, { params: { week: WEEK }, body })).status).toBe(401);
    }
    expect(await planContents()).toEqual(before);
  });

  it('by another plant’s planner concerns that plant’s own week, never this one', async () => {
    const before = await planContents();
    expect(await outcome(await call(ISSUE, 'hal', { planRevision: 7, comment }))).toEqual({
      status: 409,
      code: 'PLAN-STALE',
    });
    const { plans, ...rest } = await planContents();
    expect({ ...rest, plans: plans.filter(({ plantId }) => plantId === 'quay') }).toEqual(before);
  });
});
