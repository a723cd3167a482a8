import type { Problem, ProblemActivity, ProblemLink, ProblemMode, Use } from '@/core/levelling/problem';
import { seededRandom, wholeBelow, type Random } from '@/core/levelling/random';

const HORIZON = 120;
const UNITS = ['u0', 'u1', 'u2'];
const FAMILIES = ['f0', 'f1'];

/** What a small random problem has in it. */
export interface SmallShape {
  readonly cleaningDraws: boolean;
  /** Runs idle, warm up and are still warm by the gap before them, and some are stored cleanings. */
  readonly gapDraws?: boolean;
}

/**
 * A small random problem whose plan breaks no rule of time: chains and single runs on three units with cleaning, shifts,
 * waits from starts or ends, units that are taken off later, fixed runs, a header, vents at once and a shared limit.
 */
export function smallProblem(seed: number, shape: SmallShape = { cleaningDraws: false }): Problem {
  const random = seededRandom(seed);
  const free = new Map(UNITS.map((u) => [u, 2]));
  const activities: ProblemActivity[] = [];
  const links: ProblemLink[] = [];
  const batches = 3 + wholeBelow(random, 3);
  for (let b = 0; b < batches; b++) addBatch(random, b, free, activities, links);
  if (shape.gapDraws) activities.forEach((a, i) => (activities[i] = withGapDraws(random, a)));
  return {
    version: 1,
    horizonMin: HORIZON,
    units: UNITS.map((id, i) => ({
      id,
      open:
        i === 2
          ? [
              { from: 0, to: 58 },
              { from: 62, to: HORIZON },
            ]
          : [{ from: 0, to: HORIZON }],
    })),
    cleaning: UNITS.flatMap((id) => [
      cleaning(id, 'f0', 'f1', 3, shape.cleaningDraws),
      cleaning(id, 'f1', 'f0', 2, shape.cleaningDraws),
    ]),
    resources: [
      resource('header:main', 'steam', [
        { from: 0, value: 80 },
        { from: 40, value: 50 },
        { from: 70, value: 80 },
      ]),
      resource('vents:g', 'process', [{ from: 0, value: 1 }]),
      resource('limit:people', 'shared', [{ from: 0, value: 2 }]),
    ],
    activities,
    links,
    prices: { batchMoved: 5, minuteMoved: 1, unitChanged: 7 },
  };
}

function resource(id: string, of: Problem['resources'][number]['class'], capacity: { from: number; value: number }[]) {
  return { id, class: of, sourceId: id, capacity, baseLoad: [] };
}

function cleaning(unitId: string, fromFamilyId: string, toFamilyId: string, minutes: number, draws: boolean) {
  const uses: Use[] = draws ? [use('header:main', 0, minutes, 25)] : [];
  return { unitIds: [unitId], fromFamilyId, toFamilyId, minutes, uses };
}

const use = (resourceId: string, offsetMin: number, minutes: number, amount: number): Use => ({
  resourceId,
  offsetMin,
  minutes,
  amount,
  phase: null,
});

function addBatch(
  random: Random,
  b: number,
  free: Map<string, number>,
  activities: ProblemActivity[],
  links: ProblemLink[],
): void {
  const family = FAMILIES[wholeBelow(random, 2)] as string;
  const stages = 1 + wholeBelow(random, 2);
  const movable = random() < 0.85;
  const takenOff = random() < 0.4;
  let ready = 2 + wholeBelow(random, 20);
  for (let k = 0; k < stages; k++) {
    const id = `b${b}-${k}`;
    const home = UNITS[wholeBelow(random, 3)] as string;
    const minutes = 5 + wholeBelow(random, 6);
    const start = openStart(home, Math.max(ready, (free.get(home) ?? 0) + 3), minutes + (takenOff && k === 0 ? 12 : 0));
    const modes = UNITS.filter((u) => u === home || random() < 0.5).map((u) =>
      modeOn(random, u, u === home ? minutes : minutes + wholeBelow(random, 3)),
    );
    activities.push({
      id,
      batchId: `b${b}`,
      familyId: family,
      modes,
      plan: { unitId: home, start },
      movable,
      takenOffBy: null,
      cleanAfterMin: 0,
      earliestStart: movable ? Math.max(0, start - 15) : start,
      latestStart: movable ? start + 15 : start,
      due: random() < 0.5 ? start + minutes + wholeBelow(random, 6) : null,
      weight: 1 + wholeBelow(random, 2),
    });
    if (k > 0) linkTo(random, activities, links, id, takenOff);
    free.set(home, start + minutes);
    ready = start + minutes + 1;
  }
  const first = activities.findIndex((a) => a.id === `b${b}-0`);
  const freed = activities[first];
  const last = activities.at(-1);
  if (freed?.takenOffBy && last)
    free.set(freed.plan.unitId, Math.max(free.get(freed.plan.unitId) ?? 0, last.plan.start));
}

/** Third unit closed from 58 to 62. */
function openStart(unit: string, from: number, minutes: number): number {
  return unit === 'u2' && from < 62 && from + minutes > 58 ? 62 : from;
}

function modeOn(random: Random, unitId: string, minutes: number): ProblemMode {
  const steam = 3 + wholeBelow(random, 3);
  const uses = [use('header:main', 0, steam, 20 + 10 * wholeBelow(random, 4))];
  if (steam < minutes) uses.push(use('header:main', steam, minutes - steam, 10));
  if (random() < 0.5) uses.push(use('vents:g', 0, 3, 1));
  if (random() < 0.5) uses.push(use('limit:people', 1, 3, 1));
  return { unitId, minutes, uses };
}

function withGapDraws(random: Random, activity: ProblemActivity): ProblemActivity {
  if (random() < 0.15) return { ...activity, familyId: null, isCleaning: true };
  const modes = activity.modes.map((mode): ProblemMode => {
    const warm = [
      { gapUpToMin: 4, uses: [use('header:main', 0, 2, 15), use('vents:g', 0, 1, 1)] },
      { gapUpToMin: 12, uses: [use('header:main', 1, 4, 18)] },
    ];
    const before = {
      idle: [{ resourceId: 'header:main', amount: 8 }],
      idleUpToMin: 3 + wholeBelow(random, 8),
      warmUp: [use('header:main', -4, 3, 30), use('header:main', -1, 1, 12)],
    };
    return { ...mode, ...(random() < 0.6 ? { warm } : {}), ...(random() < 0.6 ? { before } : {}) };
  });
  return { ...activity, modes };
}

function linkTo(
  random: Random,
  activities: ProblemActivity[],
  links: ProblemLink[],
  id: string,
  takenOff: boolean,
): void {
  const at = activities.length - 2;
  const before = activities[at] as ProblemActivity;
  const after = activities[at + 1] as ProblemActivity;
  const fromEnd = random() < 0.5 || takenOff;
  const length = before.modes.find((m) => m.unitId === before.plan.unitId)?.minutes ?? 0;
  const wait = after.plan.start - before.plan.start - (fromEnd ? length : 0);
  links.push({
    id: `l-${id}`,
    from: { activityId: before.id, anchor: fromEnd ? 'end' : 'start', offsetMin: 0 },
    to: { activityId: after.id, anchor: 'start', offsetMin: 0 },
    leastMin: Math.min(wait, fromEnd ? 0 : length),
    greatestMin: random() < 0.7 ? wait + wholeBelow(random, 8) : null,
    processGreatestMin: null,
  });
  if (takenOff) activities[at] = { ...before, takenOffBy: `l-${id}` };
}
