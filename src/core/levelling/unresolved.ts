import { valueAt } from '../time/stepFunction';
import type { Judgement } from './evaluate';
import { overSpans, type OverSpan } from './figures';
import { placedUses } from './placedUses';
import {
  isUnlimited,
  type Plan,
  type Problem,
  type ProblemActivity,
  type ProblemMode,
  type ProblemResource,
} from './problem';
import type { LevellingProposal } from './proposal';
import { modeIn } from './sequences';

const TRACE = 1e-3;

type Unresolved = LevellingProposal['unresolved'][number];

/** What stays over the steam limit, with the strongest explanation that can be given, greatest first. */
export function unresolvedOf(problem: Problem, plan: Plan, judgement: Judgement): Unresolved[] {
  const spans = overSpans(problem, judgement).filter((s) => s.resource.class === 'steam');
  const fixed = new Map<string, Float64Array>();
  return spans
    .sort((a, b) => b.sum - a.sum || a.from - b.from)
    .map((span) => ({
      headerId: span.resource.sourceId,
      from: span.from,
      to: span.to,
      kg: span.sum,
      why: explain(problem, plan, span, fixed),
    }));
}

function explain(problem: Problem, plan: Plan, span: OverSpan, cache: Map<string, Float64Array>): string {
  const { resource } = span;
  const fixed = cache.get(resource.id) ?? fixedExcess(problem, resource);
  cache.set(resource.id, fixed);
  const alone = Math.max(...fixed.subarray(span.from, span.to));
  if (alone > TRACE) return `What is fixed or running is over by ${round(alone)} kg/h by itself.`;
  const stuck = withoutPlace(problem, plan, span, fixed);
  if (stuck) {
    return `No start exists for ${stuck.id}: it needs ${round(stuck.needs)} kg/h where at most ${round(stuck.left)} kg/h is left: ${round(stuck.needs - stuck.left)} kg/h more are missing.`;
  }
  return 'Best found, not proven: no better starts were found within the time and the moves allowed.';
}

/** kg/h on screens are rounded to 5. */
const round = (kgPerH: number): number => Math.ceil(kgPerH / 5 - 1e-9) * 5;

/** Load of what can't move, less capacity, by minute. */
function fixedExcess(problem: Problem, resource: ProblemResource): Float64Array {
  const plan: Plan = {
    starts: problem.activities.map((a) => a.plan.start),
    units: problem.activities.map((a) => a.plan.unitId),
  };
  const excess = new Float64Array(problem.horizonMin);
  for (let t = 0; t < excess.length; t++) excess[t] = -valueAt(resource.capacity, t);
  for (const use of placedUses(problem, plan)) {
    if (use.resourceId !== resource.id || use.follows || problem.activities[use.activity]?.movable) continue;
    const to = Math.min(excess.length, use.start + use.minutes);
    for (let t = Math.max(0, use.start); t < to; t++) excess[t] = (excess[t] as number) + use.amount;
  }
  return excess;
}

interface Stuck {
  readonly id: string;
  readonly needs: number;
  readonly left: number;
}

/** An activity of the span that is over beside the fixed ones alone at each of its starts, if there is one. */
function withoutPlace(problem: Problem, plan: Plan, span: OverSpan, fixed: Float64Array): Stuck | null {
  if (isUnlimited(span.resource)) return null;
  for (let i = 0; i < problem.activities.length; i++) {
    const activity = problem.activities[i] as ProblemActivity;
    const mode = modeIn(activity, plan, i);
    const start = plan.starts[i] as number;
    if (!activity.movable || start >= span.to || start + mode.minutes <= span.from) continue;
    const stuck = leastMissing(activity, mode, span.resource, fixed);
    if (stuck) return stuck;
  }
  return null;
}

function leastMissing(
  activity: ProblemActivity,
  mode: ProblemMode,
  resource: ProblemResource,
  fixed: Float64Array,
): Stuck | null {
  let least: Stuck | null = null;
  const warmest = mode.warm?.[0]?.uses ?? mode.uses;
  const uses = warmest.filter((u) => u.resourceId === resource.id);
  for (let start = activity.earliestStart; start <= activity.latestStart; start++) {
    let worst: Stuck = { id: activity.id, needs: 0, left: 0 };
    for (const use of uses) {
      for (let t = Math.max(0, start + use.offsetMin); t < start + use.offsetMin + use.minutes; t++) {
        const left = -(fixed[t] ?? -Infinity);
        if (use.amount - left > worst.needs - worst.left) worst = { id: activity.id, needs: use.amount, left };
      }
    }
    if (worst.needs - worst.left <= TRACE) return null;
    if (!least || worst.needs - worst.left < least.needs - least.left) least = worst;
  }
  return least;
}
