import { and, eq } from 'drizzle-orm';
import type { CapacityDto, FiringRequest, LimitRequest } from '@/contracts/capacity';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { boilerFirings, boilers, headers, plants, steamLimits } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import { instantOf, isWeekStart, weekTimeOf, type WeekTime } from '../weeks/weekTime';
import { capacityDto } from './capacityDto';

interface Span {
  readonly fromMin: number;
  readonly toMin: number;
  readonly reason: string;
}

/** The clock of one of the plant's weeks; 404 where no week of the plant begins on that day. */
async function timeOf(actor: Actor, weekStart: string): Promise<Result<WeekTime, HttpProblem>> {
  const [plant] = await db
    .select({ timeZone: plants.timeZone, weekStartsOn: plants.weekStartsOn })
    .from(plants)
    .where(eq(plants.id, actor.plantId));
  if (!plant || !isWeekStart(weekStart, plant.weekStartsOn)) {
    return fail(notFound(`No week of ${actor.plantName} begins on ${weekStart}.`));
  }
  return ok(weekTimeOf(weekStart, plant.timeZone));
}

function checkSpan(time: WeekTime, { toMin }: Span): HttpProblem | null {
  if (toMin <= time.horizonMin) return null;
  const message = `The span must end within the week, which has ${time.horizonMin} minutes.`;
  return badInput('CAPACITY-SPAN', message, 'toMin');
}

/** What every row of the capacity record carries. */
function rowOf(actor: Actor, time: WeekTime, { fromMin, toMin, reason }: Span) {
  return {
    id: newId(),
    plantId: actor.plantId,
    fromAt: instantOf(time, fromMin),
    toAt: instantOf(time, toMin),
    reason,
    authorId: actor.personId,
    createdAt: now(),
  };
}

async function change<S extends Span>(
  actor: Authorized<'capacity.set'>,
  weekStart: string,
  request: S,
  write: (tx: Db, time: WeekTime) => Promise<HttpProblem | null>,
): Promise<Result<CapacityDto, HttpProblem>> {
  const time = await timeOf(actor, weekStart);
  if (!time.ok) return time;
  const outside = checkSpan(time.value, request);
  if (outside) return fail(outside);
  const refused = await db.transaction(async (tx) => {
    const refusal = await write(tx, time.value);
    if (!refusal) await notify(tx, actor.plantId, { kind: 'capacity' });
    return refusal;
  });
  return refused ? fail(refused) : ok(await capacityDto(db, actor.plantId, time.value));
}

/** The boiler house of the plant over a week. */
export async function readCapacity(
  actor: Authorized<'capacity.read'>,
  weekStart: string,
): Promise<Result<CapacityDto, HttpProblem>> {
  const time = await timeOf(actor, weekStart);
  return time.ok ? ok(await capacityDto(db, actor.plantId, time.value)) : time;
}

/** Lights, shuts or derates a boiler for a span; what was said before is overruled there, and kept in the record. */
export function setFiring(actor: Authorized<'capacity.set'>, weekStart: string, request: FiringRequest) {
  return change(actor, weekStart, request, async (tx, time) => {
    const { boilerId, share } = request;
    const owned = and(eq(boilers.id, boilerId), eq(boilers.plantId, actor.plantId));
    const [boiler] = await tx.select({ id: boilers.id }).from(boilers).where(owned);
    if (!boiler) return notFound(`There is no such boiler at ${actor.plantName}.`);
    await tx.insert(boilerFirings).values({ ...rowOf(actor, time, request), boilerId, share });
    await record(tx, actor, 'capacity.firing', boilerId, { weekStart, ...request });
    return null;
  });
}

/** Sets a header's steam limit for a span, or takes it back there. */
export function setLimit(actor: Authorized<'capacity.set'>, weekStart: string, request: LimitRequest) {
  return change(actor, weekStart, request, async (tx, time) => {
    const { headerId, limitKgPerH } = request;
    const owned = and(eq(headers.id, headerId), eq(headers.plantId, actor.plantId));
    const [header] = await tx.select({ id: headers.id }).from(headers).where(owned);
    if (!header) return notFound(`There is no such header at ${actor.plantName}.`);
    await tx.insert(steamLimits).values({ ...rowOf(actor, time, request), headerId, limitKgPerH });
    await record(tx, actor, 'capacity.limit', headerId, { weekStart, ...request });
    return null;
  });
}
