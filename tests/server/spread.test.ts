import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { SpreadListDto, SpreadStaleResponse, UnitSpreadDto } from '@/contracts/spread';
import { db } from '@/db/client';
import * as t from '@/db/schema/index';
import { POST } from '@/pages/api/units/[unit]/spread';
import { GET } from '@/pages/api/units/spread';
import { loadWeek } from '@/server/weeks/loadWeek';
import { instantOf } from '@/server/weeks/weekTime';
import { callApi, outcome } from '../support/api';
import { everySession, openPlant, PLAN, resetPlan, setClock, time, WEEK, type Person } from '../support/fixturePlant';

let close: () => Promise<void>;
let sessions: Readonly<Record<Person, string>>;
beforeAll(async () => {
  close = await openPlant();
  sessions = await everySession();
});
afterAll(() => close());
beforeEach(async () => {
  setClock(1_500);
  await resetPlan();
  await db.update(t.units).set({ startSpread: null, startSpreadSource: null, retiredAt: null });
});

async function list(person: Person = 'sam'): Promise<SpreadListDto> {
  const response = await callApi(GET, { session: sessions[person] });
  expect(response.status).toBe(200);
  return (await response.json()) as SpreadListDto;
}
async function unitOf(unitId: string, person: Person = 'uli'): Promise<UnitSpreadDto> {
  const found = (await list(person)).units.find((unit) => unit.unitId === unitId);
  if (!found) throw new Error(`no unit ${unitId}`);
  return found;
}
const put = (unitId: string, body: unknown, person: Person = 'uli') =>
  callApi(POST, { session: sessions[person], params: { unit: unitId }, body });
async function set(unitId: string, request: Record<string, unknown>, person: Person = 'uli'): Promise<Response> {
  const { seen } = await unitOf(unitId, person);
  return put(unitId, { ...request, seen }, person);
}
async function week() {
  const loaded = await loadWeek({ plantId: 'quay' }, WEEK);
  if (!loaded.ok) throw new Error(loaded.error.message);
  return loaded.value;
}

/** Puts the week on the floor once for each deviation and records what a run's start was against it. */
async function recordStarts(activityId: string, event: 'steamOn' | 'cratesIn', plannedMin: number, late: number[]) {
  const { week: issued } = await week();
  const row = { plantId: 'quay', planId: PLAN, authorId: 'sam', createdAt: instantOf(time, 0) };
  const base = await db.$count(t.issues);
  const keys = late.map((_, i) => `${activityId}-${event}-${i}`);
  const issue = (id: string, i: number) => ({ ...row, id, number: base + i, revision: 0, week: issued, comment: '' });
  await db.insert(t.issues).values(keys.map(issue));
  await db.insert(t.floorEvents).values(
    keys.map((id, i) => ({
      ...row,
      id,
      issueId: id,
      activityId,
      event,
      happenedAt: instantOf(time, plannedMin + (late[i] as number)),
    })),
  );
}

// The fixture's A107 is planned on R1 at minute 600 and draws first at minute 605; K7 on K1 at 480.
const STARTS = [0, 0, 0, 2, 2, 2, 2, -3, -3, 9];

describe('recorded starts', () => {
  it('are counted against the issue: a retort by steam on, another unit by crates in', async () => {
    await recordStarts('A107', 'steamOn', 605, STARTS);
    await recordStarts('K7', 'cratesIn', 480, [4, 4]);
    await recordStarts('A108', 'cratesIn', 700, [4, 4]);
    const { recorded } = await unitOf('R1');
    expect(recorded).toMatchObject({ count: 10, leftOut: 0 });
    expect(recorded.outcomes.map(({ deviationMin }) => deviationMin)).toEqual([-3, 0, 2, 9]);
    [0.2, 0.3, 0.4, 0.1].forEach((chance, i) => expect(recorded.outcomes[i]?.chance).toBeCloseTo(chance, 12));
    expect((await unitOf('K1')).recorded).toEqual({ count: 2, leftOut: 0, outcomes: [{ deviationMin: 4, chance: 1 }] });
    expect((await unitOf('R2')).recorded.count).toBe(0);
  });

  it('of long ago, taken back, or more than a day out do not count', async () => {
    await recordStarts('A107', 'steamOn', 605, [1, 2, 3, 1_500]);
    await db.update(t.floorEvents).set({ takenBackById: 'x' }).where(eq(t.floorEvents.id, 'A107-steamOn-0'));
    const longAgo = { happenedAt: new Date('2026-09-01T08:00:00Z') };
    await db.update(t.floorEvents).set(longAgo).where(eq(t.floorEvents.id, 'A107-steamOn-1'));
    expect((await unitOf('R1')).recorded).toEqual({ count: 1, leftOut: 1, outcomes: [{ deviationMin: 3, chance: 1 }] });
  });

  it('become the unit’s spread when there are enough of them', async () => {
    await recordStarts('A107', 'steamOn', 605, STARTS.slice(1));
    const few = await set('R1', { kind: 'recorded' });
    expect(await outcome(few)).toEqual({ status: 400, code: 'INPUT-SPREAD' });
    expect((await unitOf('R1')).spread).toBeNull();
    await recordStarts('A109', 'steamOn', 1_325, [0]);
    const response = await set('R1', { kind: 'recorded' });
    expect(response.status).toBe(200);
    const saved = (await response.json()) as UnitSpreadDto;
    expect(saved.spread).toEqual({ outcomes: saved.recorded.outcomes });
    expect(saved.source).toBe('10 recorded starts of 8 weeks to 2026-12-01');
    expect((await week()).startSpreads).toEqual({ R1: saved.spread });
  });
});

describe('a spread from experience', () => {
  it('is kept, reaches the board, stands in the record, and is taken back again', async () => {
    const response = await set('R2', { kind: 'experience', earlyMin: 1, lateMin: 2 }, 'kim');
    expect(response.status).toBe(200);
    const { startSpreads } = await week();
    expect(startSpreads.R2?.outcomes).toEqual([-1, 0, 1, 2].map((deviationMin) => ({ deviationMin, chance: 0.25 })));
    expect((await unitOf('R2')).source).toBe('experience, 2026-12-01');
    const kept = await db.select().from(t.record);
    expect(kept).toMatchObject([{ action: 'plant.startSpread', subject: 'R2', authorId: 'kim', plantId: 'quay' }]);
    expect((await set('R2', { kind: 'onTime' })).status).toBe(200);
    expect((await week()).startSpreads).toEqual({});
  });

  it.each([
    ['early below 0', { earlyMin: -1, lateMin: 2 }, 'earlyMin'],
    ['half a minute', { earlyMin: 1, lateMin: 2.5 }, 'lateMin'],
    ['more than is a spread', { earlyMin: 1, lateMin: 241 }, 'lateMin'],
    ['nothing', { earlyMin: 1 }, 'lateMin'],
  ])('is refused for %s with a sentence at the field, and nothing is saved', async (_, minutes, path) => {
    const response = await set('R2', { kind: 'experience', ...minutes });
    expect(response.status).toBe(400);
    const body = (await response.json()) as { fields: { path: string; message: string }[] };
    expect(body.fields.map((field) => field.path)).toEqual([path]);
    expect(body.fields[0]?.message).toMatch(/whole minutes from 0 to 240\.$/);
    expect((await unitOf('R2')).spread).toBeNull();
    expect(await db.$count(t.record)).toBe(0);
  });

  it('is refused where somebody else has changed it since, with what there is now', async () => {
    const { seen } = await unitOf('R2');
    expect((await set('R2', { kind: 'experience', earlyMin: 0, lateMin: 9 }, 'kim')).status).toBe(200);
    const response = await put('R2', { kind: 'experience', earlyMin: 5, lateMin: 5, seen });
    expect(response.status).toBe(409);
    const stale = (await response.json()) as SpreadStaleResponse;
    expect(stale.code).toBe('SPREAD-STALE');
    expect(stale.unit.spread?.outcomes).toHaveLength(10);
    expect((await put('R2', { kind: 'experience', earlyMin: 5, lateMin: 5, seen: stale.unit.seen })).status).toBe(200);
  });

  it('is refused for another plant’s unit, one that is retired, and by a supervisor', async () => {
    const body = { kind: 'onTime', seen: 'x' };
    expect(await outcome(await put('hill-R1', body))).toEqual({ status: 404, code: 'NOT-FOUND' });
    await db.update(t.units).set({ retiredAt: new Date() }).where(eq(t.units.id, 'R2'));
    expect(await outcome(await put('R2', body))).toEqual({ status: 404, code: 'NOT-FOUND' });
    expect(await outcome(await put('R1', body, 'sam'))).toEqual({ status: 403, code: 'ROLE' });
    expect((await list()).units.map(({ unitId }) => unitId)).toEqual(['R1', 'K1', 'K2']);
  });
});
