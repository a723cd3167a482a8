import { valueAt } from '../time/stepFunction';
import { judge, type Judgement } from './evaluate';
import type { Plan, Problem, ProblemResource } from './problem';
import type { LevelFigures } from './proposal';
import { momentOf } from './sequences';
import { headerResource } from './uses';

const TRACE = 1e-3;

/** A span over a resource's capacity. */
export interface OverSpan {
  readonly resource: ProblemResource;
  readonly from: number;
  readonly to: number;
  /** Steam over, in kg; for other resources the sum of what is over, amount times minutes. */
  readonly sum: number;
  readonly greatest: number;
}

/** Figures of a plan for the planner. */
export function figuresOf(problem: Problem, plan: Plan, judgement: Judgement = judge(problem, plan)): LevelFigures {
  const spans = overSpans(problem, judgement);
  const steam = spans.filter((s) => s.resource.class === 'steam');
  const late = judgement.late.filter((l) => l > 0).length;
  return {
    overKg: steam.reduce((sum, s) => sum + s.sum, 0),
    overMinutes: steam.reduce((sum, s) => sum + s.to - s.from, 0),
    worstDeficitKg: Math.max(0, ...problem.resources.map((r, i) => deficitOf(r, judgement.excess[i] as Float64Array))),
    peakKgPerH: peaks(problem, judgement),
    lateMinutes: judgement.lateMin,
    lateActivities: late,
    processBreaches: spans.filter((s) => s.resource.class === 'process').length + passedWaits(problem, plan),
    sharedBreaches: spans.filter((s) => s.resource.class === 'shared').length,
  };
}

/** Spans in which a plan is over, by resource and time. */
export function overSpans(problem: Problem, judgement: Judgement): OverSpan[] {
  return problem.resources.flatMap((resource, i) => {
    const excess = judgement.excess[i] as Float64Array;
    const spans: OverSpan[] = [];
    let from = -1;
    for (let t = 0; t <= excess.length; t++) {
      const over = t < excess.length && (excess[t] as number) > TRACE;
      if (over && from < 0) from = t;
      if (over || from < 0) continue;
      const part = excess.subarray(from, t);
      const sum = part.reduce((a, b) => a + b, 0) / (resource.class === 'steam' ? 60 : 1);
      spans.push({ resource, from, to: t, sum, greatest: Math.max(...part) });
      from = -1;
    }
    return spans;
  });
}

/** Greatest running deficit: what is over adds up and what is to spare makes it good again. [kg] */
function deficitOf(resource: ProblemResource, excess: Float64Array): number {
  if (resource.class !== 'steam') return 0;
  let deficit = 0;
  let worst = 0;
  for (const e of excess) {
    deficit = Math.max(0, deficit + e / 60);
    worst = Math.max(worst, deficit);
  }
  return worst < TRACE ? 0 : worst;
}

/** Greatest load by header, base load included. [kg/h] */
function peaks(problem: Problem, judgement: Judgement): Record<string, number> {
  const found: Record<string, number> = {};
  problem.resources.forEach((r, i) => {
    if (r.class !== 'steam' || r.id !== headerResource(r.sourceId)) return;
    let peak = 0;
    (judgement.excess[i] as Float64Array).forEach((e, t) => {
      const load = e + valueAt(r.capacity, t) + valueAt(r.baseLoad, t);
      if (load > peak) peak = load;
    });
    found[r.sourceId] = peak;
  });
  return found;
}

/** Waits that are a process limit and are passed already in the planner's plan; they can't get worse. */
function passedWaits(problem: Problem, plan: Plan): number {
  return problem.links.filter((l) => {
    if (l.processGreatestMin === null) return false;
    return momentOf(problem, plan, l.to) - momentOf(problem, plan, l.from) > l.processGreatestMin;
  }).length;
}
