import { and, eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { OrderRequest, OrdersDto, PlannedOrderDto, SavedOrderDto } from '@/contracts/orders';
import { evaluateWeek } from '@/core/pipeline';
import { db } from '@/db/client';
import { activities, links, orders, processData, products, record, routeModes, units } from '@/db/schema/index';
import { DELETE as REMOVE, POST as CHANGE } from '@/pages/api/orders/[id]/index';
import { DELETE as TAKE_BACK, POST as PLAN } from '@/pages/api/orders/[id]/plan';
import { GET, POST } from '@/pages/api/orders/index';
import { listOutOfDate } from '@/server/products/rework.service';
import type { Authorized } from '@/server/auth/permissions';
import { loadWeek } from '@/server/weeks/loadWeek';
import { callApi } from '../support/api';
import { everySession, openPlant, resetPlan, setClock, WEEK, type Person } from '../support/fixturePlant';

let sessions: Readonly<Record<Person, string>>;

/** Invented: kettles of 672 kg, a filler of 84 a minute, loads of 1 680 jars of 400 g. */
beforeAll(async () => {
  const close = await openPlant();
  sessions = await everySession();
  await db
    .insert(units)
    .values({ id: 'F1', plantId: 'quay', lineId: 'l1', name: 'F1', kind: 'filler', headerId: null, position: 9 });
  const row = (position: number, unitId: string, minutes: number) => {
    return { id: `soup-${unitId}`, plantId: 'quay', productId: 'soup', position, unitId, minutes, uses: [] };
  };
  await db.insert(routeModes).values([
    { ...row(0, 'K1', 45), stage: 'cook', sizeKg: 700, yield: 0.96 },
    { ...row(0, 'K2', 45), stage: 'cook', sizeKg: 700, yield: 0.96 },
    { ...row(1, 'F1', 20), stage: 'fill', piecesPerMin: 84 },
    { ...row(2, 'R1', 80), stage: 'retort', pieces: 1_680, leadMin: 5 },
    { ...row(2, 'R2', 80), stage: 'retort', pieces: 1_680, leadMin: 5 },
  ]);
  const [soup] = await db.select().from(products).where(eq(products.id, 'soup'));
  if (!soup) throw new Error('no soup');
  await db.insert(products).values({ ...soup, id: 'raw', name: 'Raw soup' });
  await db.insert(routeModes).values({ ...row(0, 'R1', 80), id: 'raw-R1', productId: 'raw', stage: 'retort' });
  await db.insert(processData).values({
    ...{ id: 'raw-data', plantId: 'quay', productId: 'raw', document: 'SP-20', issue: '1', enteredBy: 'qua' },
    values: (await db.select().from(processData).where(eq(processData.id, 'released')))[0]!.values,
  });
  return close;
});
beforeEach(async () => {
  setClock(360);
  await resetPlan();
  await db.delete(orders);
});

const request: OrderRequest = {
  ...{ number: '4711', productId: 'soup', quantity: 300, unit: 'cases', priority: 2 },
  ...{ earliest: '2026-12-01T06:00', latestStart: '2026-12-02T12:00', due: '2026-12-04T14:00' },
};
const enter = (body: unknown = request, person: Person = 'kim') => callApi(POST, { session: sessions[person], body });
const change = (id: string, body: unknown, person: Person = 'kim') =>
  callApi(CHANGE, { session: sessions[person], params: { id }, body });
const remove = (id: string) => callApi(REMOVE, { method: 'DELETE', session: sessions.kim, params: { id } });
const plan = (id: string, body: unknown, person: Person = 'kim') =>
  callApi(PLAN, { session: sessions[person], params: { id }, body });
const takeBack = (id: string) => callApi(TAKE_BACK, { method: 'DELETE', session: sessions.kim, params: { id } });

async function entered(more: Partial<OrderRequest> = {}): Promise<SavedOrderDto> {
  const response = await enter({ ...request, ...more });
  expect(response.status).toBe(201);
  return (await response.json()) as SavedOrderDto;
}
async function planned(more: Partial<OrderRequest> = {}, part = 'levelled') {
  const order = await entered(more);
  const response = await plan(order.id, { revision: 0, part, weekStart: null });
  expect(response.status).toBe(201);
  return { id: order.id, ...((await response.json()) as PlannedOrderDto) };
}
async function listed(person: Person = 'kim'): Promise<OrdersDto> {
  const response = await callApi(GET, { method: 'GET', session: sessions[person] });
  return (await response.json()) as OrdersDto;
}
const outcome = async (response: Response) => [response.status, (await response.json()) as unknown] as const;
const netOf = (id: string) => db.select().from(activities).where(eq(activities.orderId, id)).orderBy(activities.code);
const recorded = async (action: string) =>
  (await db.select().from(record).where(eq(record.action, action))).map(({ subject }) => subject);

describe('an order', () => {
  it('is entered in cases, kept in kg and listed by the plant’s clock', async () => {
    const { id } = await entered();
    const { orders: rows } = await listed('uli');
    expect(rows).toMatchObject([
      { id, ...request, productName: 'Leek soup 400 g', revision: 0, state: { kind: 'notPlanned', total: 0 } },
    ]);
    expect(rows[0]?.quantityKg).toBeCloseTo(1_440, 9);
    const [row] = await db.select().from(orders);
    expect(row?.dueAt.toISOString()).toBe('2026-12-04T13:00:00.000Z');
    expect(await recorded('order.create')).toEqual([id]);
  });

  it.each([
    ['number', { number: ' ' }, 'Give the order its number.'],
    ['quantity', { quantity: 0 }, 'more than 0'],
    ['due', { due: '2026-02-30T10:00x' }, 'Say when it is due.'],
    ['latestStart', { latestStart: '2026-11-30T06:00' }, 'The latest start lies before the earliest.'],
    ['earliest', { earliest: '2026-12-05T06:00', latestStart: null }, 'must lie before it is due'],
    ['priority', { priority: 9 }, 'Priority is 1 (usual) to 5.'],
    ['productId', { productId: 'none' }, 'quay works has no such product.'],
  ])('is refused for its %s, with nothing saved', async (path, more, sentence) => {
    const response = await enter({ ...request, ...more });
    expect(response.status).toBe(400);
    const { fields } = (await response.json()) as { fields: { path: string; message: string }[] };
    expect(fields.find((field) => field.path === path)?.message).toContain(sentence);
    expect(await db.select().from(orders)).toEqual([]);
  });

  it('is changed by who read it last, and nobody else', async () => {
    const { id } = await entered();
    expect(await outcome(await change(id, { ...request, priority: 5, revision: 0 }))).toMatchObject([
      200,
      { revision: 1 },
    ]);
    const stale = await change(id, { ...request, priority: 1, revision: 0 }, 'ola');
    expect(await outcome(stale)).toMatchObject([409, { code: 'ORDER-STALE' }]);
    expect((await listed()).orders[0]?.priority).toBe(5);
  });

  it('is deleted while nothing is planned of it', async () => {
    const { id } = await entered();
    expect((await remove(id)).status).toBe(204);
    const next = await planned();
    expect(await outcome(await remove(next.id))).toMatchObject([409, { code: 'ORDER-PLANNED' }]);
  });

  it('of another plant is not there', async () => {
    const { id } = await entered();
    expect((await listed('hal')).orders).toEqual([]);
    expect((await change(id, { ...request, revision: 0 }, 'hal')).status).toBe(404);
    expect((await plan(id, { revision: 0, part: 'levelled', weekStart: null }, 'hal')).status).toBe(404);
  });
});

describe('planning an order', () => {
  it('adds its batches, fill run and loads to the week of its due time, not yet placed', async () => {
    const { id, weekStart, activities: count } = await planned();
    // 3 600 jars, 1 440 kg: three kettles of 672 kg out, three loads of 1 200.
    const net = await netOf(id);
    expect([weekStart, count]).toEqual([WEEK, 7]);
    expect(net.map(({ code }) => code)).toEqual(['4711-1', '4711-2', '4711-3', '4711F', '4711K1', '4711K2', '4711K3']);
    expect(net.every(({ unitId, weight }) => unitId === null && weight === 2)).toBe(true);
    expect(net.filter(({ processDataId }) => processDataId === 'released').map(({ stage }) => stage)).toEqual([
      ...['retort', 'retort', 'retort'],
    ]);
    expect(net.filter(({ latestStartAt }) => latestStartAt !== null).map(({ stage }) => stage)).toEqual([
      ...['cook', 'cook', 'cook'],
    ]);
    expect((await listed()).orders[0]?.state).toEqual({ kind: 'planned', total: 7, placed: 0, weekStart: WEEK });
    expect(await recorded('order.plan')).toEqual([id]);
  });

  it('links them: kettles taken off, loads filled, and the waits of the released document', async () => {
    const { id } = await planned();
    const [load] = await netOf(id);
    const own = await db.select().from(links).where(eq(links.plantId, 'quay'));
    const closing = own.find(({ to, rule }) => to.activityId === load?.id && rule === 'sinceClosing');
    expect(closing).toMatchObject({ greatestMin: 120, greatestBreach: 'process', source: 'SP-12, issue 3' });
    expect(closing?.to.offsetMin).toBe(5);
    const week = await loadWeek({ plantId: 'quay' }, WEEK);
    if (!week.ok) throw new Error(week.error.message);
    const linked = new Set(week.value.week.links.map(({ id: link }) => link));
    const cooks = week.value.week.activities.filter(
      ({ stage, title, code }) => stage === 'cook' && title && code !== 'K7',
    );
    expect(cooks.map(({ occupiesUntil }) => occupiesUntil !== 'end' && linked.has(occupiesUntil.linkId))).toEqual([
      ...[true, true, true],
    ]);
    const breaches = evaluateWeek(week.value.week).breaches;
    expect(breaches.filter((breach) => breach.class === 'process')).toEqual([]);
  });

  it('counts the plan’s revision, and finds nothing out of date', async () => {
    const { planRevision } = await planned();
    expect(planRevision).toBe(1);
    const actor = { plantId: 'quay' } as Authorized<'plan.read'>;
    const old = await listOutOfDate(actor, WEEK);
    expect(old.ok && old.value.activities.filter(({ code }) => code.startsWith('4711'))).toEqual([]);
  });

  it('carries a part load over into an order of its own', async () => {
    const { carriedTo } = await planned({}, 'carried');
    expect(carriedTo).toBe('4711/2');
    const rows = (await listed()).orders;
    const kg = rows.map(({ number, quantityKg }) => [number, Math.round(quantityKg)]);
    expect(kg).toEqual([
      ['4711', 1_344],
      ['4711/2', 96],
    ]);
  });

  it('refuses unreleased process data, and says whom to ask', async () => {
    const { id } = await entered({ productId: 'raw' });
    const [status, problem] = await outcome(await plan(id, { revision: 0, part: 'levelled', weekStart: null }));
    expect([status, problem]).toMatchObject([409, { code: 'ORDER-PROCESS-DATA' }]);
    expect(JSON.stringify(problem)).toContain('Ask the quality lead to release it');
    expect(await netOf(id)).toEqual([]);
    expect((await listed()).products.find((product) => product.id === 'raw')?.refusal).toContain('SP-20, issue 1');
  });

  it('is done once', async () => {
    const { id } = await planned();
    const again = await plan(id, { revision: 1, part: 'levelled', weekStart: null });
    expect(await outcome(again)).toMatchObject([409, { code: 'ORDER-PLANNED' }]);
    expect(await netOf(id)).toHaveLength(7);
  });

  it('keeps product and quantity, and takes new times along', async () => {
    const { id } = await planned();
    const other = await change(id, { ...request, quantity: 301, revision: 1 });
    expect(await outcome(other)).toMatchObject([409, { code: 'ORDER-PLANNED', fields: [{ path: 'quantity' }] }]);
    expect((await change(id, { ...request, due: '2026-12-03T14:00', revision: 1 })).status).toBe(200);
    const due = (await netOf(id)).flatMap(({ dueAt }) => (dueAt ? [dueAt.toISOString()] : []));
    expect(due).toEqual(Array.from({ length: 3 }, () => '2026-12-03T13:00:00.000Z'));
  });
});

describe('taking an order back', () => {
  it('takes its net and links out of the week', async () => {
    const before = await db.select().from(links);
    const { id } = await planned();
    expect((await takeBack(id)).status).toBe(200);
    expect([await netOf(id), await db.select().from(links)]).toEqual([[], before]);
    expect((await listed()).orders[0]?.state.kind).toBe('notPlanned');
    expect(await outcome(await takeBack(id))).toMatchObject([409, { code: 'ORDER-NOT-PLANNED' }]);
  });

  it('is refused while anything of it is placed', async () => {
    const { id } = await planned();
    const [load] = await netOf(id);
    await db
      .update(activities)
      .set({ unitId: 'R1', startAt: new Date('2026-12-03T08:00:00Z') })
      .where(and(eq(activities.orderId, id), eq(activities.id, load?.id ?? '')));
    const [status, problem] = await outcome(await takeBack(id));
    expect([status, problem]).toMatchObject([409, { code: 'ORDER-PLACED' }]);
    expect(JSON.stringify(problem)).toContain('1 of 7 of 4711 has a place on the board');
    expect(await netOf(id)).toHaveLength(7);
    expect((await listed()).orders[0]?.state).toMatchObject({ kind: 'planned', placed: 1 });
  });
});
