/** One door to the duty models: a stage's data names its model and inputs; a typed profile is what a meter says. */
import { fail, ok, type Result } from '../result';
import { cleaningInPlace, type CleaningInPlaceInput } from './cleaningInPlace';
import { continuousCooker, type ContinuousCookerInput } from './continuousCooker';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { evaporator, type EvaporatorInput } from './evaporator';
import { exhaustBox, type ExhaustBoxInput } from './exhaustBox';
import { hotWater, type HotWaterInput } from './hotWater';
import { injectionCooker, type InjectionCookerInput } from './injectionCooker';
import { checkEach, range, type InputRanges } from './inputs';
import { jacketedKettle } from './jacketedKettle';
import type { JacketedKettleInput } from './jacketedKettleInput';
import { overpressureRetort } from './overpressureRetort';
import type { OverpressureRetortInput } from './overpressureRetortInput';
import { platePasteuriser, type PlatePasteuriserInput } from './platePasteuriser';
import { steamBlancher, type SteamBlancherInput } from './steamBlancher';
import { stillRetort } from './stillRetort';
import type { StillRetortInput } from './stillRetortInput';
import { tunnelPasteuriser, type TunnelPasteuriserInput } from './tunnelPasteuriser';
import { waterBlancher, type WaterBlancherInput } from './waterBlancher';
import { waterHeating, type WaterHeatingInput } from './waterHeating';
import { openWorking } from './working';

/** Draws as somebody responsible has typed or measured them, and where they are from. */
export interface TypedProfile {
  readonly phases: readonly DutyPhase[];
  readonly source: string;
}

export type DutyModel =
  | { readonly model: 'steamBlancher'; readonly inputs: SteamBlancherInput }
  | { readonly model: 'waterBlancher'; readonly inputs: WaterBlancherInput }
  | { readonly model: 'jacketedKettle'; readonly inputs: JacketedKettleInput }
  | { readonly model: 'injectionCooker'; readonly inputs: InjectionCookerInput }
  | { readonly model: 'stillRetort'; readonly inputs: StillRetortInput }
  | { readonly model: 'overpressureRetort'; readonly inputs: OverpressureRetortInput }
  | { readonly model: 'continuousCooker'; readonly inputs: ContinuousCookerInput }
  | { readonly model: 'exhaustBox'; readonly inputs: ExhaustBoxInput }
  | { readonly model: 'platePasteuriser'; readonly inputs: PlatePasteuriserInput }
  | { readonly model: 'tunnelPasteuriser'; readonly inputs: TunnelPasteuriserInput }
  | { readonly model: 'evaporator'; readonly inputs: EvaporatorInput }
  | { readonly model: 'hotWater'; readonly inputs: HotWaterInput }
  | { readonly model: 'waterHeating'; readonly inputs: WaterHeatingInput }
  | { readonly model: 'cleaningInPlace'; readonly inputs: CleaningInPlaceInput }
  | { readonly model: 'typed'; readonly inputs: TypedProfile };

/**
 * Works a duty out on the steam of a header.
 * @returns the model's own problems; DUTY-RANGE for a typed phase whose length or draw is out of range.
 */
export function workOut(duty: DutyModel, supply: SteamSupply): Result<Duty> {
  switch (duty.model) {
    case 'steamBlancher':
      return steamBlancher(duty.inputs, supply);
    case 'waterBlancher':
      return waterBlancher(duty.inputs, supply);
    case 'jacketedKettle':
      return jacketedKettle(duty.inputs, supply);
    case 'injectionCooker':
      return injectionCooker(duty.inputs, supply);
    case 'stillRetort':
      return stillRetort(duty.inputs, supply);
    case 'overpressureRetort':
      return overpressureRetort(duty.inputs, supply);
    case 'continuousCooker':
      return continuousCooker(duty.inputs, supply);
    case 'exhaustBox':
      return exhaustBox(duty.inputs, supply);
    case 'platePasteuriser':
      return platePasteuriser(duty.inputs, supply);
    case 'tunnelPasteuriser':
      return tunnelPasteuriser(duty.inputs, supply);
    case 'evaporator':
      return evaporator(duty.inputs, supply);
    case 'hotWater':
      return hotWater(duty.inputs, supply);
    case 'waterHeating':
      return waterHeating(duty.inputs, supply);
    case 'cleaningInPlace':
      return cleaningInPlace(duty.inputs, supply);
    case 'typed':
      return typedProfile(duty.inputs);
  }
}

/** Ranges of a typed phase. */
export const TYPED_RANGES: InputRanges<DutyPhase> = {
  minutes: range('Length of a typed phase', 'min', 0.01, 10_080),
  steamKgPerH: range('Draw of a typed phase', 'kg/h', 0, 200_000),
};

function typedProfile({ phases, source }: TypedProfile): Result<Duty> {
  const bad = checkEach('phases', phases, TYPED_RANGES);
  if (bad) return fail(bad);
  return ok(closeDuty(openWorking(`Draw as entered: ${source}`, [ESTIMATE_CAUTION]), phases));
}
