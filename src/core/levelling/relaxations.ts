import { withPlacements } from '../pipeline';
import type { Activity } from '../plant/activity';
import type { Week } from '../schedule/week';
import { judge } from './evaluate';
import { overSpans, type OverSpan } from './figures';
import type { LevellingEnv, Solved } from './env';
import { fullOptions, type FullOptions, type LevellingOptions } from './options';
import type { Plan, Problem } from './problem';
import type { Relaxation } from './proposal';
import { modeIn } from './sequences';
import { toProblem } from './toProblem';

/** Solves a problem from where its plan stands; handed in, so that trying does not depend on the search. */
export type Solve = (problem: Problem, options: FullOptions, env: LevellingEnv) => Solved;

/** A trial's own budget beside a run by iterations, and beside one in ms. */
const TRIAL_ITERATIONS = 200;
const TRIAL_MS = 250;
const FIXED_TRIED = 3;
/** Spans over the limit that are nearer than this are covered by one more of steam. [min] */
const SAME_SPELL_MIN = 60;
const SPELLS_NAMED = 3;
/** Less than this is not worth saying. [kg] */
const WORTH_KG = 1;
const TRACE = 1e-6;

interface Tried {
  readonly week: Week;
  readonly options: LevellingOptions;
  readonly problem: Problem;
  readonly plan: Plan;
}

/**
 * What to ask for where a plan stays over the steam limit, cheapest first: so much more steam for a while, freeing one
 * of the batches that the planner has fixed, moves further than allowed, other units. Each trial goes on from the plan
 * that was found; none where nothing stays over.
 */
export function relaxationsFor(tried: Tried, solve: Solve, env: LevellingEnv): Relaxation[] {
  const judged = judge(tried.problem, tried.plan);
  const spans = overSpans(tried.problem, judged).filter((span) => span.resource.class === 'steam');
  if (spans.length === 0) return [];
  const found = [...unfixed(tried, spans), ...loosened(tried)].flatMap(({ week, options, says }): Relaxation[] => {
    const leavesKg = leaves(week, options, solve, env);
    const better = leavesKg !== null && leavesKg < judged.steamKg - WORTH_KG;
    return better ? [{ ...says, leavesKg: leavesKg < TRACE ? 0 : leavesKg }] : [];
  });
  return [...moreSteam(spans), ...found.sort((a, b) => leftOf(a) - leftOf(b))];
}

const leftOf = (relaxation: Relaxation): number => ('leavesKg' in relaxation ? relaxation.leavesKg : 0);

/** So much more between such times: the greatest excess of each spell. */
function moreSteam(spans: readonly OverSpan[]): Relaxation[] {
  const headers = [...new Set(spans.map((span) => span.resource.sourceId))].sort();
  const spells = headers.flatMap((headerId) => spellsOf(headerId, spans));
  return spells.sort((a, b) => b.kgPerH - a.kgPerH).slice(0, SPELLS_NAMED);
}

type MoreSteam = Extract<Relaxation, { readonly kind: 'moreSteam' }>;

function spellsOf(headerId: string, spans: readonly OverSpan[]): MoreSteam[] {
  const own = spans.filter((span) => span.resource.sourceId === headerId).sort((a, b) => a.from - b.from);
  return own.reduce<MoreSteam[]>((spells, { from, to, greatest: kgPerH }) => {
    const last = spells.at(-1);
    if (!last || from - last.to > SAME_SPELL_MIN) return [...spells, { kind: 'moreSteam', headerId, from, to, kgPerH }];
    const joined = { ...last, to: Math.max(last.to, to), kgPerH: Math.max(last.kgPerH, kgPerH) };
    return [...spells.slice(0, -1), joined];
  }, []);
}

type Says =
  | { readonly kind: 'unfix'; readonly activityId: string }
  | { readonly kind: 'furtherMoves'; readonly minutes: number }
  | { readonly kind: 'otherUnits' };

interface Trial {
  readonly week: Week;
  readonly options: LevellingOptions;
  readonly says: Says;
}

/** Batches that the planner has fixed and that draw while something is over, those in the worst spans first. */
function unfixed({ week, options, problem, plan }: Tried, spans: readonly OverSpan[]): Trial[] {
  const worst = [...spans].sort((a, b) => b.sum - a.sum);
  const fixed = new Map(week.activities.filter((a) => a.fixing === 'fixed').map((a) => [a.id, a]));
  const concerned = worst.flatMap((span) =>
    problem.activities.flatMap((a, i) => {
      const start = plan.starts[i] as number;
      const activity = fixed.get(a.id);
      return activity && start < span.to && start + modeIn(a, plan, i).minutes > span.from ? [activity] : [];
    }),
  );
  const standing = asFound(week, problem, plan);
  return [...new Set(concerned)].slice(0, FIXED_TRIED).map(({ id }) => ({
    week: {
      ...standing,
      activities: standing.activities.map((a): Activity => (a.id === id ? { ...a, fixing: 'free' } : a)),
    },
    options,
    says: { kind: 'unfix', activityId: id },
  }));
}

function loosened({ week, options, problem, plan }: Tried): Trial[] {
  const standing = asFound(week, problem, plan);
  const { greatestShiftMin, mayChangeUnit } = fullOptions(options);
  const minutes = 2 * greatestShiftMin;
  const further: Trial = {
    week: standing,
    options: { ...options, greatestShiftMin: minutes },
    says: { kind: 'furtherMoves', minutes },
  };
  if (mayChangeUnit) return [further];
  return [further, { week: standing, options: { ...options, mayChangeUnit: true }, says: { kind: 'otherUnits' } }];
}

/** The week with the plan that was found. */
function asFound(week: Week, problem: Problem, plan: Plan): Week {
  const kept = new Map(week.activities.map((a) => [a.id, a.placement]));
  const changes = problem.activities.map(({ id }, i) => {
    const placement = { ...kept.get(id), unitId: plan.units[i] as string, start: plan.starts[i] as number };
    return { activityId: id, placement };
  });
  return withPlacements(week, changes);
}

/** Steam still over in a trial, where nothing else gets worse by it; null where something does. [kg] */
function leaves(week: Week, options: LevellingOptions, solve: Solve, env: LevellingEnv): number | null {
  const problem = toProblem(week, options);
  const byTime = env.now !== undefined && fullOptions(options).budget.iterations === undefined;
  const budget = byTime ? { ms: TRIAL_MS } : { iterations: TRIAL_ITERATIONS };
  const { now, solveLp } = env;
  const solved = solve(problem, { ...fullOptions(options), budget }, byTime && now ? { now, solveLp } : { solveLp });
  return solved.withheld ? null : judge(problem, solved.plan).steamKg;
}
