/** Duty data of the demo plant and the modes that follow from it. Machines are those of an invented plant. */
import { toGrid } from '../../core/demand/grid';
import { workMode } from '../../core/demand/workMode';
import type { SteamSupply } from '../../core/duty/duty';
import { workOut, type DutyModel } from '../../core/duty/model';
import type { LimitUse, Mode, Phase, Stage } from '../../core/plant/activity';
import type { CleaningRule, UnitKind } from '../../core/plant/plant';
import { barAbsolute, barGauge } from '../../core/quantity/units';
import { steamState } from '../../core/steam/steamState';
import { FILL_MINUTES_PER_LOAD, RETORT_LEAD_MIN } from './nets';
import * as plant from './plant';
import { DEMO_PRODUCTS, type DemoProduct } from './products';

export type DemoDuty = DutyModel & { readonly id: string; readonly name: string };

const CHARGE_MIN = 10;
const COOL_MIN = 20;
const UNLOAD_MIN = 6;
const ROOM_C = 22;

/** Steam as a header gives it. */
export function supplyOf(headerId: string): SteamSupply {
  const header = plant.DEMO_HEADERS.find((h) => h.id === headerId);
  const ambient = barAbsolute(plant.DEMO_PLANT.ambientBarA);
  const quality = { kind: 'wet', dryness: header?.dryness ?? 1 } as const;
  const state = steamState({ pressure: barGauge(header?.pressureBarG ?? 0), quality, ambient });
  if (!state.ok) throw new Error(state.error.message);
  return { header: state.value, ambient };
}

const basis = (product: DemoProduct) => ({ kind: 'composition', composition: product.composition }) as const;

function blanchDuty(product: DemoProduct): DemoDuty {
  const runMin = product.line === 'a' ? 78 : 40;
  return {
    id: `${product.id}-blanch`,
    name: `${product.name}, blanch`,
    model: 'steamBlancher',
    inputs: {
      productKgPerH: product.line === 'a' ? 2_400 : 900,
      productInC: 15,
      productOutC: 90,
      product: basis(product),
      warmUpMin: 15,
      runMin,
      idleMin: 7,
      steelKg: 850,
      sumpWaterKg: 180,
      coldC: 20,
      chamberC: 95,
      shellAreaM2: 9.5,
      ambientC: ROOM_C,
      surfaceLossWPerM2K: 14,
      escapeFraction: 0.5,
      idleEscapeKgPerH: 60,
    },
  };
}

function cookDuty(product: DemoProduct): DemoDuty {
  return {
    id: `${product.id}-cook`,
    name: `${product.name}, cook`,
    model: 'jacketedKettle',
    inputs: {
      batchKg: 780,
      product: basis(product),
      kettleSteelKg: 380,
      startC: 20,
      endC: 100,
      jacketPressureBarG: 2.5,
      heatTransferWPerM2K: 700,
      jacketAreaM2: 2.4,
      heatingLossKW: 3,
      boilOffKg: product.cook?.boilOffKg ?? 0,
      holdMin: product.cook?.holdMin ?? 0,
      holdLossKW: 4.5,
    },
  };
}

function retortDuty(product: DemoProduct): DemoDuty {
  const hotter = (share: number) => product.initialC + (product.processC - product.initialC) * share;
  return {
    id: `${product.id}-retort`,
    name: `${product.name}, retort load`,
    model: 'stillRetort',
    inputs: {
      containers: 1_680,
      contentsKgEach: 0.425,
      containerSteelKgEach: 0.055,
      containerVolumeM3: 0.000455,
      contents: basis(product),
      specificHeatAtC: 90,
      basketsKg: 360,
      shellKg: 3_200,
      shellDiameterM: 1.2,
      shellLengthM: 5,
      shellC: 25,
      basketsC: 25,
      initialC: product.initialC,
      ambientC: 25,
      surfaceLossWPerM2K: 14,
      ventMin: 6,
      ventSteps: 2,
      ventEndC: 107.2222222,
      contentsAfterVentC: hotter(0.23),
      comeUpMin: 6,
      processC: product.processC,
      contentsAfterComeUpC: hotter(0.43),
      holds: [
        { minutes: 12, contentsEndC: hotter(0.78) },
        { minutes: product.processMinutes - 12, contentsEndC: hotter(0.97) },
      ],
      coolMin: COOL_MIN,
      vents: 4,
      ventBoreMm: 26.645,
      ventDischarge: 0.6,
      ventPressureBarG: 0.15,
      bleeders: 5,
      bleederBoreMm: 3.175,
    },
  };
}

const cleaningDuty = (kind: 'rinse' | 'wash' | 'allergen'): DemoDuty => ({
  id: `demo-clean-${kind}`,
  name: `Cleaning water, ${kind}`,
  model: 'waterHeating',
  inputs: {
    kind: kind === 'rinse' ? 'rinse' : 'wash',
    waterKg: { rinse: 250, wash: 600, allergen: 900 }[kind],
    fromC: 15,
    toC: kind === 'rinse' ? 60 : 82,
    minutes: { rinse: 5, wash: 10, allergen: 15 }[kind],
  },
});

/** Every duty of the demo plant. */
export const DEMO_DUTIES: readonly DemoDuty[] = [
  ...DEMO_PRODUCTS.filter((p) => p.line === 'a' || p.id === 'demo-rice').map(blanchDuty),
  ...DEMO_PRODUCTS.filter((p) => p.cook).map(cookDuty),
  ...DEMO_PRODUCTS.map(retortDuty),
  ...(['rinse', 'wash', 'allergen'] as const).map(cleaningDuty),
];

const dutyOf = (dutyId: string): DemoDuty => {
  const duty = DEMO_DUTIES.find((d) => d.id === dutyId);
  if (!duty) throw new Error(`no demo duty ${dutyId}`);
  return duty;
};

/** A cleaning's phases on the minute grid, on the steam of a header. */
function cleaningPhases(dutyId: string, headerId: string): readonly Phase[] {
  const worked = workOut(dutyOf(dutyId), supplyOf(headerId));
  if (!worked.ok) throw new Error(`${dutyId}: ${worked.error.message}`);
  return toGrid(worked.value.phases);
}

type DutyDraw = Omit<Mode, 'unitId' | 'dutyId' | 'uses'>;
const drawCache = new Map<string, DutyDraw>();

/** What a stage draws on the steam of a header, from charging or loading to unloading; worked out once. */
function drawOf(dutyId: string, headerId: string, leadMin: number, afterMin: number): DutyDraw {
  const key = `${dutyId} ${headerId}`;
  const known = drawCache.get(key);
  if (known) return known;
  const [duty, supply] = [dutyOf(dutyId), supplyOf(headerId)];
  const mode = workMode({ unitId: '', dutyId, duty, supply, leadMin, afterMin, minutes: 0, uses: [] });
  if (!mode.ok) throw new Error(`${dutyId}: ${mode.error.message}`);
  const { unitId: _unit, dutyId: _duty, uses: _uses, ...draw } = mode.value;
  drawCache.set(key, draw);
  return draw;
}

const ELIGIBLE: Readonly<Record<DemoProduct['line'], Partial<Record<Stage, readonly string[]>>>> = {
  a: { blanch: ['blancher-1'], fill: ['filler-1'], retort: ['retort-1', 'retort-2'] },
  b: { cook: ['kettle-1', 'kettle-2'], fill: ['filler-2'], retort: ['retort-3', 'retort-4'] },
  c: {
    blanch: ['blancher-2'],
    cook: ['kettle-3', 'kettle-4'],
    fill: ['filler-3'],
    retort: ['retort-5', 'retort-6'],
  },
};

/** Charging or loading before a stage's steam, unloading after it. [min] */
export function demoStageEnds(stage: Stage): { readonly leadMin: number; readonly afterMin: number } {
  const leadMin = { retort: RETORT_LEAD_MIN, cook: CHARGE_MIN }[stage as string] ?? 0;
  return { leadMin, afterMin: stage === 'retort' ? UNLOAD_MIN : 0 };
}

function modeOn(product: DemoProduct, stage: Stage, unitName: string, loads: number): Mode {
  const unitId = `demo-${unitName}`;
  const headerId = plant.DEMO_UNITS.find((u) => u.id === unitId)?.headerId ?? plant.MAIN_HEADER;
  const crates = (minutes: number, amount: number): LimitUse => ({
    limitId: plant.CRATES,
    offsetMin: 0,
    minutes,
    amount,
  });
  if (stage === 'fill') {
    const minutes = FILL_MINUTES_PER_LOAD * loads;
    return { unitId, minutes, phases: [], uses: [crates(minutes, 4)], dutyId: null };
  }
  const dutyId = `${product.id}-${stage}`;
  const { leadMin, afterMin } = demoStageEnds(stage);
  const draw = drawOf(dutyId, headerId, leadMin, afterMin);
  if (stage !== 'retort') return { unitId, uses: [], dutyId, ...draw };
  const operator: LimitUse = { limitId: plant.OPERATORS, offsetMin: leadMin - 2, minutes: 8, amount: 1 };
  return { unitId, uses: [crates(draw.minutes, 4), operator], dutyId, ...draw };
}

/** Modes of a product's stage on its line's units. */
export function demoModes(product: DemoProduct, stage: Stage, loads: number): readonly Mode[] {
  return (ELIGIBLE[product.line][stage] ?? []).map((unitName) => modeOn(product, stage, unitName, loads));
}

const HEADER_OF_KIND: Partial<Record<UnitKind, string>> = { kettle: plant.KETTLE_HEADER };

/** Cleaning between every pair of families on the kinds of unit that need it. */
export function demoCleaning(): CleaningRule[] {
  const families = plant.DEMO_FAMILIES.map((f) => f.id);
  return (
    Object.entries(plant.CLEANING_MINUTES) as [UnitKind, Partial<Record<CleaningRule['kind'], number>>][]
  ).flatMap(([unitKind, minutesOf]) =>
    families.flatMap((from) =>
      families.flatMap((to): CleaningRule[] => {
        const kind = plant.cleaningKind(from, to);
        const minutes = minutesOf[kind];
        if (minutes === undefined) return [];
        const dutyId = `demo-clean-${kind}`;
        const phases = cleaningPhases(dutyId, HEADER_OF_KIND[unitKind] ?? plant.MAIN_HEADER);
        return [{ unitKind, fromFamilyId: from, toFamilyId: to, minutes, kind, phases, uses: [], dutyId }];
      }),
    ),
  );
}
