import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { PracticeDto } from '@/contracts/practice';
import type { Link } from '@/core/plant/activity';
import { db } from '@/db/client';
import { practiceRules, processData, record, ventGroups } from '@/db/schema/index';
import { GET, POST as ENTER } from '@/pages/api/practice/index';
import { POST as RELEASE } from '@/pages/api/practice/[id]/release';
import { POST as WITHDRAW } from '@/pages/api/practice/[id]/withdraw';
import { longestWaitsInForce } from '@/server/practice/practice.repo';
import { keptWaits } from '@/server/practice/waits';
import { loadWeek } from '@/server/weeks/loadWeek';
import { callApi, outcome } from '../support/api';
import { nameOf, openWorld, sessionOf, WEEK } from '../support/world';

const numbers = { ventsAtOnce: 2, steamOnsAtOnce: 2, steamOnMinutes: 1, marginMinutes: 0, source: 'invented study' };

beforeAll(async () => {
  const close = await openWorld();
  for (const plantId of ['north', 'south']) {
    await db.insert(ventGroups).values({ id: `${plantId}-vents`, plantId, name: 'North manifold', ...numbers });
  }
  return close;
});
beforeEach(async () => {
  await db.delete(practiceRules);
  await db.update(ventGroups).set({ ...numbers, leastHeaderBarG: null, studyGreatestLoadKgPerH: null });
  await db.delete(record);
});

const vents = {
  kind: 'ventGroup',
  ventGroupId: 'north-vents',
  values: {
    ventsAtOnce: 3,
    steamOnsAtOnce: 1,
    steamOnMinutes: 2,
    marginMinutes: 1,
    leastHeaderBarG: 6.5,
    studyGreatestLoadKgPerH: 5_200,
  },
  source: 'Invented study 7',
};
const clean = {
  kind: 'cleanliness',
  values: { greatestRunningMin: 960, greatestStandingDirtyMin: null, allergenReleaseMin: 30 },
  source: 'common practice, no source',
};
const waits = {
  kind: 'waits',
  values: { longestWaitSinceClosingMin: 45, longestWaitForInitialTemperatureMin: null },
  source: 'Invented rule 3',
};

const enter = async (body: unknown, personId = 'north-planner') =>
  callApi(ENTER, { session: await sessionOf(personId), body });
const act = async (route: typeof RELEASE, id: string, personId = 'north-qualityLead') =>
  callApi(route, { session: await sessionOf(personId), method: 'POST', params: { id } });
const list = async (personId = 'north-planner') =>
  (await (await callApi(GET, { session: await sessionOf(personId) })).json()) as PracticeDto;
async function entered(body: unknown, personId?: string): Promise<string> {
  const response = await enter(body, personId);
  expect(response.status).toBe(201);
  return ((await response.json()) as PracticeDto).rules[0]?.id ?? '';
}
const group = async () => (await db.select().from(ventGroups).where(eq(ventGroups.id, 'north-vents')))[0];
const rulesOfWeek = async () => {
  const week = await loadWeek({ plantId: 'north' }, WEEK);
  if (!week.ok) throw new Error(week.error.message);
  return week.value.week.plant;
};

describe('a practice rule', () => {
  it('is entered by one person and changes nothing until it is released', async () => {
    await entered(vents);
    expect((await list()).rules).toMatchObject([
      { kind: 'ventGroup', ventGroup: { name: 'North manifold' }, enteredBy: nameOf('north-planner'), released: null },
    ]);
    expect(await group()).toMatchObject(numbers);
    expect(await db.select().from(record)).toMatchObject([{ action: 'practice.enter', authorId: 'north-planner' }]);
  });

  it('gives a vent group its numbers and its source when released, in the week too', async () => {
    const id = await entered(vents);
    const released = await act(RELEASE, id);
    expect(released.status).toBe(200);
    expect(await group()).toMatchObject({ ...vents.values, source: vents.source });
    expect((await rulesOfWeek()).ventGroups).toMatchObject([{ id: 'north-vents', ...vents.values }]);
    expect((await list()).rules[0]?.released?.by).toBe(nameOf('north-qualityLead'));
    const actions = (await db.select().from(record)).map(({ action }) => action);
    expect(actions.sort()).toEqual(['practice.enter', 'practice.release']);
  });

  it('of cleanliness is in the plant’s rules while it is in force', async () => {
    expect((await rulesOfWeek()).rules.practice).toBeUndefined();
    const id = await entered(clean);
    expect((await rulesOfWeek()).rules.practice).toBeUndefined();
    await act(RELEASE, id);
    expect((await rulesOfWeek()).rules.practice).toEqual(clean.values);
    await act(WITHDRAW, id);
    expect((await rulesOfWeek()).rules.practice).toBeUndefined();
  });

  it('takes the place of the one before; withdrawn, the one before does not come back', async () => {
    const first = await entered(clean);
    await act(RELEASE, first);
    const second = await entered({ ...clean, values: { ...clean.values, greatestRunningMin: 480 } });
    await act(RELEASE, second);
    expect((await rulesOfWeek()).rules.practice?.greatestRunningMin).toBe(480);
    expect((await list()).rules.find(({ id }) => id === first)?.withdrawnAt).toEqual(expect.any(String));
    await act(WITHDRAW, second);
    expect((await rulesOfWeek()).rules.practice).toBeUndefined();
  });

  it('withdrawn, leaves its vent group one vent and one steam on at a time', async () => {
    const id = await entered(vents);
    await act(RELEASE, id);
    await act(WITHDRAW, id);
    expect(await group()).toMatchObject({ ventsAtOnce: 1, steamOnsAtOnce: 1, marginMinutes: 1, leastHeaderBarG: 6.5 });
    expect(await outcome(await act(WITHDRAW, id))).toEqual({ status: 409, code: 'PRACTICE-WITHDRAWN' });
  });

  it('withdrawn before it was released, leaves the vent group as it is', async () => {
    await act(WITHDRAW, await entered(vents));
    expect(await group()).toMatchObject(numbers);
  });

  it('is released by a second person, once, of the same plant', async () => {
    const id = await entered(clean);
    await db.update(practiceRules).set({ enteredBy: 'north-qualityLead' });
    expect(await outcome(await act(RELEASE, id))).toEqual({ status: 409, code: 'RELEASE-OWN' });
    expect(await outcome(await act(RELEASE, id, 'south-qualityLead'))).toEqual({ status: 404, code: 'NOT-FOUND' });
    const both = await Promise.all([act(RELEASE, id, 'north-qualityLead-2'), act(RELEASE, id, 'north-qualityLead-2')]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
    await act(WITHDRAW, id);
    expect(await outcome(await act(RELEASE, id, 'north-qualityLead-2'))).toEqual({
      status: 409,
      code: 'RELEASE-WITHDRAWN',
    });
  });

  it.each([
    ['no vent at once', { ...vents, values: { ...vents.values, ventsAtOnce: 0 } }, 400],
    ['another plant’s vent group', { ...vents, ventGroupId: 'south-vents' }, 400],
    ['no source', { ...vents, source: '' }, 400],
    [
      'nothing set',
      { ...clean, values: { greatestRunningMin: null, greatestStandingDirtyMin: null, allergenReleaseMin: null } },
      400,
    ],
    ['half a minute', { ...waits, values: { ...waits.values, longestWaitSinceClosingMin: 0.5 } }, 400],
  ])('is refused with %s, and nothing is saved', async (_, body, status) => {
    const response = await enter(body);
    expect(response.status).toBe(status);
    expect(await response.json()).toMatchObject({ fields: [{ path: expect.any(String) }] });
    expect([await db.$count(practiceRules), await db.$count(record)]).toEqual([0, 0]);
  });

  it.each([
    ['entered by a quality lead', () => enter(clean, 'north-qualityLead')],
    ['released by a planner', async () => act(RELEASE, await entered(clean), 'north-planner')],
    ['withdrawn by a utilities lead', async () => act(WITHDRAW, await entered(clean), 'north-utilitiesLead')],
  ])('is not %s', async (_, attempt) => {
    expect(await outcome(await attempt())).toEqual({ status: 403, code: 'ROLE' });
  });

  it('shows one plant nothing of another', async () => {
    await entered(clean);
    expect((await list('south-qualityLead')).rules).toEqual([]);
  });
});

describe('the plant’s longest waits', () => {
  const link = (rule: Link['rule'], greatestMin: number | null): Link => {
    const end = { activityId: 'a', anchor: 'start', offsetMin: 0 } as const;
    return { id: rule, from: end, to: end, leastMin: 0, greatestMin, rule, greatestBreach: 'time', source: null };
  };

  it('hold where they are shorter than what the documents allow, as process limits with their source', async () => {
    await act(RELEASE, await entered(waits));
    const inForce = await longestWaitsInForce(db, 'north');
    const links = [
      link('sinceClosing', 60),
      link('sinceClosing', 40),
      link('flow', 500),
      link('initialTemperature', 90),
    ];
    const kept = keptWaits(links, inForce);
    expect(kept.map(({ greatestMin }) => greatestMin)).toEqual([45, 40, 500, 90]);
    expect(kept[0]).toMatchObject({ greatestBreach: 'process', source: 'Invented rule 3' });
    expect(keptWaits([link('sinceClosing', null)], inForce)[0]?.greatestMin).toBe(45);
    expect(keptWaits(links, null)).toEqual(links);
  });

  it('are shown beside documents that allow longer ones', async () => {
    await db.update(processData).set({ releasedBy: 'north-qualityLead-2', releasedAt: new Date() });
    await act(RELEASE, await entered(waits));
    expect((await list()).longerWaits).toEqual([{ product: 'Leek soup', document: 'SP-12 issue 3', minutes: 60 }]);
  });
});
