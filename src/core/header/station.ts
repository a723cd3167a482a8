/**
 * A station: steam from a boiler or a higher header passes a valve into a header. The valve keeps kg/h and enthalpy;
 * where the header is stated otherwise, mass and heat still close, and the station says by what.
 * Source: energy balance of a throttle; states IAPWS R7-97(2012).
 */
import { ENERGY_BALANCE, IF97 } from '../duty/balance';
import { ESTIMATE_CAUTION } from '../duty/duty';
import { openWorking, type Working, type WorkingSheet } from '../duty/working';
import { toAbsolute, toGauge } from '../quantity/pressure';
import { shortNumber } from '../quantity/range';
import { barGauge, type BarAbsolute } from '../quantity/units';
import { fail, ok, problem, type Problem, type Result } from '../result';
import { stateFromEnthalpy, throttle, type SteamState } from '../steam/steamState';

export interface StationInput {
  /** What feeds the header, as sentences name it: a boiler or a higher header. */
  readonly upstreamName: string;
  readonly upstream: SteamState;
  readonly headerName: string;
  /** As entered for the header. */
  readonly stated: SteamState;
  /** What passes. [kg/h] */
  readonly kgPerH: number;
  readonly ambient: BarAbsolute;
}

export interface Station {
  readonly kgPerH: number;
  /** By the valve alone: same kg/h, same enthalpy. */
  readonly afterValve: SteamState;
  /** Heat that leaves between valve and users if the mains lose it; 0 where the steam arrives as stated. [kJ/kg, kW] */
  readonly lostKJPerKg: number;
  readonly lostKW: number;
  /** Share of what passes that condenses when the mains lose that heat, 0 to 1, and as a rate. [kg/h] */
  readonly condensedFraction: number;
  readonly condensedKgPerH: number;
  /** Or the state before the valve that would arrive as stated by the valve alone: a boiler that carries water over. */
  readonly upstreamNeeded: SteamState;
  /** Water in that state, all that passes taken together. [kg/h] */
  readonly carriedOverKgPerH: number;
  /** The same in sentences. */
  readonly says: readonly string[];
  readonly working: Working;
}

/** A header is entered with three digits of dryness; half of the last is about this. [kJ/kg] */
export const STATED_AS_IT_ARRIVES_KJ_PER_KG = 1;

/**
 * What a header's state would be by the valve alone: the feed's enthalpy at the header's pressure.
 * @returns STEAM-THROTTLE under `pressureBarG` where the feed's pressure is lower, STEAM-RANGE.
 */
export function headerStateFrom(feed: SteamState, pressureBarG: number, ambient: BarAbsolute): Result<SteamState> {
  const to = toAbsolute(barGauge(pressureBarG), ambient);
  if (to <= feed.pressure) return throttle(feed, to);
  const pressures = `${shortNumber(toGauge(feed.pressure, ambient))} bar g cannot feed ${shortNumber(pressureBarG)} bar g`;
  return fail(problem('STEAM-THROTTLE', `${pressures}; lower the pressure of this header.`, 'pressureBarG'));
}

/** A state in a few words: pressure and how dry. */
export function stateWords(steam: SteamState, ambient: BarAbsolute): string {
  const pressure = `${shortNumber(toGauge(steam.pressure, ambient))} bar g`;
  if (steam.kind === 'superheated') return `${pressure}, ${steam.superheatK.toFixed(1)} K above saturation`;
  return steam.dryness === 1
    ? `${pressure}, dry saturated`
    : `${pressure}, dryness ${Number(steam.dryness.toFixed(4))}`;
}

/**
 * The balance of a station at a rate.
 * @returns STEAM-THROTTLE as {@link headerStateFrom}; STATION-HOTTER under `dryness` or `superheatK` where the header is
 * stated hotter than what feeds it can make it; STEAM-RANGE.
 */
export function stationBalance(input: StationInput): Result<Station> {
  const { upstream, stated, kgPerH, ambient } = input;
  const afterValve = headerStateFrom(upstream, toGauge(stated.pressure, ambient), ambient);
  if (!afterValve.ok) return afterValve;
  const hotter = checkNotHotter(input, afterValve.value);
  if (hotter) return fail(hotter);
  const upstreamNeeded = stateFromEnthalpy(upstream.pressure, stated.h);
  if (!upstreamNeeded.ok) return upstreamNeeded;
  const sheet = openWorking(`Station from ${input.upstreamName} into ${input.headerName}`, [ESTIMATE_CAUTION]);
  const figures = {
    kgPerH,
    afterValve: writeValve(sheet, input, afterValve.value),
    ...writeLoss(sheet, input, afterValve.value),
    upstreamNeeded: upstreamNeeded.value,
    carriedOverKgPerH: writeCarryOver(sheet, input, upstreamNeeded.value),
  };
  return ok({ ...figures, says: sentences(input, figures), working: sheet.finish() });
}

function checkNotHotter({ upstreamName, headerName, stated, ambient }: StationInput, arrives: SteamState) {
  if (stated.h <= arrives.h + STATED_AS_IT_ARRIVES_KJ_PER_KG) return undefined;
  const found = `${headerName} is stated with ${stateWords(stated, ambient)} (${stated.h.toFixed(1)} kJ/kg)`;
  const can = `steam of ${upstreamName} arrives with ${stateWords(arrives, ambient)} (${arrives.h.toFixed(1)} kJ/kg) at most`;
  const field = stated.kind === 'wet' ? 'dryness' : 'superheatK';
  return problem('STATION-HOTTER', `${found}, but ${can}; lower the ${fieldWords[field]}.`, field) satisfies Problem;
}

const fieldWords = { dryness: 'dryness', superheatK: 'superheat' } as const;

function writeEnthalpy(sheet: WorkingSheet, symbol: string, name: string, steam: SteamState): number {
  const common = { symbol, name, unit: 'kJ/kg', source: IF97 };
  if (steam.kind === 'superheated')
    return sheet.step({
      ...common,
      formula: 'h(p, T)',
      inputs: { p: [steam.pressure, 'bar a'], T: [steam.temperature, '°C'] },
      value: () => steam.h,
    });
  return sheet.step({
    ...common,
    formula: 'h_f + x · h_fg',
    inputs: { h_f: [steam.hf, 'kJ/kg'], x: [steam.dryness, ''], h_fg: [steam.hfg, 'kJ/kg'] },
    value: ({ h_f, x, h_fg }) => h_f + x * h_fg,
  });
}

function writeValve(sheet: WorkingSheet, { upstream, stated }: StationInput, after: SteamState): SteamState {
  sheet.section('Through the valve: same kg/h, same enthalpy');
  const h = writeEnthalpy(sheet, 'h_1', 'Enthalpy before the valve', upstream);
  if (after.kind === 'wet')
    sheet.step({
      symbol: 'x_v',
      name: 'Dryness after the valve',
      formula: '(h_1 − h_f) / h_fg',
      unit: '',
      source: `${ENERGY_BALANCE} of a throttle`,
      inputs: { h_1: [h, 'kJ/kg'], h_f: [after.hf, 'kJ/kg'], h_fg: [after.hfg, 'kJ/kg'] },
      value: ({ h_1, h_f, h_fg }) => (h_1 - h_f) / h_fg,
    });
  else
    sheet.step({
      symbol: 'ΔT_v',
      name: 'Superheat after the valve',
      formula: 'T(p, h_1) − T_s',
      unit: 'K',
      source: `${ENERGY_BALANCE} of a throttle; ${IF97}`,
      inputs: { p: [after.pressure, 'bar a'], h_1: [h, 'kJ/kg'], T_s: [after.temperature - after.superheatK, '°C'] },
      value: () => after.superheatK,
    });
  writeEnthalpy(sheet, 'h_2', 'Enthalpy as the header is stated', stated);
  return after;
}

function writeLoss(sheet: WorkingSheet, { stated, kgPerH }: StationInput, after: SteamState) {
  sheet.section(
    arrivesAsStated(after.h - stated.h)
      ? 'What is left is rounding of what is entered'
      : 'Either the mains lose the difference',
  );
  const lostKJPerKg = sheet.step({
    symbol: 'Δh',
    name: 'Heat lost between valve and users',
    formula: 'h_1 − h_2',
    unit: 'kJ/kg',
    source: ENERGY_BALANCE,
    inputs: { h_1: [after.h, 'kJ/kg'], h_2: [stated.h, 'kJ/kg'] },
    value: ({ h_1, h_2 }) => h_1 - h_2,
  });
  const lostKW = sheet.step({
    symbol: 'q_m',
    name: 'Heat lost by the mains',
    formula: 'ṁ · Δh / 3600',
    unit: 'kW',
    source: ENERGY_BALANCE,
    inputs: { ṁ: [kgPerH, 'kg/h'], Δh: [lostKJPerKg, 'kJ/kg'] },
    value: ({ ṁ, Δh }) => (ṁ * Δh) / 3600,
  });
  const condensedFraction = sheet.step({
    symbol: 'y',
    name: 'Share that condenses on the way',
    formula: 'x_v − x_2',
    unit: '',
    source: 'Mass balance of the vapour; superheated and dry steam count as 1',
    inputs: { x_v: [drynessOf(after), ''], x_2: [drynessOf(stated), ''] },
    value: ({ x_v, x_2 }) => Math.max(0, x_v - x_2),
  });
  return { lostKJPerKg, lostKW, condensedFraction, condensedKgPerH: condensedFraction * kgPerH };
}

const drynessOf = (steam: SteamState): number => (steam.kind === 'wet' ? steam.dryness : 1);

const arrivesAsStated = (differenceKJPerKg: number): boolean =>
  Math.abs(differenceKJPerKg) <= STATED_AS_IT_ARRIVES_KJ_PER_KG;

function writeCarryOver(sheet: WorkingSheet, { upstream, stated, kgPerH }: StationInput, needed: SteamState): number {
  if (needed.kind === 'superheated') return 0;
  if (arrivesAsStated(upstream.h - stated.h)) return (1 - needed.dryness) * kgPerH;
  sheet.section('Or water comes over the valve already');
  const dryness = sheet.step({
    symbol: 'x_1',
    name: 'Dryness before the valve that arrives as stated by the valve alone',
    formula: '(h_2 − h_f1) / h_fg1',
    unit: '',
    source: ENERGY_BALANCE,
    inputs: { h_2: [stated.h, 'kJ/kg'], h_f1: [needed.hf, 'kJ/kg'], h_fg1: [needed.hfg, 'kJ/kg'] },
    value: ({ h_2, h_f1, h_fg1 }) => (h_2 - h_f1) / h_fg1,
  });
  return sheet.step({
    symbol: 'ṁ_w',
    name: 'Water carried over',
    formula: '(1 − x_1) · ṁ',
    unit: 'kg/h',
    source: 'Mass balance',
    inputs: { x_1: [dryness, ''], ṁ: [kgPerH, 'kg/h'] },
    value: ({ x_1, ṁ }) => (1 - x_1) * ṁ,
  });
}

type Figures = Omit<Station, 'says' | 'working'>;

function sentences({ upstreamName, upstream, headerName, stated, ambient }: StationInput, station: Figures): string[] {
  const { afterValve, lostKJPerKg, upstreamNeeded } = station;
  const arrives = `By the valve alone, steam of ${upstreamName} (${stateWords(upstream, ambient)}) arrives with ${stateWords(afterValve, ambient)}.`;
  if (arrivesAsStated(lostKJPerKg)) return [arrives, `${headerName} is stated so.`];
  const stands = `${headerName} is stated with ${stateWords(stated, ambient)}: ${lostKJPerKg.toFixed(1)} kJ/kg less.`;
  return [
    arrives,
    stands,
    mainsSentence(station),
    carrySentence(upstreamName, upstreamNeeded, station.carriedOverKgPerH),
  ];
}

function mainsSentence({ kgPerH, lostKW, condensedFraction, condensedKgPerH }: Figures): string {
  const lost = `Either the mains lose that heat, ${lostKW.toFixed(1)} kW at ${kgPerH.toFixed(0)} kg/h`;
  if (condensedFraction === 0) return `${lost}, and the steam stays dry.`;
  const share = `${(100 * condensedFraction).toFixed(1)} % of the steam (${condensedKgPerH.toFixed(0)} kg/h)`;
  return `${lost}, and ${share} condenses on the way; drain it, or the users get it as water.`;
}

function carrySentence(upstreamName: string, needed: SteamState, waterKgPerH: number): string {
  if (needed.kind === 'superheated')
    return `Or it leaves ${upstreamName} with ${needed.superheatK.toFixed(1)} K of superheat only.`;
  const water = `water carried over, ${waterKgPerH.toFixed(0)} kg/h`;
  return `Or it leaves ${upstreamName} with dryness ${needed.dryness.toFixed(4)}: ${water}.`;
}
