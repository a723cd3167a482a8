import { and, eq } from 'drizzle-orm';
import type { ChangeDutyRequest, DutiesDto, NewDutyRequest } from '@/contracts/duties';
import { faultField } from '@/core/duty/dutyFields';
import { supplyOf } from '@/core/duty/supply';
import { workOut, type DutyModel } from '@/core/duty/model';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { duties } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, withStatus, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { namesOf } from '../people/people.repo';
import { record } from '../record/record';
import { dayTime, someOf } from '../plans/words';
import { dutiesDto, headersOfDuty, readUses, usesOf } from './dutiesDto';
import { headerRows, lockDuty, plantPlace, type DutyRow, type HeaderRow } from './duties.repo';
import { refreshCleaning } from './refreshCleaning';

/** What a save answers with: the duty's id and its revision now. */
export interface SavedDuty {
  readonly id: string;
  readonly revision: number;
}

/** Every duty of the actor's plant. */
export async function listDuties(actor: Authorized<'library.read'>): Promise<Result<DutiesDto, HttpProblem>> {
  const dto = await dutiesDto(db, actor.plantId);
  return dto ? ok(dto) : fail(notFound());
}

/** Writes a new duty once it can be worked out on the header that it was tried on. */
export function createDuty(
  actor: Authorized<'library.edit'>,
  { name, duty, tryOnHeaderId }: NewDutyRequest,
): Promise<Result<SavedDuty, HttpProblem>> {
  return db.transaction(async (tx) => {
    const refused = await unworkable(tx, actor, duty, tryOnHeaderId, []);
    if (refused) return fail(refused);
    const id = newId();
    const { model, inputs } = duty;
    const written = { id, plantId: actor.plantId, name, model, inputs: { ...inputs }, ...stamp(actor) };
    await tx.insert(duties).values({ ...written, createdAt: now() });
    await record(tx, actor, 'duty.create', id, { name, model, inputs });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id, revision: 0 });
  });
}

/** Changes a duty, unless it has been changed since it was read or can't be worked out where it is used. */
export function changeDuty(
  actor: Authorized<'library.edit'>,
  id: string,
  request: ChangeDutyRequest,
): Promise<Result<SavedDuty, HttpProblem>> {
  return db.transaction(async (tx) => {
    const locked = await current(tx, actor, id, request.revision);
    if (!locked.ok) return locked;
    const { name, duty, tryOnHeaderId } = request;
    const { model, inputs } = duty;
    const usedOn = headersOfDuty(id, await readUses(tx, actor.plantId));
    const refused = await unworkable(tx, actor, duty, tryOnHeaderId, usedOn);
    if (refused) return fail(refused);
    const revision = request.revision + 1;
    await write(tx, actor, id, { name, model, inputs: { ...inputs }, revision });
    await refreshCleaning(tx, actor.plantId);
    const before = { name: locked.value.name, model: locked.value.model, inputs: locked.value.inputs };
    await record(tx, actor, 'duty.change', id, { revision, before, after: { name, model, inputs } });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id, revision });
  });
}

/** Takes a duty out of use; refused while a route, a cleaning rule or a run not yet started needs it. */
export function retireDuty(
  actor: Authorized<'library.edit'>,
  id: string,
  revision: number,
): Promise<Result<SavedDuty, HttpProblem>> {
  return db.transaction(async (tx) => {
    const locked = await current(tx, actor, id, revision);
    if (!locked.ok) return locked;
    const uses = usesOf(id, await readUses(tx, actor.plantId));
    if (uses.length > 0) {
      const by = someOf(uses.map(({ text }) => text));
      return fail(
        conflict('DUTY-USED', `“${locked.value.name}” is still used by ${by}. Give them another duty first.`),
      );
    }
    await write(tx, actor, id, { retiredAt: now(), revision: revision + 1 });
    await record(tx, actor, 'duty.retire', id, { name: locked.value.name });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return ok({ id, revision: revision + 1 });
  });
}

const stamp = (actor: Actor) => ({ changedAt: now(), changedBy: actor.personId });

const write = (tx: Db, actor: Actor, id: string, values: Partial<typeof duties.$inferInsert>) =>
  tx
    .update(duties)
    .set({ ...values, ...stamp(actor) })
    .where(and(eq(duties.plantId, actor.plantId), eq(duties.id, id)));

/** The duty under lock, if it is there, in use and as it was read. */
async function current(tx: Db, actor: Actor, id: string, revision: number): Promise<Result<DutyRow, HttpProblem>> {
  const row = await lockDuty(tx, actor.plantId, id);
  if (!row) return fail(notFound(`There is no such duty at ${actor.plantName}.`));
  if (row.retiredAt) return fail(conflict('DUTY-RETIRED', `“${row.name}” has been taken out of use.`));
  if (row.revision === revision) return ok(row);
  const place = await plantPlace(tx, actor.plantId);
  const names = await namesOf(tx, row.changedBy === null ? [] : [row.changedBy]);
  const by = row.changedBy === null ? 'somebody else' : (names.get(row.changedBy) ?? 'somebody who has left');
  const at = row.changedAt && place ? ` at ${dayTime(row.changedAt, place.timeZone, now())}` : '';
  const message = `“${row.name}” was changed by ${by}${at} since you opened it; nothing was saved. Load it again.`;
  const { name, model, inputs } = row;
  return fail(conflict('DUTY-STALE', message, { now: { name, model, inputs, revision: row.revision } }));
}

/** Why the duty can't be worked out on the header that it was tried on, or on one that it is used on; null: it can. */
async function unworkable(
  tx: Db,
  actor: Actor,
  duty: DutyModel,
  triedOn: string,
  usedOn: readonly string[],
): Promise<HttpProblem | null> {
  const place = await plantPlace(tx, actor.plantId);
  const headers = await headerRows(tx, actor.plantId);
  const tried = headers.find(({ id }) => id === triedOn);
  if (!place || !tried) {
    return badInput('DUTY-HEADER', `${actor.plantName} has no such header to try the duty on.`, 'tryOnHeaderId');
  }
  const used = headers.filter(({ id }) => id !== triedOn && usedOn.includes(id));
  return [tried, ...used].reduce<HttpProblem | null>(
    (found, header) => found ?? unworkableOn(duty, header, place.altitudeM, header === tried),
    null,
  );
}

function unworkableOn(duty: DutyModel, header: HeaderRow, altitudeM: number, isTried: boolean): HttpProblem | null {
  const supply = supplyOf(header, altitudeM);
  if (!supply.ok) return withStatus(409, { ...supply.error, field: 'tryOnHeaderId' });
  const worked = workOut(duty, supply.value);
  if (worked.ok) return null;
  const { code, message } = worked.error;
  const field = faultField(duty, worked.error);
  const told = isTried ? message : `On the ${header.name.toLowerCase()}, where it is used: ${message}`;
  return withStatus(400, { code, message: told, ...(field === undefined ? {} : { field: `duty.inputs.${field}` }) });
}
