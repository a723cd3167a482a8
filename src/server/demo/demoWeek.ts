/** The demo week as the naive hand leaves it: invented, the same for every week start. Minutes from Monday 00:00. */
import { boilerExport } from '../../core/duty/boilerExport';
import { buildHeaderCapacity, type BoilerInForce } from '../../core/header/capacity';
import { firesOf, readySpans } from '../../core/house/readiness';
import type { HeaderCapacity, PlantModel } from '../../core/plant/plant';
import { barAbsolute, barGauge } from '../../core/quantity/units';
import { toAbsolute } from '../../core/quantity/pressure';
import type { Week } from '../../core/schedule/week';
import { storedSteamKgPerBar } from '../../core/steam/flash';
import { stepsFromSpans } from '../../core/time/stepMath';
import { demoCleaning, demoModes, supplyOf } from './duties';
import { NaiveHand } from './naiveHand';
import { buildNet, type DemoNet, type NetParts } from './nets';
import * as plant from './plant';
import { productById } from './products';
import { seededRandom } from './random';

const DAY = 1_440;
const HOUR = 60;

/** Rotation of products by line: what the hand runs, in order, each day. */
const ROTATION: Readonly<Record<'a' | 'b' | 'c', readonly string[]>> = {
  a: ['demo-sweetcorn', 'demo-carrots', 'demo-carrots', 'demo-sweetcorn', 'demo-sweetcorn', 'demo-beans'],
  b: [
    'demo-lentil',
    'demo-lentil',
    'demo-tomato',
    'demo-leek',
    'demo-tomato',
    'demo-tomato',
    'demo-leek',
    'demo-cream-leek',
  ],
  c: ['demo-chickpea', 'demo-rice', 'demo-chickpea', 'demo-chickpea', 'demo-rice', 'demo-rice'],
};
const FIRST_START: Readonly<Record<'a' | 'b' | 'c', number>> = { a: 6 * HOUR, b: 6 * HOUR, c: 6 * HOUR };
const SPACING: Readonly<Record<'a' | 'b' | 'c', number>> = { a: 255, b: 165, c: 195 };
const PER_DAY: Readonly<Record<'a' | 'b' | 'c', number>> = { a: 3, b: 4, c: 4 };

function net(line: 'a' | 'b' | 'c', number: number, productId: string, earliest: number, due: number): DemoNet {
  const product = productById(productId);
  return {
    code: `${line.toUpperCase()}${String(number).padStart(2, '0')}`,
    product,
    blanched: line === 'a' || productId === 'demo-rice',
    kettles: { a: 0, b: 1, c: 2 }[line],
    loads: { a: 4, b: 1, c: 2 }[line],
    earliest,
    due,
  };
}

/** Orders that the hand places, day by day and line by line. */
function plannedNets(): DemoNet[] {
  const random = seededRandom(7);
  const nets: DemoNet[] = [];
  const count = { a: 0, b: 0, c: 0 };
  for (let day = 0; day < 5; day++) {
    for (let turn = 0; turn < 4; turn++) {
      for (const line of ['a', 'b', 'c'] as const) {
        if (turn >= PER_DAY[line]) continue;
        const earliest = day * DAY + FIRST_START[line] + turn * SPACING[line];
        const rotation = ROTATION[line];
        const productId = rotation[count[line] % rotation.length] as string;
        const slack = (random() < 0.25 ? 2 : 7) * HOUR + Math.floor(random() * 16) * HOUR;
        count[line] += 1;
        nets.push(net(line, count[line], productId, earliest, roundUp(earliest + 5 * HOUR + slack, 30)));
      }
    }
  }
  return nets;
}

const roundUp = (minute: number, step: number): number => Math.ceil(minute / step) * step;

/** Orders that came late: not yet placed. */
const LATE_ORDERS: readonly DemoNet[] = [
  net('a', 41, 'demo-beans', 3 * DAY + 6 * HOUR, 5 * DAY + 12 * HOUR),
  net('a', 42, 'demo-carrots', 4 * DAY + 6 * HOUR, 5 * DAY + 12 * HOUR),
  net('b', 41, 'demo-leek', 2 * DAY + 6 * HOUR, 4 * DAY + 22 * HOUR),
  net('b', 42, 'demo-lentil', 3 * DAY + 6 * HOUR, 5 * DAY + 12 * HOUR),
  net('b', 43, 'demo-tomato', 4 * DAY + 6 * HOUR, 5 * DAY + 12 * HOUR),
  net('c', 41, 'demo-mild-curry', 2 * DAY + 6 * HOUR, 4 * DAY + 22 * HOUR),
  net('c', 42, 'demo-chickpea', 4 * DAY + 6 * HOUR, 5 * DAY + 12 * HOUR),
];

const OPEN = [0, 1, 2, 3, 4].map((day) => ({ from: day * DAY + 360, to: day * DAY + 1_320 }));
const SATURDAY = { from: 5 * DAY + 360, to: 5 * DAY + 720 };

/** All nets: those placed by the naive hand, and those not yet placed. */
export function demoNets(): readonly NetParts[] {
  const cleaning = demoCleaning();
  const kindOf = new Map(plant.DEMO_UNITS.map((u) => [u.id, u.kind]));
  const groupOf = new Map(plant.DEMO_UNITS.map((u) => [u.id, u.ventGroupId]));
  const hand = new NaiveHand({
    open: OPEN,
    cleaningMin: (unitId, from, to) =>
      cleaning.find((r) => r.unitKind === kindOf.get(unitId) && r.fromFamilyId === from && r.toFamilyId === to)
        ?.minutes ?? 0,
    ventGroupOf: (unitId) => groupOf.get(unitId) ?? null,
    ventsAtOnce: 2,
  });
  const placed = plannedNets().map((n) => {
    const parts = buildNet(n, demoModes);
    return { ...parts, activities: hand.place(parts) };
  });
  return [...placed, ...LATE_ORDERS.map((n) => buildNet(n, demoModes))];
}

/** The demo plant as a model. */
export function demoPlantModel(): PlantModel {
  return {
    id: plant.DEMO_PLANT.id,
    name: plant.DEMO_PLANT.name,
    isDemo: true,
    ambientBarA: plant.DEMO_PLANT.ambientBarA,
    rules: plant.DEMO_RULES,
    lines: plant.DEMO_LINES,
    units: plant.DEMO_UNITS,
    ventGroups: plant.DEMO_VENT_GROUPS,
    headers: plant.DEMO_HEADERS,
    sharedLimits: plant.DEMO_SHARED_LIMITS.map((limit) => ({
      ...limit,
      capacity: limit.capacity.map((step) => ({ from: step.fromHour * HOUR, value: step.value })),
    })),
    cleaning: demoCleaning(),
  };
}

function boilerInForce(boiler: plant.DemoBoiler): BoilerInForce {
  const exported = boilerExport(
    { ...boiler, boilerPressureBarG: boiler.pressureBarG, feedTankPressureBarG: boiler.feedTankBarG },
    supplyOf(plant.MAIN_HEADER),
  );
  const pressure = toAbsolute(barGauge(boiler.pressureBarG), barAbsolute(plant.DEMO_PLANT.ambientBarA));
  const stored = storedSteamKgPerBar(pressure, 1_000);
  if (!exported.ok || !stored.ok) throw new Error(`demo ${boiler.name} can't be worked out`);
  const firings = plant.DEMO_FIRINGS.filter((f) => f.boilerId === boiler.id).map(({ from, to, share }) => {
    return { from, to, value: share };
  });
  return {
    id: boiler.id,
    exportKgPerH: exported.value.netKgPerH,
    greatestRisePerMin: boiler.greatestRiseFractionPerMin,
    waterTonnes: boiler.waterTonnes,
    storedKgPerBarAndTonne: stored.value,
    lit: readySpans(firesOf(stepsFromSpans(firings, 0), boiler, 7 * DAY)),
    outages: [],
    deratings: firings,
  };
}

function mainCapacity(): HeaderCapacity {
  return buildHeaderCapacity({
    headerId: plant.MAIN_HEADER,
    boilers: plant.DEMO_BOILERS.map(boilerInForce),
    reserveFraction: plant.DEMO_RULES.reserveFraction,
    setLimits: [],
    baseLoadKgPerH: plant.DEMO_BASE_LOADS.flatMap((load) => [
      { from: load.fromHour * HOUR, value: load.kgPerH },
      { from: load.toHour * HOUR, value: 0 },
    ]),
  });
}

/** The demo week for benches and tests, without a database. */
export function demoWeek(): Week {
  const nets = demoNets();
  const open = [...OPEN, SATURDAY];
  return {
    horizonMin: 7 * DAY,
    plant: demoPlantModel(),
    calendars: plant.DEMO_UNITS.map((unit) => ({ unitId: unit.id, open })),
    capacities: [
      mainCapacity(),
      {
        headerId: plant.KETTLE_HEADER,
        exportKgPerH: null,
        limitKgPerH: null,
        baseLoadKgPerH: [],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null,
      },
    ],
    activities: nets.flatMap((parts) => parts.activities),
    links: nets.flatMap((parts) => parts.links),
  };
}
