import { and, eq } from 'drizzle-orm';
import type { ChangeProductRequest, ProductRequest, ProductsDto } from '@/contracts/products';
import type { SpecificHeatBasis } from '@/core/duty/specificHeat';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { families, products } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import { productMark, productsDto } from './productsDto';
import { lockProduct, plannedRuns, type ProductRow } from './products.repo';

export interface SavedProduct {
  readonly id: string;
}

/** Products, families, routes and cleaning of the actor's plant. */
export async function listProducts(actor: Authorized<'library.read'>): Promise<Result<ProductsDto, HttpProblem>> {
  const dto = await productsDto(db, actor.plantId);
  return dto ? ok(dto) : fail(notFound());
}

/** Writes a new product. */
export function createProduct(
  actor: Authorized<'library.edit'>,
  request: ProductRequest,
): Promise<Result<SavedProduct, HttpProblem>> {
  return db.transaction(async (tx) => {
    const foreign = await foreignFamily(tx, actor, request.familyId);
    if (foreign) return fail(foreign);
    const id = newId();
    await tx.insert(products).values({ id, plantId: actor.plantId, ...columnsOf(request) });
    await record(tx, actor, 'product.create', id, { ...request });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id });
  });
}

/** Changes a product, unless somebody else has since it was read. */
export function changeProduct(
  actor: Authorized<'library.edit'>,
  id: string,
  { read, ...request }: ChangeProductRequest,
): Promise<Result<SavedProduct, HttpProblem>> {
  return db.transaction(async (tx) => {
    const found = await productAsRead(tx, actor, id, read);
    if (!found.ok) return found;
    const foreign = await foreignFamily(tx, actor, request.familyId);
    if (foreign) return fail(foreign);
    await write(tx, actor, id, columnsOf(request));
    await record(tx, actor, 'product.change', id, { before: found.value, after: request });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id });
  });
}

/** Takes a product out of use; refused while runs of it are planned that have not started. */
export function retireProduct(
  actor: Authorized<'library.edit'>,
  id: string,
  read: string,
): Promise<Result<SavedProduct, HttpProblem>> {
  return db.transaction(async (tx) => {
    const found = await productAsRead(tx, actor, id, read);
    if (!found.ok) return found;
    const runs = (await plannedRuns(tx, actor.plantId)).get(id) ?? 0;
    if (runs > 0) {
      const message = `${runs} ${runs === 1 ? 'run' : 'runs'} of ${found.value.name} ${runs === 1 ? 'is' : 'are'} planned`;
      return fail(conflict('PRODUCT-USED', `${message} and not yet started; it can't be taken out of use now.`));
    }
    await write(tx, actor, id, { retiredAt: now() });
    await record(tx, actor, 'product.retire', id, { name: found.value.name });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id });
  });
}

/** The product under lock, if it is there, made and as it was read. */
export async function productAsRead(
  tx: Db,
  actor: Actor,
  id: string,
  read: string,
): Promise<Result<ProductRow, HttpProblem>> {
  const row = await lockProduct(tx, actor.plantId, id);
  if (!row) return fail(notFound(`There is no such product at ${actor.plantName}.`));
  if (row.retiredAt) return fail(conflict('PRODUCT-RETIRED', `${row.name} has been taken out of use.`));
  if (productMark(row) === read) return ok(row);
  const message = `${row.name} has been changed since you opened it; nothing was saved. Load it again.`;
  return fail(conflict('PRODUCT-STALE', message, { now: row }));
}

const write = (tx: Db, actor: Actor, id: string, values: Partial<typeof products.$inferInsert>) =>
  tx
    .update(products)
    .set(values)
    .where(and(eq(products.plantId, actor.plantId), eq(products.id, id)));

/** A composition is a column of its own; any other basis stands beside an empty one. */
function columnsOf({ basis, ...rest }: ProductRequest) {
  const composition = basis.kind === 'composition' ? { ...basis.composition } : {};
  const specificHeat: SpecificHeatBasis | null = basis.kind === 'composition' ? null : basis;
  return { ...rest, composition, specificHeat };
}

async function foreignFamily(tx: Db, actor: Actor, familyId: string): Promise<HttpProblem | null> {
  const owned = and(eq(families.plantId, actor.plantId), eq(families.id, familyId));
  const [row] = await tx.select({ retiredAt: families.retiredAt }).from(families).where(owned);
  if (row && row.retiredAt === null) return null;
  return badInput('PRODUCT-FAMILY', `${actor.plantName} has no such family.`, 'familyId');
}
