import type { Activity, Phase } from '@/core/plant/activity';
import type { HeaderCapacity, PlantModel, Unit } from '@/core/plant/plant';
import type { Week } from '@/core/schedule/week';

const HORIZON_MIN = 10_080;
const RETORT_PHASES: readonly Phase[] = [
  { kind: 'vent', offsetMin: 10, minutes: 6, steamKgPerH: 1555.237 },
  { kind: 'comeUp', offsetMin: 16, minutes: 6, steamKgPerH: 359.2303 },
  { kind: 'process', offsetMin: 22, minutes: 12, steamKgPerH: 217.2079 },
  { kind: 'process', offsetMin: 34, minutes: 26, steamKgPerH: 119.811 },
];
const KETTLE_PHASES: readonly Phase[] = Array.from({ length: 40 }, (_, t) => ({
  kind: 'heatUp',
  offsetMin: t,
  minutes: 1,
  steamKgPerH: 340.9365 * Math.exp(-0.0283 * t),
}));

/** An invented week of so many activities, the same for the same number: half retort loads, half kettles. */
export function generatedWeek(count: number): Week {
  const random = linearCongruential(count);
  const unitsOfAKind = Math.max(6, Math.ceil(count / 120));
  const units = Array.from({ length: 2 * unitsOfAKind }, (_, i) => unitOf(i));
  const activities = Array.from({ length: count }, (_, i) => activityOf(i, units, random));
  return {
    horizonMin: HORIZON_MIN,
    plant: plantOf(units),
    calendars: units.map(({ id }) => ({ unitId: id, open: [{ from: 0, to: HORIZON_MIN }] })),
    capacities: [capacityOf(3500 * Math.max(1, count / 350))],
    activities,
    links: activities.slice(1).flatMap((later, i) => linksOf(activities[i] as Activity, later)),
  };
}

/** Numbers from 0 to 1, the same for the same seed. */
export function linearCongruential(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

function unitOf(i: number): Unit {
  const retort = i % 2 === 0;
  const common = { id: `unit${i}`, lineId: `line${i % 3}`, name: `Unit ${i}`, headerId: 'main' };
  return { ...common, kind: retort ? 'retort' : 'kettle', ventGroupId: retort ? `group${i % 4}` : null };
}

function activityOf(i: number, units: readonly Unit[], random: () => number): Activity {
  const retort = i % 2 === 1;
  const unit = units[2 * Math.floor((random() * units.length) / 2) + (retort ? 0 : 1)] as Unit;
  const start = Math.floor(random() * (HORIZON_MIN - 120));
  return {
    id: `activity${i}`,
    kind: 'stage',
    stage: retort ? 'retort' : 'cook',
    batchId: `batch${i >> 1}`,
    code: `G${i}`,
    title: `Generated ${i}`,
    productId: null,
    familyId: `family${Math.floor(random() * 3)}`,
    modes: units
      .filter((other) => other.kind === unit.kind)
      .map(({ id }) => ({
        unitId: id,
        minutes: retort ? 80 : 70,
        phases: retort ? RETORT_PHASES : KETTLE_PHASES,
        uses: [],
        dutyId: null,
      })),
    placement: { unitId: unit.id, start },
    fixing: 'free',
    occupiesUntil: 'end',
    earliestStart: 0,
    latestStart: null,
    due: start + 60,
    weight: 1,
    processData: null,
    revision: 1,
  };
}

function linksOf(earlier: Activity, later: Activity): Week['links'] {
  if (earlier.batchId !== later.batchId) return [];
  return [
    {
      id: `link-${later.id}`,
      from: { activityId: earlier.id, anchor: 'end', offsetMin: 0 },
      to: { activityId: later.id, anchor: 'start', offsetMin: 0 },
      leastMin: 0,
      greatestMin: 120,
      rule: 'sinceClosing',
      greatestBreach: 'process',
      source: null,
    },
  ];
}

function capacityOf(limitKgPerH: number): HeaderCapacity {
  const flat = (value: number) => [{ from: 0, value }];
  return {
    headerId: 'main',
    exportKgPerH: flat(limitKgPerH),
    limitKgPerH: flat(limitKgPerH * 0.9),
    baseLoadKgPerH: flat(200),
    greatestRiseKgPerHPerMin: flat(limitKgPerH * 0.1),
    storedKgPerBar: flat(88.24),
  };
}

function plantOf(units: readonly Unit[]): PlantModel {
  const families = [0, 1, 2];
  const group = (i: number) => `group${2 * i}`;
  return {
    id: 'generated',
    name: 'Generated plant',
    isDemo: true,
    ambientBarA: 1.01325,
    rules: { snapMinutes: 5, reserveFraction: 0.1, sagToleranceBar: 0.5 },
    lines: [0, 1, 2].map((i) => ({ id: `line${i}`, name: `Line ${i}` })),
    units,
    ventGroups: [0, 1].map((i) => ({
      id: group(i),
      name: `Manifold ${i}`,
      ventsAtOnce: 1,
      steamOnsAtOnce: 2,
      steamOnMinutes: 1,
      marginMinutes: 1,
      source: 'common practice, no source',
    })),
    headers: [
      { id: 'main', name: 'Main', pressureBarG: 7, dryness: 0.98, superheatK: null, feed: { kind: 'boilers' } },
    ],
    sharedLimits: [],
    cleaning: families.flatMap((from) =>
      families
        .filter((to) => to !== from)
        .map((to) => ({
          unitKind: 'kettle' as const,
          fromFamilyId: `family${from}`,
          toFamilyId: `family${to}`,
          minutes: 15,
          kind: 'wash' as const,
          phases: [{ kind: 'wash' as const, offsetMin: 0, minutes: 10, steamKgPerH: 694.1 }],
          uses: [],
        })),
    ),
  };
}
