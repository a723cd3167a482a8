/** What a still retort's cycle is described by, and the checks on it. */
import { checkRange } from '../quantity/range';
import type { Problem } from '../result';
import { checkEach, checkInputs, checkRising, DUTY_RANGE, plantDefaults, range, type InputRanges } from './inputs';
import type { SpecificHeatBasis } from './specificHeat';

/** A piece of the process time, with the mean temperature of the contents at its end. */
export interface HoldPiece {
  readonly minutes: number;
  readonly contentsEndC: number;
}

export interface StillRetortInput {
  readonly containers: number;
  readonly contentsKgEach: number;
  readonly containerSteelKgEach: number;
  readonly containerVolumeM3: number;
  readonly contents: SpecificHeatBasis;
  readonly specificHeatAtC: number;
  readonly basketsKg: number;
  readonly shellKg: number;
  readonly shellDiameterM: number;
  readonly shellLengthM: number;
  /** Temperatures at steam on: shell (warm after a load), baskets, containers with contents. */
  readonly shellC: number;
  readonly basketsC: number;
  readonly initialC: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
  readonly ventMin: number;
  /**
   * Steps that the vent is drawn in, whole; one even draw unless given. More show how it runs: the metal takes most of
   * its heat at first, the outflow grows with the pressure. The kg stay the same.
   */
  readonly ventSteps?: number;
  readonly ventEndC: number;
  /** Mean temperature of the contents when vents close and when come-up ends: from a heat-penetration record. */
  readonly contentsAfterVentC: number;
  readonly comeUpMin: number;
  readonly processC: number;
  readonly contentsAfterComeUpC: number;
  readonly holds: readonly HoldPiece[];
  /** Cooling without steam; 0 leaves it out. */
  readonly coolMin: number;
  readonly vents: number;
  readonly ventBoreMm: number;
  readonly ventDischarge: number;
  /** Pressure in the retort while it vents. */
  readonly ventPressureBarG: number;
  readonly bleeders: number;
  readonly bleederBoreMm: number;
}

export const STILL_RETORT_RANGES: InputRanges<StillRetortInput> = {
  containers: range('Containers', '', 0, 100_000),
  contentsKgEach: range('Contents of a container', 'kg', 0, 10),
  containerSteelKgEach: range('Steel of a container', 'kg', 0, 2),
  containerVolumeM3: range('Volume of a container', 'm³', 0, 0.02),
  specificHeatAtC: range('Temperature for the specific heat', '°C', 0, 150),
  basketsKg: range('Baskets', 'kg', 0, 10_000),
  shellKg: range('Shell', 'kg', 0, 50_000),
  shellDiameterM: range('Shell diameter', 'm', 0.3, 5),
  shellLengthM: range('Shell length', 'm', 0.3, 30),
  shellC: range('Shell temperature at steam on', '°C', 0, 120),
  basketsC: range('Basket temperature at steam on', '°C', 0, 100),
  initialC: range('Initial temperature', '°C', 0, 100),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
  ventMin: range('Vent', 'min', 0.5, 60),
  ventEndC: range('Vent temperature', '°C', 90, 130),
  contentsAfterVentC: range('Contents when vents close', '°C', 0, 140),
  comeUpMin: range('Come-up after the vent', 'min', 0.5, 120),
  processC: range('Process temperature', '°C', 100, 140),
  contentsAfterComeUpC: range('Contents at the end of come-up', '°C', 0, 140),
  coolMin: range('Cooling', 'min', 0, 300),
  vents: range('Vents', '', 0, 100),
  ventBoreMm: range('Vent bore', 'mm', 1, 200),
  ventDischarge: range('Vent discharge coefficient', '', 0.1, 1),
  ventPressureBarG: range('Pressure while venting', 'bar g', 0, 1),
  bleeders: range('Bleeders', '', 0, 100),
  bleederBoreMm: range('Bleeder bore', 'mm', 0.5, 30),
};

/** The scheduled process has no default: its times and temperatures come from the process authority. */
export const STILL_RETORT_DEFAULTS = plantDefaults<StillRetortInput>({
  specificHeatAtC: 90,
  basketsKg: 360,
  shellKg: 3200,
  shellDiameterM: 1.2,
  shellLengthM: 5,
  shellC: 25,
  basketsC: 25,
  ambientC: 25,
  surfaceLossWPerM2K: 14,
  ventSteps: 2,
  coolMin: 20,
  vents: 4,
  ventBoreMm: 26.645,
  ventDischarge: 0.6,
  ventPressureBarG: 0.15,
  bleeders: 5,
  bleederBoreMm: 3.175,
});

export const HOLD_RANGES: InputRanges<HoldPiece> = {
  minutes: range('Process time', 'min', 0.1, 600),
  contentsEndC: range('Contents at the end of a piece of process time', '°C', 0, 140),
};
export const VENT_STEPS = range('Whole steps of the vent', '', 1, 10);
export const HOLD_COUNT = range('Pieces of process time', '', 1, 20);

function checkHolds({ holds }: StillRetortInput): Problem | undefined {
  return checkRange(DUTY_RANGE, HOLD_COUNT, holds.length, 'holds') ?? checkEach('holds', holds, HOLD_RANGES);
}

/** @returns as {@link DUTY_RANGE} for a number of vent steps that is not whole or out of range. */
function checkVentSteps({ ventSteps }: StillRetortInput): Problem | undefined {
  if (ventSteps === undefined) return undefined;
  const whole = Number.isInteger(ventSteps) ? ventSteps : Number.NaN;
  return checkRange(DUTY_RANGE, VENT_STEPS, whole, 'ventSteps');
}

/** @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; undefined for a sound cycle. */
export function checkStillRetort(input: StillRetortInput): Problem | undefined {
  const holds = input.holds.map(
    ({ contentsEndC }, index) =>
      [`Contents after piece ${index + 1}`, `holds.${index}.contentsEndC`, contentsEndC] as const,
  );
  return (
    checkInputs(input, STILL_RETORT_RANGES) ??
    checkHolds(input) ??
    checkVentSteps(input) ??
    checkRising([
      ['Shell temperature', 'shellC', input.shellC],
      ['Vent temperature', 'ventEndC', input.ventEndC],
      ['Process temperature', 'processC', input.processC],
    ]) ??
    checkRising([
      ['Initial temperature', 'initialC', input.initialC],
      ['Contents when vents close', 'contentsAfterVentC', input.contentsAfterVentC],
      ['Contents at the end of come-up', 'contentsAfterComeUpC', input.contentsAfterComeUpC],
      ...holds,
      ['Process temperature', 'processC', input.processC],
    ]) ??
    checkRising([
      ['Contents when vents close', 'contentsAfterVentC', input.contentsAfterVentC],
      ['Vent temperature', 'ventEndC', input.ventEndC],
    ])
  );
}
