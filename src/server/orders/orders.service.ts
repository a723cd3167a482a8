import type {
  ChangeOrderRequest,
  OrderDto,
  OrderRequest,
  OrdersDto,
  OrderStateDto,
  SavedOrderDto,
} from '@/contracts/orders';
import { fail, ok, type Result } from '@/core/result';
import { zonedText } from '@/calendar/dates';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { lockPlanById, setPlanRevision } from '../plans/plans.repo';
import { productRows, routeRows, type ProductRow } from '../products/products.repo';
import { record } from '../record/record';
import { plantRow } from '../weeks/plantParts.repo';
import { instantOf, wallMinute, weekStartOf, weekTimeOf, type WeekRule } from '../weeks/weekTime';
import * as repo from './orders.repo';
import { orderProducts } from './productRoutes';

const SHOWN_DAYS = 90;
const DAY_MS = 86_400_000;

/** Orders of the actor's plant, how far each has got, and the products that orders can name. */
export async function listOrders(actor: Authorized<'plan.read'>): Promise<Result<OrdersDto, HttpProblem>> {
  const { plantId } = actor;
  const plant = await plantRow(db, plantId);
  if (!plant) return fail(notFound());
  const rows = await repo.orderRows(db, plantId, new Date(now().getTime() - SHOWN_DAYS * DAY_MS));
  const products = new Map((await productRows(db, plantId)).map((product) => [product.id, product]));
  const progress = await repo.progressRows(db, plantId);
  const issued = await repo.issuedOrders(db, plantId);
  const orders = rows.flatMap((row): OrderDto[] => {
    const product = products.get(row.productId);
    const far = progress.find(({ orderId }) => orderId === row.id);
    return product ? [orderDto(row, product, plant, stateOf(far, issued.has(row.id)))] : [];
  });
  return ok({ timeZone: plant.timeZone, orders, products: await orderProducts(db, plantId) });
}

type Progress = Awaited<ReturnType<typeof repo.progressRows>>[number];

function stateOf(far: Progress | undefined, isIssued: boolean): OrderStateDto {
  if (!far) return { kind: 'notPlanned', total: 0, placed: 0, weekStart: null };
  const { total, placed, weekStart, started } = far;
  return { kind: isIssued || started > 0 ? 'onFloor' : 'planned', total, placed, weekStart };
}

const caseKg = ({ casePieces, fillKg }: ProductRow): number => casePieces * fillKg;

/** A quantity in cases comes back as it was typed, without rounding noise. */
const shown = (value: number): number => Number(value.toPrecision(12));

function orderDto(row: repo.OrderRow, product: ProductRow, plant: WeekRule, state: OrderStateDto): OrderDto {
  const { id, number, productId, quantityKg, priority, revision } = row;
  const wall = (at: Date): string => zonedText(at, plant.timeZone, "yyyy-MM-dd'T'HH:mm");
  return {
    ...{ id, number, productId, productName: product.name, quantityKg, priority, revision, state },
    quantity: shown(row.quantityUnit === 'cases' ? quantityKg / caseKg(product) : quantityKg),
    unit: row.quantityUnit,
    earliest: row.earliestAt && wall(row.earliestAt),
    latestStart: row.latestStartAt && wall(row.latestStartAt),
    due: wall(row.dueAt),
    dueWeek: weekStartOf(row.dueAt, plant),
  };
}

/** The instant of a time on the plant's clock. */
function instantOfWall(text: string, timeZone: string): Date {
  const [date = '', clock = ''] = text.split('T');
  const [hours = 0, minutes = 0] = clock.split(':').map(Number);
  const time = weekTimeOf(date, timeZone);
  return instantOf(time, wallMinute(time, date, hours * 60 + minutes));
}

async function columnsOf(tx: Db, actor: Actor, request: OrderRequest) {
  const plant = await plantRow(tx, actor.plantId);
  const product = (await productRows(tx, actor.plantId)).find(({ id }) => id === request.productId);
  if (!plant || !product)
    return fail(badInput('ORDER-PRODUCT', `${actor.plantName} has no such product.`, 'productId'));
  if (product.retiredAt) {
    return fail(badInput('ORDER-PRODUCT', `${product.name} has been taken out of use.`, 'productId'));
  }
  const { number, productId, quantity, unit, priority } = request;
  const at = (text: string | null) => (text === null ? null : instantOfWall(text, plant.timeZone));
  return ok({
    ...{ number, productId, priority },
    quantityKg: unit === 'cases' ? quantity * caseKg(product) : quantity,
    quantityUnit: unit,
    earliestAt: at(request.earliest),
    latestStartAt: at(request.latestStart),
    dueAt: instantOfWall(request.due, plant.timeZone),
  });
}

/** Writes a new order. */
export function createOrder(
  actor: Authorized<'plan.edit'>,
  request: OrderRequest,
): Promise<Result<SavedOrderDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const columns = await columnsOf(tx, actor, request);
    if (!columns.ok) return columns;
    const id = newId();
    await repo.insertOrder(tx, { id, plantId: actor.plantId, createdAt: now(), ...columns.value });
    await told(tx, actor, 'order.create', id, { ...request });
    return ok({ id, revision: 0 });
  });
}

/** Changes an order, unless somebody else has since it was read; what is planned of it keeps product and quantity. */
export function changeOrder(
  actor: Authorized<'plan.edit'>,
  id: string,
  { revision, ...request }: ChangeOrderRequest,
): Promise<Result<SavedOrderDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const found = await orderAsRead(tx, actor, id, revision);
    if (!found.ok) return found;
    const before = found.value;
    const [far] = await repo.progressRows(tx, actor.plantId, id);
    const plan = far ? await lockPlanById(tx, actor.plantId, far.planId) : null;
    const columns = await columnsOf(tx, actor, request);
    if (!columns.ok) return columns;
    const after = { ...before, ...columns.value };
    const isOther = after.productId !== before.productId || Math.abs(after.quantityKg - before.quantityKg) > 1e-6;
    if (far && isOther) {
      const field = after.productId === before.productId ? 'quantity' : 'productId';
      const message = `${before.number} is planned: take it back from the week first. Nothing was saved.`;
      return fail({ ...conflict('ORDER-PLANNED', message), fields: [{ path: field, message }] });
    }
    await repo.writeOrder(tx, before, columns.value);
    if (plan) {
      const [first] = await routeRows(tx, actor.plantId, after.productId);
      const { firstInstant } = weekTimeOf(plan.weekStart, (await plantRow(tx, actor.plantId))?.timeZone ?? 'UTC');
      await repo.retimeNet(tx, plan, after, later(after.earliestAt, firstInstant), first?.stage ?? null);
      await setPlanRevision(tx, plan, plan.revision + 1);
      await notify(tx, plan.plantId, { kind: 'plan', planId: plan.id, revision: plan.revision + 1 });
    }
    await told(tx, actor, 'order.change', id, { before, after: request });
    return ok({ id, revision: before.revision + 1 });
  });
}

/** The later of an order's earliest start and its week's first instant. */
export const later = (at: Date | null, firstInstant: Date): Date => (at && at > firstInstant ? at : firstInstant);

/** Deletes an order of which nothing is planned. */
export function deleteOrder(actor: Authorized<'plan.edit'>, id: string): Promise<Result<undefined, HttpProblem>> {
  return db.transaction(async (tx) => {
    const row = await repo.lockOrder(tx, actor.plantId, id);
    if (!row) return fail(notFound(`There is no such order at ${actor.plantName}.`));
    const planned = await repo.progressRows(tx, actor.plantId, id);
    if (planned.length > 0) {
      const message = `${row.number} is planned: take it back from the week first. Nothing was deleted.`;
      return fail(conflict('ORDER-PLANNED', message));
    }
    await repo.deleteOrder(tx, row);
    await told(tx, actor, 'order.delete', id, { before: row });
    return ok(undefined);
  });
}

/** The order under lock, if it is there and as it was read. */
export async function orderAsRead(
  tx: Db,
  actor: Actor,
  id: string,
  revision: number,
): Promise<Result<repo.OrderRow, HttpProblem>> {
  const row = await repo.lockOrder(tx, actor.plantId, id);
  if (!row) return fail(notFound(`There is no such order at ${actor.plantName}.`));
  if (row.revision === revision) return ok(row);
  const message = `${row.number} has been changed since you read it; nothing was saved. Look at it as it is now.`;
  return fail(conflict('ORDER-STALE', message, { now: row }));
}

/** Keeps who did it, and has open pages read anew. */
export async function told(
  tx: Db,
  actor: Actor,
  action: string,
  subject: string,
  details: Readonly<Record<string, unknown>>,
): Promise<void> {
  await record(tx, actor, action, subject, details);
  await notify(tx, actor.plantId, { kind: 'orders' });
}
