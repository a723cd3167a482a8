/**
 * Still retort in saturated steam: vent, come-up, process time in pieces, cooling without steam. Steam is what
 * condenses on shell, baskets, containers, contents and for losses, what fills the void, and what leaves by vents and
 * bleeders. Times and temperatures are those of the scheduled process; only their steam is worked out.
 * Source: heat and mass balance; flow by Napier's rule and Cd A sqrt(2 rho dp); enthalpies IAPWS R7-97(2012).
 */
import { toAbsolute } from '../quantity/pressure';
import { barGauge, celsius } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { boreAreaMm2, openingAt, type Opening } from '../steam/opening';
import { saturationAtTemperature, type Saturation } from '../steam/saturation';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, PROCESS_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { allOf } from './inputs';
import { ventInSteps } from './retortVenting';
import { openingFlow, surfaceArea, voidVolume } from './retortVessel';
import { specificHeat, type SpecificHeat } from './specificHeat';
import { checkStillRetort, type StillRetortInput } from './stillRetortInput';
import { openWorking, type WorkingSheet } from './working';

/** Looked up or worked out once for the cycle. */
interface Cycle {
  readonly input: StillRetortInput;
  readonly headerH: number;
  readonly contentsKJPerK: number;
  readonly areaM2: number;
  readonly voidM3: number;
  readonly vent: Saturation;
  readonly process: Saturation;
  readonly ventOpening: Opening;
  readonly bleedersKgPerH: number;
}

interface Lookups {
  readonly cp: SpecificHeat;
  readonly vent: Saturation;
  readonly process: Saturation;
  readonly ventOpening: Opening;
}
function lookUp(input: StillRetortInput, { ambient }: SteamSupply): Result<Lookups> {
  const venting = toAbsolute(barGauge(input.ventPressureBarG), ambient);
  const ventArea = input.vents * boreAreaMm2(input.ventBoreMm);
  return allOf<Lookups>({
    cp: specificHeat(input.contents, input.specificHeatAtC),
    vent: saturationAtTemperature(celsius(input.ventEndC)),
    process: saturationAtTemperature(celsius(input.processC)),
    ventOpening: openingAt(venting, ambient, ventArea, input.ventDischarge),
  });
}

function cycleOf(sheet: WorkingSheet, input: StillRetortInput, supply: SteamSupply): Result<Cycle> {
  const at = lookUp(input, supply);
  if (!at.ok) return at;
  const { cp, vent, process, ventOpening } = at.value;
  const bleederArea = input.bleeders * boreAreaMm2(input.bleederBoreMm);
  const bleeding = openingAt(process.pressure, supply.ambient, bleederArea, 1);
  if (!bleeding.ok) return bleeding;
  sheet.section('Retort and load');
  const contentsKJPerK = balance.contentsCapacity(sheet, input, cp);
  const areaM2 = surfaceArea(sheet, input);
  const voidM3 = voidVolume(sheet, input);
  if (voidM3 < 0) {
    const text = `Containers and baskets take ${(-voidM3).toFixed(2)} m³ more than the retort holds.`;
    return fail(problem('DUTY-VOID', `${text} Check their number and size.`, 'containers'));
  }
  const bleedersKgPerH = openingFlow(sheet, 'Leaving by the bleeders', bleeding.value);
  const headerH = supply.header.h;
  return ok({ input, headerH, contentsKJPerK, areaM2, voidM3, vent, process, ventOpening, bleedersKgPerH });
}

/** Heat into the contents and lost from the shell over a spell, with what the metal takes [kJ]. */
function spellHeat(
  sheet: WorkingSheet,
  { input, contentsKJPerK, areaM2 }: Cycle,
  spell: { metalKJ: number; fromC: number; toC: number; meanShellC: number; minutes: number },
): number {
  const lossKW = balance.surfaceLoss(sheet, input.surfaceLossWPerM2K, areaM2, spell.meanShellC, input.ambientC);
  return sheet.step({
    symbol: 'Q',
    name: 'Heat into metal and contents, and lost',
    formula: 'Q_metal + C_p · (T_2 − T_1) + 60 · q_loss · t',
    unit: 'kJ',
    source: balance.ENERGY_BALANCE,
    inputs: {
      Q_metal: [spell.metalKJ, 'kJ'],
      C_p: [contentsKJPerK, 'kJ/K'],
      T_1: [spell.fromC, '°C'],
      T_2: [spell.toC, '°C'],
      q_loss: [lossKW, 'kW'],
      t: [spell.minutes, 'min'],
    },
    value: ({ Q_metal, C_p, T_1, T_2, q_loss, t }) => Q_metal + C_p * (T_2 - T_1) + 60 * q_loss * t,
  });
}

/** Condensed + filling + flowing out, as an even rate over the spell. */
function spellPhase(
  sheet: WorkingSheet,
  kind: DutyPhase['kind'],
  minutes: number,
  parts: { condensedKg: number; fillKg: number; outKgPerH: number },
): DutyPhase {
  const kg = sheet.step({
    symbol: 'm',
    name: 'Steam condensed, filling the void and flowing out',
    formula: 'm_c + m_v + ṁ_o · t / 60',
    unit: 'kg',
    source: 'Mass balance',
    inputs: {
      m_c: [parts.condensedKg, 'kg'],
      m_v: [parts.fillKg, 'kg'],
      ṁ_o: [parts.outKgPerH, 'kg/h'],
      t: [minutes, 'min'],
    },
    value: ({ m_c, m_v, ṁ_o, t }) => m_c + m_v + (ṁ_o * t) / 60,
  });
  return { kind, minutes, steamKgPerH: balance.averageRate(sheet, kg, minutes) };
}

function fillKg(sheet: WorkingSheet, voidM3: number, beforeKgPerM3: number, afterKgPerM3: number): number {
  return sheet.step({
    symbol: 'm_v',
    name: 'Steam filling the void',
    formula: 'V_0 · (ρ_2 − ρ_1)',
    unit: 'kg',
    source: balance.IF97,
    inputs: { V_0: [voidM3, 'm³'], ρ_1: [beforeKgPerM3, 'kg/m³'], ρ_2: [afterKgPerM3, 'kg/m³'] },
    value: ({ V_0, ρ_1, ρ_2 }) => V_0 * (ρ_2 - ρ_1),
  });
}

function vent(sheet: WorkingSheet, cycle: Cycle): DutyPhase[] {
  const { input, headerH, voidM3, ventOpening } = cycle;
  const { ventEndC: endC, ventMin: minutes, containers } = input;
  sheet.section('Vent');
  const steel = (symbol: string, name: string, kg: number, fromC: number) =>
    balance.sensibleHeat(sheet, { symbol, name }, kg, balance.STEEL_KJ_PER_KG_K, fromC, endC);
  const metalKJ =
    steel('Q_shell', 'Heat in the shell', input.shellKg, input.shellC) +
    steel('Q_baskets', 'Heat in the baskets', input.basketsKg, input.basketsC) +
    steel('Q_cans', 'Heat in the containers', containers * input.containerSteelKgEach, input.initialC);
  const meanShellC = (input.shellC + endC) / 2;
  const contents = { fromC: input.initialC, toC: input.contentsAfterVentC };
  const heatKJ = spellHeat(sheet, cycle, { metalKJ, ...contents, meanShellC, minutes });
  const dh = balance.heatGivenUp(sheet, headerH, cycle.vent.hf, endC);
  const condensedKg = balance.steamForHeat(sheet, 'm_c', 'Steam condensed', heatKJ, dh);
  const filled = fillKg(sheet, voidM3, 0, 1 / cycle.vent.vg);
  const outKgPerH = openingFlow(sheet, 'Leaving by the vents', ventOpening);
  const whole = spellPhase(sheet, 'vent', minutes, { condensedKg, fillKg: filled, outKgPerH });
  const { ventSteps: steps = 1 } = input;
  if (steps === 1) return [whole];
  const metalKg = metalKJ / dh;
  const evenKg = condensedKg - metalKg + filled;
  return ventInSteps(sheet, { metalKg, evenKg, outKg: (outKgPerH * minutes) / 60 }, minutes, steps);
}

function comeUp(sheet: WorkingSheet, cycle: Cycle): DutyPhase {
  const { input, headerH, voidM3, bleedersKgPerH } = cycle;
  const { comeUpMin: minutes, ventEndC, processC } = input;
  sheet.section('Come-up');
  const metalKg = input.shellKg + input.basketsKg + input.containers * input.containerSteelKgEach;
  const metal = { symbol: 'Q_metal', name: 'Heat in shell, baskets and containers' };
  const metalKJ = balance.sensibleHeat(sheet, metal, metalKg, balance.STEEL_KJ_PER_KG_K, ventEndC, processC);
  const contents = { fromC: input.contentsAfterVentC, toC: input.contentsAfterComeUpC };
  const heatKJ = spellHeat(sheet, cycle, { metalKJ, ...contents, meanShellC: (ventEndC + processC) / 2, minutes });
  const dh = balance.heatGivenUp(sheet, headerH, cycle.process.hf, processC);
  const condensedKg = balance.steamForHeat(sheet, 'm_c', 'Steam condensed', heatKJ, dh);
  const filled = fillKg(sheet, voidM3, 1 / cycle.vent.vg, 1 / cycle.process.vg);
  return spellPhase(sheet, 'comeUp', minutes, { condensedKg, fillKg: filled, outKgPerH: bleedersKgPerH });
}

function processTime(sheet: WorkingSheet, cycle: Cycle): DutyPhase[] {
  const { input, headerH, bleedersKgPerH } = cycle;
  let fromC = input.contentsAfterComeUpC;
  return input.holds.map(({ minutes, contentsEndC: toC }, index) => {
    sheet.section(input.holds.length === 1 ? 'Process time' : `Process time, piece ${index + 1}`);
    const heatKJ = spellHeat(sheet, cycle, { metalKJ: 0, fromC, toC, meanShellC: input.processC, minutes });
    const dh = balance.heatGivenUp(sheet, headerH, cycle.process.hf, input.processC);
    const condensedKg = balance.steamForHeat(sheet, 'm_c', 'Steam condensed', heatKJ, dh);
    fromC = toC;
    return spellPhase(sheet, 'process', minutes, { condensedKg, fillKg: 0, outKgPerH: bleedersKgPerH });
  });
}

/**
 * Steam of a still retort's cycle from steam on to the end of cooling.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; DUTY-VOID when the load does not fit; STEAM-RANGE.
 */
export function stillRetort(input: StillRetortInput, supply: SteamSupply): Result<Duty> {
  const bad = checkStillRetort(input);
  if (bad) return fail(bad);
  const sheet = openWorking('Still retort', [PROCESS_CAUTION, ESTIMATE_CAUTION]);
  const cycle = cycleOf(sheet, input, supply);
  if (!cycle.ok) return cycle;
  const phases: DutyPhase[] = [
    ...vent(sheet, cycle.value),
    comeUp(sheet, cycle.value),
    ...processTime(sheet, cycle.value),
  ];
  phases.push({ kind: 'cool', minutes: input.coolMin, steamKgPerH: 0 });
  return ok(closeDuty(sheet, phases));
}
