import { createHash } from 'node:crypto';
import type { SpreadListDto, SpreadRequest, UnitSpreadDto } from '@/contracts/spread';
import { uniformSpread, type StartSpread } from '@/core/header/spread/startSpread';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, withStatus, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { localDate } from '../weeks/weekTime';
import { recordedDeviations, recordedStarts, RECORDED_WEEKS } from './recordedStarts';
import { timeZoneOf, unitSpreadRows, writeSpread, type UnitSpreadRow } from './spread.repo';

/** Fewer recorded starts than this say too little: one of them alone would stand for a tenth of the weeks. */
export const LEAST_RECORDED = 10;

type Deviations = ReadonlyMap<string, readonly number[]>;

/** The start spread of every unit in use, with what the floor has recorded. */
export async function listSpreads(actor: Authorized<'plant.read'>): Promise<Result<SpreadListDto, HttpProblem>> {
  const timeZone = await timeZoneOf(db, actor.plantId);
  if (timeZone === null) return fail(notFound());
  const deviations = await recordedDeviations(db, actor.plantId, timeZone);
  const rows = await unitSpreadRows(db, actor.plantId);
  return ok({
    weeks: RECORDED_WEEKS,
    leastCount: LEAST_RECORDED,
    units: rows.map((row) => dtoOf(row, deviations)),
  });
}

/** Sets a unit's start spread from experience or from the recorded starts, or takes it as on time again. */
export function setSpread(
  actor: Authorized<'library.edit'>,
  unitId: string,
  request: SpreadRequest,
): Promise<Result<UnitSpreadDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const [row] = await unitSpreadRows(tx, actor.plantId, unitId);
    const timeZone = await timeZoneOf(tx, actor.plantId);
    if (!row || timeZone === null) return fail(notFound(`There is no such unit in use at ${actor.plantName}.`));
    const deviations = await recordedDeviations(tx, actor.plantId, timeZone);
    if (seenOf(row) !== request.seen) {
      const message = `The starts of ${row.unit.name} have been changed since. See what they are now, and set them again.`;
      return fail(conflict('SPREAD-STALE', message, { unit: dtoOf(row, deviations) }));
    }
    const wanted = wantedOf(request, deviations.get(unitId) ?? [], localDate(now(), timeZone));
    if (!wanted.ok) return wanted;
    return ok(await saved(tx, actor, row, wanted.value, deviations));
  });
}

interface Wanted {
  readonly spread: StartSpread | null;
  readonly source: string | null;
}

function wantedOf(request: SpreadRequest, deviations: readonly number[], date: string): Result<Wanted, HttpProblem> {
  if (request.kind === 'onTime') return ok({ spread: null, source: null });
  if (request.kind === 'experience') {
    const spread = uniformSpread(request.earlyMin, request.lateMin);
    return spread.ok
      ? ok({ spread: spread.value, source: `experience, ${date}` })
      : fail(withStatus(400, spread.error));
  }
  const { count, outcomes } = recordedStarts(deviations);
  if (count < LEAST_RECORDED) {
    const message = `${count} starts are recorded of the last ${RECORDED_WEEKS} weeks; at least ${LEAST_RECORDED} are needed.`;
    return fail(badInput('INPUT-SPREAD', message));
  }
  return ok({ spread: { outcomes }, source: `${count} recorded starts of ${RECORDED_WEEKS} weeks to ${date}` });
}

async function saved(
  tx: Db,
  actor: Authorized<'library.edit'>,
  { unit, lineName }: UnitSpreadRow,
  { spread, source }: Wanted,
  deviations: Deviations,
): Promise<UnitSpreadDto> {
  await writeSpread(tx, actor.plantId, unit.id, spread, source);
  await record(tx, actor, 'plant.startSpread', unit.id, {
    before: { spread: unit.startSpread, source: unit.startSpreadSource },
    after: { spread, source },
  });
  await notify(tx, actor.plantId, { kind: 'plant' });
  return dtoOf({ unit: { ...unit, startSpread: spread, startSpreadSource: source }, lineName }, deviations);
}

function dtoOf(row: UnitSpreadRow, deviations: Deviations): UnitSpreadDto {
  const { unit, lineName } = row;
  return {
    unitId: unit.id,
    name: unit.name,
    lineName,
    kind: unit.kind,
    spread: unit.startSpread,
    source: unit.startSpreadSource,
    seen: seenOf(row),
    recorded: recordedStarts(deviations.get(unit.id) ?? []),
  };
}

/** Stands for a spread as it is: the chances in a fixed order, so that how the database keeps them plays no part. */
function seenOf({ unit }: UnitSpreadRow): string {
  const outcomes = unit.startSpread?.outcomes.map(({ deviationMin, chance }) => [deviationMin, chance]) ?? null;
  return createHash('sha1')
    .update(JSON.stringify([outcomes, unit.startSpreadSource]))
    .digest('hex');
}
