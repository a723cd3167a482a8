import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { EditRequest, EditResponse, StaleResponse } from '@/contracts/week';
import { db } from '@/db/client';
import { activities, edits, record } from '@/db/schema/index';
import { POST } from '@/pages/api/weeks/[week]/edits';
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

const post = (person: Person, body: unknown, week = WEEK) =>
  callApi(POST, { session: sessions[person], params: { week }, body });
async function save(person: Person, body: EditRequest): Promise<EditResponse> {
  const response = await post(person, body);
  expect(response.status).toBe(200);
  return (await response.json()) as EditResponse;
}
const to = (unitId: string, start: number) => ({ unitId, start });
const move = (activityId: string, start: number, revision = 0, unitId = 'R1'): EditRequest => {
  return { kind: 'move', changes: [{ activityId, revision, placement: to(unitId, start) }] };
};
async function load() {
  const week = await loadWeek({ plantId: 'quay' }, WEEK);
  if (!week.ok) throw new Error(week.error.message);
  return week.value;
}

describe('saving an edit', () => {
  it('moves, counts the activity’s and the plan’s revision, and says who moved it', async () => {
    const saved = await save('kim', move('A107', 640));
    expect(saved.planRevision).toBe(1);
    expect(saved.activities).toEqual([
      expect.objectContaining({
        id: 'A107',
        placement: to('R1', 640),
        fixing: 'free',
        revision: 1,
        movedBy: 'Kim Example',
      }),
    ]);
    const dto = await load();
    expect(dto.planRevision).toBe(1);
    expect(activityIn(dto, 'A107')).toMatchObject({ placement: to('R1', 640), revision: 1 });
    expect(activityIn(dto, 'A108').revision).toBe(0);
    expect(dto.moved).toEqual({
      A107: { by: 'Kim Example', at: expect.stringContaining('2026-11-30T05:00') as string },
    });
  });

  it('keeps what was before and after under the plan’s revision, and the record of who did it', async () => {
    await save('kim', {
      kind: 'slip',
      changes: [
        { activityId: 'A107', revision: 0, placement: to('R1', 615) },
        { activityId: 'A109', revision: 0, placement: { ...to('R1', 1_335), cleanAfterMin: 30 }, fixing: 'fixed' },
      ],
    });
    expect(await db.select().from(edits)).toEqual([
      expect.objectContaining({
        planId: 'quay-plan',
        revision: 1,
        kind: 'slip',
        authorId: 'kim',
        changes: [
          {
            activityId: 'A107',
            revision: 0,
            before: { placement: to('R1', 600), fixing: 'free' },
            after: { placement: to('R1', 615), fixing: 'free' },
          },
          {
            activityId: 'A109',
            revision: 0,
            before: { placement: to('R1', 1_320), fixing: 'free' },
            after: { placement: { ...to('R1', 1_335), cleanAfterMin: 30 }, fixing: 'fixed' },
          },
        ],
      }),
    ]);
    expect(await db.select().from(record)).toEqual([
      expect.objectContaining({ authorId: 'kim', action: 'plan.slip', subject: 'quay-plan', plantId: 'quay' }),
    ]);
  });

  it('places, takes off, and keeps a fixing that the edit does not name', async () => {
    await save('kim', { kind: 'place', changes: [{ activityId: 'A110', revision: 0, placement: to('R2', 900) }] });
    await save('kim', {
      kind: 'fix',
      changes: [{ activityId: 'A110', revision: 1, placement: to('R2', 900), fixing: 'fixed' }],
    });
    const taken = await save('kim', {
      kind: 'takeOff',
      changes: [{ activityId: 'A110', revision: 2, placement: null }],
    });
    expect(taken.activities[0]).toMatchObject({ placement: null, fixing: 'fixed', revision: 3 });
  });

  it('stores a unit that is not eligible: the board shows the breach', async () => {
    await save('kim', move('A107', 600, 0, 'K2'));
    expect(activityIn(await load(), 'A107').placement).toEqual(to('K2', 600));
  });

  it('makes no revision where nothing changes', async () => {
    const saved = await save('kim', move('A107', 600));
    expect(saved).toMatchObject({ planRevision: 0, activities: [{ id: 'A107', revision: 0 }] });
    expect(await db.select().from(edits)).toEqual([]);
  });
});

describe('two planners at once', () => {
  it('lets one win, tells the other, and loses nothing', async () => {
    const rounds = 8;
    for (let round = 0; round < rounds; round++) {
      const answers = await Promise.all([
        post('kim', move('A107', 600 + 10 * (round + 1), round)),
        post('ola', move('A107', 605 + 10 * (round + 1), round)),
      ]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    }
    const written = await db.select().from(edits).orderBy(edits.revision);
    expect(written.map(({ revision }) => revision)).toEqual(Array.from({ length: rounds }, (_, i) => i + 1));
    for (const [i, edit] of written.entries()) {
      const before = written[i - 1]?.changes[0]?.after;
      if (before) expect(edit.changes[0]?.before).toEqual(before);
    }
    expect(activityIn(await load(), 'A107').placement).toEqual(written.at(-1)?.changes[0]?.after.placement);
  });

  it('saves both where they move different activities', async () => {
    const answers = await Promise.all([post('kim', move('A107', 620)), post('ola', move('A108', 720, 0, 'R2'))]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    expect((await load()).planRevision).toBe(2);
  });

  it('never waits for itself, in whatever order activities are named', async () => {
    const ids = ['A107', 'A108', 'A109', 'K7'];
    const all = (order: readonly string[], start: number): EditRequest => {
      const changes = order.map((activityId) => ({ activityId, revision: 0, placement: to('R1', start) }));
      return { kind: 'move', changes };
    };
    const answers = await Promise.all(
      Array.from({ length: 8 }, (_, i) => post(i % 2 ? 'kim' : 'ola', all(i % 2 ? ids : [...ids].reverse(), 800 + i))),
    );
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(7);
  });
});

describe('an edit of what another has changed', () => {
  it('is refused whole, with the current values, who and when', async () => {
    await save('kim', move('A107', 640));
    const before = await planContents();
    const response = await post('ola', {
      kind: 'slip',
      changes: [...move('A107', 700).changes, ...move('A108', 800, 0, 'R2').changes],
    });
    expect(response.status).toBe(409);
    const stale = (await response.json()) as StaleResponse;
    expect(stale).toMatchObject({
      code: 'PLAN-STALE',
      planRevision: 1,
      message: 'Retort load A107 was moved by Kim Example at Mon 06:00; nothing was saved.',
    });
    expect(stale.stale).toEqual([
      expect.objectContaining({ id: 'A107', placement: to('R1', 640), revision: 1, movedBy: 'Kim Example' }),
    ]);
    expect(await planContents()).toEqual(before);
  });

  it('is not undone over: the refusal names who moved it', async () => {
    await save('kim', move('A107', 640));
    setClock(400);
    await save('ola', move('A107', 660, 1));
    const response = await post('kim', { kind: 'undo', changes: move('A107', 600, 1).changes });
    expect(response.status).toBe(409);
    const { message } = (await response.json()) as StaleResponse;
    expect(message).toBe('Retort load A107 was moved by Ola Example at Mon 06:40; nothing was undone.');
    expect(activityIn(await load(), 'A107').placement).toEqual(to('R1', 660));
  });

  it('undoes and redoes where nobody was in between', async () => {
    await save('kim', move('A107', 640));
    await save('kim', { kind: 'undo', changes: move('A107', 600, 1).changes });
    await save('kim', { kind: 'redo', changes: move('A107', 640, 2).changes });
    expect(activityIn(await load(), 'A107')).toMatchObject({ placement: to('R1', 640), revision: 3 });
  });

  it('never moves what the floor has started or done', async () => {
    for (const fixing of ['started', 'done'] as const) {
      await db.update(activities).set({ fixing }).where(eq(activities.id, 'A107'));
      const before = await planContents();
      const response = await post('kim', move('A107', 640));
      expect(await outcome(response)).toEqual({ status: 409, code: 'ON-FLOOR' });
      expect(await planContents()).toEqual(before);
    }
  });
});

const change = { activityId: 'A107', revision: 0, placement: to('R1', 640) };
const BAD: readonly (readonly [string, unknown, number, string])[] = [
  ['nothing', undefined, 415, 'INPUT-TYPE'],
  ['no changes', { kind: 'move', changes: [] }, 400, 'INPUT'],
  ['a kind that only levelling has', { kind: 'level', changes: [change] }, 400, 'INPUT'],
  ['no kind', { changes: [change] }, 400, 'INPUT'],
  [
    'a start that is no whole minute',
    { kind: 'move', changes: [{ ...change, placement: to('R1', 1.5) }] },
    400,
    'INPUT',
  ],
  ['a start before the week', { kind: 'move', changes: [{ ...change, placement: to('R1', -5) }] }, 400, 'INPUT'],
  [
    'a start after the week',
    { kind: 'move', changes: [{ ...change, placement: to('R1', 10_080) }] },
    400,
    'EDIT-START',
  ],
  ['a revision as text', { kind: 'move', changes: [{ ...change, revision: '0' }] }, 400, 'INPUT'],
  ['the floor’s fixing', { kind: 'fix', changes: [{ ...change, fixing: 'done' }] }, 400, 'INPUT'],
  ['one activity twice', { kind: 'move', changes: [change, change] }, 400, 'EDIT-TWICE'],
  ['an unknown activity', { kind: 'move', changes: [change, { ...change, activityId: 'nope' }] }, 404, 'NOT-FOUND'],
  ['an unknown unit', { kind: 'move', changes: [{ ...change, placement: to('R9', 640) }] }, 404, 'NOT-FOUND'],
  ['another plant’s unit', { kind: 'move', changes: [{ ...change, placement: to('hill-R1', 640) }] }, 404, 'NOT-FOUND'],
];

describe('a bad edit changes nothing', () => {
  it.each(BAD)('%s', async (_name, body, status, code) => {
    const before = await planContents();
    const response = await callApi(POST, {
      method: 'POST',
      session: sessions.kim,
      params: { week: WEEK },
      ...(body === undefined ? {} : { body }),
    });
    expect(await outcome(response)).toEqual({ status, code });
    expect(await planContents()).toEqual(before);
  });

  it('by another plant’s planner, of another week, or by another role', async () => {
    const before = await planContents();
    const body = move('A107', 640);
    expect(await outcome(await post('hal', body))).toEqual({ status: 404, code: 'NOT-FOUND' });
    expect(await outcome(await post('kim', body, '2026-12-01'))).toEqual({ status: 404, code: 'NOT-FOUND' });
    expect(await outcome(await post('kim', body, 'x'))).toEqual({ status: 400, code: 'INPUT-WEEK' });
    for (const person of ['uli', 'sam'] as const) {
      const refused = await post(person, body);
      expect(refused.status).toBe(403);
      expect(await refused.json()).toMatchObject({
        code: 'ROLE',
        message: expect.stringContaining('planner') as string,
      });
    }
    expect((await callApi(POST, { params: { week: WEEK }, body })).status).toBe(401);
    const after = await planContents();
    expect({ ...after, plans: after.plans.filter(({ plantId }) => plantId === 'quay') }).toEqual(before);
  });
});
