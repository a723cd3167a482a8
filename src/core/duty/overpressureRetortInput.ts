/** What an over-pressure retort's cycle is described by, and the checks on it. */
import { checkRange } from '../quantity/range';
import { type Problem } from '../result';
import { EXCHANGER_PRESSURE, type Heating } from './heating';
import {
  checkEach,
  checkInputs,
  checkRising,
  DUTY_RANGE,
  plantDefaults,
  range,
  type InputRanges,
  type Ladder,
} from './inputs';
import type { SpecificHeatBasis } from './specificHeat';
import { HOLD_COUNT, HOLD_RANGES, type HoldPiece } from './stillRetortInput';

/** A step of the temperature programme up to process temperature, with the contents' mean temperature at its end. */
export interface ProgrammeStep {
  readonly minutes: number;
  readonly mediumEndC: number;
  readonly contentsEndC: number;
}

export interface OverpressureRetortInput extends Heating {
  readonly medium: 'steamAir' | 'waterSpray' | 'waterImmersion';
  readonly containers: number;
  readonly contentsKgEach: number;
  readonly containerKgEach: number;
  /** Steel 0.50; glass 0.84, plastic about 1.9 (from memory). */
  readonly containerKJPerKgK: number;
  readonly contents: SpecificHeatBasis;
  readonly specificHeatAtC: number;
  readonly basketsKg: number;
  readonly shellKg: number;
  readonly surfaceAreaM2: number;
  /** Not taken by containers, baskets or water. */
  readonly freeVolumeM3: number;
  readonly shellC: number;
  readonly basketsC: number;
  readonly initialC: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
  readonly circulatingWaterKg: number;
  readonly freshWaterC: number;
  /** Part of the circulating water kept from the load before, and its temperature. */
  readonly reusedWaterShare: number;
  readonly reusedWaterC: number;
  /** Steam that leaves with the air let out to hold the pressure. */
  readonly carriedOffKgPerH: number;
  /** The last step ends at process temperature. */
  readonly comeUp: readonly ProgrammeStep[];
  readonly holds: readonly HoldPiece[];
  /** Cooling without steam; 0 leaves it out. */
  readonly coolMin: number;
}

export const OVERPRESSURE_RETORT_RANGES: InputRanges<OverpressureRetortInput> = {
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  containers: range('Containers', '', 0, 100_000),
  contentsKgEach: range('Contents of a container', 'kg', 0, 10),
  containerKgEach: range('Empty container', 'kg', 0, 2),
  containerKJPerKgK: range('Specific heat of the container', 'kJ/kgK', 0.1, 3),
  specificHeatAtC: range('Temperature for the specific heat', '°C', 0, 150),
  basketsKg: range('Baskets', 'kg', 0, 10_000),
  shellKg: range('Shell', 'kg', 0, 50_000),
  surfaceAreaM2: range('Shell surface', 'm²', 0, 500),
  freeVolumeM3: range('Free volume', 'm³', 0, 200),
  shellC: range('Shell temperature at steam on', '°C', 0, 120),
  basketsC: range('Basket temperature at steam on', '°C', 0, 100),
  initialC: range('Initial temperature', '°C', 0, 100),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
  circulatingWaterKg: range('Circulating water', 'kg', 0, 50_000),
  freshWaterC: range('Fresh water temperature', '°C', 0, 99),
  reusedWaterShare: range('Share of water kept hot', '', 0, 1),
  reusedWaterC: range('Temperature of the water kept', '°C', 0, 140),
  carriedOffKgPerH: range('Steam carried off with air', 'kg/h', 0, 5000),
  coolMin: range('Cooling', 'min', 0, 300),
};

export const STEP_RANGES: InputRanges<ProgrammeStep> = {
  minutes: range('Step of the come-up', 'min', 0.1, 240),
  mediumEndC: range('Temperature at the end of a step', '°C', 30, 140),
  contentsEndC: range('Contents at the end of a step', '°C', 0, 140),
};
export const STEP_COUNT = range('Steps of the come-up', '', 1, 20);

export const OVERPRESSURE_RETORT_DEFAULTS = plantDefaults<OverpressureRetortInput>({
  heating: 'direct',
  exchangerPressureBarG: 5,
  basketsKg: 400,
  shellKg: 3500,
  surfaceAreaM2: 22,
  freeVolumeM3: 3,
  shellC: 30,
  basketsC: 25,
  initialC: 40,
  ambientC: 25,
  surfaceLossWPerM2K: 14,
  circulatingWaterKg: 400,
  freshWaterC: 20,
  reusedWaterShare: 0,
  reusedWaterC: 60,
  carriedOffKgPerH: 20,
  coolMin: 20,
});

const contentsLadder = ({ initialC, comeUp, holds }: OverpressureRetortInput): Ladder => [
  ['Initial temperature', 'initialC', initialC],
  ...comeUp.map(
    ({ contentsEndC }, i) => [`Contents after step ${i + 1}`, `comeUp.${i}.contentsEndC`, contentsEndC] as const,
  ),
  ...holds.map(
    ({ contentsEndC }, i) => [`Contents after piece ${i + 1}`, `holds.${i}.contentsEndC`, contentsEndC] as const,
  ),
  ['Process temperature', `comeUp.${comeUp.length - 1}.mediumEndC`, comeUp.at(-1)?.mediumEndC ?? 0],
];

const mediumLadder = (input: OverpressureRetortInput, name: string, field: string, startC: number): Ladder => [
  [name, field, startC],
  ...input.comeUp.map(
    ({ mediumEndC }, i) => [`Temperature after step ${i + 1}`, `comeUp.${i}.mediumEndC`, mediumEndC] as const,
  ),
];

/** No hotter inside a container than outside it, at the end of any step. */
const checkInside = ({ comeUp }: OverpressureRetortInput): Problem | undefined => {
  for (const [i, { contentsEndC, mediumEndC }] of comeUp.entries()) {
    const bad = checkRising([
      [`Contents after step ${i + 1}`, `comeUp.${i}.contentsEndC`, contentsEndC],
      [`Temperature after step ${i + 1}`, `comeUp.${i}.mediumEndC`, mediumEndC],
    ]);
    if (bad) return bad;
  }
  return undefined;
};

/** @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; undefined for a sound cycle. */
export function checkOverpressureRetort(input: OverpressureRetortInput): Problem | undefined {
  const waterC = input.reusedWaterShare > 0 ? Math.max(input.reusedWaterC, input.freshWaterC) : input.freshWaterC;
  const waterField = input.reusedWaterShare > 0 ? 'reusedWaterC' : 'freshWaterC';
  return (
    checkInputs(input, OVERPRESSURE_RETORT_RANGES) ??
    checkRange(DUTY_RANGE, STEP_COUNT, input.comeUp.length, 'comeUp') ??
    checkRange(DUTY_RANGE, HOLD_COUNT, input.holds.length, 'holds') ??
    checkEach('comeUp', input.comeUp, STEP_RANGES) ??
    checkEach('holds', input.holds, HOLD_RANGES) ??
    checkRising(mediumLadder(input, 'Shell temperature', 'shellC', input.shellC)) ??
    checkRising(mediumLadder(input, 'Basket temperature', 'basketsC', input.basketsC)) ??
    checkRising(mediumLadder(input, 'Circulating water at the start', waterField, waterC)) ??
    checkRising(contentsLadder(input)) ??
    checkInside(input)
  );
}
