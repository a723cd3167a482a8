import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import type { ProcessDataDto, ProcessDataListDto } from '@/contracts/processData';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { plants, processData, products } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import { authorize, type Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { conflict, notFound, type HttpProblem } from '../http/problem';
import { namesOf } from '../people/people.repo';
import { record } from '../record/record';

type ProcessDataRow = typeof processData.$inferSelect;

const GONE = 'somebody who has left';

/** Why this person can't release the data as it stands: done before, out of force, or entered by themselves. */
function standing(actor: Actor, row: ProcessDataRow): HttpProblem | null {
  const what = `${row.document} issue ${row.issue}`;
  if (row.withdrawnAt) return conflict('RELEASE-WITHDRAWN', `${what} was withdrawn. Enter a new issue of it.`);
  if (row.releasedBy) return conflict('RELEASE-DONE', `${what} is released already.`);
  if (row.enteredBy !== actor.personId) return null;
  return conflict(
    'RELEASE-OWN',
    `You entered ${what} yourself: a second person with the quality role must release it.`,
  );
}

function refusalFor(actor: Actor, row: ProcessDataRow): string | null {
  const authorized = authorize(actor, 'processData.release');
  return authorized.ok ? (standing(actor, row)?.message ?? null) : authorized.error.message;
}

function dtoOf(actor: Actor, row: ProcessDataRow, productName: string, names: ReadonlyMap<string, string>) {
  const { id, productId, document, issue, values, releasedBy, releasedAt } = row;
  const dto: ProcessDataDto = {
    id,
    productId,
    productName,
    document,
    issue,
    values,
    enteredBy: names.get(row.enteredBy) ?? GONE,
    enteredAt: row.createdAt.toISOString(),
    released: releasedBy && releasedAt ? { by: names.get(releasedBy) ?? GONE, at: releasedAt.toISOString() } : null,
    withdrawnAt: row.withdrawnAt?.toISOString() ?? null,
    releaseRefusal: refusalFor(actor, row),
  };
  return dto;
}

async function dtos(tx: Db, actor: Actor, id?: string): Promise<ProcessDataDto[]> {
  const own = eq(processData.plantId, actor.plantId);
  const rows = await tx
    .select({ row: processData, productName: products.name })
    .from(processData)
    .innerJoin(products, eq(products.id, processData.productId))
    .where(id === undefined ? own : and(own, eq(processData.id, id)))
    .orderBy(asc(products.name), desc(processData.createdAt), asc(processData.id));
  const names = await namesOf(
    tx,
    rows.flatMap(({ row }) => (row.releasedBy ? [row.enteredBy, row.releasedBy] : [row.enteredBy])),
  );
  return rows.map(({ row, productName }) => dtoOf(actor, row, productName, names));
}

/** The plant's process data by product, newest first; nobody changes any of it here. */
export async function listProcessData(
  actor: Authorized<'processData.read'>,
): Promise<Result<ProcessDataListDto, HttpProblem>> {
  const [plant] = await db.select({ timeZone: plants.timeZone }).from(plants).where(eq(plants.id, actor.plantId));
  if (!plant) return fail(notFound());
  return ok({ timeZone: plant.timeZone, items: await dtos(db, actor) });
}

/** Releases process data for planning: by a second person, once, for as long as it is in force. */
export function releaseProcessData(
  actor: Authorized<'processData.release'>,
  id: string,
): Promise<Result<ProcessDataDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const owned = and(eq(processData.id, id), eq(processData.plantId, actor.plantId));
    const [row] = await tx.select().from(processData).where(owned).for('update');
    if (!row) return fail(notFound(`There is no such process data at ${actor.plantName}.`));
    const refusal = standing(actor, row);
    if (refusal) return fail(refusal);
    const release = { releasedBy: actor.personId, releasedAt: now() };
    await tx
      .update(processData)
      .set(release)
      .where(and(owned, isNull(processData.releasedBy)));
    await record(tx, actor, 'processData.release', id, { document: row.document, issue: row.issue });
    await notify(tx, actor.plantId, { kind: 'processData' });
    const [dto] = await dtos(tx, actor, id);
    return dto ? ok(dto) : fail(notFound());
  });
}
