/**
 * Cooker with steam blown into the batch: heat-up at an even draw, then held. The steam stays in the batch as water.
 * Source: heat balance M c (T2 - T1) + losses = m_s (h - h_w(T2)); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, problem, type Problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type SteamSupply } from './duty';
import { spell } from './heating';
import { allOf, checkInputs, plantDefaults, range, type InputRanges } from './inputs';
import { specificHeat, type SpecificHeat, type SpecificHeatBasis } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

export interface InjectionCookerInput {
  readonly batchKg: number;
  readonly product: SpecificHeatBasis;
  readonly vesselSteelKg: number;
  readonly startC: number;
  readonly endC: number;
  /** The valve stays as it is, so the draw is even over this time. */
  readonly heatUpMin: number;
  readonly heatingLossKW: number;
  /** A length of 0 leaves the hold out. */
  readonly holdMin: number;
  readonly holdLossKW: number;
  /** Share of the supplied steam that bubbles through uncondensed. */
  readonly escapeFraction: number;
  /** Water left out of the recipe for the steam to add. */
  readonly recipeRoomKg: number;
}

export const INJECTION_COOKER_RANGES: InputRanges<InjectionCookerInput> = {
  batchKg: range('Batch before steam', 'kg', 1, 20_000),
  vesselSteelKg: range('Vessel steel', 'kg', 0, 10_000),
  startC: range('Temperature at the start', '°C', 0, 139),
  endC: range('Temperature at the end', '°C', 1, 140),
  heatUpMin: range('Heat-up', 'min', 0.1, 480),
  heatingLossKW: range('Loss while heating', 'kW', 0, 200),
  holdMin: range('Holding at temperature', 'min', 0, 1440),
  holdLossKW: range('Loss while holding', 'kW', 0, 200),
  escapeFraction: range('Share escaping uncondensed', '', 0, 0.9),
  recipeRoomKg: range('Water left out of the recipe', 'kg', 0, 20_000),
};

export const INJECTION_COOKER_DEFAULTS = plantDefaults<InjectionCookerInput>({
  vesselSteelKg: 400,
  startC: 20,
  endC: 95,
  heatUpMin: 15,
  heatingLossKW: 3,
  holdMin: 0,
  holdLossKW: 4,
  escapeFraction: 0.05,
  recipeRoomKg: 0,
});

function checkOrder({ startC, endC }: InjectionCookerInput): Problem | undefined {
  if (endC > startC) return undefined;
  return problem('DUTY-ORDER', `The batch must end hotter than it starts: ${startC} to ${endC} °C.`, 'endC');
}

function heatUpRate(sheet: WorkingSheet, input: InjectionCookerInput, specific: SpecificHeat, dh: number): number {
  sheet.section('Heat-up');
  const { batchKg, vesselSteelKg, startC, endC, heatUpMin } = input;
  const cp = balance.writeSpecificHeat(sheet, specific);
  const batch = { symbol: 'Q_batch', name: 'Heat into the batch' };
  const steel = { symbol: 'Q_steel', name: 'Heat into the vessel' };
  const heatKJ = balance.sumOf(
    sheet,
    { symbol: 'Q', name: 'Heat into batch and vessel, and lost', unit: 'kJ' },
    {
      Q_batch: balance.sensibleHeat(sheet, batch, batchKg, cp, startC, endC),
      Q_steel: balance.sensibleHeat(sheet, steel, vesselSteelKg, balance.STEEL_KJ_PER_KG_K, startC, endC),
      Q_loss: balance.lostHeat(sheet, 'Lost while heating', input.heatingLossKW, heatUpMin),
    },
  );
  const kg = balance.steamForHeat(sheet, 'm_c', 'Steam condensing in the batch', heatKJ, dh);
  const condensing = balance.averageRate(sheet, kg, heatUpMin);
  return balance.withEscape(sheet, 'Steam supplied while heating', condensing, input.escapeFraction);
}

function holdRate(sheet: WorkingSheet, input: InjectionCookerInput, dh: number): number {
  sheet.section('Holding');
  const condensing = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing in the batch', input.holdLossKW, dh);
  return balance.withEscape(sheet, 'Steam supplied while holding', condensing, input.escapeFraction);
}

/** Water that the steam leaves behind, against the room that the recipe keeps for it. */
function writeDilution(sheet: WorkingSheet, input: InjectionCookerInput, steamKg: number) {
  const addedKg = sheet.total('Water added by the steam', steamKg * (1 - input.escapeFraction), 'kg');
  sheet.total('Water added / batch', addedKg / input.batchKg, '');
  if (addedKg <= input.recipeRoomKg) return;
  const added = `Steam adds ${addedKg.toFixed(1)} kg of water`;
  sheet.warn(`${added}, the recipe leaves room for ${input.recipeRoomKg} kg; take the rest out of the recipe.`);
}

/**
 * Steam of a batch cooked by direct injection.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; STEAM-RANGE.
 */
export function injectionCooker(input: InjectionCookerInput, { header }: SteamSupply): Result<Duty> {
  const bad = checkInputs(input, INJECTION_COOKER_RANGES) ?? checkOrder(input);
  if (bad) return fail(bad);
  const at = allOf<{ cp: SpecificHeat; hot: number }>({
    cp: specificHeat(input.product, (input.startC + input.endC) / 2),
    hot: liquidEnthalpy(celsius(input.endC)),
  });
  if (!at.ok) return at;
  const sheet = openWorking('Cooker with direct steam', [ESTIMATE_CAUTION]);
  sheet.section('Steam');
  const dh = balance.heatGivenUp(sheet, header.h, at.value.hot, input.endC);
  const phases = [
    ...spell('heatUp', input.heatUpMin, () => heatUpRate(sheet, input, at.value.cp, dh)),
    ...spell('hold', input.holdMin, () => holdRate(sheet, input, dh)),
  ];
  const steamKg = phases.reduce((kg, { minutes, steamKgPerH }) => kg + (minutes * steamKgPerH) / 60, 0);
  writeDilution(sheet, input, steamKg);
  return ok(closeDuty(sheet, phases));
}
