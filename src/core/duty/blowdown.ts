/**
 * Blowdown from the salts in feed and boiler: what is blown down, the feed for it, the heat that leaves with it.
 * Source: mass balance of dissolved solids (MIL-HDBK-1003/6, equation 11); enthalpies IAPWS R7-97(2012).
 */
import { toAbsolute } from '../quantity/pressure';
import { barGauge, celsius } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import { saturationAtPressure, type Saturation } from '../steam/saturation';
import { ENERGY_BALANCE, IF97 } from './balance';
import { ESTIMATE_CAUTION, type SteamSupply } from './duty';
import { allOf, checkInputs, plantDefaults, range, type InputRanges } from './inputs';
import { openWorking, type Working } from './working';

export interface BlowdownInput {
  readonly steamKgPerH: number;
  /** Dissolved solids of the feed, and the most that the boiler's water may hold; same unit. */
  readonly feedSolidsPpm: number;
  readonly boilerSolidsPpm: number;
  readonly boilerPressureBarG: number;
  readonly makeUpC: number;
}

export const BLOWDOWN_RANGES: InputRanges<BlowdownInput> = {
  steamKgPerH: range('Steam', 'kg/h', 0, 500_000),
  feedSolidsPpm: range('Dissolved solids of the feed', 'ppm', 0, 5000),
  boilerSolidsPpm: range('Limit of the boiler water', 'ppm', 100, 20_000),
  boilerPressureBarG: range('Boiler pressure', 'bar g', 0, 60),
  makeUpC: range('Make-up temperature', '°C', 0, 100),
};

export const BLOWDOWN_DEFAULTS = plantDefaults<BlowdownInput>({
  feedSolidsPpm: 150,
  boilerSolidsPpm: 3000,
  boilerPressureBarG: 10,
  makeUpC: 15,
});

export interface Blowdown {
  readonly blowdownKgPerH: number;
  readonly feedKgPerH: number;
  /** For the blowdown share of a boiler house. */
  readonly shareOfFeed: number;
  readonly heatLostKW: number;
  readonly working: Working;
}

/**
 * What must be blown down to hold the boiler water at its limit.
 * @returns DUTY-RANGE naming field, value and range; DUTY-ORDER when the feed holds as much as the boiler may;
 * STEAM-RANGE.
 */
export function blowdown(input: BlowdownInput, { ambient }: Pick<SteamSupply, 'ambient'>): Result<Blowdown> {
  const bad = checkInputs(input, BLOWDOWN_RANGES) ?? checkSolids(input);
  if (bad) return fail(bad);
  const at = allOf<{ boiler: Saturation; makeUp: number }>({
    boiler: saturationAtPressure(toAbsolute(barGauge(input.boilerPressureBarG), ambient)),
    makeUp: liquidEnthalpy(celsius(input.makeUpC)),
  });
  if (!at.ok) return at;
  const sheet = openWorking('Blowdown', [ESTIMATE_CAUTION]);
  const blowdownKgPerH = sheet.step({
    symbol: 'ṁ_b',
    name: 'Blown down',
    formula: 'ṁ_s · C_f / (C_b − C_f)',
    unit: 'kg/h',
    source: 'MIL-HDBK-1003/6, equation 11',
    inputs: {
      ṁ_s: [input.steamKgPerH, 'kg/h'],
      C_f: [input.feedSolidsPpm, 'ppm'],
      C_b: [input.boilerSolidsPpm, 'ppm'],
    },
    value: ({ ṁ_s, C_f, C_b }) => (ṁ_s * C_f) / (C_b - C_f),
  });
  const heatLostKW = sheet.step({
    symbol: 'q_b',
    name: 'Heat leaving with it, counted from make-up',
    formula: 'ṁ_b · (h_f − h_mu) / 3600',
    unit: 'kW',
    source: `${ENERGY_BALANCE}; ${IF97}`,
    inputs: {
      ṁ_b: [blowdownKgPerH, 'kg/h'],
      h_f: [at.value.boiler.hf, 'kJ/kg'],
      h_mu: [at.value.makeUp, 'kJ/kg'],
    },
    value: ({ ṁ_b, h_f, h_mu }) => (ṁ_b * (h_f - h_mu)) / 3600,
  });
  const feedKgPerH = sheet.total('Feed', input.steamKgPerH + blowdownKgPerH, 'kg/h');
  const shareOfFeed = sheet.total('Blowdown / feed', input.feedSolidsPpm / input.boilerSolidsPpm, '');
  return ok({ blowdownKgPerH, feedKgPerH, shareOfFeed, heatLostKW, working: sheet.finish() });
}

function checkSolids({ feedSolidsPpm, boilerSolidsPpm }: BlowdownInput) {
  if (feedSolidsPpm < boilerSolidsPpm) return undefined;
  const text = `Feed holds ${feedSolidsPpm} ppm, the boiler water may hold ${boilerSolidsPpm}; soften the feed.`;
  return problem('DUTY-ORDER', text, 'boilerSolidsPpm');
}
