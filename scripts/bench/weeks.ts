import type { Activity, Link, Mode } from '@/core/plant/activity';
import type { Unit, UnitKind } from '@/core/plant/plant';
import type { Interval } from '@/core/time/interval';
import type { Week } from '@/core/schedule/week';
import { seededRandom, type Random } from '@/core/levelling/random';
import { stagesOf, whole, type StageRun } from './weekStages';
import { CLEANING, DAY, FAMILIES, limitOf, operators, plantOf } from './weekPlant';

/** What a generated week is like. */
export interface WeekShape {
  readonly batches: number;
  readonly days: number;
  /** Runs day and night with an hour of maintenance now and then; otherwise 05:00 to 23:00. */
  readonly dayAndNight: boolean;
}

export const WEEKS: Readonly<Record<string, WeekShape>> = {
  w40: { batches: 40, days: 2, dayAndNight: false },
  w150: { batches: 150, days: 5, dayAndNight: false },
  w500: { batches: 500, days: 7, dayAndNight: true },
};

const UNIT_KINDS: readonly UnitKind[] = ['blancher', 'blancher', ...kinds('kettle', 4), ...kinds('retort', 6)];

/** A week planned by a naive hand that looks at units and waits but not at steam or operators; invented. */
export function generateWeek(shape: WeekShape, seed: number): Week {
  const random = seededRandom(seed * 7919 + shape.batches);
  const horizonMin = (shape.days + 1) * DAY;
  const units = UNIT_KINDS.map((kind, i): Unit => ({
    id: `u${String(i).padStart(2, '0')}`,
    lineId: 'line',
    name: `${kind} ${i}`,
    kind,
    headerId: 'main',
    ventGroupId: null,
  }));
  const open = units.map((_, i) => calendarOf(i, shape));
  const planned = planByHand(shape, random, units, open, horizonMin);
  const naivePeak = peakOf(planned.activities, horizonMin);
  const base = Math.ceil(naivePeak / (1.6 + 0.3 * random()) / 50) * 50;
  return {
    horizonMin,
    plant: plantOf(units, operators(shape.days)),
    calendars: units.map((u, i) => ({ unitId: u.id, open: open[i] as Interval[] })),
    capacities: [
      {
        headerId: 'main',
        exportKgPerH: null,
        limitKgPerH: limitOf(base, shape.days),
        baseLoadKgPerH: [{ from: 0, value: 0 }],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null,
      },
    ],
    activities: unfixWhatIsOverAlone(planned.activities, base * 0.8, horizonMin),
    links: planned.links,
  };
}

function kinds(kind: UnitKind, count: number): UnitKind[] {
  return Array.from({ length: count }, () => kind);
}

function calendarOf(unit: number, shape: WeekShape): Interval[] {
  const open: Interval[] = [];
  for (let day = 0; day <= shape.days; day++) {
    const from = day * DAY;
    if (!shape.dayAndNight) open.push({ from: from + 300, to: from + 1380 });
    else if (day % 2 === 0) {
      const stop = from + ((unit * 110) % 1320);
      if (stop > from) open.push({ from, to: stop });
      open.push({ from: stop + 60, to: from + DAY });
    } else open.push({ from, to: from + DAY });
  }
  return join(open);
}

function join(spans: readonly Interval[]): Interval[] {
  const joined: Interval[] = [];
  for (const s of spans) {
    const last = joined.at(-1);
    if (last && last.to >= s.from) joined[joined.length - 1] = { from: last.from, to: s.to };
    else joined.push(s);
  }
  return joined;
}

interface Planned {
  readonly activities: Activity[];
  readonly links: Link[];
}

function planByHand(shape: WeekShape, random: Random, units: Unit[], open: Interval[][], horizonMin: number): Planned {
  const queues = units.map((): { end: number; family: number }[] => []);
  const activities: Activity[] = [];
  const links: Link[] = [];
  const perDay = Math.ceil(shape.batches / shape.days);
  for (let b = 0; b < shape.batches; b++) {
    const day = Math.min(shape.days - 1, Math.floor(b / perDay));
    const family = random() < 0.15 ? 3 : whole(random, 0, 2);
    const stages = stagesOf(random);
    const waits = stages.map((_, k) => (k === 0 ? 0 : 5 * whole(random, 9, 24)));
    const dayStart = shape.dayAndNight ? 0 : day * DAY + 300;
    const places = placeByHand(stages, waits, dayStart, units, open, queues, family);
    places.forEach((p, k) => queues[p.unit]?.push({ end: p.start + (stages[k] as StageRun).minutes, family }));
    const first = places[0]?.start ?? 0;
    const last = places.at(-1);
    const end = (last?.start ?? 0) + (stages.at(-1)?.minutes ?? 0);
    const loose = shape.dayAndNight ? Math.max(0, first - whole(random, 0, 24) * 60) : dayStart;
    const earliest = Math.min(first, random() < 0.5 ? loose : Math.max(0, first - whole(random, 0, 6) * 30));
    const due = end + (random() < 0.25 ? whole(random, 1, 6) * 15 : whole(random, 8, 40) * 30);
    const fixed = random() < 0.05;
    const id = `b${String(b).padStart(3, '0')}`;
    stages.forEach((stage, k) => {
      activities.push({
        id: `${id}-${k}`,
        kind: 'stage',
        stage: stage.kind === 'retort' ? 'retort' : stage.kind === 'kettle' ? 'cook' : 'blanch',
        batchId: id,
        code: `${id}-${k}`,
        title: `Batch ${b}`,
        productId: null,
        familyId: FAMILIES[family] as string,
        modes: units
          .filter((u) => u.kind === stage.kind)
          .map((u): Mode => ({
            unitId: u.id,
            minutes: stage.minutes,
            phases: stage.phases,
            uses: stage.operators.map(([offsetMin, minutes]) => ({
              limitId: 'operators',
              offsetMin,
              minutes,
              amount: 1,
            })),
            dutyId: null,
          })),
        placement: { unitId: units[places[k]?.unit ?? 0]?.id ?? '', start: places[k]?.start ?? 0 },
        fixing: fixed ? 'fixed' : 'free',
        occupiesUntil: 'end',
        earliestStart: k === 0 ? earliest : 0,
        latestStart: null,
        due: k === stages.length - 1 ? due : null,
        weight: 1,
        processData: null,
        revision: 1,
      });
      if (k === 0) return;
      links.push({
        id: `${id}-${k}`,
        from: { activityId: `${id}-${k - 1}`, anchor: 'end', offsetMin: 0 },
        to: { activityId: `${id}-${k}`, anchor: 'start', offsetMin: 0 },
        leastMin: 5,
        greatestMin: waits[k] as number,
        rule: 'flow',
        greatestBreach: 'time',
        source: null,
      });
    });
  }
  if (activities.some((a) => (a.placement?.start ?? 0) + 200 > horizonMin)) throw new Error('week too full');
  return { activities, links };
}

/** Every stage as early as its unit allows; the whole batch later where a wait would be passed. */
function placeByHand(
  stages: readonly StageRun[],
  waits: readonly number[],
  dayStart: number,
  units: readonly Unit[],
  open: readonly Interval[][],
  queues: readonly { end: number; family: number }[][],
  family: number,
): { unit: number; start: number }[] {
  let from = dayStart;
  for (let tries = 0; tries < 2000; tries++) {
    const places: { unit: number; start: number }[] = [];
    let ready = from;
    let behind = 0;
    for (let k = 0; k < stages.length && behind <= 0; k++) {
      const stage = stages[k] as StageRun;
      const place = earliestPlace(stage, k === 0 ? ready : ready + 5, units, open, queues, family);
      behind = k === 0 ? 0 : place.start - ready - (waits[k] as number);
      places.push(place);
      ready = place.start + stage.minutes;
    }
    if (behind <= 0) return places;
    from = Math.max(from, places[0]?.start ?? from) + Math.max(1, Math.min(120, behind));
  }
  throw new Error('no place found by hand');
}

function earliestPlace(
  stage: StageRun,
  from: number,
  units: readonly Unit[],
  open: readonly Interval[][],
  queues: readonly { end: number; family: number }[][],
  family: number,
): { unit: number; start: number } {
  let best = { unit: -1, start: Infinity };
  units.forEach((unit, i) => {
    if (unit.kind !== stage.kind) return;
    const last = queues[i]?.at(-1);
    const clean = last ? (CLEANING[unit.kind]?.[last.family]?.[family] ?? 0) : 0;
    const ready = Math.max(from, last ? last.end + clean : 0);
    const span = (open[i] as Interval[]).find((o) => Math.max(o.from, ready) + stage.minutes <= o.to);
    const start = span ? Math.max(span.from, ready) : Infinity;
    if (start < best.start) best = { unit: i, start };
  });
  return best;
}

function peakOf(activities: readonly Activity[], horizonMin: number): number {
  return Math.max(...loadOf(activities, horizonMin));
}

function loadOf(activities: readonly Activity[], horizonMin: number): Float64Array {
  const load = new Float64Array(horizonMin);
  for (const a of activities) addLoad(load, a, 1);
  return load;
}

function addLoad(load: Float64Array, a: Activity, sign: number): void {
  for (const p of a.modes[0]?.phases ?? []) {
    const from = (a.placement?.start ?? 0) + p.offsetMin;
    for (let t = from; t < from + p.minutes; t++) load[t] = (load[t] as number) + sign * p.steamKgPerH;
  }
}

/** Fixed batches alone stay under the limit, so that a week under it can exist. */
function unfixWhatIsOverAlone(activities: readonly Activity[], limit: number, horizonMin: number): Activity[] {
  const load = new Float64Array(horizonMin);
  const freed = new Set<string>();
  for (const batchId of new Set(activities.map((a) => a.batchId ?? a.id))) {
    const fixed = activities.filter((a) => a.batchId === batchId && a.fixing === 'fixed');
    fixed.forEach((a) => addLoad(load, a, 1));
    if (fixed.length === 0 || Math.max(...load) <= limit) continue;
    fixed.forEach((a) => addLoad(load, a, -1));
    freed.add(batchId);
  }
  return activities.map((a) => (freed.has(a.batchId ?? a.id) ? { ...a, fixing: 'free' } : a));
}
