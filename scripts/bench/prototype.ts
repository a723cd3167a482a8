import { pathToFileURL } from 'node:url';
import { join } from 'node:path';
import type { Activity, Link, Phase } from '@/core/plant/activity';
import type { CleaningRule, UnitKind } from '@/core/plant/plant';
import type { Week } from '@/core/schedule/week';
import { fromMinutes } from '@/core/time/stepFunction';

/** An operation of the experiment's instances. */
interface Op {
  readonly id: number;
  readonly job: number;
  readonly k: number;
  readonly units: readonly number[];
  readonly dur: number;
  readonly prof: readonly (readonly (readonly [number, number, number])[])[];
  readonly fam: number;
  readonly minLag: number;
  readonly maxLag: number;
  readonly p: number;
  readonly pu: number;
}

/** A generated instance of the experiment. */
export interface Instance {
  readonly H: number;
  readonly units: readonly { readonly kind: string; readonly open: readonly (readonly [number, number])[] }[];
  readonly jobs: readonly {
    readonly ops: readonly number[];
    readonly rel: number;
    readonly due: number;
    readonly pinned: boolean;
  }[];
  readonly ops: readonly Op[];
  readonly clean: Readonly<Record<string, readonly (readonly number[])[]>>;
  readonly cap: readonly Float64Array[];
}

export interface InstancePlan {
  readonly s: Int32Array;
  readonly u: Int32Array;
}

export interface Evaluation {
  readonly over: number;
  readonly tard: number;
  readonly disp: number;
  readonly unitMoves: number;
  readonly viol: readonly string[];
}

/** The experiment's modules, from the folder given by flag. */
export interface Prototype {
  readonly generate: (shape: object) => Instance;
  readonly evaluate: (instance: Instance, plan: InstancePlan) => Evaluation;
  readonly presets: Readonly<Record<string, object>>;
  readonly lns: (instance: Instance, options: object) => { readonly best: InstancePlan };
  readonly extract: (instance: Instance, plan: InstancePlan) => unknown;
  readonly solveJs: (instance: Instance, plan: InstancePlan, system: unknown) => InstancePlan | null;
}

export async function loadPrototype(folder: string): Promise<Prototype> {
  const load = (file: string) => import(pathToFileURL(join(folder, file)).href);
  const [gen, lns, lp] = [await load('gen.mjs'), await load('lns.mjs'), await load('timinglp.mjs')];
  return {
    generate: gen.generate,
    evaluate: gen.evaluate,
    presets: gen.PRESETS,
    lns: lns.lns,
    extract: lp.extract,
    solveJs: lp.solveJs,
  };
}

export const unitId = (u: number): string => `u${String(u).padStart(2, '0')}`;
export const activityId = (op: number): string => `o${String(op).padStart(5, '0')}`;

/** The same instance as a week, so that both solve the same thing. */
export function toWeek(instance: Instance): Week {
  return {
    horizonMin: instance.H,
    plant: {
      id: 'instance',
      name: 'Converted instance',
      isDemo: true,
      ambientBarA: 1.01325,
      rules: { snapMinutes: 5, reserveFraction: 0, sagToleranceBar: 1 },
      lines: [{ id: 'line', name: 'Line' }],
      units: instance.units.map((u, i) => ({
        id: unitId(i),
        lineId: 'line',
        name: unitId(i),
        kind: u.kind as UnitKind,
        headerId: 'main',
        ventGroupId: null,
      })),
      ventGroups: [],
      headers: [
        { id: 'main', name: 'Main', pressureBarG: 7, dryness: 0.98, superheatK: null, feed: { kind: 'boilers' } },
      ],
      sharedLimits: [
        { id: 'crew', name: 'Crew', unit: 'people', capacity: fromMinutes(instance.cap[1] ?? new Float64Array(1)) },
      ],
      cleaning: cleaningOf(instance),
    },
    calendars: instance.units.map((u, i) => ({ unitId: unitId(i), open: u.open.map(([from, to]) => ({ from, to })) })),
    capacities: [
      {
        headerId: 'main',
        exportKgPerH: null,
        limitKgPerH: fromMinutes(instance.cap[0] as Float64Array),
        baseLoadKgPerH: [{ from: 0, value: 0 }],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null,
      },
    ],
    activities: instance.ops.map((op) => toActivity(instance, op)),
    links: instance.ops.flatMap((op) => (op.k === 0 ? [] : [toLink(op)])),
  };
}

function cleaningOf(instance: Instance): CleaningRule[] {
  return Object.entries(instance.clean).flatMap(([kind, rows]) =>
    rows.flatMap((row, from) =>
      row.map((minutes, to): CleaningRule => ({
        unitKind: kind as UnitKind,
        fromFamilyId: `f${from}`,
        toFamilyId: `f${to}`,
        minutes,
        kind: 'wash',
        phases: [],
        uses: [],
      })),
    ),
  );
}

function toActivity(instance: Instance, op: Op): Activity {
  const job = instance.jobs[op.job] as Instance['jobs'][number];
  const phases = (op.prof[0] ?? []).map(([offsetMin, minutes, steamKgPerH]): Phase => ({
    kind: 'run',
    offsetMin,
    minutes,
    steamKgPerH,
  }));
  const uses = (op.prof[1] ?? []).map(([offsetMin, minutes, amount]) => ({
    limitId: 'crew',
    offsetMin,
    minutes,
    amount,
  }));
  return {
    id: activityId(op.id),
    kind: 'stage',
    stage: 'other',
    batchId: `j${String(op.job).padStart(4, '0')}`,
    code: activityId(op.id),
    title: activityId(op.id),
    productId: null,
    familyId: `f${op.fam}`,
    modes: op.units.map((u) => ({ unitId: unitId(u), minutes: op.dur, phases, uses, dutyId: null })),
    placement: { unitId: unitId(op.pu), start: op.p },
    fixing: job.pinned ? 'fixed' : 'free',
    occupiesUntil: 'end',
    earliestStart: op.k === 0 ? job.rel : 0,
    latestStart: null,
    due: job.ops.at(-1) === op.id ? job.due : null,
    weight: 1,
    processData: null,
    revision: 0,
  };
}

function toLink(op: Op): Link {
  return {
    id: activityId(op.id),
    from: { activityId: activityId(op.id - 1), anchor: 'end', offsetMin: 0 },
    to: { activityId: activityId(op.id), anchor: 'start', offsetMin: 0 },
    leastMin: op.minLag,
    greatestMin: op.maxLag,
    rule: 'flow',
    greatestBreach: 'time',
    source: null,
  };
}
