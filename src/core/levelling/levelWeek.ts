import type { Placement } from '../plant/activity';
import type { Week } from '../schedule/week';
import { judge, type Judgement } from './evaluate';
import type { LevellingEnv, Solved } from './env';
import { MEETING_EVERY } from './exchange';
import { figuresOf } from './figures';
import { keepRules } from './keepRules';
import type { Key } from './key';
import { toModel } from './model';
import { fullOptions, type FullOptions, type LevellingOptions } from './options';
import { movedBatches, polish } from './polish';
import { planOf, type Plan, type Problem, type ProblemActivity } from './problem';
import type { LevellingProposal, ProposedMove } from './proposal';
import { seededRandom } from './random';
import { reasonsFor } from './reasons';
import { relaxationsFor } from './relaxations';
import { Search, type Assignment } from './search';
import type { SolveLp } from './solverPort';
import { toProblem } from './toProblem';
import { unresolvedOf } from './unresolved';

export type { LevellingEnv, LevellingProgress, Solved } from './env';

export interface LevellingResult {
  readonly proposal: LevellingProposal;
  readonly iterations: number;
  readonly cancelled: boolean;
  /** True where the search's plan did not stand up to judging from scratch, so that nothing is proposed: a fault. */
  readonly withheld: boolean;
}

/** Iterations between two looks at the clock and the cancel flag. */
const LOOK = 8;
const REPORT = 256;
/** Part of a budget in ms that is kept for the timing. */
const TIMING_SHARE = 0.08;
/** Where something is still over by then, the search starts anew from nothing. */
const REBUILD_AT = 0.4;
const DEFAULT_MS = 15_000;

/**
 * Proposes the least change of the week's plan that fits the limits: orders by search, times by linear programming,
 * and a judgement from scratch before anything is returned. The week is not changed.
 */
export function levelWeek(week: Week, options: LevellingOptions, env: LevellingEnv): LevellingResult {
  const problem = toProblem(week, options);
  const { plan: found, ...solved } = solveProblem(problem, fullOptions(options), env);
  const kept = keepRules(week, problem, found);
  const worse = isWorse(judge(problem, kept), judge(problem, planOf(problem)));
  const plan = worse ? planOf(problem) : kept;
  const proposal = toProposal(week, problem, plan, env.solveLp);
  if (proposal.unresolved.length === 0 || solved.cancelled || env.exchange?.startsFrom === 'nothing') {
    return { ...solved, proposal };
  }
  const relaxations = relaxationsFor({ week, options, problem, plan }, solveProblem, env);
  return { ...solved, proposal: { ...proposal, relaxations } };
}

/** The same for a problem in its plain form. */
export function solveProblem(problem: Problem, options: FullOptions, env: LevellingEnv): Solved {
  const clock = new Stopwatch(options, env);
  const search = new Search(toModel(problem), seededRandom(options.seed));
  if (!search.idle) run(search, clock, env);
  const found = toPlan(problem, search.best);
  const plan = clock.cancelled() ? found : polish(problem, found, env.solveLp, () => clock.overtime());
  const before = planOf(problem);
  const withheld = isWorse(judge(problem, plan), judge(problem, before));
  const { iterations } = search;
  return { plan: withheld ? before : plan, iterations, cancelled: clock.cancelled(), withheld };
}

function run(search: Search, clock: Stopwatch, env: LevellingEnv): void {
  const { exchange } = env;
  let rebuilt = exchange?.startsFrom === 'nothing' && search.construct();
  if (!rebuilt) search.flatten();
  report(search, clock, env);
  while (!clock.isOver(search.iterations) && !isPerfect(search.best.key)) {
    const progress = clock.progress(search.iterations);
    if (!rebuilt && progress > REBUILD_AT) {
      rebuilt = true;
      if (isOver(search.best.key)) search.construct();
    }
    for (let i = 0; i < LOOK; i++) search.step(progress);
    if (search.iterations % MEETING_EVERY === 0) take(search, exchange?.meet(search.best));
    if (search.iterations % REPORT === 0) report(search, clock, env);
  }
  take(search, exchange?.close(search.best));
  report(search, clock, env);
}

function take(search: Search, found: Assignment | null | undefined): void {
  if (found) search.offer(found);
}

const isOver = (key: Key): boolean => key.process + key.sharedWorse + key.steamKg > 0;
const isPerfect = (key: Key): boolean => !isOver(key) && key.shared === 0 && key.late === 0 && key.change === 0;

function report(search: Search, clock: Stopwatch, env: LevellingEnv): void {
  const { key, starts } = search.best;
  const moved = search.model.activities.map((a) => Math.abs((starts[a.index] as number) - a.home.start));
  env.onProgress?.({
    ms: clock.elapsed(),
    iterations: search.iterations,
    overKg: key.steamKg,
    lateMin: key.late,
    movedMin: moved.reduce((a, b) => a + b, 0),
    limitsOver: key.process + key.shared,
  });
}

function toPlan(problem: Problem, { starts, modes }: Assignment): Plan {
  return {
    starts: [...starts],
    units: problem.activities.map((a, i) => a.modes[modes[i] as number]?.unitId ?? a.plan.unitId),
  };
}

/** Worse than the planner's plan in what must not get worse; steam may only give way to vents at once. */
function isWorse(found: Judgement, before: Judgement): boolean {
  const grew = (part: 'broken' | 'processOver' | 'sharedOver' | 'steamKg'): boolean =>
    found[part] > before[part] + 1e-6;
  if (grew('broken') || grew('processOver') || grew('sharedOver')) return true;
  return grew('steamKg') && found.processOver > before.processOver - 1e-6;
}

/** Time and cancelling, by whichever bound of the budget comes first. */
class Stopwatch {
  private readonly started: number;
  private readonly iterations: number;
  private readonly ms: number;
  private wasCancelled = false;

  constructor(
    { budget }: FullOptions,
    private readonly env: LevellingEnv,
  ) {
    this.started = env.now?.() ?? 0;
    this.ms = env.now ? (budget.ms ?? (budget.iterations === undefined ? DEFAULT_MS : Infinity)) : Infinity;
    this.iterations = budget.iterations ?? (env.now ? Infinity : 20_000);
  }

  elapsed(): number {
    return (this.env.now?.() ?? 0) - this.started;
  }

  cancelled(): boolean {
    this.wasCancelled ||= this.env.cancelled?.() ?? false;
    return this.wasCancelled;
  }

  progress(iterations: number): number {
    return Math.min(1, Math.max(iterations / this.iterations, this.elapsed() / (this.ms * (1 - TIMING_SHARE))));
  }

  isOver(iterations: number): boolean {
    return this.progress(iterations) >= 1 || this.cancelled();
  }

  overtime(): boolean {
    return this.cancelled() || this.elapsed() > this.ms;
  }
}

function toProposal(week: Week, problem: Problem, plan: Plan, solve: SolveLp): LevellingProposal {
  const before = judge(problem, planOf(problem));
  const after = judge(problem, plan);
  const moved = problem.activities.flatMap((a, i) =>
    plan.starts[i] !== a.plan.start || plan.units[i] !== a.plan.unitId ? [i] : [],
  );
  const minutes = moved.map((i) =>
    Math.abs((plan.starts[i] as number) - (problem.activities[i] as ProblemActivity).plan.start),
  );
  return {
    moves: toMoves(week, problem, plan, moved, solve),
    before: figuresOf(problem, planOf(problem), before),
    after: figuresOf(problem, plan, after),
    movedBatches: movedBatches(problem, plan).size,
    meanMoveMin: moved.length === 0 ? 0 : minutes.reduce((a, b) => a + b, 0) / moved.length,
    unresolved: unresolvedOf(problem, plan, after),
  };
}

function toMoves(week: Week, problem: Problem, plan: Plan, moved: readonly number[], solve: SolveLp): ProposedMove[] {
  const activities = new Map(week.activities.map((a) => [a.id, a]));
  const reasons = reasonsFor(problem, plan, moved, solve);
  return moved.map((i, k) => {
    const { id, plan: home } = problem.activities[i] as ProblemActivity;
    const activity = activities.get(id);
    const from: Placement = activity?.placement ?? home;
    return {
      activityId: id,
      revision: activity?.revision ?? 0,
      from,
      to: { ...from, unitId: plan.units[i] as string, start: plan.starts[i] as number },
      reason: reasons[k] ?? { kind: 'other', activityId: null, minute: null },
    };
  });
}
