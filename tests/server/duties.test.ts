import { and, eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { DutiesDto } from '@/contracts/duties';
import { db } from '@/db/client';
import { activities, cleaningRules, duties, families, plans, record, routeModes } from '@/db/schema/index';
import { POST as change } from '@/pages/api/duties/[id]/index';
import { POST as retire } from '@/pages/api/duties/[id]/retire';
import { GET, POST as create } from '@/pages/api/duties/index';
import { callApi } from '../support/api';
import { insertUnits } from '../support/library';
import { nameOf, openWorld, sessionOf, WEEK } from '../support/world';
import { blancherA, kettleB, retortC } from '../verification/dutyWorkedBatches';

beforeAll(async () => {
  const close = await openWorld();
  await insertUnits('north');
  await db.insert(families).values({ id: 'north-sauces', plantId: 'north', name: 'Sauces' });
  return close;
});
beforeEach(async () => {
  for (const table of [activities, plans, routeModes, cleaningRules, duties, record]) await db.delete(table);
});

const lead = 'north-utilitiesLead';
const kettle = { model: 'jacketedKettle', inputs: kettleB };
const wanted = (changes: Record<string, unknown> = {}) => {
  return { name: 'Sauce, cook', tryOnHeaderId: 'north-main', duty: kettle, ...changes };
};
const post = async (route: typeof create, body: unknown, id?: string, person = lead) =>
  callApi(route, { session: await sessionOf(person), body, ...(id === undefined ? {} : { params: { id } }) });
const bodyOf = async (response: Response) => [response.status, await response.json()] as const;
const made = async (changes: Record<string, unknown> = {}): Promise<string> =>
  ((await (await post(create, wanted(changes))).json()) as { id: string }).id;
const list = async (person = lead) =>
  (await (await callApi(GET, { session: await sessionOf(person) })).json()) as DutiesDto;
const stored = async (id: string) => (await db.select().from(duties).where(eq(duties.id, id)))[0];

async function useOnRoute(dutyId: string, unitId = 'north-kettle-1'): Promise<void> {
  const id = `route-${dutyId}`;
  const row = { id, plantId: 'north', productId: 'north-soup', position: 0, stage: 'cook' as const, unitId, dutyId };
  await db.insert(routeModes).values({ ...row, minutes: 0, uses: [] });
}

describe('duties', () => {
  it('are saved with their name, read by every role of the plant and kept in the record', async () => {
    const [status, body] = await bodyOf(await post(create, wanted()));
    expect([status, body]).toEqual([201, { id: expect.any(String), revision: 0 }]);
    const dto = await list('north-lineSupervisor');
    expect(dto.duties).toMatchObject([
      { name: 'Sauce, cook', duty: kettle, revision: 0, changedBy: nameOf(lead), isRetired: false, uses: [] },
    ]);
    expect(dto.headers.map(({ id }) => id)).toEqual(['north-main', 'north-low']);
    expect(dto.products).toMatchObject([{ id: 'north-soup', basis: { kind: 'composition' } }]);
    expect(await db.select().from(record)).toMatchObject([{ action: 'duty.create', authorId: lead }]);
    expect((await list('south-utilitiesLead')).duties).toEqual([]);
  });

  it('with numbers out of range are refused at every field at once, and nothing is saved', async () => {
    const inputs = { ...kettleB, batchKg: -900, jacketAreaM2: undefined, holdMin: 5000 };
    const [status, body] = await bodyOf(await post(create, wanted({ duty: { ...kettle, inputs } })));
    expect(status).toBe(400);
    expect((body as { fields: { path: string }[] }).fields.map(({ path }) => path).sort()).toEqual([
      'duty.inputs.batchKg',
      'duty.inputs.holdMin',
      'duty.inputs.jacketAreaM2',
    ]);
    expect(await db.$count(duties)).toBe(0);
  });

  it.each([
    ['a jacket colder than the product', kettle.model, { ...kettleB, jacketPressureBarG: 0 }, 'jacketPressureBarG'],
    ['a product that cools in a blancher', 'steamBlancher', { ...blancherA, productOutC: 10 }, 'productOutC'],
    ['a missing escape', 'steamBlancher', { ...blancherA, escapeFraction: null }, 'escapeFraction'],
    ['more boiled off than there is', kettle.model, { ...kettleB, boilOffKg: 950 }, 'boilOffKg'],
    [
      'contents hotter than the process',
      'stillRetort',
      { ...retortC, holds: [{ minutes: 9, contentsEndC: 130 }] },
      'processC',
    ],
  ])('are refused for %s', async (_, model, inputs, field) => {
    const [status, body] = await bodyOf(await post(create, wanted({ duty: { model, inputs } })));
    expect([status, body]).toMatchObject([400, { fields: [{ path: `duty.inputs.${field}` }] }]);
    expect(await db.$count(duties)).toBe(0);
  });

  it('are refused without a name, a header of the plant or a source of typed figures', async () => {
    const typed = { model: 'typed', inputs: { phases: [{ kind: 'vent', minutes: 8, steamKgPerH: 2000 }], source: '' } };
    const [, body] = await bodyOf(await post(create, wanted({ name: ' ', duty: typed })));
    expect((body as { fields: { path: string }[] }).fields.map(({ path }) => path)).toEqual([
      'name',
      'duty.inputs.source',
    ]);
    expect(await bodyOf(await post(create, wanted({ tryOnHeaderId: 'south-main' })))).toMatchObject([
      400,
      { fields: [{ path: 'tryOnHeaderId' }] },
    ]);
  });

  it('are changed on the revision that was read; a save on an older one is refused with what is there now', async () => {
    const id = await made();
    const hotter = { ...kettle, inputs: { ...kettleB, holdMin: 40 } };
    expect(await bodyOf(await post(change, wanted({ duty: hotter, revision: 0 }), id))).toEqual([
      200,
      { id, revision: 1 },
    ]);
    const [status, body] = await bodyOf(await post(change, wanted({ name: 'Mine', revision: 0 }), id, 'north-planner'));
    expect([status, body]).toMatchObject([409, { code: 'DUTY-STALE', now: { name: 'Sauce, cook', revision: 1 } }]);
    expect((body as { message: string }).message).toContain(nameOf(lead));
    expect(await stored(id)).toMatchObject({ revision: 1, inputs: { holdMin: 40 } });
  });

  it('must also work out on the headers of the units that they are used on', async () => {
    const id = await made();
    await useOnRoute(id);
    const inputs = { ...kettleB, jacketPressureBarG: 4 };
    const request = wanted({ duty: { ...kettle, inputs }, revision: 0 });
    const [status, body] = await bodyOf(await post(change, request, id));
    expect(status).toBe(400);
    expect((body as { message: string }).message).toContain('On the kettle header');
    expect(body).toMatchObject({ fields: [{ path: 'duty.inputs.jacketPressureBarG' }] });
    expect(await stored(id)).toMatchObject({ revision: 0 });
    expect((await list()).duties[0]?.uses).toEqual([
      { kind: 'route', text: 'Leek soup, cooking', href: '/products/north-soup' },
    ]);
  });

  it('work the steam of their cleaning rules out anew', async () => {
    const water = { kind: 'wash', waterKg: 600, fromC: 15, toC: 82, minutes: 10 };
    const id = await made({ duty: { model: 'waterHeating', inputs: water } });
    const pair = { fromFamilyId: 'north-soups', toFamilyId: 'north-sauces' };
    const rule = {
      id: 'rule',
      plantId: 'north',
      unitKind: 'kettle' as const,
      ...pair,
      minutes: 15,
      kind: 'wash' as const,
    };
    await db.insert(cleaningRules).values({ ...rule, phases: [], uses: [], dutyId: id });
    const longer = { model: 'waterHeating', inputs: { ...water, minutes: 20 } };
    await post(change, wanted({ duty: longer, revision: 0 }), id);
    const [kept] = await db.select().from(cleaningRules);
    expect(kept).toMatchObject({ minutes: 20, phases: [{ kind: 'wash', offsetMin: 0, minutes: 20 }] });
  });

  it('are retired when nothing uses them, and refused by naming what does', async () => {
    const id = await made();
    await useOnRoute(id);
    const [status, body] = await bodyOf(await post(retire, { revision: 0 }, id));
    expect([status, body]).toMatchObject([409, { code: 'DUTY-USED' }]);
    expect((body as { message: string }).message).toContain('Leek soup, cooking');
    await db.delete(routeModes);
    expect(await bodyOf(await post(retire, { revision: 0 }, id))).toEqual([200, { id, revision: 1 }]);
    expect(await bodyOf(await post(change, wanted({ revision: 1 }), id))).toMatchObject([
      409,
      { code: 'DUTY-RETIRED' },
    ]);
    expect((await list()).duties).toMatchObject([{ isRetired: true }]);
  });

  it('are kept while a run that has not started is planned with them', async () => {
    const id = await made();
    await db.insert(plans).values({ id: 'plan', plantId: 'north', weekStart: WEEK });
    const mode = { unitId: 'north-kettle-1', minutes: 30, phases: [], uses: [], dutyId: id };
    const run = { id: 'run', plantId: 'north', planId: 'plan', kind: 'stage' as const, code: 'A1', title: 'Sauce' };
    await db.insert(activities).values({ ...run, modes: [mode], earliestAt: new Date(0) });
    expect((await bodyOf(await post(retire, { revision: 0 }, id)))[1]).toMatchObject({
      message: expect.stringContaining('1 run planned and not yet started'),
    });
    await db.update(activities).set({ fixing: 'done' });
    expect((await post(retire, { revision: 0 }, id)).status).toBe(200);
  });

  it.each([
    ['of another plant', 'south-utilitiesLead', 404],
    ['by a role that may not', 'north-lineSupervisor', 403],
  ])('are not changed or retired %s', async (_, person, status) => {
    const id = await made();
    expect((await post(change, wanted({ revision: 0 }), id, person)).status).toBe(status);
    expect((await post(retire, { revision: 0 }, id, person)).status).toBe(status);
    expect(await db.$count(duties, and(eq(duties.id, id), eq(duties.revision, 0)))).toBe(1);
  });
});
