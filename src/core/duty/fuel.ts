/** Fuel and carbon dioxide for the heat that goes into the boiler's water. */
import { fail, ok, type Result } from '../result';
import { ENERGY_BALANCE } from './balance';
import { ESTIMATE_CAUTION } from './duty';
import { checkInputs, range, type InputRanges } from './inputs';
import { openWorking, type Working } from './working';

/** Carbon dioxide by fuel burnt, with what the heat of the fuel is counted as. */
export interface EmissionFactor {
  readonly name: string;
  readonly kgCO2PerKWh: number;
  readonly heatingValue: 'gross' | 'net';
  readonly source: string;
}

/** kWh in a million Btu (International Table). */
const KWH_PER_MMBTU = 293.07107;

export const EMISSION_FACTORS = {
  naturalGasUs: {
    name: 'Natural gas, gross heating value',
    kgCO2PerKWh: 53.06 / KWH_PER_MMBTU,
    heatingValue: 'gross',
    source: '53.06 kg/MMBtu: 40 CFR 98, Table C-1',
  },
  naturalGasIpcc: {
    name: 'Natural gas, net heating value',
    kgCO2PerKWh: 56_100 / 277_777.8,
    heatingValue: 'net',
    source: '56 100 kg/TJ: IPCC 2006 guidelines, volume 2, Table 2.2; from memory',
  },
} as const satisfies Record<string, EmissionFactor>;

/** Names one of {@link EMISSION_FACTORS}. */
export type FuelKey = keyof typeof EMISSION_FACTORS;

export interface FuelInput {
  readonly heatToWaterKW: number;
  /** On the heating value that the factor is for. */
  readonly efficiency: number;
}

const RANGES: InputRanges<FuelInput> = {
  heatToWaterKW: range('Heat into the water', 'kW', 0, 500_000),
  efficiency: range('Boiler efficiency', '', 0.5, 1),
};

export interface FuelUse {
  readonly fuelKW: number;
  readonly co2KgPerH: number;
  readonly working: Working;
}

/** @returns fuel [kW] and carbon dioxide [kg/h] for heat into the water, or DUTY-RANGE naming field, value and range. */
export function fuelFor(input: FuelInput, factor: EmissionFactor): Result<FuelUse> {
  const bad = checkInputs(input, RANGES);
  if (bad) return fail(bad);
  const sheet = openWorking('Fuel and carbon dioxide', [ESTIMATE_CAUTION]);
  const fuelKW = sheet.step({
    symbol: 'q_fuel',
    name: `Fuel, ${factor.heatingValue} heating value`,
    formula: 'q / η',
    unit: 'kW',
    source: ENERGY_BALANCE,
    inputs: { q: [input.heatToWaterKW, 'kW'], η: [input.efficiency, ''] },
    value: ({ q, η }) => q / η,
  });
  const co2KgPerH = sheet.step({
    symbol: 'ṁ_CO2',
    name: 'Carbon dioxide',
    formula: 'q_fuel · f',
    unit: 'kg/h',
    source: factor.source,
    inputs: { q_fuel: [fuelKW, 'kW'], f: [factor.kgCO2PerKWh, 'kg/kWh'] },
    value: ({ q_fuel, f }) => q_fuel * f,
  });
  return ok({ fuelKW, co2KgPerH, working: sheet.finish() });
}
