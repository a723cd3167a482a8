import type { CleaningKind, Mode } from '@/core/plant/activity';
import { fail, ok, type Result } from '@/core/result';
import { longestRule } from '@/core/schedule/plannedCleaning';
import type { Db } from '@/db/client';
import { badInput, withStatus, type HttpProblem } from '../http/problem';
import type { UnitRow } from '../products/products.repo';
import { stageModes } from '../products/stageModes';
import { rulesOf } from './cleanings.repo';

const ONE_OF: Readonly<Record<CleaningKind, string>> = {
  rinse: 'a rinse',
  wash: 'a wash',
  allergen: 'an allergen clean',
};

/** What a clean takes on a unit. A unit without a header draws no steam, as with cleanings that follow. */
export async function cleaningMode(tx: Db, unit: UnitRow, kind: CleaningKind): Promise<Result<Mode, HttpProblem>> {
  const rule = longestRule(await rulesOf(tx, unit.plantId, unit.kind, kind), unit.kind, kind);
  if (!rule) {
    const message = `No cleaning rule says what ${ONE_OF[kind]} of a ${unit.kind} takes; nothing was added.`;
    return fail(badInput('CLEANING-RULE', message, 'kind'));
  }
  const { minutes, phases, uses, dutyId } = rule;
  const plain: Mode = { unitId: unit.id, minutes, phases: unit.headerId === null ? [] : phases, uses, dutyId: null };
  if (dutyId === null || unit.headerId === null) return ok(plain);
  const modeOf = await stageModes(tx, unit.plantId);
  const worked = modeOf({ unitId: unit.id, dutyId, minutes, leadMin: 0, afterMin: 0, uses });
  return worked.ok ? worked : fail(withStatus(409, worked.error));
}
