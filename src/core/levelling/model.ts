import {
  isUnlimited,
  type Problem,
  type ProblemActivity,
  type ProblemLink,
  type Use,
  type UsesBefore,
} from './problem';
import { toMinutes } from '../time/stepFunction';

/** Stands for "no bound" in whole minutes. */
export const FAR = 1_000_000_000;

/** A draw with its resource as a number. */
export interface Draw {
  readonly resource: number;
  readonly offset: number;
  readonly minutes: number;
  readonly amount: number;
}

/** How an activity runs on one unit. Modes of equal `shape` draw alike, those of equal `length` last as long. */
export interface Mode {
  readonly unit: number;
  readonly minutes: number;
  /** Of a cold machine. */
  readonly draws: readonly Draw[];
  /** Of a machine still warm, by the gap since the run before, ascending. */
  readonly warm: readonly WarmDraws[];
  readonly before: DrawsBefore | null;
  /** What its starts are priced with wherever they are: a cold machine, warmed up before. */
  readonly priced: readonly Draw[];
  readonly shape: number;
  readonly length: number;
}

export interface WarmDraws {
  readonly gapUpTo: number;
  readonly draws: readonly Draw[];
}

/** Drawn before a run: all through a short gap, or a warm-up with offsets from the run's start. */
export interface DrawsBefore {
  readonly idle: readonly { readonly resource: number; readonly amount: number }[];
  readonly idleUpTo: number;
  readonly warmUp: readonly Draw[];
}

/** A link as seen from the starts: least <= (start of `to`) - (start of `from`) - base <= greatest. */
export interface LinkArc {
  readonly from: number;
  readonly to: number;
  readonly fromEnd: boolean;
  readonly toEnd: boolean;
  readonly fromOffset: number;
  readonly toOffset: number;
  readonly least: number;
  readonly greatest: number;
}

export interface Cleaning {
  readonly minutes: number;
  readonly draws: readonly Draw[];
}

export interface ModelActivity {
  readonly index: number;
  readonly batch: number;
  readonly group: number;
  readonly family: number;
  readonly modes: readonly Mode[];
  /** One mode of each shape, and the minutes of each length. */
  readonly shapes: readonly Mode[];
  readonly lengths: readonly number[];
  readonly home: { readonly start: number; readonly mode: number };
  readonly homeOutsideShift: boolean;
  readonly movable: boolean;
  /** A stored cleaning: it leaves no machine warm. */
  readonly isCleaning: boolean;
  /** Link whose later moment frees the unit, or -1. */
  readonly takenOffBy: number;
  readonly cleanAfter: number;
  readonly earliest: number;
  readonly latest: number;
  readonly due: number;
  readonly weight: number;
  readonly links: readonly number[];
  /** Activities whose unit this one frees. */
  readonly frees: readonly number[];
}

/** The problem in numbers, for the search; indices are the problem's own order. */
export interface Model {
  readonly problem: Problem;
  readonly horizon: number;
  /** Length of the load arrays: the horizon and room for what runs past it. */
  readonly size: number;
  readonly activities: readonly ModelActivity[];
  readonly links: readonly LinkArc[];
  /** Activities that the kernel places together: trees of links within a batch. */
  readonly groups: readonly Group[];
  readonly batchCount: number;
  readonly open: readonly (readonly (readonly [number, number])[])[];
  /** By unit, from family * families + to family. */
  readonly cleaning: readonly (readonly (Cleaning | null)[])[];
  readonly families: number;
  readonly capacity: readonly Float64Array[];
  /** Greatest capacity by resource, at least a small positive number: overload is weighed as a share of it. */
  readonly scale: Float64Array;
  readonly resourceClass: readonly ('steam' | 'process' | 'shared')[];
}

/** A member of a placement group; `parent` is the position within the group of the member it is linked to, or -1. */
export interface GroupMember {
  readonly activity: number;
  readonly parent: number;
  /** Links between the member and its parent. */
  readonly links: readonly number[];
  readonly children: readonly number[];
}

export interface Group {
  readonly batch: number;
  readonly members: readonly GroupMember[];
}

/** Turns the plain problem into numbers. */
export function toModel(problem: Problem): Model {
  const index = new Map(problem.activities.map((a, i) => [a.id, i]));
  const limiting = problem.resources.flatMap((r, i) => (isUnlimited(r) ? [] : [[r.id, i] as const]));
  const resources = new Map(limiting);
  const units = new Map(problem.units.map((u, i) => [u.id, i]));
  const families = indexOf(problem.activities.flatMap((a) => (a.familyId === null ? [] : [a.familyId])));
  const batches = indexOf(problem.activities.map((a) => a.batchId));
  const linkIndex = new Map(problem.links.map((l, i) => [l.id, i]));
  const links = problem.links.map((l) => toArc(l, index));
  const open = problem.units.map((u) => u.open.map((o) => [o.from, o.to] as const));
  const { groups, groupOf } = toGroups(problem.activities, links, batches);
  const size = problem.horizonMin + reach(problem);
  const activities = problem.activities.map((a, i): ModelActivity => {
    const modes = toModes(a, units, resources);
    const mode = Math.max(
      0,
      a.modes.findIndex((m) => m.unitId === a.plan.unitId),
    );
    const minutes = modes[mode]?.minutes ?? 0;
    const spans = open[modes[mode]?.unit ?? -1] ?? [];
    const free = Math.max(a.plan.start + minutes, takenOffAt(problem, a, index));
    return {
      index: i,
      batch: batches.get(a.batchId) ?? 0,
      group: groupOf[i] ?? -1,
      family: a.familyId === null ? -1 : (families.get(a.familyId) ?? -1),
      modes,
      shapes: firstOfEach(modes),
      lengths: [...new Set(modes.map((m) => m.minutes))],
      home: { start: a.plan.start, mode },
      homeOutsideShift: !spans.some(([from, to]) => from <= a.plan.start && free <= to),
      movable: a.movable,
      isCleaning: a.isCleaning === true,
      takenOffBy: a.takenOffBy === null ? -1 : (linkIndex.get(a.takenOffBy) ?? -1),
      cleanAfter: a.cleanAfterMin,
      earliest: a.earliestStart,
      latest: a.latestStart,
      due: a.due ?? FAR,
      weight: a.weight,
      links: links.flatMap((l, k) => (l.from === i || l.to === i ? [k] : [])),
      frees: problem.activities.flatMap((b, j) =>
        b.takenOffBy !== null && links[linkIndex.get(b.takenOffBy) ?? -1]?.to === i ? [j] : [],
      ),
    };
  });
  const capacity = problem.resources.map((r) => padded(toMinutes(r.capacity, problem.horizonMin), size));
  return {
    problem,
    horizon: problem.horizonMin,
    size,
    activities,
    links,
    groups,
    batchCount: batches.size,
    open,
    cleaning: toCleaning(problem, families, resources),
    families: families.size,
    capacity,
    scale: Float64Array.from(capacity, (c) => c.subarray(0, problem.horizonMin).reduce((m, v) => Math.max(m, v), 1e-3)),
    resourceClass: problem.resources.map((r) => r.class),
  };
}

/** Moment at which the planner's plan has an activity taken off its unit; -FAR where its own end frees it. */
function takenOffAt(problem: Problem, a: ProblemActivity, index: ReadonlyMap<string, number>): number {
  const link = a.takenOffBy === null ? undefined : problem.links.find((l) => l.id === a.takenOffBy);
  const taker = link && problem.activities[index.get(link.to.activityId) ?? -1];
  if (!link || !taker) return -FAR;
  const minutes = taker.modes.find((m) => m.unitId === taker.plan.unitId)?.minutes ?? 0;
  return taker.plan.start + (link.to.anchor === 'end' ? minutes : 0) + link.to.offsetMin;
}

/** Start of the later activity less that of the earlier when the wait is 0. */
export function linkBase(link: LinkArc, fromMinutes: number, toMinutes_: number): number {
  return (link.fromEnd ? fromMinutes : 0) + link.fromOffset - (link.toEnd ? toMinutes_ : 0) - link.toOffset;
}

function indexOf(names: readonly string[]): Map<string, number> {
  return new Map([...new Set(names)].sort().map((name, i) => [name, i]));
}

/** Nothing after the week's end is limited. */
function padded(values: Float64Array, size: number): Float64Array {
  const all = new Float64Array(size).fill(FAR);
  all.set(values);
  return all;
}

/** Minutes past the horizon that any draw may reach, with cleaning behind the last activity. */
function reach(problem: Problem): number {
  const uses = problem.activities.flatMap((a) => a.modes.flatMap((m) => m.uses));
  const own = Math.max(
    0,
    ...uses.map((u) => u.offsetMin + u.minutes),
    ...problem.activities.flatMap((a) => a.modes.map((m) => m.minutes)),
  );
  const cleaning = Math.max(
    0,
    ...problem.cleaning.flatMap((c) => [c.minutes, ...c.uses.map((u) => u.offsetMin + u.minutes)]),
  );
  return own + cleaning + 64;
}

function toArc(l: ProblemLink, index: ReadonlyMap<string, number>): LinkArc {
  return {
    from: index.get(l.from.activityId) ?? -1,
    to: index.get(l.to.activityId) ?? -1,
    fromEnd: l.from.anchor === 'end',
    toEnd: l.to.anchor === 'end',
    fromOffset: l.from.offsetMin,
    toOffset: l.to.offsetMin,
    least: l.leastMin,
    greatest: l.greatestMin ?? FAR,
  };
}

function toDraws(uses: readonly Use[], resources: ReadonlyMap<string, number>): Draw[] {
  return uses.flatMap((u) => {
    const resource = resources.get(u.resourceId);
    if (resource === undefined) return [];
    return [{ resource, offset: u.offsetMin, minutes: u.minutes, amount: u.amount }];
  });
}

function toBefore({ idle, idleUpToMin, warmUp }: UsesBefore, resources: ReadonlyMap<string, number>): DrawsBefore {
  const idling = idle.flatMap(({ resourceId, amount }) => {
    const resource = resources.get(resourceId);
    return resource === undefined ? [] : [{ resource, amount }];
  });
  return { idle: idling, idleUpTo: idleUpToMin, warmUp: toDraws(warmUp, resources) };
}

function toModes(
  a: ProblemActivity,
  units: ReadonlyMap<string, number>,
  resources: ReadonlyMap<string, number>,
): Mode[] {
  const shapes = new Map<string, number>();
  const lengths = new Map<number, number>();
  return a.modes.map((m) => {
    const draws = toDraws(m.uses, resources);
    const warm = (m.warm ?? []).map((w) => ({ gapUpTo: w.gapUpToMin, draws: toDraws(w.uses, resources) }));
    const before = m.before ? toBefore(m.before, resources) : null;
    const priced = before ? [...before.warmUp, ...draws] : draws;
    const key = JSON.stringify([m.minutes, draws, warm, before]);
    const shape = shapes.get(key) ?? shapes.size;
    const length = lengths.get(m.minutes) ?? lengths.size;
    shapes.set(key, shape);
    lengths.set(m.minutes, length);
    return { unit: units.get(m.unitId) ?? -1, minutes: m.minutes, draws, warm, before, priced, shape, length };
  });
}

function firstOfEach(modes: readonly Mode[]): Mode[] {
  const shapes: Mode[] = [];
  for (const mode of modes) shapes[mode.shape] ??= mode;
  return shapes;
}

function toCleaning(
  problem: Problem,
  families: ReadonlyMap<string, number>,
  resources: ReadonlyMap<string, number>,
): (Cleaning | null)[][] {
  const n = families.size;
  const rules = problem.cleaning.map((c) => ({ ...c, draws: toDraws(c.uses, resources) }));
  return problem.units.map((unit) => {
    const table = new Array<Cleaning | null>(n * n).fill(null);
    for (const rule of rules) {
      const from = families.get(rule.fromFamilyId);
      const to = families.get(rule.toFamilyId);
      if (from === undefined || to === undefined || !rule.unitIds.includes(unit.id)) continue;
      if (rule.minutes > 0 || rule.draws.length > 0) {
        table[from * n + to] = { minutes: rule.minutes, draws: rule.draws };
      }
    }
    return table;
  });
}

/**
 * Movable activities of a batch that hang together by links, as trees in the order of the links; a link that would
 * close a ring puts its later activity into a group of its own.
 */
function toGroups(
  activities: readonly ProblemActivity[],
  links: readonly LinkArc[],
  batches: ReadonlyMap<string, number>,
): { groups: Group[]; groupOf: number[] } {
  const groupOf = new Array<number>(activities.length).fill(-1);
  const groups: Group[] = [];
  const order = activities.map((_, i) => i).sort((a, b) => startOf(activities, a) - startOf(activities, b) || a - b);
  for (const root of order) {
    if (groupOf[root] !== -1 || !activities[root]?.movable) continue;
    const members: { activity: number; parent: number; links: number[]; children: number[] }[] = [];
    groupOf[root] = groups.length;
    members.push({ activity: root, parent: -1, links: [], children: [] });
    for (let at = 0; at < members.length; at++) {
      const member = members[at]!;
      for (const other of neighbours(member.activity, links)) {
        const mate = activities[other]!;
        if (groupOf[other] !== -1 || !mate.movable || mate.batchId !== activities[root].batchId) continue;
        const joining = linksBetween(
          links,
          other,
          members.map((m) => m.activity),
        );
        if (joining.some((k) => !touches(links[k]!, member.activity))) continue;
        groupOf[other] = groups.length;
        member.children.push(members.length);
        members.push({ activity: other, parent: at, links: joining, children: [] });
      }
    }
    groups.push({ batch: batches.get(activities[root].batchId) ?? 0, members });
  }
  return { groups, groupOf };
}

const startOf = (activities: readonly ProblemActivity[], i: number): number => activities[i]?.plan.start ?? 0;
const touches = (link: LinkArc, a: number): boolean => link.from === a || link.to === a;

function neighbours(a: number, links: readonly LinkArc[]): number[] {
  return [...new Set(links.flatMap((l) => (l.from === a ? [l.to] : l.to === a ? [l.from] : [])))];
}

function linksBetween(links: readonly LinkArc[], a: number, others: readonly number[]): number[] {
  return links.flatMap((l, k) =>
    (l.from === a && others.includes(l.to)) || (l.to === a && others.includes(l.from)) ? [k] : [],
  );
}
