import { planOf, type Plan } from '@/core/levelling/problem';
import { judge } from '@/core/levelling/evaluate';
import { levelWeek } from '@/core/levelling/levelWeek';
import type { LevellingOptions } from '@/core/levelling/options';
import type { LevellingProposal } from '@/core/levelling/proposal';
import { toProblem } from '@/core/levelling/toProblem';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import type { Week } from '@/core/schedule/week';
import { demoWeek } from '@/server/demo/demoWeek';
import { solveLp } from '@/solver/lpSolver';
import { loadPrototype, toWeek, unitId, type Instance, type InstancePlan, type Prototype } from './prototype';
import { generateWeek, WEEKS } from './weeks';

/**
 * npm run bench:level -- [--json] [--quick] [--seeds 1,2,3] [--seconds N] [--prototype DIR]
 *
 * Levels the demo week and generated weeks and judges every answer with the ordinary pipeline. Times are processor
 * seconds of this process, so that a busy machine doesn't change the answers. With --prototype the experiment in that
 * folder runs beside ours on its own instances, with the same seconds and the same objective.
 */
const flag = (name: string): string | undefined => {
  const at = process.argv.indexOf(`--${name}`);
  return at < 0 ? undefined : process.argv[at + 1];
};
const json = process.argv.includes('--json');
const quick = process.argv.includes('--quick');

const cpuMs = (): number => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
};

interface Row {
  readonly week: string;
  readonly seed: number | null;
  readonly activities: number;
  readonly kgOverBefore: number;
  readonly kgOverAfter: number;
  readonly peakBefore: number;
  readonly peakAfter: number;
  readonly peakOverLimitBefore: number;
  readonly processBreachesAfter: number;
  readonly sharedBreachesBefore: number;
  readonly sharedBreachesAfter: number;
  readonly lateBefore: number;
  readonly lateAfter: number;
  readonly batchesMoved: number;
  readonly meanMoveMin: number;
  readonly secondsToNothingOver: number | null;
  readonly seconds: number;
  readonly iterations: number;
}

const round = (value: number, digits = 2): number => Number(value.toFixed(digits));

function bench(name: string, seed: number | null, week: Week, seconds: number): Row {
  const started = cpuMs();
  let firstClear: number | null = null;
  const options: LevellingOptions = { budget: { ms: seconds * 1000 }, greatestShiftMin: 1440 };
  const { proposal, iterations } = levelWeek(week, options, {
    solveLp,
    now: cpuMs,
    onProgress: (p) => {
      if (p.overKg + p.limitsOver === 0) firstClear ??= p.ms / 1000;
    },
  });
  const took = (cpuMs() - started) / 1000;
  return rowOf(name, seed, week, proposal, { firstClear, took, iterations });
}

/** Before and after as the ordinary pipeline judges them. */
function rowOf(
  name: string,
  seed: number | null,
  week: Week,
  proposal: LevellingProposal,
  run: { readonly firstClear: number | null; readonly took: number; readonly iterations: number },
): Row {
  const before = evaluateWeek(week);
  const moves = proposal.moves.map((m) => ({ activityId: m.activityId, placement: m.to }));
  const after = evaluateWeek(withPlacements(week, moves));
  const count = (e: typeof before, of: string): number => e.breaches.filter((b) => b.class === of).length;
  const peak = (e: typeof before): number => Math.max(...e.headers.map((h) => h.peak.kgPerH));
  const limit = Math.max(...before.headers.map((h) => greatest(h.limitKgPerH)));
  return {
    week: name,
    seed,
    activities: week.activities.filter((a) => a.placement).length,
    kgOverBefore: round(before.over.kg),
    kgOverAfter: round(after.over.kg),
    peakBefore: round(peak(before), 0),
    peakAfter: round(peak(after), 0),
    peakOverLimitBefore: round(peak(before) / limit),
    processBreachesAfter: count(after, 'process'),
    sharedBreachesBefore: count(before, 'shared'),
    sharedBreachesAfter: count(after, 'shared'),
    lateBefore: before.lateMinutes,
    lateAfter: after.lateMinutes,
    batchesMoved: proposal.movedBatches,
    meanMoveMin: round(proposal.meanMoveMin, 1),
    secondsToNothingOver: run.firstClear === null ? null : round(run.firstClear),
    seconds: round(run.took),
    iterations: run.iterations,
  };
}

function greatest(values: Float64Array | null): number {
  return values === null ? 0 : values.reduce((a, b) => (b < 1e11 ? Math.max(a, b) : a), 0);
}

interface Duel {
  readonly week: string;
  readonly seed: number;
  readonly side: 'ours' | 'experiment';
  readonly over: number;
  readonly late: number;
  readonly displacement: number;
  readonly unitChanges: number;
  readonly violations: number;
}

/** The experiment's best approach (hybrid with push and timing) and ours, judged by its evaluator. */
function duel(prototype: Prototype, name: string, seed: number, seconds: number): Duel[] {
  const instance = prototype.generate({ ...prototype.presets[name], seed });
  const line = (side: Duel['side'], plan: InstancePlan): Duel => {
    const e = prototype.evaluate(instance, plan);
    const { over, tard: late, disp: displacement, unitMoves: unitChanges, viol } = e;
    return { week: name, seed, side, over: round(over), late, displacement, unitChanges, violations: viol.length };
  };
  return [line('ours', ourPlan(instance, seconds)), line('experiment', theirPlan(prototype, instance, seconds))];
}

function ourPlan(instance: Instance, seconds: number): InstancePlan {
  const week = toWeek(instance);
  const options: LevellingOptions = {
    budget: { ms: seconds * 1000 },
    greatestShiftMin: instance.H,
    prices: { batchMoved: 0, minuteMoved: 1, unitChanged: 30 },
  };
  const { proposal } = levelWeek(week, options, { solveLp, now: cpuMs });
  const problem = toProblem(week, options);
  const plan: Plan = planOf(problem);
  const starts = Int32Array.from(plan.starts);
  const units = Int32Array.from(plan.units, numberOf);
  for (const move of proposal.moves) {
    const at = problem.activities.findIndex((a) => a.id === move.activityId);
    starts[at] = move.to.start;
    units[at] = numberOf(move.to.unitId);
  }
  const broken = judge(problem, { starts: [...starts], units: [...units].map(unitId) }).broken;
  if (broken > 0) throw new Error('our answer breaks a rule of time');
  return { s: starts, u: units };
}

const numberOf = (unit: string): number => Number(unit.slice(1));

/** The experiment reads performance.now, which stands for processor time meanwhile. */
function theirPlan(prototype: Prototype, instance: Instance, seconds: number): InstancePlan {
  const clock = performance.now.bind(performance);
  performance.now = cpuMs;
  const settings = { ms: seconds * 970, seed: 1, pf: 0.4, pen0: 100, T0: 30, T1: 1, ripplePct: 0.3, push: 0.6 };
  let plan = prototype.lns(instance, settings).best;
  performance.now = clock;
  for (let round_ = 0; round_ < 3; round_++) {
    const system = prototype.extract(instance, plan);
    const retimed = system ? prototype.solveJs(instance, plan, system) : null;
    if (!retimed || prototype.evaluate(instance, retimed).disp >= prototype.evaluate(instance, plan).disp) break;
    plan = retimed;
  }
  return plan;
}

const seeds = (flag('seeds') ?? (quick ? '21' : '21,22,23,24,25')).split(',').map(Number);
const seconds = Number(flag('seconds') ?? (quick ? 2 : 5));
const sizes = quick ? ['w40', 'w150'] : ['w40', 'w150', 'w500'];

const rows: Row[] = [bench('demo', null, demoWeek(), seconds)];
for (const size of sizes) {
  for (const seed of seeds)
    rows.push(bench(size, seed, generateWeek(WEEKS[size] as (typeof WEEKS)[string], seed), seconds));
}
const folder = flag('prototype');
const duels: Duel[] = [];
if (folder !== undefined) {
  const prototype = await loadPrototype(folder);
  for (const size of sizes) for (const seed of seeds) duels.push(...duel(prototype, size, seed, seconds));
}
if (json) console.log(JSON.stringify({ seconds, rows, duels }, null, 2));
else {
  console.table(rows);
  if (duels.length > 0) console.table(duels);
}
