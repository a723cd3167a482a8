/** How an order's run, batch or load runs on each unit: its duty with the quantity of the order. */
import type { BatchSplit, LoadSplit, OrderSplit, RunSplit } from '@/core/orders/split';
import type { LimitUse, Mode } from '@/core/plant/activity';
import { ok, type Result } from '@/core/result';
import type { StageMode } from '../products/stageModes';
import { yieldOf, type StageRow } from './orderRoute';

type Part = RunSplit | BatchSplit | LoadSplit;

/** Duty inputs that the part's quantity sets; empty where it is the duty's own. */
export function sizedInputs(stage: StageRow, part: Part, split: OrderSplit): Record<string, number> {
  const { inputs } = stage;
  const has = (name: string): boolean => typeof inputs[name] === 'number';
  const sized: Record<string, number> = {};
  const set = (name: string, value: number): void => {
    if (has(name) && Math.abs(Number(inputs[name]) - value) > 1e-6 * Math.abs(value)) sized[name] = value;
  };
  if ('ownMin' in part) {
    set('runMin', part.minutes);
    set('productKgPerH', (60 * split.kg) / yieldOf(stage) / part.minutes);
    set('containersPerMin', split.pieces / part.minutes);
  } else if ('inKg' in part) {
    set('batchKg', part.inKg);
    if (has('boilOffKg')) set('boilOffKg', (Number(inputs.boilOffKg) * part.inKg) / Number(inputs.batchKg));
  } else {
    set('containers', part.pieces);
  }
  return sized;
}

/** A use that ran to the end of one load's run runs to the end of the whole run. */
function stretched(uses: readonly LimitUse[], before: number, minutes: number): LimitUse[] {
  return uses.map((use) =>
    use.offsetMin + use.minutes >= before ? { ...use, minutes: Math.max(1, minutes - use.offsetMin) } : use,
  );
}

/** The part's mode on one unit; of a quantity that the duty can't take, that of its own quantity. */
export function partMode(stage: StageRow, part: Part, split: OrderSplit, modeOf: StageMode): Result<Mode> {
  const { row, mode } = stage;
  const minutes = 'ownMin' in part ? part.minutes : row.minutes;
  const uses = 'ownMin' in part ? stretched(row.uses, mode.minutes, minutes) : row.uses;
  const { unitId, dutyId, leadMin, afterMin } = row;
  const plain = { unitId, dutyId, leadMin, afterMin, minutes, uses };
  const sized = sizedInputs(stage, part, split);
  if (dutyId === null || Object.keys(sized).length === 0) return modeOf(plain);
  const worked = modeOf({ ...plain, sized });
  return worked.ok ? ok(worked.value) : modeOf(plain);
}
