/** One door to the duty models: a stage's data names its model and inputs; a typed profile is what a meter says. */
import { fail, ok, problem, type Result } from '../result';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { checkInputs, range, type InputRanges } from './inputs';
import { jacketedKettle } from './jacketedKettle';
import type { JacketedKettleInput } from './jacketedKettleInput';
import { steamBlancher, type SteamBlancherInput } from './steamBlancher';
import { stillRetort } from './stillRetort';
import type { StillRetortInput } from './stillRetortInput';
import { waterHeating, type WaterHeatingInput } from './waterHeating';
import { openWorking } from './working';

/** Draws as somebody responsible has typed or measured them, and where they are from. */
export interface TypedProfile {
  readonly phases: readonly DutyPhase[];
  readonly source: string;
}

export type DutyModel =
  | { readonly model: 'steamBlancher'; readonly inputs: SteamBlancherInput }
  | { readonly model: 'jacketedKettle'; readonly inputs: JacketedKettleInput }
  | { readonly model: 'stillRetort'; readonly inputs: StillRetortInput }
  | { readonly model: 'waterHeating'; readonly inputs: WaterHeatingInput }
  | { readonly model: 'typed'; readonly inputs: TypedProfile };

/**
 * Works a duty out on the steam of a header.
 * @returns the model's own problems; DUTY-RANGE for a typed phase whose length or draw is out of range.
 */
export function workOut(duty: DutyModel, supply: SteamSupply): Result<Duty> {
  switch (duty.model) {
    case 'steamBlancher':
      return steamBlancher(duty.inputs, supply);
    case 'jacketedKettle':
      return jacketedKettle(duty.inputs, supply);
    case 'stillRetort':
      return stillRetort(duty.inputs, supply);
    case 'waterHeating':
      return waterHeating(duty.inputs, supply);
    case 'typed':
      return typedProfile(duty.inputs);
  }
}

const TYPED_RANGES: InputRanges<DutyPhase> = {
  minutes: range('Length of a typed phase', 'min', 0.01, 10_080),
  steamKgPerH: range('Draw of a typed phase', 'kg/h', 0, 200_000),
};

function typedProfile({ phases, source }: TypedProfile): Result<Duty> {
  for (const [index, phase] of phases.entries()) {
    const bad = checkInputs(phase, TYPED_RANGES);
    if (bad) return fail(problem(bad.code, bad.message, `phases.${index}.${bad.field}`));
  }
  return ok(closeDuty(openWorking(`Draw as entered: ${source}`, [ESTIMATE_CAUTION]), phases));
}
