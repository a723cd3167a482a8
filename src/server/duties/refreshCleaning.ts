import { and, eq } from 'drizzle-orm';
import { parseDuty } from '@/contracts/dutyInputs';
import { gridMinutes, toGrid } from '@/core/demand/grid';
import { workOut } from '@/core/duty/model';
import { supplyOf } from '@/core/duty/supply';
import type { Phase } from '@/core/plant/activity';
import { fail, ok, type Result } from '@/core/result';
import type { Db } from '@/db/client';
import { cleaningRules } from '@/db/schema/index';
import { conflict, withStatus, type HttpProblem } from '../http/problem';
import { cleaningUses, dutyRows, headerOfKinds, headerRows, plantPlace } from './duties.repo';

/** A cleaning's phases, and the minutes that they take. */
interface CleaningDraw {
  readonly phases: readonly Phase[];
  readonly minutes: number;
}

type Drawn = (dutyId: string, unitKind: string) => Result<CleaningDraw, HttpProblem>;

/** Gives what works a cleaning's duty out on the header of a kind of unit; each pair once. */
export async function cleaningDraws(tx: Db, plantId: string): Promise<Drawn> {
  const place = await plantPlace(tx, plantId);
  const headers = new Map((await headerRows(tx, plantId)).map((header) => [header.id, header]));
  const headerOfKind = await headerOfKinds(tx, plantId);
  const duties = new Map((await dutyRows(tx, plantId)).map((duty) => [duty.id, duty]));
  const known = new Map<string, Result<CleaningDraw, HttpProblem>>();
  const work: Drawn = (dutyId, unitKind) => {
    const row = duties.get(dutyId);
    if (!row) return fail(conflict('DUTY-GONE', 'The cleaning names a duty that is not there.'));
    const duty = parseDuty(row.model, row.inputs);
    if (!duty.ok) return fail(withStatus(409, duty.error));
    const header = headers.get(headerOfKind.get(unitKind) ?? '');
    if (!header || !place) {
      return fail(
        conflict('CLEANING-HEADER', 'No unit of this kind draws on a header; a cleaning of it takes no steam.'),
      );
    }
    const supply = supplyOf(header, place.altitudeM);
    const worked = supply.ok ? workOut(duty.value, supply.value) : supply;
    if (!worked.ok) {
      const where = `“${row.name}” as a cleaning on the ${header.name.toLowerCase()}`;
      return fail(withStatus(409, { code: worked.error.code, message: `${where}: ${worked.error.message}` }));
    }
    return ok({ phases: toGrid(worked.value.phases), minutes: gridMinutes(worked.value.phases) });
  };
  return (dutyId, unitKind) => {
    const key = `${dutyId} ${unitKind}`;
    const found = known.get(key) ?? work(dutyId, unitKind);
    known.set(key, found);
    return found;
  };
}

/**
 * Works the steam of every cleaning rule with a duty out anew; a cleaning lasts at least as long as it draws. A rule
 * whose duty can't be worked out keeps what it had.
 */
export async function refreshCleaning(tx: Db, plantId: string): Promise<void> {
  const draws = await cleaningDraws(tx, plantId);
  for (const rule of await cleaningUses(tx, plantId)) {
    if (rule.dutyId === null) continue;
    const drawn = draws(rule.dutyId, rule.unitKind);
    if (!drawn.ok) continue;
    const phases = [...drawn.value.phases];
    const minutes = Math.max(rule.minutes, drawn.value.minutes);
    if (minutes === rule.minutes && JSON.stringify(phases) === JSON.stringify(rule.phases)) continue;
    await tx
      .update(cleaningRules)
      .set({ phases, minutes })
      .where(and(eq(cleaningRules.plantId, plantId), eq(cleaningRules.id, rule.id)));
  }
}
