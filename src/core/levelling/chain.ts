import { toMinutes } from '../time/stepFunction';
import type { EdgeCause, EdgeList } from './edges';
import { placedUses, type PlacedUse } from './placedUses';
import { isUnlimited, type Plan, type Problem, type ProblemResource } from './problem';

/** A draw, or a block that stands for capacity which is not there; it hands its amount on to later draws. */
interface Piece {
  /** -1: a block. */
  readonly activity: number;
  readonly from: number;
  readonly to: number;
  readonly amount: number;
  left: number;
}

const TRACE = 1e-6;
const BLOCK = -1;
const SOURCE = -2;

/**
 * Orders the draws on every resource so that any timing that keeps the orders keeps the load where it is or lower: each
 * draw takes what it needs from draws that have ended before it. Capacity that falls is a fixed block. Where the plan is
 * over, its own load is the capacity, so that it can't grow.
 */
export function chainResources(problem: Problem, plan: Plan, edges: EdgeList): void {
  const uses = placedUses(problem, plan);
  for (const resource of problem.resources) {
    if (isUnlimited(resource)) continue;
    const own = uses.filter((u) => u.resourceId === resource.id && u.start < problem.horizonMin);
    chainResource(problem, plan, resource, own, edges);
  }
}

function chainResource(
  problem: Problem,
  plan: Plan,
  resource: ProblemResource,
  uses: readonly PlacedUse[],
  edges: EdgeList,
): void {
  const capacity = capacityOrLoad(resource, uses, problem.horizonMin);
  const most = capacity.reduce((a, b) => Math.max(a, b), 0);
  const pieces = [...uses.map(pieceOf), ...blocks(capacity, most)];
  pieces.sort((a, b) => a.from - b.from || a.to - b.to || a.activity - b.activity);
  let pool: Piece[] = [{ activity: SOURCE, from: -Infinity, to: -Infinity, amount: most, left: most }];
  for (const piece of pieces) {
    take(piece, pool, plan, resource, edges);
    pool.push(piece);
    if (pool.length > 300) pool = pool.filter((p) => p.left > TRACE);
  }
}

const pieceOf = (u: PlacedUse): Piece => ({
  activity: u.activity,
  from: u.start,
  to: u.start + u.minutes,
  amount: u.amount,
  left: u.amount,
});

function capacityOrLoad(resource: ProblemResource, uses: readonly PlacedUse[], horizonMin: number): Float64Array {
  const load = new Float64Array(horizonMin);
  for (const u of uses) {
    const to = Math.min(horizonMin, u.start + u.minutes);
    for (let t = Math.max(0, u.start); t < to; t++) load[t] = (load[t] as number) + u.amount;
  }
  return toMinutes(resource.capacity, horizonMin).map((c, t) => Math.max(0, c, load[t] as number));
}

function blocks(capacity: Float64Array, most: number): Piece[] {
  const found: Piece[] = [];
  let from = 0;
  for (let t = 1; t <= capacity.length; t++) {
    if (t < capacity.length && capacity[t] === capacity[from]) continue;
    const missing = most - (capacity[from] as number);
    if (missing > TRACE) found.push({ activity: BLOCK, from, to: t, amount: missing, left: missing });
    from = t;
  }
  return found;
}

/** Draws on the same activity's own pieces first, then on those that ended first. */
function take(piece: Piece, pool: readonly Piece[], plan: Plan, resource: ProblemResource, edges: EdgeList): void {
  const givers = pool.filter((p) => p.to <= piece.from && p.left > TRACE);
  const rank = (p: Piece): number => (p.activity === piece.activity ? 0 : 1);
  givers.sort((a, b) => rank(a) - rank(b) || a.to - b.to || a.activity - b.activity);
  let need = piece.amount;
  for (const giver of givers) {
    if (need <= TRACE) return;
    const given = Math.min(need, giver.left);
    giver.left -= given;
    need -= given;
    bind(giver, piece, plan, resource, edges);
  }
}

function bind(giver: Piece, piece: Piece, plan: Plan, resource: ProblemResource, edges: EdgeList): void {
  if (giver.activity === SOURCE || giver.activity === piece.activity) return;
  const start = (p: Piece): number => plan.starts[p.activity] as number;
  const cause: EdgeCause = { kind: kindOf(resource, giver, piece), minute: piece.from };
  if (giver.activity === BLOCK) edges.atLeast(piece.activity, giver.to - (piece.from - start(piece)), cause);
  else if (piece.activity === BLOCK) edges.atMost(giver.activity, piece.from - (giver.to - start(giver)), cause);
  else edges.add(giver.activity, piece.activity, giver.to - start(giver) - (piece.from - start(piece)), cause);
}

function kindOf(resource: ProblemResource, giver: Piece, piece: Piece): EdgeCause['kind'] {
  if (resource.class === 'process') return 'vents';
  if (resource.class === 'shared') return 'sharedLimit';
  return giver.activity === BLOCK || piece.activity === BLOCK ? 'boiler' : 'steam';
}
