import type { PlannedOrderDto, PlanOrderRequest } from '@/contracts/orders';
import { piecesOf } from '@/core/orders/amounts';
import { orderNet, type NetInput, type OrderNet } from '@/core/orders/net';
import { splitOrder, type OrderSplit } from '@/core/orders/split';
import type { Activity, Link, Mode } from '@/core/plant/activity';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { codesOf } from '../cleanings/cleanings.repo';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { conflict, notFound, withStatus, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { lockPlanById, setPlanRevision, type PlanRow } from '../plans/plans.repo';
import { productRows } from '../products/products.repo';
import { plantRow } from '../weeks/plantParts.repo';
import { findWeek, planOf } from '../weeks/findWeek';
import { ceilMinuteOf, instantOf, minuteOf, weekStartOf, type WeekTime } from '../weeks/weekTime';
import { partMode } from './orderModes';
import { steamOnMin } from './orderRoute';
import * as repo from './orders.repo';
import { later, orderAsRead, told } from './orders.service';
import { plannable, type PlannableProduct } from './productRoutes';

/** Splits an order over its product's route and adds its net to a week, not yet placed. */
export function planOrder(
  actor: Authorized<'plan.edit'>,
  id: string,
  request: PlanOrderRequest,
): Promise<Result<PlannedOrderDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const plant = await plantRow(tx, actor.plantId);
    const found = await orderAsRead(tx, actor, id, request.revision);
    if (!found.ok || !plant) return found.ok ? fail(notFound()) : found;
    const order = found.value;
    if ((await repo.progressRows(tx, actor.plantId, id)).length > 0) {
      return fail(conflict('ORDER-PLANNED', `${order.number} is planned already; nothing was added.`));
    }
    const week = await findWeek(actor, request.weekStart ?? weekStartOf(order.dueAt, plant), tx);
    if (!week.ok) return week;
    const product = await plannableOf(tx, actor, order);
    if (!product.ok) return product;
    const split = splitOrder(
      product.value.route,
      piecesOf(order.quantityKg, product.value.product.fillKg),
      request.part,
    );
    if (!split.ok) return fail(withStatus(400, split.error));
    const plan = await planOf(tx, week.value, true);
    const code = freeCode(order.number, await codesOf(tx, plan));
    const net = netOf(order, product.value, split.value, { code, time: week.value.time });
    if (!net.ok) return net;
    const carriedTo = await carryOver(tx, order, split.value, product.value.product.fillKg);
    await writeNet(tx, plan, order, net.value, week.value.time);
    await repo.writeOrder(tx, order, {});
    const details = { order: order.number, part: request.part, activities: net.value.activities.length, carriedTo };
    const planRevision = await changed(tx, actor, plan, order, 'order.plan', details);
    return ok({ weekStart: plan.weekStart, planRevision, activities: net.value.activities.length, carriedTo });
  });
}

/** Takes an order's net back out of its week, while nothing of it is placed or known to the floor. */
export function takeOrderBack(
  actor: Authorized<'plan.edit'>,
  id: string,
): Promise<Result<PlannedOrderDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const order = await repo.lockOrder(tx, actor.plantId, id);
    if (!order) return fail(notFound(`There is no such order at ${actor.plantName}.`));
    const [far] = await repo.progressRows(tx, actor.plantId, id);
    const plan = far ? await lockPlanById(tx, actor.plantId, far.planId) : null;
    if (!plan)
      return fail(conflict('ORDER-NOT-PLANNED', `${order.number} is not planned; there is nothing to take back.`));
    const rows = await repo.lockNet(tx, plan, id);
    const placed = rows.filter(({ unitId }) => unitId !== null);
    if (placed.length > 0) {
      const many = `${placed.length} of ${rows.length} of ${order.number} ${placed.length === 1 ? 'has' : 'have'}`;
      return fail(
        conflict('ORDER-PLACED', `${many} a place on the board; take them off first. Nothing was taken back.`),
      );
    }
    const ids = rows.map((row) => row.id);
    if ((await repo.issuedOrders(tx, actor.plantId)).has(id) || (await repo.anyRecorded(tx, plan, ids))) {
      return fail(conflict('ORDER-ISSUED', `${order.number} is on the floor and is kept. Nothing was taken back.`));
    }
    await repo.deleteNet(tx, plan, ids);
    await repo.writeOrder(tx, order, {});
    const planRevision = await changed(tx, actor, plan, order, 'order.takeBack', { order: order.number });
    return ok({ weekStart: plan.weekStart, planRevision, activities: rows.length, carriedTo: null });
  });
}

async function plannableOf(tx: Db, actor: Actor, order: repo.OrderRow): Promise<Result<PlannableProduct, HttpProblem>> {
  const product = (await productRows(tx, actor.plantId)).find(({ id }) => id === order.productId);
  if (!product) return fail(notFound());
  if (product.retiredAt) return fail(conflict('ORDER-PRODUCT', `${product.name} has been taken out of use.`));
  const found = (await plannable(tx, actor.plantId))(product);
  return found.ok ? found : fail(withStatus(409, found.error));
}

/** The order's number as activities carry it; with a letter behind where the week has it already. */
function freeCode(number: string, codes: readonly string[]): string {
  const base = number.replace(/\s+/g, '').slice(-12);
  const isTaken = (code: string): boolean => codes.some((other) => other.startsWith(code));
  const tails = ['', ...'bcdefghijklmnopqrstuvwxyz'].map((tail) => (tail === '' ? base : `${base}${tail}.`));
  return tails.find((code) => !isTaken(code)) ?? `${base}.${codes.length}.`;
}

interface NetPlace {
  readonly code: string;
  readonly time: WeekTime;
}

/** The net on the week's clock, with every part's modes; refused where one can't be worked out. */
function netOf(
  order: repo.OrderRow,
  { product, stages, route, data, modeOf }: PlannableProduct,
  split: OrderSplit,
  { code, time }: NetPlace,
): Result<OrderNet, HttpProblem> {
  const at = (kind: 'batch' | 'load') => route.stages.findIndex((stage) => stage.kind === kind);
  const faults: string[] = [];
  const modesOf: NetInput['modesOf'] = (part) => {
    const index = 'ownMin' in part ? part.index : at('inKg' in part ? 'batch' : 'load');
    return (stages[index] ?? []).flatMap((stage): Mode[] => {
      const mode = partMode(stage, part, split, modeOf);
      if (!mode.ok) faults.push(mode.error.message);
      return mode.ok ? [mode.value] : [];
    });
  };
  const values = data?.values;
  const source = data ? `${data.document}, issue ${data.issue}` : '';
  const net = orderNet(
    {
      ...{ id: newId(), code, title: product.name, productId: product.id, familyId: product.familyId, modesOf },
      earliest: ceilMinuteOf(time, later(order.earliestAt, time.firstInstant)),
      latestStart: order.latestStartAt && minuteOf(time, order.latestStartAt),
      due: minuteOf(time, order.dueAt),
      weight: order.priority,
      steamOnMin: steamOnMin(stages[at('load')] ?? []),
      processData: data && { id: data.id, document: data.document, issue: data.issue, released: true },
      waits: values
        ? {
            sinceClosingMin: values.longestWaitSinceClosingMinutes,
            initialTemperatureMin: values.longestWaitForInitialTemperatureMinutes,
            source,
          }
        : null,
    },
    split,
    route.stages[at('batch')]?.stage ?? 'cook',
    route.stages[at('load')]?.stage ?? 'retort',
  );
  const empty = net.activities.some(({ modes }) => modes.length === 0);
  return empty ? fail(conflict('ORDER-MODE', `${product.name}: ${faults[0] ?? 'a stage has no unit.'}`)) : ok(net);
}

/** What a part load leaves over becomes an order of its own, with the same times. */
async function carryOver(tx: Db, order: repo.OrderRow, split: OrderSplit, fillKg: number): Promise<string | null> {
  if (split.carriedPieces === 0) return null;
  const taken = new Set(await repo.numbersLike(tx, order.plantId, order.number));
  const tails = Array.from({ length: taken.size + 1 }, (_, i) => `${order.number}/${i + 2}`);
  const number = tails.find((free) => !taken.has(free)) ?? `${order.number}/rest`;
  const carriedKg = Math.max(0, order.quantityKg - split.pieces * fillKg);
  await repo.insertOrder(tx, { ...order, id: newId(), number, quantityKg: carriedKg, revision: 0, createdAt: now() });
  await repo.writeOrder(tx, order, { quantityKg: order.quantityKg - carriedKg });
  return number;
}

function activityRow(a: Activity, plan: PlanRow, order: repo.OrderRow, time: WeekTime) {
  return {
    ...{ id: a.id, plantId: plan.plantId, planId: plan.id, kind: a.kind, stage: a.stage, batchId: a.batchId },
    ...{ orderId: order.id, code: a.code, title: a.title, productId: a.productId, familyId: a.familyId },
    modes: [...a.modes],
    occupiesUntilLinkId: a.occupiesUntil === 'end' ? null : a.occupiesUntil.linkId,
    earliestAt: instantOf(time, a.earliestStart),
    latestStartAt: a.latestStart === null ? null : order.latestStartAt,
    dueAt: a.due === null ? null : order.dueAt,
    weight: a.weight,
    processDataId: a.processData?.id ?? null,
  };
}

async function writeNet(tx: Db, plan: PlanRow, order: repo.OrderRow, net: OrderNet, time: WeekTime): Promise<void> {
  const linkRow = (link: Link) => ({ ...link, plantId: plan.plantId, planId: plan.id });
  await repo.insertNet(
    tx,
    net.activities.map((activity) => activityRow(activity, plan, order, time)),
    net.links.map(linkRow),
  );
}

/** Counts the plan's next revision, says so to open boards and order lists, and keeps who did it. */
async function changed(
  tx: Db,
  actor: Actor,
  plan: PlanRow,
  order: repo.OrderRow,
  action: string,
  details: Readonly<Record<string, unknown>>,
): Promise<number> {
  const revision = plan.revision + 1;
  await setPlanRevision(tx, plan, revision);
  await notify(tx, plan.plantId, { kind: 'plan', planId: plan.id, revision });
  await told(tx, actor, action, order.id, { revision, ...details });
  return revision;
}
