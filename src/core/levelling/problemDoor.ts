import { fail, ok, problem as fault, type Problem as Fault, type Result } from '../result';
import type { Plan, Problem, ProblemActivity, ProblemLink, ProblemMode, Use } from './problem';

/** Faults named at once; more would not be read. */
const FAULTS_NAMED = 20;

/**
 * Checks what a schema can't: that every name is used once and every name used is there, and that the plan lies within
 * what it may be. Sorts everything by id, so that the order in which it was handed in does not matter.
 * @returns the problem sorted, or its faults, each with the place in `field`.
 */
export function admitProblem(given: Problem): Result<Problem, readonly Fault[]> {
  const faults = [...doubled(given), ...missing(given), ...outOfBounds(given)];
  return faults.length > 0 ? fail(faults.slice(0, FAULTS_NAMED)) : ok(sorted(given));
}

/** A plan for a problem, by activity id. */
export interface NamedPlan {
  readonly activities: readonly { readonly id: string; readonly unitId: string; readonly start: number }[];
}

/** Puts a plan in the problem's order; every activity must be in it once, on a unit that it can run on. */
export function admitPlan(problem: Problem, given: NamedPlan): Result<Plan, readonly Fault[]> {
  const byId = new Map(given.activities.map((a) => [a.id, a]));
  const faults = [
    ...repeated(given.activities, 'activities'),
    ...given.activities.flatMap(({ id }, i) =>
      problem.activities.some((a) => a.id === id) ? [] : [unknown('activity', id, `activities.${i}.id`)],
    ),
    ...problem.activities.flatMap((a) => planFault(a, byId.get(a.id)?.unitId)),
  ];
  if (faults.length > 0) return fail(faults.slice(0, FAULTS_NAMED));
  const placed = problem.activities.map((a) => byId.get(a.id) as NamedPlan['activities'][number]);
  return ok({ starts: placed.map((p) => p.start), units: placed.map((p) => p.unitId) });
}

/** The plan with the names of its activities. */
export function namePlan(problem: Problem, plan: Plan): NamedPlan {
  return {
    activities: problem.activities.map(({ id }, i) => {
      return { id, unitId: plan.units[i] as string, start: plan.starts[i] as number };
    }),
  };
}

function planFault(activity: ProblemActivity, unitId: string | undefined): Fault[] {
  if (unitId === undefined) return [fault('PLAN-MISSING', `The plan has no start for ${activity.id}.`, activity.id)];
  if (activity.modes.some((mode) => mode.unitId === unitId)) return [];
  return [fault('PLAN-UNIT', `${activity.id} can't run on ${unitId}; it has no mode there.`, activity.id)];
}

function doubled(p: Problem): Fault[] {
  return (['units', 'resources', 'activities', 'links'] as const).flatMap((list) => repeated(p[list], list));
}

function repeated(list: readonly { readonly id: string }[], name: string): Fault[] {
  const seen = new Set<string>();
  return list.flatMap(({ id }, i) => {
    if (!seen.has(id)) return (seen.add(id), []);
    return [fault('PROBLEM-TWICE', `“${id}” is there twice among ${name}; give each its own id.`, `${name}.${i}.id`)];
  });
}

const unknown = (what: string, id: string, field: string): Fault =>
  fault('PROBLEM-UNKNOWN', `There is no ${what} “${id}”; name one that the file has.`, field);

function missing(p: Problem): Fault[] {
  const units = new Set(p.units.map((u) => u.id));
  const resources = new Set(p.resources.map((r) => r.id));
  const activities = new Set(p.activities.map((a) => a.id));
  const links = new Set(p.links.map((l) => l.id));
  const known = (set: ReadonlySet<string>, what: string, id: string, field: string): Fault[] =>
    set.has(id) ? [] : [unknown(what, id, field)];
  const uses = (list: readonly Use[], at: string): Fault[] =>
    list.flatMap((use, i) => known(resources, 'resource', use.resourceId, `${at}.uses.${i}.resourceId`));
  const beforeFaults = ({ before }: ProblemMode, at: string): Fault[] => [
    ...(before?.idle ?? []).flatMap((use, i) =>
      known(resources, 'resource', use.resourceId, `${at}.idle.${i}.resourceId`),
    ),
    ...(before?.warmUp ?? []).flatMap((use, i) =>
      known(resources, 'resource', use.resourceId, `${at}.warmUp.${i}.resourceId`),
    ),
  ];
  return [
    ...p.activities.flatMap((a, i) => [
      ...a.modes.flatMap((m, k) => [
        ...known(units, 'unit', m.unitId, `activities.${i}.modes.${k}.unitId`),
        ...uses(m.uses, `activities.${i}.modes.${k}`),
        ...(m.warm ?? []).flatMap((w, j) => uses(w.uses, `activities.${i}.modes.${k}.warm.${j}`)),
        ...beforeFaults(m, `activities.${i}.modes.${k}.before`),
      ]),
      ...(a.takenOffBy === null ? [] : known(links, 'link', a.takenOffBy, `activities.${i}.takenOffBy`)),
    ]),
    ...p.links.flatMap((l, i) => [
      ...known(activities, 'activity', l.from.activityId, `links.${i}.from.activityId`),
      ...known(activities, 'activity', l.to.activityId, `links.${i}.to.activityId`),
    ]),
    ...p.cleaning.flatMap((c, i) => [
      ...c.unitIds.flatMap((id, k) => known(units, 'unit', id, `cleaning.${i}.unitIds.${k}`)),
      ...uses(c.uses, `cleaning.${i}`),
    ]),
  ];
}

function outOfBounds(p: Problem): Fault[] {
  return [...p.activities.flatMap((a, i) => activityFaults(a, i)), ...p.links.flatMap((l, i) => linkFaults(l, i))];
}

function activityFaults(a: ProblemActivity, i: number): Fault[] {
  const at = `activities.${i}`;
  const faults: Fault[] = [];
  if (!a.modes.some((m) => m.unitId === a.plan.unitId)) {
    faults.push(fault('PROBLEM-PLAN', `${a.id} stands on ${a.plan.unitId} without a mode there.`, `${at}.plan.unitId`));
  }
  if (a.plan.start < a.earliestStart || a.plan.start > a.latestStart) {
    const bounds = `${a.earliestStart} to ${a.latestStart}`;
    const text = `${a.id} starts at ${a.plan.start}, outside its own bounds ${bounds}; widen them or move the plan.`;
    faults.push(fault('PROBLEM-BOUNDS', text, `${at}.plan.start`));
  }
  return faults;
}

function linkFaults(l: ProblemLink, i: number): Fault[] {
  if (l.greatestMin === null || l.greatestMin >= l.leastMin) return [];
  const text = `${l.id} waits at least ${l.leastMin} and at most ${l.greatestMin} min; no wait is both.`;
  return [fault('PROBLEM-WAIT', text, `links.${i}.greatestMin`)];
}

function sorted(p: Problem): Problem {
  return {
    ...p,
    units: byId(p.units),
    resources: byId(p.resources),
    links: byId(p.links),
    cleaning: [...p.cleaning].sort((a, b) => compare(cleaningKey(a), cleaningKey(b))),
    activities: byId(p.activities).map((a) => ({
      ...a,
      modes: [...a.modes].sort((x, y) => compare(x.unitId, y.unitId)),
    })),
  };
}

const cleaningKey = (c: Problem['cleaning'][number]): string =>
  JSON.stringify([c.fromFamilyId, c.toFamilyId, c.unitIds]);
const compare = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
const byId = <T extends { readonly id: string }>(list: readonly T[]): T[] =>
  [...list].sort((a, b) => compare(a.id, b.id));
