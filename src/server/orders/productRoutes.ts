import type { OrderProductDto } from '@/contracts/orders';
import type { OrderRoute } from '@/core/orders/route';
import { splitOrder } from '@/core/orders/split';
import { fail, ok, problem, type Result } from '@/core/result';
import type { Db } from '@/db/client';
import { dutyRows } from '../duties/duties.repo';
import { limitRows, productRows, routeRows, type ProductRow, type RouteRow } from '../products/products.repo';
import { stageModes, type StageMode } from '../products/stageModes';
import { orderRoute, type StageRows } from './orderRoute';
import { processDataOf } from './orders.repo';

export type ProcessDataRow = Awaited<ReturnType<typeof processDataOf>>[number];

/** A product that can be planned: what an order of it is split over. */
export interface PlannableProduct {
  readonly product: ProductRow;
  readonly stages: StageRows;
  readonly route: OrderRoute;
  /** Released; null where nothing of the route is a thermal process. */
  readonly data: ProcessDataRow | null;
  readonly modeOf: StageMode;
}

/** Where no document says how long a load may wait: a week. [min] */
const NO_LONGEST_WAIT_MIN = 10_080;

/** Reads the library once, and gives what makes a product plannable, or why it isn't. */
export async function plannable(tx: Db, plantId: string): Promise<(product: ProductRow) => Result<PlannableProduct>> {
  const routes = await routeRows(tx, plantId);
  const inputs = new Map((await dutyRows(tx, plantId)).map((duty) => [duty.id, duty.inputs]));
  const released = await processDataOf(tx, plantId);
  const modeOf = await stageModes(tx, plantId);
  return (product) => {
    const rows = routes.filter(({ productId }) => productId === product.id);
    if (rows.length === 0)
      return fail(problem('ORDER-ROUTE', `${product.name} has no route yet; add its stages first.`));
    const data = released.find(({ productId }) => productId === product.id) ?? null;
    const refused = isThermal(rows) ? whyNotReleased(product.name, data) : null;
    if (refused) return fail(problem('ORDER-PROCESS-DATA', refused));
    const stages = stageRows(rows, inputs, modeOf);
    if (!stages.ok) return stages;
    const longestWaitMin = longestWait(data);
    const route = orderRoute(stages.value, { fillKg: product.fillKg, longestWaitMin });
    if (!route.ok) return fail(problem(route.error.code, `${product.name}: ${route.error.message}`));
    const fits = splitOrder(route.value, 1, 'levelled');
    if (!fits.ok) return fail(problem(fits.error.code, `${product.name}: ${fits.error.message}`));
    return ok({ product, stages: stages.value, route: route.value, data: isThermal(rows) ? data : null, modeOf });
  };
}

const isThermal = (rows: readonly RouteRow[]): boolean =>
  rows.some(({ stage }) => stage === 'retort' || stage === 'pasteurise');

const longestWait = (data: ProcessDataRow | null): number =>
  data
    ? Math.min(
        data.values.longestWaitSinceClosingMinutes,
        data.values.longestWaitForInitialTemperatureMinutes ?? NO_LONGEST_WAIT_MIN,
      )
    : NO_LONGEST_WAIT_MIN;

function whyNotReleased(name: string, data: ProcessDataRow | null): string | null {
  if (data?.releasedAt) return null;
  if (!data)
    return `${name} has no thermal-process data. Ask the quality lead for it; until it is released nothing can be planned.`;
  return `The process data of ${name} (${data.document}, issue ${data.issue}) is not released. Ask the quality lead to release it; until then nothing can be planned.`;
}

function stageRows(
  rows: readonly RouteRow[],
  inputs: ReadonlyMap<string, Record<string, unknown>>,
  modeOf: StageMode,
): Result<StageRows> {
  const positions = [...new Set(rows.map(({ position }) => position))].sort((a, b) => a - b);
  const stages: StageRows[number][] = [];
  for (const position of positions) {
    const here = rows.filter((row) => row.position === position);
    const worked = here.map((row) => ({ row, inputs: inputs.get(row.dutyId ?? '') ?? {}, mode: modeOf(row) }));
    const able = worked.flatMap(({ mode, ...rest }) => (mode.ok ? [{ ...rest, mode: mode.value }] : []));
    const fault = worked.find(({ mode }) => !mode.ok)?.mode;
    if (able.length === 0 && fault && !fault.ok) return fault;
    stages.push(able);
  }
  return ok(stages);
}

/** Products that are made, with what their orders are split over. */
export async function orderProducts(tx: Db, plantId: string): Promise<OrderProductDto[]> {
  const planOf = await plannable(tx, plantId);
  const limits = new Map((await limitRows(tx, plantId)).map((limit) => [limit.id, limit]));
  const made = (await productRows(tx, plantId)).filter(({ retiredAt }) => retiredAt === null);
  return made.map((product) => {
    const { id, name, fillKg, casePieces } = product;
    const found = planOf(product);
    const own = { id, name, fillKg, casePieces };
    if (!found.ok) return { ...own, route: null, limits: [], refusal: found.error.message };
    const at = found.value.route.stages.findIndex(({ kind }) => kind === 'load');
    const uses = found.value.stages[at]?.[0]?.mode.uses ?? [];
    const named = uses.flatMap(({ limitId, amount, minutes }) => {
      const limit = limits.get(limitId);
      return limit ? [{ name: limit.name, unit: limit.unit, amount, minutes }] : [];
    });
    return { ...own, route: found.value.route, limits: named, refusal: null };
  });
}
