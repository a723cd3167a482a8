import { chainResources } from './chain';
import { EdgeList, type Edge } from './edges';
import { changeovers, freeAt, modeIn, sequences, indexById } from './sequences';
import type { Plan, Problem, ProblemActivity } from './problem';
import type { LpModel, LpRow, SolveLp } from './solverPort';

/** What binds the starts of the free activities while all orders stay as they are in the plan. */
export interface TimingSystem {
  readonly free: readonly number[];
  readonly edges: readonly Edge[];
}

/** Price of a minute late in the timing, against that of a minute moved; lateness goes first. */
const LATE_PRICE = 1000;

/** Takes the orders of a plan as given: on units, along links, and of the draws on every resource. */
export function timingSystem(problem: Problem, plan: Plan, free: ReadonlySet<number>): TimingSystem {
  const edges = new EdgeList((a) => free.has(a), plan.starts);
  for (const a of free) ownBounds(problem, plan, a, edges);
  linkEdges(problem, plan, edges);
  unitEdges(problem, plan, edges);
  chainResources(problem, plan, edges);
  return { free: [...free].sort((a, b) => a - b), edges: edges.all() };
}

function ownBounds(problem: Problem, plan: Plan, a: number, edges: EdgeList): void {
  const activity = problem.activities[a] as ProblemActivity;
  const start = plan.starts[a] as number;
  const minutes = modeIn(activity, plan, a).minutes;
  edges.atLeast(a, Math.max(0, activity.earliestStart), { kind: 'other', minute: null });
  edges.atMost(a, Math.min(activity.latestStart, problem.horizonMin - minutes), { kind: 'other', minute: null });
  const span = problem.units
    .find((u) => u.id === plan.units[a])
    ?.open.find((o) => o.from <= start && start + minutes <= o.to);
  if (!span) {
    edges.atLeast(a, start, { kind: 'shift', minute: null });
    edges.atMost(a, start, { kind: 'shift', minute: null });
    return;
  }
  edges.atLeast(a, span.from, { kind: 'shift', minute: span.from });
  edges.atMost(a, span.to - minutes, { kind: 'shift', minute: span.to });
}

function linkEdges(problem: Problem, plan: Plan, edges: EdgeList): void {
  const index = indexById(problem);
  for (const link of problem.links) {
    const from = index.get(link.from.activityId) as number;
    const to = index.get(link.to.activityId) as number;
    const after = (end: typeof link.from, i: number): number =>
      end.offsetMin + (end.anchor === 'end' ? modeIn(problem.activities[i] as ProblemActivity, plan, i).minutes : 0);
    const base = after(link.from, from) - after(link.to, to);
    const cause = { kind: 'wait', minute: null } as const;
    edges.add(from, to, base + link.leastMin, cause);
    if (link.greatestMin !== null) edges.add(to, from, -(base + link.greatestMin), cause);
  }
}

/** Who follows whom on a unit, with the cleaning between; what is taken off later is free only then. */
function unitEdges(problem: Problem, plan: Plan, edges: EdgeList): void {
  const cleaning = new Map(changeovers(problem, plan).map((c) => [c.after, c]));
  for (const { unitId, order } of sequences(problem, plan)) {
    const open = problem.units.find((u) => u.id === unitId)?.open ?? [];
    order.forEach((a, k) => {
      const clean = cleaning.get(a);
      const behind = clean ? clean.from + clean.minutes - freeAt(problem, plan, a) : 0;
      const next = order[k + 1];
      const kind = clean ? 'cleaning' : 'unit';
      const start = plan.starts[a] as number;
      const activity = problem.activities[a] as ProblemActivity;
      const end = start + modeIn(activity, plan, a).minutes;
      if (next !== undefined) {
        const minute = plan.starts[next] as number;
        edges.add(a, next, Math.min(end + behind, minute) - start, { kind, minute });
      }
      takenOffEdges(problem, plan, a, behind, next, open, edges);
    });
  }
}

function takenOffEdges(
  problem: Problem,
  plan: Plan,
  a: number,
  behind: number,
  next: number | undefined,
  open: readonly { readonly from: number; readonly to: number }[],
  edges: EdgeList,
): void {
  const activity = problem.activities[a] as ProblemActivity;
  const link = problem.links.find((l) => l.id === activity.takenOffBy);
  if (!link) return;
  const taker = indexById(problem).get(link.to.activityId) as number;
  const takerStart = plan.starts[taker] as number;
  const free = freeAt(problem, plan, a);
  const start = plan.starts[a] as number;
  const moment = free - takerStart;
  if (next !== undefined) {
    const minute = plan.starts[next] as number;
    edges.add(taker, next, Math.min(moment + behind, minute - takerStart), { kind: 'unit', minute });
  }
  const span = open.find((o) => o.from <= start && start < o.to);
  if (span) edges.atMost(taker, Math.max(takerStart, span.to - moment), { kind: 'shift', minute: span.to });
}

/**
 * The least change in time under the orders, as a linear program. A start is its place in the plan plus minutes later
 * less minutes earlier, so that every variable is at least 0.
 */
export function timingModel(problem: Problem, system: TimingSystem, plan: Plan): LpModel {
  const at = new Map(system.free.map((a, i) => [a, i]));
  const costs: number[] = [];
  const rows: LpRow[] = [];
  for (const a of system.free) {
    const weight = Math.max(1e-3, (problem.activities[a] as ProblemActivity).weight * problem.prices.minuteMoved);
    costs.push(weight, weight);
  }
  const terms = (a: number, sign: number): [number, number][] => {
    const i = at.get(a) as number;
    return [
      [2 * i, sign],
      [2 * i + 1, -sign],
    ];
  };
  const home = (a: number): number => (problem.activities[a] as ProblemActivity).plan.start;
  for (const e of system.edges) {
    const plus = e.to < 0 ? [] : terms(e.to, 1);
    const minus = e.from < 0 ? [] : terms(e.from, -1);
    const value = e.wait - (e.to < 0 ? 0 : home(e.to)) + (e.from < 0 ? 0 : home(e.from));
    rows.push({ terms: [...plus, ...minus], sense: 'atLeast', value });
  }
  for (const a of system.free) {
    const activity = problem.activities[a] as ProblemActivity;
    if (activity.due === null) continue;
    const end = activity.plan.start + modeIn(activity, plan, a).minutes;
    const late = costs.push(LATE_PRICE * activity.weight) - 1;
    rows.push({ terms: [[late, 1], ...terms(a, -1)], sense: 'atLeast', value: end - activity.due });
  }
  return { costs, rows };
}

/** A plan with the least change under its own orders, and what each edge holds. */
export interface Timed {
  readonly plan: Plan;
  readonly objective: number;
  /** By edge of the system. */
  readonly duals: readonly number[];
}

/** Solves the timing; null where the program has no answer or one that isn't in whole minutes. */
export function solveTiming(problem: Problem, plan: Plan, system: TimingSystem, solve: SolveLp): Timed | null {
  if (system.free.length === 0) return null;
  const outcome = solve(timingModel(problem, system, plan));
  if (outcome.status !== 'optimal') return null;
  const starts = [...plan.starts];
  for (let i = 0; i < system.free.length; i++) {
    const a = system.free[i] as number;
    const exact =
      (problem.activities[a] as ProblemActivity).plan.start +
      (outcome.values[2 * i] as number) -
      (outcome.values[2 * i + 1] as number);
    const whole = Math.round(exact);
    if (Math.abs(exact - whole) > 1e-4) return null;
    starts[a] = whole;
  }
  return {
    plan: { starts, units: plan.units },
    objective: outcome.objective,
    duals: outcome.duals.slice(0, system.edges.length),
  };
}
