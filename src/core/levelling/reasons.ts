import type { Edge } from './edges';
import type { Plan, Problem, ProblemActivity } from './problem';
import type { MoveReason } from './proposal';
import type { SolveLp } from './solverPort';
import { solveTiming, timingSystem } from './timing';

/** Among equals the first of these is named. */
const RANK: readonly MoveReason['kind'][] = [
  'vents',
  'steam',
  'boiler',
  'sharedLimit',
  'cleaning',
  'unit',
  'wait',
  'due',
  'shift',
  'other',
];

const NONE: MoveReason = { kind: 'other', activityId: null, minute: null };
const GREATEST_LP = 120;

/**
 * What holds each moved activity where it is: among the edges without slack on the side it would go back to, the one
 * that the timing's duals weigh most.
 */
export function reasonsFor(problem: Problem, plan: Plan, moved: readonly number[], solve: SolveLp): MoveReason[] {
  const system = timingSystem(problem, plan, new Set(moved));
  const timed = moved.length <= GREATEST_LP ? solveTiming(problem, plan, system, solve) : null;
  return moved.map((a) => {
    const home = (problem.activities[a] as ProblemActivity).plan.start;
    const later = (plan.starts[a] as number) > home;
    if (plan.starts[a] === home) return { kind: 'unit', activityId: null, minute: home };
    const holding = system.edges
      .map((edge, i) => ({ edge, dual: timed?.duals[i] ?? 0 }))
      .filter(({ edge }) => (later ? edge.to : edge.from) === a && slackOf(edge, plan) === 0);
    holding.sort((x, y) => y.dual - x.dual || rankOf(x.edge) - rankOf(y.edge));
    const edge = holding[0]?.edge;
    return edge ? reasonOf(problem, edge, a) : NONE;
  });
}

function slackOf(edge: Edge, plan: Plan): number {
  const to = edge.to < 0 ? 0 : (plan.starts[edge.to] as number);
  const from = edge.from < 0 ? 0 : (plan.starts[edge.from] as number);
  return to - from - edge.wait;
}

const rankOf = (edge: Edge): number => RANK.indexOf(edge.cause.kind);

function reasonOf(problem: Problem, edge: Edge, a: number): MoveReason {
  const other = edge.fixedOther >= 0 ? edge.fixedOther : edge.to === a ? edge.from : edge.to;
  return {
    kind: edge.cause.kind,
    activityId: problem.activities[other]?.id ?? null,
    minute: edge.cause.minute,
  };
}

/** Words that a sentence is made with. */
export interface ReasonWords {
  /** What people call an activity, such as "A107 in Retort 4". */
  readonly activity: (id: string) => string;
  /** A time of the week, such as "Tue 06:40". */
  readonly time: (minute: number) => string;
}

/** A reason as the planner reads it. */
export function reasonSentence(reason: MoveReason, words: ReasonWords): string {
  const at = reason.minute === null ? '' : ` at ${words.time(reason.minute)}`;
  const other = reason.activityId === null ? null : words.activity(reason.activityId);
  switch (reason.kind) {
    case 'steam':
      return `leaves the steam to ${other ?? 'others'}${at}`;
    case 'vents':
      return `keeps its vent apart from ${other ? `that of ${other}` : 'others'}${at}`;
    case 'sharedLimit':
      return `waits for what ${other ?? 'others'} must hand on${at}`;
    case 'unit':
      return other ? `takes its turn on the unit with ${other}` : 'runs on another unit';
    case 'cleaning':
      return `leaves the time to clean between it and ${other ?? 'its neighbour'}`;
    case 'wait':
      return `keeps its wait to ${other ?? 'what it is linked to'}`;
    case 'shift':
      return `keeps within the shift${at}`;
    case 'boiler':
      return `keeps clear of the lower steam limit${at}`;
    case 'due':
      return 'is ready when it is due';
    case 'other':
      return 'makes room for others';
  }
}
