import { parseDuty } from '@/contracts/dutyInputs';
import { workMode } from '@/core/demand/workMode';
import type { SteamSupply } from '@/core/duty/duty';
import type { DutyModel } from '@/core/duty/model';
import { supplyOf } from '@/core/duty/supply';
import type { LimitUse, Mode } from '@/core/plant/activity';
import { fail, ok, problem, type Result } from '@/core/result';
import type { Db } from '@/db/client';
import { dutyRows, headerRows, plantPlace } from '../duties/duties.repo';
import { unitRows } from './products.repo';

/** One stage on one unit, as a route has it. */
export interface StageOnUnit {
  readonly unitId: string;
  readonly dutyId: string | null;
  readonly minutes: number;
  readonly leadMin: number;
  readonly afterMin: number;
  readonly uses: readonly LimitUse[];
  /** Duty inputs that hang on a run's quantity, instead of the duty's own; left out: none. */
  readonly sized?: Mode['sized'];
}

/** Works the mode of a stage on a unit out from the library as it is now; each once. */
export type StageMode = (stage: StageOnUnit) => Result<Mode>;

/** Reads the plant's duties, units and headers, and gives what makes modes of them. */
export async function stageModes(tx: Db, plantId: string): Promise<StageMode> {
  const place = await plantPlace(tx, plantId);
  const headers = new Map((await headerRows(tx, plantId)).map((header) => [header.id, header]));
  const units = new Map((await unitRows(tx, plantId)).map(({ unit }) => [unit.id, unit]));
  const duties = new Map((await dutyRows(tx, plantId)).map((duty) => [duty.id, duty]));

  const dutyOf = ({ dutyId, sized }: StageOnUnit): Result<DutyModel | null> => {
    if (dutyId === null) return ok(null);
    const row = duties.get(dutyId);
    if (!row || row.retiredAt)
      return fail(problem('ROUTE-DUTY', 'The duty is not there any more: choose another.', 'dutyId'));
    return parseDuty(row.model, { ...row.inputs, ...sized });
  };
  const supplyFor = (unitId: string): Result<SteamSupply | null> => {
    const unit = units.get(unitId);
    if (!unit) return fail(problem('ROUTE-UNIT', 'The unit is not there any more: choose another.', 'unitId'));
    const header = headers.get(unit.headerId ?? '');
    return header && place ? supplyOf(header, place.altitudeM) : ok(null);
  };
  const work: StageMode = (stage) => {
    const duty = dutyOf(stage);
    const supply = supplyFor(stage.unitId);
    if (!supply.ok) return supply;
    if (!duty.ok) return duty;
    const { sized, ...plain } = stage;
    const mode = workMode({ ...plain, duty: duty.value, supply: supply.value });
    return mode.ok && sized ? ok({ ...mode.value, sized }) : mode;
  };
  const known = new Map<string, Result<Mode>>();
  return (stage) => {
    const { unitId, dutyId, minutes, leadMin, afterMin, uses, sized } = stage;
    const key = JSON.stringify([unitId, dutyId, minutes, leadMin, afterMin, uses, sized]);
    const own = { unitId, dutyId, minutes, leadMin, afterMin, uses };
    const found = known.get(key) ?? work(sized ? { ...own, sized } : own);
    known.set(key, found);
    return found;
  };
}
