import { and, eq } from 'drizzle-orm';
import type { RouteRequest } from '@/contracts/products';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { routeModes } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import { routeMark } from './productsDto';
import { limitRows, lockProduct, routeRows, type RouteRow } from './products.repo';
import type { SavedProduct } from './products.service';
import { stageModes } from './stageModes';

type Field = { readonly path: string; readonly message: string };

/**
 * Writes a product's whole route, unless somebody else has since it was read. Each stage must be workable on each of
 * its units; activities that are planned keep their modes until they are worked out anew.
 */
export function saveRoute(
  actor: Authorized<'library.edit'>,
  productId: string,
  request: RouteRequest,
): Promise<Result<SavedProduct, HttpProblem>> {
  return db.transaction(async (tx) => {
    const product = await lockProduct(tx, actor.plantId, productId);
    if (!product) return fail(notFound(`There is no such product at ${actor.plantName}.`));
    const before = await routeRows(tx, actor.plantId, productId);
    if (routeMark(before) !== request.read) {
      const message = `The route of ${product.name} has been changed since you opened it; nothing was saved. Load it again.`;
      return fail(conflict('ROUTE-STALE', message));
    }
    const faults = await faultsOf(tx, actor, request);
    if (faults[0]) return fail({ ...badInput('ROUTE', faults[0].message), fields: faults });
    await tx.delete(routeModes).where(and(eq(routeModes.plantId, actor.plantId), eq(routeModes.productId, productId)));
    const rows = rowsOf(actor.plantId, productId, request, before);
    if (rows.length > 0) await tx.insert(routeModes).values(rows);
    await record(tx, actor, 'product.route', productId, { stages: request.stages });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id: productId });
  });
}

/** New rows; what orders are split by stays with its stage and unit. */
function rowsOf(plantId: string, productId: string, { stages }: RouteRequest, before: readonly RouteRow[]) {
  const splitBy = (stage: RouteRow['stage'], unitId: string) => {
    const row = before.find((old) => old.stage === stage && old.unitId === unitId);
    return row ? { sizeKg: row.sizeKg, pieces: row.pieces, piecesPerMin: row.piecesPerMin, yield: row.yield } : {};
  };
  return stages.flatMap(({ stage, units, uses }, position) =>
    units.map((unit) => {
      const own = { id: newId(), plantId, productId, position, stage, uses: [...uses] };
      return { ...own, ...unit, ...splitBy(stage, unit.unitId) };
    }),
  );
}

/** Every unit, duty or limit that the plant does not have, and every stage that can't be worked out, at its field. */
async function faultsOf(tx: Db, actor: Actor, { stages }: RouteRequest): Promise<Field[]> {
  const modeOf = await stageModes(tx, actor.plantId);
  const limits = new Set((await limitRows(tx, actor.plantId)).map(({ id }) => id));
  return stages.flatMap(({ units, uses }, s): Field[] => [
    ...units.flatMap((unit, u): Field[] => {
      const mode = modeOf({ ...unit, uses });
      if (mode.ok) return [];
      const known = ['unitId', 'leadMin', 'afterMin', 'minutes'].find((field) => field === mode.error.field);
      return [{ path: `stages.${s}.units.${u}.${known ?? 'dutyId'}`, message: mode.error.message }];
    }),
    ...uses.flatMap(({ limitId }, i): Field[] =>
      limits.has(limitId) ? [] : [{ path: `stages.${s}.uses.${i}.limitId`, message: 'Choose a shared limit.' }],
    ),
  ]);
}
