import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { ProductDto, ProductsDto } from '@/contracts/products';
import { db } from '@/db/client';
import { activities, cleaningRules, duties, families, plans, products, record, routeModes } from '@/db/schema/index';
import { DELETE as retireFamily, POST as renameFamily } from '@/pages/api/families/[id]';
import { POST as setCleaning } from '@/pages/api/families/cleaning';
import { POST as createFamily } from '@/pages/api/families/index';
import { POST as change } from '@/pages/api/products/[id]/index';
import { POST as retire } from '@/pages/api/products/[id]/retire';
import { POST as saveRoute } from '@/pages/api/products/[id]/route';
import { GET, POST as create } from '@/pages/api/products/index';
import { callApi } from '../support/api';
import { insertUnits } from '../support/library';
import { openWorld, sessionOf, WEEK } from '../support/world';
import { kettleB } from '../verification/dutyWorkedBatches';

beforeAll(async () => {
  const close = await openWorld();
  await insertUnits('north');
  const own = { plantId: 'north' };
  await db.insert(families).values({ ...own, id: 'north-sauces', name: 'Sauces' });
  const water = { kind: 'wash', waterKg: 600, fromC: 15, toC: 82, minutes: 10 };
  await db.insert(duties).values([
    { ...own, id: 'cook', name: 'Sauce, cook', model: 'jacketedKettle', inputs: { ...kettleB } },
    { ...own, id: 'wash', name: 'Wash', model: 'waterHeating', inputs: water },
  ]);
  return close;
});
beforeEach(async () => {
  for (const table of [activities, plans, routeModes, cleaningRules, record]) await db.delete(table);
  await db.delete(products).where(eq(products.name, 'Tomato sauce'));
});

const lead = 'north-utilitiesLead';
const basis = kettleB.product;
const sauce = (changes: Record<string, unknown> = {}) => {
  const figures = { containerKg: 0.05, fillKg: 0.4, casePieces: 12, initialC: 65 };
  return { name: 'Tomato sauce', familyId: 'north-soups', basis, ...figures, ...changes };
};
const post = async (route: typeof create, body: unknown, id?: string, person = lead) =>
  callApi(route, { session: await sessionOf(person), body, method: 'POST', ...(id ? { params: { id } } : {}) });
const bodyOf = async (response: Response) => [response.status, await response.json()] as const;
const list = async (person = lead) =>
  (await (await callApi(GET, { session: await sessionOf(person) })).json()) as ProductsDto;
const made = async (): Promise<string> => ((await (await post(create, sauce())).json()) as { id: string }).id;
const product = async (id: string) => (await list()).products.find((one) => one.id === id) as ProductDto;
const pathsOf = (body: unknown) => (body as { fields: { path: string }[] }).fields.map(({ path }) => path).sort();

describe('products', () => {
  it('are saved and read with their family and composition by every role of the plant', async () => {
    const id = await made();
    const dto = await list('north-lineSupervisor');
    expect(dto.products.find((one) => one.id === id)).toMatchObject({ ...sauce(), stages: [], plannedRuns: 0 });
    expect(dto.families).toMatchObject([
      { id: 'north-sauces', products: 0 },
      { id: 'north-soups', products: 2 },
    ]);
    expect((await list('south-utilitiesLead')).products.map(({ id: other }) => other)).toEqual(['south-soup']);
    expect(await db.select().from(record)).toMatchObject([{ action: 'product.create', subject: id }]);
  });

  it('keep a figure from elsewhere with its source, or water alone', async () => {
    const given = { kind: 'given', kJPerKgK: 3.9, source: 'supplier, sheet 4' };
    const { id } = (await (await post(create, sauce({ basis: given }))).json()) as { id: string };
    expect((await product(id)).basis).toEqual(given);
  });

  it('are refused with every fault at its field, and nothing is saved', async () => {
    const composition = { water: 0.9, protein: -0.1, fat: 0, carbohydrate: 0.1, fibre: 0, ash: 0.01 };
    const wrong = sauce({ name: '', fillKg: -1, casePieces: 1.5, basis: { kind: 'composition', composition } });
    const [status, body] = await bodyOf(await post(create, wrong));
    expect(status).toBe(400);
    expect(pathsOf(body)).toEqual(['basis.composition.protein', 'casePieces', 'fillKg', 'name']);
    const [, foreign] = await bodyOf(await post(create, sauce({ familyId: 'south-soups' })));
    expect(pathsOf(foreign)).toEqual(['familyId']);
    expect(await db.$count(products, eq(products.name, 'Tomato sauce'))).toBe(0);
  });

  it('are changed as they were read; a save over another change is refused with what is there', async () => {
    const id = await made();
    const { read } = await product(id);
    expect((await post(change, { ...sauce({ fillKg: 0.5 }), read }, id)).status).toBe(200);
    const [status, body] = await bodyOf(await post(change, { ...sauce({ fillKg: 0.6 }), read }, id));
    expect([status, body]).toMatchObject([409, { code: 'PRODUCT-STALE', now: { fillKg: 0.5 } }]);
    expect((await product(id)).fillKg).toBe(0.5);
  });

  it('are not retired while runs are planned that have not started', async () => {
    const id = await made();
    await db.insert(plans).values({ id: 'plan', plantId: 'north', weekStart: WEEK });
    const run = { id: 'run', plantId: 'north', planId: 'plan', kind: 'stage' as const, code: 'A1', title: 'Sauce' };
    await db.insert(activities).values({ ...run, productId: id, modes: [], earliestAt: new Date(0) });
    const { read } = await product(id);
    expect(await bodyOf(await post(retire, { read }, id))).toMatchObject([409, { code: 'PRODUCT-USED' }]);
    await db.delete(activities);
    expect((await post(retire, { read }, id)).status).toBe(200);
    expect((await product(id)).isRetired).toBe(true);
  });

  it.each([
    ['of another plant', 'south-utilitiesLead', 404],
    ['by a role that may not', 'north-lineSupervisor', 403],
  ])('are not changed, retired or routed %s', async (_, person, status) => {
    const id = await made();
    const { read, routeRead } = await product(id);
    expect((await post(change, { ...sauce(), read }, id, person)).status).toBe(status);
    expect((await post(retire, { read }, id, person)).status).toBe(status);
    expect((await post(saveRoute, { read: routeRead, stages: [] }, id, person)).status).toBe(status);
  });
});

describe('a route', () => {
  const cook = { unitId: 'north-kettle-1', dutyId: 'cook', minutes: 0, leadMin: 10, afterMin: 5 };
  const fill = { unitId: 'north-filler-1', dutyId: null, minutes: 20, leadMin: 0, afterMin: 0 };
  const stages = [
    { stage: 'cook', units: [cook], uses: [] },
    { stage: 'fill', units: [fill], uses: [] },
  ];

  it('is saved in order and shows the mode of each stage on each unit', async () => {
    const id = await made();
    const { routeRead } = await product(id);
    expect((await post(saveRoute, { read: routeRead, stages }, id)).status).toBe(200);
    const { stages: kept } = await product(id);
    expect(kept.map(({ stage }) => stage)).toEqual(['cook', 'fill']);
    const mode = kept[0]?.units[0]?.mode;
    expect(mode?.phases[0]?.offsetMin).toBe(10);
    const last = mode?.phases.at(-1);
    expect(mode?.minutes).toBe((last?.offsetMin ?? 0) + (last?.minutes ?? 0) + 5);
    expect(kept[1]?.units[0]).toMatchObject({ mode: { minutes: 20, phases: [] }, fault: null });
    expect(await bodyOf(await post(saveRoute, { read: routeRead, stages: [] }, id))).toMatchObject([
      409,
      { code: 'ROUTE-STALE' },
    ]);
  });

  it.each([
    ['a duty on a unit without a header', [{ ...fill, dutyId: 'cook' }], 'stages.0.units.0.dutyId'],
    ['a unit of another plant', [{ ...cook, unitId: 'south-kettle-1' }], 'stages.0.units.0.unitId'],
    ['a unit named twice', [cook, cook], 'stages.0.units.1.unitId'],
    ['a duty that is not there', [{ ...cook, dutyId: 'none' }], 'stages.0.units.0.dutyId'],
    ['no duty and no minutes', [{ ...fill, minutes: 0 }], 'stages.0.units.0.minutes'],
    ['half minutes', [{ ...cook, leadMin: 2.5 }], 'stages.0.units.0.leadMin'],
    ['no unit', [], 'stages.0.units'],
  ])('is refused for %s', async (_, units, path) => {
    const id = await made();
    const { routeRead } = await product(id);
    const wrong = { read: routeRead, stages: [{ stage: 'cook', units, uses: [] }] };
    const [status, body] = await bodyOf(await post(saveRoute, wrong, id));
    expect([status, pathsOf(body)]).toEqual([400, [path]]);
    expect(await db.$count(routeModes)).toBe(0);
  });

  it('is refused for a use of a limit that the plant does not have', async () => {
    const id = await made();
    const { routeRead } = await product(id);
    const uses = [{ limitId: 'none', offsetMin: 0, minutes: 5, amount: 1 }];
    const [, body] = await bodyOf(
      await post(saveRoute, { read: routeRead, stages: [{ stage: 'cook', units: [cook], uses }] }, id),
    );
    expect(pathsOf(body)).toEqual(['stages.0.uses.0.limitId']);
  });
});

describe('families and cleaning', () => {
  const pair = { unitKind: 'kettle', fromFamilyId: 'north-soups', toFamilyId: 'north-sauces' };
  const rule = { kind: 'wash', minutes: 15, dutyId: 'wash', uses: [] };

  it('set a rule with the steam of its duty, and take it back', async () => {
    expect((await post(setCleaning, { ...pair, rule })).status).toBe(204);
    const { cleaning } = await list();
    expect(cleaning).toMatchObject([{ ...pair, kind: 'wash', minutes: 15, dutyId: 'wash' }]);
    expect(cleaning[0]?.steamKg).toBeGreaterThan(50);
    expect((await post(setCleaning, { ...pair, rule: null })).status).toBe(204);
    expect((await list()).cleaning).toEqual([]);
  });

  it.each([
    ['a family of another plant', { ...pair, toFamilyId: 'south-soups', rule }, 'toFamilyId'],
    ['a duty longer than the cleaning', { ...pair, rule: { ...rule, minutes: 5 } }, 'rule.minutes'],
    ['steam on a kind of unit without a header', { ...pair, unitKind: 'filler', rule }, 'rule.dutyId'],
    ['no length', { ...pair, rule: { ...rule, minutes: 0 } }, 'rule.minutes'],
  ])('refuse a rule for %s', async (_, request, path) => {
    const [status, body] = await bodyOf(await post(setCleaning, request));
    expect([status, pathsOf(body)]).toEqual([400, [path]]);
    expect(await db.$count(cleaningRules)).toBe(0);
  });

  it('are named, renamed and retired when no product belongs to them', async () => {
    const { id } = (await (await post(createFamily, { name: 'Drinks' })).json()) as { id: string };
    expect((await post(renameFamily, { name: 'Juices' }, id)).status).toBe(200);
    expect((await list()).families.map(({ name }) => name)).toEqual(['Juices', 'Sauces', 'Soups']);
    const remove = async (familyId: string) =>
      callApi(retireFamily, { method: 'DELETE', session: await sessionOf(lead), params: { id: familyId } });
    expect((await remove(id)).status).toBe(200);
    expect(await bodyOf(await remove('north-soups'))).toMatchObject([409, { code: 'FAMILY-USED' }]);
    expect((await remove('south-soups')).status).toBe(404);
    expect(await bodyOf(await post(createFamily, { name: ' ' }))).toMatchObject([400, { fields: [{ path: 'name' }] }]);
  });
});
