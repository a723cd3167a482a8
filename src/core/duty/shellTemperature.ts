/**
 * How warm a retort's shell is at steam on, by the time since its last run: it cools exponentially to the room.
 * Source: Newton's law of cooling on the lumped shell; to treat a shell so is common practice, no source.
 */
import { fail, ok, type Result } from '../result';
import { STEEL_KJ_PER_KG_K } from './balance';
import { ESTIMATE_CAUTION } from './duty';
import { checkInputs, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { openWorking, type Working } from './working';

export interface ShellCoolingInput {
  /** Shell when the last run ended: after water cooling far below the process temperature. */
  readonly endC: number;
  readonly ambientC: number;
  readonly minutesSinceEnd: number;
  readonly shellKg: number;
  readonly areaM2: number;
  readonly surfaceLossWPerM2K: number;
}

export const SHELL_COOLING_RANGES: InputRanges<ShellCoolingInput> = {
  endC: range('Shell temperature at the end of the last run', '°C', 0, 140),
  ambientC: range('Room temperature', '°C', 0, 50),
  minutesSinceEnd: range('Time since the last run', 'min', 0, 100_000),
  shellKg: range('Shell', 'kg', 1, 50_000),
  areaM2: range('Shell surface', 'm²', 0.1, 500),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0.5, 40),
};

export const SHELL_COOLING_DEFAULTS = plantDefaults<ShellCoolingInput>({
  endC: 40,
  ambientC: 25,
  surfaceLossWPerM2K: 14,
});

export interface ShellAtSteamOn {
  /** For `shellC` of a retort's cycle. [degC] */
  readonly shellC: number;
  readonly timeConstantMin: number;
  readonly working: Working;
}

/**
 * The shell's temperature now. Leave the last run out (a first run) by taking the room's temperature instead.
 * @returns DUTY-RANGE, or DUTY-ORDER when the shell ended colder than the room, naming field, value and range.
 */
export function shellAtSteamOn(input: ShellCoolingInput): Result<ShellAtSteamOn> {
  const bad =
    checkInputs(input, SHELL_COOLING_RANGES) ??
    checkRising([
      ['Room temperature', 'ambientC', input.ambientC],
      ['Shell temperature at the end of the last run', 'endC', input.endC],
    ]);
  if (bad) return fail(bad);
  const sheet = openWorking('Shell at steam on', [ESTIMATE_CAUTION]);
  const timeConstantMin = sheet.step({
    symbol: 'τ',
    name: 'Time constant of the shell',
    formula: '1000 · m · c / (k · A) / 60',
    unit: 'min',
    source: 'Lumped heat balance: common practice, no source',
    inputs: {
      m: [input.shellKg, 'kg'],
      c: [STEEL_KJ_PER_KG_K, 'kJ/kgK'],
      k: [input.surfaceLossWPerM2K, 'W/m²K'],
      A: [input.areaM2, 'm²'],
    },
    value: ({ m, c, k, A }) => (1000 * m * c) / (k * A) / 60,
  });
  const shellC = sheet.step({
    symbol: 'T_s',
    name: 'Shell temperature at steam on',
    formula: 'T_a + (T_0 − T_a) · e^(−t / τ)',
    unit: '°C',
    source: "Newton's law of cooling",
    inputs: {
      T_a: [input.ambientC, '°C'],
      T_0: [input.endC, '°C'],
      t: [input.minutesSinceEnd, 'min'],
      τ: [timeConstantMin, 'min'],
    },
    value: ({ T_a, T_0, t, τ }) => T_a + (T_0 - T_a) * Math.exp(-t / τ),
  });
  return ok({ shellC, timeConstantMin, working: sheet.finish() });
}
