/**
 * From a boiler's from-and-at rating to what it can send out: real evaporation at pressure and feed temperature,
 * less the steam that the feed tank takes for itself.
 * Source: heat balances of boiler and open heater (MIL-HDBK-1003/6 for blowdown); enthalpies IAPWS R7-97(2012).
 */
import { STANDARD_ATMOSPHERE, toAbsolute } from '../quantity/pressure';
import { checkRange } from '../quantity/range';
import { barGauge, celsius, type BarAbsolute } from '../quantity/units';
import { fail, ok, problem, type Problem, type Result } from '../result';
import { liquidEnthalpy, waterAt } from '../steam/fluid';
import type { FluidProperties } from '../steam/gibbs';
import { saturationAtPressure, type Saturation } from '../steam/saturation';
import { ENERGY_BALANCE, IF97 } from './balance';
import { ESTIMATE_CAUTION, type SteamSupply } from './duty';
import { allOf, checkInputs, DUTY_RANGE, range, type InputRanges } from './inputs';
import { openWorking, type Working, type WorkingSheet } from './working';

export interface BoilerHouseInputs {
  /** Evaporation from and at 100 degC, as on the plate. */
  readonly ratingFromAndAtKgPerH: number;
  readonly boilerPressureBarG: number;
  /** Pressure of the deaerator or feed tank that heats the feed. */
  readonly feedTankPressureBarG: number;
  /** Share of the feed that is blown down. */
  readonly blowdownFraction: number;
  /** Share of the feed that comes back as condensate; the rest is make-up. */
  readonly condensateReturnFraction: number;
  readonly condensateC: number;
  readonly makeUpC: number;
  /** Dry steam that the feed tank vents, as a share of the feed; none unless given. */
  readonly feedTankVentFraction?: number;
}

export interface BoilerExport {
  readonly grossKgPerH: number;
  readonly feedKgPerH: number;
  readonly feedTankSteamKgPerH: number;
  /** What leaves for the plant. */
  readonly netKgPerH: number;
  /** Heat from the fire into steam and blowdown. */
  readonly heatToWaterKW: number;
  readonly working: Working;
}

export const BOILER_HOUSE_RANGES: InputRanges<BoilerHouseInputs> = {
  ratingFromAndAtKgPerH: range('Rating from and at 100 °C', 'kg/h', 50, 200_000),
  boilerPressureBarG: range('Boiler pressure', 'bar g', 0, 60),
  feedTankPressureBarG: range('Feed tank pressure', 'bar g', 0, 5),
  blowdownFraction: range('Blowdown share', '', 0, 0.5),
  condensateReturnFraction: range('Condensate return', '', 0, 1),
  condensateC: range('Condensate temperature', '°C', 0, 100),
  makeUpC: range('Make-up temperature', '°C', 0, 100),
};

interface Enthalpies {
  readonly boiler: Saturation;
  readonly feedTank: Saturation;
  readonly fromAndAt: Saturation;
  readonly condensate: number;
  readonly makeUp: number;
}

/**
 * Evaporation / from-and-at rating, hfg(0 bar g) / (hg - h_feed): dry steam at a pressure from feed water at a
 * temperature [degC], pumped up to that pressure.
 * @returns STEAM-RANGE, also when the feed would boil.
 */
export function fromAndAtFactor(boilerPressure: BarAbsolute, feedC: number): Result<number> {
  const at = allOf<{ fromAndAt: Saturation; boiler: Saturation; feed: FluidProperties }>({
    fromAndAt: saturationAtPressure(STANDARD_ATMOSPHERE),
    boiler: saturationAtPressure(boilerPressure),
    feed: waterAt(boilerPressure, celsius(feedC)),
  });
  return at.ok ? ok(at.value.fromAndAt.hfg / (at.value.boiler.hg - at.value.feed.h)) : at;
}

function enthalpiesOf(house: BoilerHouseInputs, ambient: BarAbsolute): Result<Enthalpies> {
  return allOf<Enthalpies>({
    boiler: saturationAtPressure(toAbsolute(barGauge(house.boilerPressureBarG), ambient)),
    feedTank: saturationAtPressure(toAbsolute(barGauge(house.feedTankPressureBarG), ambient)),
    fromAndAt: saturationAtPressure(STANDARD_ATMOSPHERE),
    condensate: liquidEnthalpy(celsius(house.condensateC)),
    makeUp: liquidEnthalpy(celsius(house.makeUpC)),
  });
}

const VENTED = range('Feed tank vent', '', 0, 0.05);

function checkVent({ feedTankVentFraction }: BoilerHouseInputs): Problem | undefined {
  if (feedTankVentFraction === undefined) return undefined;
  return checkRange(DUTY_RANGE, VENTED, feedTankVentFraction, 'feedTankVentFraction');
}

function checkPressures({ boilerPressureBarG, feedTankPressureBarG }: BoilerHouseInputs): Problem | undefined {
  if (boilerPressureBarG > feedTankPressureBarG) return undefined;
  const pressures = `${feedTankPressureBarG} bar g in the tank, ${boilerPressureBarG} bar g in the boiler`;
  const text = `Feed tank pressure must be below boiler pressure: ${pressures}.`;
  return problem('DUTY-ORDER', text, 'feedTankPressureBarG');
}

function gross(sheet: WorkingSheet, house: BoilerHouseInputs, at: Enthalpies): number {
  sheet.section('Evaporation');
  const factor = sheet.step({
    symbol: 'f',
    name: 'Factor from the rating to real evaporation',
    formula: 'h_fg0 / (h_g − h_feed)',
    unit: '',
    source: IF97,
    inputs: {
      h_fg0: [at.fromAndAt.hfg, 'kJ/kg'],
      h_g: [at.boiler.hg, 'kJ/kg'],
      h_feed: [at.feedTank.hf, 'kJ/kg'],
    },
    value: ({ h_fg0, h_g, h_feed }) => h_fg0 / (h_g - h_feed),
  });
  return sheet.step({
    symbol: 'ṁ_g',
    name: 'Gross evaporation',
    formula: 'f · ṁ_rating',
    unit: 'kg/h',
    source: ENERGY_BALANCE,
    inputs: { f: [factor, ''], ṁ_rating: [house.ratingFromAndAtKgPerH, 'kg/h'] },
    value: ({ f, ṁ_rating }) => f * ṁ_rating,
  });
}

function feed(sheet: WorkingSheet, house: BoilerHouseInputs, grossKgPerH: number): number {
  return sheet.step({
    symbol: 'ṁ_f',
    name: 'Feed water, blowdown included',
    formula: 'ṁ_g / (1 − b)',
    unit: 'kg/h',
    source: 'Mass balance',
    inputs: { ṁ_g: [grossKgPerH, 'kg/h'], b: [house.blowdownFraction, ''] },
    value: ({ ṁ_g, b }) => ṁ_g / (1 - b),
  });
}

function mixEnthalpy(sheet: WorkingSheet, house: BoilerHouseInputs, at: Enthalpies): number {
  sheet.section('Feed tank');
  return sheet.step({
    symbol: 'h_mix',
    name: 'Enthalpy of condensate and make-up together',
    formula: 'r · h_cond + (1 − r) · h_mu',
    unit: 'kJ/kg',
    source: IF97,
    inputs: {
      r: [house.condensateReturnFraction, ''],
      h_cond: [at.condensate, 'kJ/kg'],
      h_mu: [at.makeUp, 'kJ/kg'],
    },
    value: ({ r, h_cond, h_mu }) => r * h_cond + (1 - r) * h_mu,
  });
}

function feedTankSteam(sheet: WorkingSheet, house: BoilerHouseInputs, feedKgPerH: number, mixH: number, at: Tank) {
  const { feedTankVentFraction: vented = 0 } = house;
  const heating = sheet.step({
    symbol: 'ṁ_ft',
    name: 'Steam for the feed tank (none when the mix is hot enough)',
    formula: 'ṁ_f · max(0, h_ft − h_mix) / (h − h_mix)',
    unit: 'kg/h',
    source: 'Balance of an open heater',
    inputs: {
      ṁ_f: [feedKgPerH, 'kg/h'],
      h_ft: [at.tank.hf, 'kJ/kg'],
      h_mix: [mixH, 'kJ/kg'],
      h: [at.steamH, 'kJ/kg'],
    },
    value: ({ ṁ_f, h_ft, h_mix, h }) => (ṁ_f * Math.max(0, h_ft - h_mix)) / (h - h_mix),
  });
  if (vented === 0) return heating;
  return sheet.step({
    symbol: 'ṁ_ft',
    name: 'Steam for the feed tank, its vent included',
    formula: 'ṁ_h + v · ṁ_f · (h_g − h_mix) / (h − h_mix)',
    unit: 'kg/h',
    source: 'Balance of an open heater that vents dry steam',
    inputs: {
      ṁ_h: [heating, 'kg/h'],
      v: [vented, ''],
      ṁ_f: [feedKgPerH, 'kg/h'],
      h_g: [at.tank.hg, 'kJ/kg'],
      h_mix: [mixH, 'kJ/kg'],
      h: [at.steamH, 'kJ/kg'],
    },
    value: ({ ṁ_h, v, ṁ_f, h_g, h_mix, h }) => ṁ_h + (v * ṁ_f * (h_g - h_mix)) / (h - h_mix),
  });
}

/** The feed tank's water and steam, and the enthalpy of the steam it is fed with [kJ/kg]. */
interface Tank {
  readonly tank: Saturation;
  readonly steamH: number;
}

function net(sheet: WorkingSheet, grossKgPerH: number, feedTankSteamKgPerH: number): number {
  sheet.section('Net export');
  return sheet.step({
    symbol: 'ṁ_n',
    name: 'What leaves for the plant: the feed tank’s steam is drawn from the same header',
    formula: 'ṁ_g − ṁ_ft',
    unit: 'kg/h',
    source: 'Mass balance',
    inputs: { ṁ_g: [grossKgPerH, 'kg/h'], ṁ_ft: [feedTankSteamKgPerH, 'kg/h'] },
    value: ({ ṁ_g, ṁ_ft }) => ṁ_g - ṁ_ft,
  });
}

function heatToWater(sheet: WorkingSheet, grossKgPerH: number, feedKgPerH: number, at: Enthalpies): number {
  sheet.section('Fire');
  return sheet.step({
    symbol: 'q',
    name: 'Heat into steam and blowdown',
    formula: '(ṁ_g · (h_g − h_feed) + (ṁ_f − ṁ_g) · (h_f − h_feed)) / 3600',
    unit: 'kW',
    source: ENERGY_BALANCE,
    inputs: {
      ṁ_g: [grossKgPerH, 'kg/h'],
      ṁ_f: [feedKgPerH, 'kg/h'],
      h_g: [at.boiler.hg, 'kJ/kg'],
      h_f: [at.boiler.hf, 'kJ/kg'],
      h_feed: [at.feedTank.hf, 'kJ/kg'],
    },
    value: ({ ṁ_g, ṁ_f, h_g, h_f, h_feed }) => (ṁ_g * (h_g - h_feed) + (ṁ_f - ṁ_g) * (h_f - h_feed)) / 3600,
  });
}

/**
 * Net export of one boiler; `supply` is the header that feeds the feed tank.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; STEAM-RANGE.
 */
export function boilerExport(house: BoilerHouseInputs, supply: SteamSupply): Result<BoilerExport> {
  const bad = checkInputs(house, BOILER_HOUSE_RANGES) ?? checkVent(house) ?? checkPressures(house);
  if (bad) return fail(bad);
  const at = enthalpiesOf(house, supply.ambient);
  if (!at.ok) return at;
  const sheet = openWorking('Boiler export', [ESTIMATE_CAUTION]);
  const grossKgPerH = gross(sheet, house, at.value);
  const feedKgPerH = feed(sheet, house, grossKgPerH);
  const mixH = mixEnthalpy(sheet, house, at.value);
  const tank = { tank: at.value.feedTank, steamH: supply.header.h };
  const feedTankSteamKgPerH = feedTankSteam(sheet, house, feedKgPerH, mixH, tank);
  const netKgPerH = sheet.total('Net export', net(sheet, grossKgPerH, feedTankSteamKgPerH), 'kg/h');
  const heatToWaterKW = heatToWater(sheet, grossKgPerH, feedKgPerH, at.value);
  return ok({ grossKgPerH, feedKgPerH, feedTankSteamKgPerH, netKgPerH, heatToWaterKW, working: sheet.finish() });
}
