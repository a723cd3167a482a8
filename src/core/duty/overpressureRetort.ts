/**
 * Retort under over-pressure: steam with air, water spray, or water immersion. There is no vent; the draw follows the
 * temperature programme, which heats contents, metal and circulating water. Steam blown into circulating water stays in
 * it; steam among air drains as it condenses. Metal and water are taken to follow the programme without lag.
 * Source: heat and mass balance; enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import { saturationAtTemperature } from '../steam/saturation';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, PROCESS_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { condensateOf } from './heating';
import { allOf } from './inputs';
import { checkOverpressureRetort, type OverpressureRetortInput, type ProgrammeStep } from './overpressureRetortInput';
import { specificHeat } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

const TITLES: Readonly<Record<OverpressureRetortInput['medium'], string>> = {
  steamAir: 'Retort in steam and air',
  waterSpray: 'Water spray retort',
  waterImmersion: 'Water immersion retort',
};

/** Where the cycle stands before a step. */
interface Standing {
  /** null: shell, baskets and containers still have temperatures of their own. */
  readonly mediumC: number | null;
  readonly contentsC: number;
  readonly waterKg: number;
  readonly waterH: number;
  readonly steamKgPerM3: number;
}

interface Step extends ProgrammeStep {
  readonly kind: 'comeUp' | 'process';
  readonly section: string;
}

/** What every step needs, and the shares of metal and contents. */
interface Load {
  readonly input: OverpressureRetortInput;
  readonly supply: SteamSupply;
  readonly contentsKJPerK: number;
}

function waterAtStart(sheet: WorkingSheet, input: OverpressureRetortInput): Result<number> {
  const at = allOf<{ fresh: number; reused: number }>({
    fresh: liquidEnthalpy(celsius(input.freshWaterC)),
    reused: liquidEnthalpy(celsius(input.reusedWaterC)),
  });
  if (!at.ok) return at;
  return ok(
    sheet.step({
      symbol: 'h_0',
      name: 'Circulating water at the start, part of it kept hot from the load before',
      formula: 'r · h_reused + (1 − r) · h_fresh',
      unit: 'kJ/kg',
      source: balance.IF97,
      inputs: {
        r: [input.reusedWaterShare, ''],
        h_reused: [at.value.reused, 'kJ/kg'],
        h_fresh: [at.value.fresh, 'kJ/kg'],
      },
      value: ({ r, h_reused, h_fresh }) => r * h_reused + (1 - r) * h_fresh,
    }),
  );
}

function metalHeat(sheet: WorkingSheet, input: OverpressureRetortInput, fromC: number | null, toC: number): number {
  const { containers, containerKgEach, containerKJPerKgK, shellKg, basketsKg } = input;
  const warm = (symbol: string, name: string, kg: number, c: number, startC: number) =>
    balance.sensibleHeat(sheet, { symbol, name }, kg, c, fromC ?? startC, toC);
  const steel = balance.STEEL_KJ_PER_KG_K;
  const metal = { symbol: 'Q_metal', name: 'Heat into shell, baskets and containers', unit: 'kJ' };
  return balance.sumOf(sheet, metal, {
    Q_shell: warm('Q_shell', 'Heat in the shell', shellKg, steel, input.shellC),
    Q_baskets: warm('Q_baskets', 'Heat in the baskets', basketsKg, steel, input.basketsC),
    Q_cans: warm('Q_cans', 'Heat in the containers', containers * containerKgEach, containerKJPerKgK, input.initialC),
  });
}

/** Steam of one step of the programme, and where the cycle stands after it. */
function work(sheet: WorkingSheet, { input, supply, contentsKJPerK }: Load, before: Standing, step: Step) {
  const at = allOf({
    condensate: condensateOf(input, step.mediumEndC, supply),
    hotH: liquidEnthalpy(celsius(step.mediumEndC)),
    steam: saturationAtTemperature(celsius(step.mediumEndC)),
  });
  if (!at.ok) return at;
  const { condensate, hotH, steam } = at.value;
  sheet.section(step.section);
  const dh = balance.heatGivenUp(sheet, supply.header.h, condensate.h, condensate.celsius);
  const meanC = ((before.mediumC ?? input.shellC) + step.mediumEndC) / 2;
  const { surfaceLossWPerM2K, surfaceAreaM2, ambientC } = input;
  const lossKW = balance.surfaceLoss(sheet, surfaceLossWPerM2K, surfaceAreaM2, meanC, ambientC);
  const contents = { symbol: 'Q_contents', name: 'Heat into the contents' };
  const water = { symbol: 'Q_water', name: 'Heat into the circulating water' };
  const heatKJ = balance.sumOf(
    sheet,
    { symbol: 'Q', name: 'Heat of this step', unit: 'kJ' },
    {
      Q_metal: metalHeat(sheet, input, before.mediumC, step.mediumEndC),
      Q_contents: balance.sensibleHeat(sheet, contents, contentsKJPerK, 1, before.contentsC, step.contentsEndC),
      Q_water: balance.waterHeat(sheet, water, before.waterKg, before.waterH, hotH),
      Q_loss: balance.lostHeat(sheet, 'Lost from the shell', lossKW, step.minutes),
    },
  );
  const condensedKg = balance.steamForHeat(sheet, 'm_c', 'Steam condensed', heatKJ, dh);
  const steamKgPerM3 = 1 / steam.vg;
  const kg = balance.sumOf(
    sheet,
    { symbol: 'm', name: 'Steam condensed, filling the free volume and carried off', unit: 'kg' },
    {
      m_c: condensedKg,
      m_v: filling(sheet, input.freeVolumeM3, before.steamKgPerM3, steamKgPerM3),
      m_o: carriedOff(sheet, input.carriedOffKgPerH, step.minutes),
    },
  );
  const steamKgPerH = balance.averageRate(sheet, kg, step.minutes);
  const staysInWater = input.heating === 'direct' && input.medium !== 'steamAir';
  const phase: DutyPhase = { kind: step.kind, minutes: step.minutes, steamKgPerH };
  const after: Standing = {
    mediumC: step.mediumEndC,
    contentsC: step.contentsEndC,
    waterKg: before.waterKg + (staysInWater ? condensedKg : 0),
    waterH: hotH,
    steamKgPerM3,
  };
  return ok({ phase, after });
}

const filling = (sheet: WorkingSheet, volumeM3: number, before: number, after: number): number =>
  sheet.step({
    symbol: 'm_v',
    name: 'Steam filling the free volume, at its own pressure among the air',
    formula: 'V · (ρ_2 − ρ_1)',
    unit: 'kg',
    source: balance.IF97,
    inputs: { V: [volumeM3, 'm³'], ρ_1: [before, 'kg/m³'], ρ_2: [after, 'kg/m³'] },
    value: ({ V, ρ_1, ρ_2 }) => V * (ρ_2 - ρ_1),
  });

const carriedOff = (sheet: WorkingSheet, kgPerH: number, minutes: number): number =>
  sheet.step({
    symbol: 'm_o',
    name: 'Steam carried off with the air that holds the pressure',
    formula: 'ṁ_o · t / 60',
    unit: 'kg',
    source: 'Figure of the plant',
    inputs: { ṁ_o: [kgPerH, 'kg/h'], t: [minutes, 'min'] },
    value: ({ ṁ_o, t }) => (ṁ_o * t) / 60,
  });

function stepsOf(input: OverpressureRetortInput): Step[] {
  const processC = input.comeUp.at(-1)?.mediumEndC ?? 0;
  return [
    ...input.comeUp.map((step, i) => ({ ...step, kind: 'comeUp' as const, section: `Come-up, step ${i + 1}` })),
    ...input.holds.map(({ minutes, contentsEndC }, i) => {
      const section = `Process time, piece ${i + 1}`;
      return { minutes, contentsEndC, mediumEndC: processC, kind: 'process' as const, section };
    }),
  ];
}

/**
 * Steam of an over-pressure retort's cycle from steam on to the end of cooling.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE, STEAM-RANGE.
 */
export function overpressureRetort(input: OverpressureRetortInput, supply: SteamSupply): Result<Duty> {
  const bad = checkOverpressureRetort(input);
  if (bad) return fail(bad);
  const cp = specificHeat(input.contents, input.specificHeatAtC);
  if (!cp.ok) return cp;
  const sheet = openWorking(TITLES[input.medium], [PROCESS_CAUTION, ESTIMATE_CAUTION]);
  sheet.section('Retort and load');
  const contentsKJPerK = balance.contentsCapacity(sheet, input, cp.value);
  const waterH = waterAtStart(sheet, input);
  if (!waterH.ok) return waterH;
  let standing: Standing = {
    mediumC: null,
    contentsC: input.initialC,
    waterKg: input.circulatingWaterKg,
    waterH: waterH.value,
    steamKgPerM3: 0,
  };
  const phases: DutyPhase[] = [];
  for (const step of stepsOf(input)) {
    const worked = work(sheet, { input, supply, contentsKJPerK }, standing, step);
    if (!worked.ok) return worked;
    phases.push(worked.value.phase);
    standing = worked.value.after;
  }
  phases.push({ kind: 'cool', minutes: input.coolMin, steamKgPerH: 0 });
  return ok(closeDuty(sheet, phases));
}
