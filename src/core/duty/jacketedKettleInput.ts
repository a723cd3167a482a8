/** What a jacketed kettle's batch is described by, and the checks on it. */
import { problem, type Problem } from '../result';
import { checkInputs, plantDefaults, range, type InputRanges } from './inputs';
import type { SpecificHeatBasis } from './specificHeat';

export interface JacketedKettleInput {
  readonly batchKg: number;
  readonly product: SpecificHeatBasis;
  readonly kettleSteelKg: number;
  readonly startC: number;
  /** End of the heat-up, and boiling point while boiling off. */
  readonly endC: number;
  readonly jacketPressureBarG: number;
  readonly heatTransferWPerM2K: number;
  readonly jacketAreaM2: number;
  /** Lost from jacket and kettle while heating up and boiling off. */
  readonly heatingLossKW: number;
  /** Water to boil off; 0 leaves the phase out, as a length of 0 does with the hold. */
  readonly boilOffKg: number;
  readonly holdMin: number;
  readonly holdLossKW: number;
}

export const JACKETED_KETTLE_RANGES: InputRanges<JacketedKettleInput> = {
  batchKg: range('Batch', 'kg', 1, 20_000),
  kettleSteelKg: range('Kettle steel', 'kg', 0, 10_000),
  startC: range('Temperature at the start', '°C', 0, 99),
  endC: range('Temperature at the end', '°C', 1, 130),
  jacketPressureBarG: range('Jacket pressure', 'bar g', 0, 10),
  heatTransferWPerM2K: range('Heat transfer coefficient', 'W/m²K', 20, 5000),
  jacketAreaM2: range('Jacket surface', 'm²', 0.05, 50),
  heatingLossKW: range('Loss while heating', 'kW', 0, 200),
  boilOffKg: range('Water boiled off', 'kg', 0, 10_000),
  holdMin: range('Holding at temperature', 'min', 0, 1440),
  holdLossKW: range('Loss while holding', 'kW', 0, 200),
};

export const JACKETED_KETTLE_DEFAULTS = plantDefaults<JacketedKettleInput>({
  kettleSteelKg: 380,
  startC: 20,
  endC: 100,
  jacketPressureBarG: 2.5,
  heatTransferWPerM2K: 700,
  jacketAreaM2: 2.4,
  heatingLossKW: 3,
  boilOffKg: 0,
  holdMin: 0,
  holdLossKW: 4.5,
});

/** @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; undefined for a sound batch. */
export function checkJacketedKettle(input: JacketedKettleInput): Problem | undefined {
  return checkInputs(input, JACKETED_KETTLE_RANGES) ?? checkOrder(input);
}

function checkOrder({ startC, endC, batchKg, boilOffKg }: JacketedKettleInput): Problem | undefined {
  if (endC <= startC) {
    return problem('DUTY-ORDER', `The batch must end hotter than it starts: ${startC} to ${endC} °C.`, 'endC');
  }
  if (boilOffKg >= batchKg) {
    const amounts = `${boilOffKg} kg of a batch of ${batchKg} kg`;
    return problem('DUTY-ORDER', `Water boiled off must be less than the batch: ${amounts}.`, 'boilOffKg');
  }
  return undefined;
}
