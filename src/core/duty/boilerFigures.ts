/** What a boiler can follow, how far it turns down, and what its water gives up: figures that judging a week stands on. */
import { toAbsolute } from '../quantity/pressure';
import { barGauge } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { storedSteamKgPerBar } from '../steam/flash';
import { ENERGY_BALANCE, IF97 } from './balance';
import { ESTIMATE_CAUTION, type SteamSupply } from './duty';
import { checkInputs, range, type InputRanges } from './inputs';
import { openWorking, type Working } from './working';

export interface BoilerFiguresInput {
  readonly netKgPerH: number;
  /** Greatest over least fire. */
  readonly turndown: number;
  /** Share of the net export by which it can rise in a minute. */
  readonly greatestRiseFractionPerMin: number;
  readonly waterTonnes: number;
  readonly boilerPressureBarG: number;
}

const RANGES: InputRanges<BoilerFiguresInput> = {
  netKgPerH: range('Net export', 'kg/h', -200_000, 200_000),
  turndown: range('Turndown', '', 1, 50),
  greatestRiseFractionPerMin: range('Greatest rise', '1/min', 0, 1),
  waterTonnes: range('Boiler water', 't', 0, 500),
  boilerPressureBarG: range('Boiler pressure', 'bar g', 0, 60),
};

export interface BoilerFigures {
  readonly greatestRiseKgPerHPerMin: number;
  /** Below this it goes out and is lit again. */
  readonly leastKgPerH: number;
  readonly storedKgPerBar: number;
  readonly working: Working;
}

/** How long a boiler fires in each hour where the load is under its least: it goes out and is lit again. [min] */
export const firingMinPerHour = (loadKgPerH: number, leastKgPerH: number): number =>
  leastKgPerH > 0 ? 60 * Math.min(1, loadKgPerH / leastKgPerH) : 60;

/** @returns rise, least fire and stored steam of a boiler; DUTY-RANGE naming field, value and range; STEAM-RANGE. */
export function boilerFigures(
  input: BoilerFiguresInput,
  { ambient }: Pick<SteamSupply, 'ambient'>,
): Result<BoilerFigures> {
  const bad = checkInputs(input, RANGES);
  if (bad) return fail(bad);
  const perTonne = storedSteamKgPerBar(toAbsolute(barGauge(input.boilerPressureBarG), ambient), 1000);
  if (!perTonne.ok) return perTonne;
  const sheet = openWorking('What the boiler can follow', [ESTIMATE_CAUTION]);
  const greatestRiseKgPerHPerMin = sheet.step({
    symbol: 'r',
    name: 'Greatest rise',
    formula: 'f_r · ṁ_n',
    unit: 'kg/h per min',
    source: 'Share as entered for the boiler',
    inputs: { f_r: [input.greatestRiseFractionPerMin, '1/min'], ṁ_n: [input.netKgPerH, 'kg/h'] },
    value: ({ f_r, ṁ_n }) => f_r * ṁ_n,
  });
  const leastKgPerH = sheet.step({
    symbol: 'ṁ_min',
    name: 'Least it sends while in fire; below it goes out and is lit again',
    formula: 'ṁ_n / t',
    unit: 'kg/h',
    source: 'Turndown as entered for the boiler',
    inputs: { ṁ_n: [input.netKgPerH, 'kg/h'], t: [input.turndown, ''] },
    value: ({ ṁ_n, t }) => ṁ_n / t,
  });
  sheet.step({
    symbol: 't_f',
    name: 'Fires in each hour at a tenth of its export',
    formula: '60 · min(1, 0.1 · ṁ_n / ṁ_min)',
    unit: 'min',
    source: 'Mass balance over the hour',
    inputs: { ṁ_n: [input.netKgPerH, 'kg/h'], ṁ_min: [leastKgPerH, 'kg/h'] },
    value: ({ ṁ_n, ṁ_min }) => firingMinPerHour(ṁ_n / 10, ṁ_min),
  });
  const storedKgPerBar = sheet.step({
    symbol: 'm_bar',
    name: 'Steam that its water gives up per bar of falling pressure: a warning’s measure, never capacity',
    formula: 'M · (dh_f/dp − v_f) / h_fg',
    unit: 'kg/bar',
    source: `${ENERGY_BALANCE}; ${IF97}`,
    inputs: { M: [input.waterTonnes, 't'], per_t: [perTonne.value, 'kg/bar t'] },
    value: ({ M, per_t }) => M * per_t,
  });
  return ok({ greatestRiseKgPerHPerMin, leastKgPerH, storedKgPerBar, working: sheet.finish() });
}
