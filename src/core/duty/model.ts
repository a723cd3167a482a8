/** One door to the duty models: a stage's data names its model and inputs; a typed profile is what a meter says. */
import { fail, ok, problem, type Result } from '../result';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
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
 * @returns the model's own problems; DUTY-RANGE for a typed profile with a negative draw or length.
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

function typedProfile({ phases, source }: TypedProfile): Result<Duty> {
  const bad = phases.findIndex((p) => !(p.minutes > 0) || !(p.steamKgPerH >= 0) || p.steamKgPerH > 200_000);
  if (bad >= 0) {
    const text = `Phase ${bad + 1} of the typed profile needs a length above 0 min and a draw of 0 to 200000 kg/h.`;
    return fail(problem('DUTY-RANGE', text, `phases.${bad}`));
  }
  return ok(closeDuty(openWorking(`Draw as entered: ${source}`, [ESTIMATE_CAUTION]), phases));
}
