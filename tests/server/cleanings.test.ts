import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { CleaningPlanDto } from '@/contracts/cleanings';
import type { ShiftSheetDto } from '@/contracts/floor';
import type { EditRequest, EditResponse, IssueDto } from '@/contracts/week';
import { evaluateWeek } from '@/core/pipeline';
import { db } from '@/db/client';
import { activities, cleaningRules, duties, edits, families, record, units } from '@/db/schema/index';
import { DELETE } from '@/pages/api/weeks/[week]/cleanings/[activity]';
import { POST } from '@/pages/api/weeks/[week]/cleanings/index';
import { POST as EDIT } from '@/pages/api/weeks/[week]/edits';
import { POST as EVENT } from '@/pages/api/weeks/[week]/floor-events';
import { POST as ISSUE } from '@/pages/api/weeks/[week]/issues';
import { GET as SHEET } from '@/pages/api/weeks/[week]/shift-sheet';
import { GET as OUT_OF_DATE, POST as REWORK } from '@/pages/api/weeks/[week]/rework';
import type { Actor } from '@/server/auth/actor';
import { authorize } from '@/server/auth/permissions';
import { loadWeek } from '@/server/weeks/loadWeek';
import { loadWorking } from '@/server/working/loadWorking';
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
import { phase } from '../support/builders';

let sessions: Readonly<Record<Person, string>>;

const READER: Actor = {
  ...{ personId: 'sam', name: 'Sam Example', plantId: 'quay', plantName: 'quay works' },
  ...{ isDemo: false, roles: ['lineSupervisor'] },
};

/** Invented: water for a wash, heated over ten minutes. */
const washWater = { kind: 'wash', waterKg: 600, fromC: 15, toC: 82, minutes: 10 };
const typed = [phase(0, 5, 240, 'rinse')];

beforeAll(async () => {
  const close = await openPlant();
  sessions = await everySession();
  const own = { plantId: 'quay' };
  await db.insert(families).values([
    { ...own, id: 'milk', name: 'Milk' },
    { id: 'hill-f', plantId: 'hill', name: 'Hill' },
  ]);
  await db.insert(duties).values({ ...own, id: 'wash', name: 'Wash water', model: 'waterHeating', inputs: washWater });
  const of = (id: string, from: string, to: string, kind: 'rinse' | 'wash', minutes: number, dutyId: string | null) => {
    const pair = { fromFamilyId: from, toFamilyId: to, unitKind: 'kettle' as const };
    return { ...own, id, ...pair, kind, minutes, dutyId, phases: typed, uses: [] };
  };
  await db
    .insert(cleaningRules)
    .values([
      of('short', 'soups', 'milk', 'wash', 20, null),
      of('long', 'milk', 'soups', 'wash', 35, 'wash'),
      of('rinse', 'soups', 'soups', 'rinse', 8, null),
      { ...of('other', 'hill-f', 'hill-f', 'wash', 90, null), plantId: 'hill' },
    ]);
  await db.insert(units).values({ ...own, id: 'K3', lineId: 'l2', name: 'K3', kind: 'kettle', position: 4 });
  return close;
});
beforeEach(async () => {
  setClock(360);
  await resetPlan();
});

const add = (body: unknown, person: Person = 'kim', week = WEEK) =>
  callApi(POST, { session: sessions[person], params: { week }, body });
const remove = (activity: string, person: Person = 'kim') =>
  callApi(DELETE, { method: 'DELETE', session: sessions[person], params: { week: WEEK, activity } });
async function added(unitId: string, kind: string): Promise<CleaningPlanDto> {
  const response = await add({ unitId, kind });
  expect(response.status).toBe(201);
  return (await response.json()) as CleaningPlanDto;
}
async function edit(kind: EditRequest['kind'], change: EditRequest['changes'][number]): Promise<EditResponse> {
  const body = { kind, changes: [change] };
  const response = await callApi(EDIT, { session: sessions.kim, params: { week: WEEK }, body });
  expect(response.status).toBe(200);
  return (await response.json()) as EditResponse;
}
async function load() {
  const week = await loadWeek({ plantId: 'quay' }, WEEK);
  if (!week.ok) throw new Error(week.error.message);
  return week.value;
}
async function issue(planRevision: number): Promise<IssueDto> {
  const body = { planRevision, comment: 'with a wash' };
  const response = await callApi(ISSUE, { session: sessions.kim, params: { week: WEEK }, body });
  expect(response.status).toBe(201);
  return (await response.json()) as IssueDto;
}
const place = (activityId: string, revision: number, start: number, fixing?: 'free' | 'fixed') =>
  edit('place', { activityId, revision, placement: { unitId: 'K1', start }, ...(fixing ? { fixing } : {}) });

describe('a clean added by the planner', () => {
  it('waits for a place, as long as the longest rule of its kind, its steam from the rule’s duty', async () => {
    const { activityId, code, planRevision } = await added('K1', 'wash');
    expect([code, planRevision]).toEqual(['C1', 1]);
    const dto = await load();
    expect(dto.planRevision).toBe(1);
    const clean = activityIn(dto, activityId);
    expect(clean).toMatchObject({
      kind: 'cleaning',
      cleaning: 'wash',
      title: 'Wash of K1',
      stage: null,
      placement: null,
      fixing: 'free',
      revision: 0,
    });
    expect(clean.modes).toMatchObject([{ unitId: 'K1', minutes: 35, dutyId: 'wash' }]);
    // 600 kg x 67 K x 4.19 kJ/(kg K) over what dry steam of 7 bar g gives up to water of 82 degC, 2 768 - 343 kJ/kg.
    const kg = clean.modes[0]?.phases.reduce((sum, { minutes, steamKgPerH }) => sum + (minutes * steamKgPerH) / 60, 0);
    expect(kg).toBeCloseTo((600 * 67 * 4.19) / (2_768 - 343), 0);
    expect(await db.select().from(record)).toMatchObject([
      { action: 'plan.addCleaning', authorId: 'kim', details: { code: 'C1', unitId: 'K1', kind: 'wash' } },
    ]);
  });

  it('takes a typed rule’s phases, and no steam on a unit without a header', async () => {
    const { activityId: rinseId } = await added('K2', 'rinse');
    const { activityId: dryId } = await added('K3', 'wash');
    const dto = await load();
    expect(activityIn(dto, rinseId).modes).toEqual([
      { unitId: 'K2', minutes: 8, phases: typed, uses: [], dutyId: null },
    ]);
    expect(activityIn(dto, dryId).modes).toEqual([{ unitId: 'K3', minutes: 35, phases: [], uses: [], dutyId: null }]);
  });

  it('has a code of its own in the week, two people adding at once included', async () => {
    const both = await Promise.all([add({ unitId: 'K1', kind: 'wash' }), add({ unitId: 'K2', kind: 'rinse' }, 'ola')]);
    const dtos = (await Promise.all(both.map((response) => response.json()))) as CleaningPlanDto[];
    expect(dtos.map(({ code }) => code).sort()).toEqual(['C1', 'C2']);
    expect((await load()).planRevision).toBe(2);
    expect((await added('K1', 'rinse')).code).toBe('C3');
  });

  it.each<[string, unknown, Person, number, string | undefined]>([
    ['of a kind that has no rule', { unitId: 'K1', kind: 'allergen' }, 'kim', 400, 'CLEANING-RULE'],
    ['of a unit that is never cleaned', { unitId: 'R1', kind: 'wash' }, 'kim', 400, 'CLEANING-RULE'],
    ['of another plant’s unit', { unitId: 'hill-K1', kind: 'wash' }, 'kim', 404, 'NOT-FOUND'],
    ['in a way that is none', { unitId: 'K1', kind: 'polish' }, 'kim', 400, 'INPUT'],
    ['by a utilities lead', { unitId: 'K1', kind: 'wash' }, 'uli', 403, 'ROLE'],
  ])('is refused %s, and nothing is saved', async (_, body, person, status, code) => {
    const before = await planContents();
    expect(await outcome(await add(body, person))).toEqual({ status, code });
    expect(await planContents()).toEqual(before);
  });
});

describe('a planned clean in the plan', () => {
  it('is placed, fixed, moved, taken off and put back by the ordinary edits', async () => {
    const { activityId } = await added('K1', 'wash');
    expect((await place(activityId, 0, 560)).planRevision).toBe(2);
    await edit('fix', { activityId, revision: 1, placement: { unitId: 'K1', start: 560 }, fixing: 'fixed' });
    expect(activityIn(await load(), activityId)).toMatchObject({ fixing: 'fixed', revision: 2 });
    await edit('takeOff', { activityId, revision: 2, placement: null, fixing: 'free' });
    expect(activityIn(await load(), activityId)).toMatchObject({ placement: null, fixing: 'free' });
    await edit('undo', { activityId, revision: 3, placement: { unitId: 'K1', start: 560 }, fixing: 'fixed' });
    expect(activityIn(await load(), activityId)).toMatchObject({ placement: { start: 560 }, fixing: 'fixed' });
    expect((await db.select().from(edits)).map(({ kind }) => kind).sort()).toEqual(['fix', 'place', 'takeOff', 'undo']);
  });

  it('draws its steam where it stands', async () => {
    const { activityId } = await added('K1', 'wash');
    const at = async () => evaluateWeek((await load()).week).headers[0]?.loadKgPerH[2_000] ?? 0;
    const before = await at();
    await place(activityId, 0, 2_000);
    const peak = activityIn(await load(), activityId).modes[0]?.phases[0]?.steamKgPerH ?? 0;
    expect(peak).toBeGreaterThan(100);
    expect((await at()) - before).toBeCloseTo(peak, 6);
  });

  it('opens its working, waiting or placed', async () => {
    const { activityId } = await added('K1', 'wash');
    const reader = authorize(READER, 'plan.read');
    if (!reader.ok) throw new Error(reader.error.message);
    const waiting = await loadWorking(reader.value, activityId);
    expect(waiting).toMatchObject({ ok: true, value: { code: 'C1', unitName: 'K1', duty: { name: 'Wash water' } } });
    await place(activityId, 0, 560);
    expect(await loadWorking(reader.value, activityId)).toEqual(waiting);
  });

  it('is worked out anew with the library’s other runs when its rule’s duty has changed', async () => {
    const { activityId } = await added('K1', 'wash');
    const rework = (body?: unknown) =>
      callApi(body ? REWORK : OUT_OF_DATE, {
        session: sessions.kim,
        params: { week: WEEK },
        ...(body ? { body } : {}),
      });
    expect(await (await rework()).json()).toMatchObject({ activities: [] });
    await db.update(duties).set({ inputs: { ...washWater, waterKg: 900 } });
    expect(await (await rework()).json()).toMatchObject({ activities: [{ id: activityId, code: 'C1' }] });
    const peakOf = async () => activityIn(await load(), activityId).modes[0]?.phases[0]?.steamKgPerH ?? 0;
    const before = await peakOf();
    expect(await (await rework({ activityIds: [activityId] })).json()).toEqual({ planRevision: 2, reworked: 1 });
    expect(await peakOf()).toBeCloseTo(1.5 * before, 6);
    await db.update(duties).set({ inputs: washWater });
  });

  it('is on the issue and the shift sheet, and the floor records it', async () => {
    const { activityId } = await added('K1', 'wash');
    const { planRevision } = await place(activityId, 0, 560);
    const { id: issueId } = await issue(planRevision);
    const query = 'line=l1&shift=early&date=2026-11-30';
    const call = { session: sessions.sam, params: { week: WEEK }, path: `/api/weeks/${WEEK}/shift-sheet?${query}` };
    const sheet = (await (await callApi(SHEET, call)).json()) as ShiftSheetDto;
    const row = sheet.rows.find(({ activity }) => activity.id === activityId);
    expect(row).toMatchObject({ unitName: 'K1', start: 560, end: 595, activity: { code: 'C1', cleaning: 'wash' } });
    setClock(561);
    const begun = { activityId, event: 'cratesIn', issueId };
    const response = await callApi(EVENT, { session: sessions.sam, params: { week: WEEK }, body: begun });
    expect(response.status).toBe(201);
    expect(activityIn(await load(), activityId).fixing).toBe('started');
  });
});

describe('removing a planned clean', () => {
  it('takes one that waits out of the week, and keeps who did it', async () => {
    const { activityId } = await added('K1', 'wash');
    expect(await (await remove(activityId)).json()).toEqual({ activityId, code: 'C1', planRevision: 2 });
    const dto = await load();
    expect([dto.planRevision, dto.week.activities.length]).toEqual([2, 5]);
    const actions = (await db.select().from(record)).map(({ action }) => action);
    expect(actions.sort()).toEqual(['plan.addCleaning', 'plan.removeCleaning']);
    expect(await outcome(await remove(activityId))).toEqual({ status: 404, code: 'NOT-FOUND' });
  });

  it('is refused while it has a place, saying where it is now', async () => {
    const { activityId } = await added('K1', 'wash');
    await place(activityId, 0, 560);
    const before = await planContents();
    const response = await remove(activityId, 'ola');
    expect(response.status).toBe(409);
    expect(await response.json()).toMatchObject({
      code: 'CLEANING-PLACED',
      message: 'Cleaning C1 has a place on the board; take it off first. Nothing was removed.',
      planRevision: 2,
      stale: [{ id: activityId, placement: { unitId: 'K1', start: 560 }, movedBy: 'Kim Example' }],
    });
    expect(await planContents()).toEqual(before);
  });

  it('is refused once an issue has it on a unit; not where it only waited then', async () => {
    const waiting = await added('K2', 'rinse');
    const { activityId } = await added('K1', 'wash');
    await issue((await place(activityId, 0, 560)).planRevision);
    await edit('takeOff', { activityId, revision: 1, placement: null });
    expect(await outcome(await remove(activityId))).toEqual({ status: 409, code: 'CLEANING-ISSUED' });
    expect((await remove(waiting.activityId)).status).toBe(200);
  });

  it.each<[string, string, Person, number]>([
    ['a run', 'A110', 'kim', 404],
    ['by another plant', 'clean', 'hal', 404],
    ['by a supervisor', 'clean', 'sam', 403],
  ])('is refused %s', async (_, named, person, status) => {
    const { activityId } = await added('K1', 'wash');
    expect((await remove(named === 'clean' ? activityId : named, person)).status).toBe(status);
    expect(await db.$count(activities)).toBe(6);
  });
});
