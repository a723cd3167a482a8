import { activeDraws, type ActiveDraw } from './active';
import { shuffle, type Random } from './random';
import type { Ripple } from './ripple';
import type { State } from './state';

export interface FlattenSettings {
  /** Middle and half-width of the span that is pulled back to the plan first; null: nothing is pulled. */
  readonly pull: { readonly middle: number; readonly within: number; readonly share: number } | null;
  /** Overloads resolved at most. */
  readonly budget: number;
  /** 0: always the cheapest way; more: the choice is blurred. */
  readonly noise: number;
}

/** Starts before each shift, latest last, so that the whole can be taken back. */
export type ShiftLog = { readonly list: readonly number[]; readonly starts: readonly number[] }[];

const OVER = 1e-6;
/** Ways of resolving one overload that are looked at. */
const LOOKED_AT = 12;
/** How far a draw is moved to wait for a limit that rises. [min] */
const GREATEST_WAIT_FOR_RISE = 240;

/** One way of resolving an overload: one of two draws moves until they no longer overlap, or one leaves a low level. */
interface Way {
  first: ActiveDraw | null;
  second: ActiveDraw;
  moves: number;
  by: number;
}

/**
 * Pulls activities of a span back to the plan, then goes through what is over from left to right and puts one draw
 * after another, by the cheaper of pushing one later or the other earlier; each order holds until the end.
 */
export function pullAndFlatten(state: State, ripple: Ripple, random: Random, settings: FlattenSettings): ShiftLog {
  const log: ShiftLog = [];
  const greatest = ripple.greatest;
  ripple.greatest = 120;
  let from = settings.pull ? pullBack(state, ripple, random, settings.pull, log) : 0;
  const until = settings.pull ? settings.pull.middle + settings.pull.within + 1440 : state.model.horizon;
  for (let step = 0; step < settings.budget; step++) {
    const over = firstOver(state, from);
    if (!over || over.minute > until) break;
    const way = cheapestWay(state, ripple, random, settings.noise, over.resource, over.minute);
    const least = way ? resolve(state, ripple, way, log) : null;
    from = least === null ? over.minute + 1 : Math.max(0, Math.min(over.minute, least));
  }
  ripple.clearOrders();
  ripple.greatest = greatest;
  return log;
}

/** Takes shifts back, latest first. */
export function takeBack(state: State, log: ShiftLog): void {
  const starts = new Map<number, number>();
  for (const entry of log) {
    entry.list.forEach((a, i) => {
      if (!starts.has(a)) starts.set(a, entry.starts[i]!);
    });
  }
  const list = [...starts.keys()];
  if (list.length > 0)
    state.shift(
      list,
      list.map((a) => starts.get(a)!),
    );
}

/** Applies a push and logs what was before; the least start concerned, or null where the push fails. */
function move(state: State, ripple: Ripple, a: number, by: number, log: ShiftLog): number | null {
  const push = ripple.push(a, by);
  if (!push) return null;
  const before = push.list.map((b) => state.starts[b]!);
  log.push({ list: push.list, starts: before });
  state.shift(push.list, push.starts);
  return Math.min(...before, ...push.starts);
}

function pullBack(
  state: State,
  ripple: Ripple,
  random: Random,
  pull: { readonly middle: number; readonly within: number; readonly share: number },
  log: ShiftLog,
): number {
  const pulled: number[] = [];
  for (let unit = 0; unit < state.queues.length; unit++) {
    const queue = state.queues[unit]!;
    for (let i = state.position(unit, pull.middle - pull.within); i < queue.length; i++) {
      const a = queue[i]!;
      if (state.starts[a]! >= pull.middle + pull.within) break;
      if (state.starts[a] !== state.model.activities[a]!.home.start && random() < pull.share) pulled.push(a);
    }
  }
  shuffle(random, pulled);
  let least = state.model.horizon;
  for (const a of pulled) {
    const by = state.model.activities[a]!.home.start - state.starts[a]!;
    const moved = by === 0 ? null : move(state, ripple, a, by, log);
    if (moved !== null) least = Math.min(least, moved);
  }
  return Math.max(0, least - 1);
}

function firstOver(state: State, from: number): { minute: number; resource: number } | null {
  let minute = state.model.horizon;
  let resource = -1;
  for (let r = 0; r < state.excess.length; r++) {
    if (state.over[r]! <= OVER) continue;
    const excess = state.excess[r]!;
    for (let t = from; t < minute; t++) {
      if (excess[t]! > OVER) {
        minute = t;
        resource = r;
        break;
      }
    }
  }
  state.work += minute - from;
  return resource < 0 ? null : { minute, resource };
}

function cheapestWay(
  state: State,
  ripple: Ripple,
  random: Random,
  noise: number,
  resource: number,
  minute: number,
): Way | null {
  let best: Way | null = null;
  let least = Infinity;
  for (const way of waysAt(state, resource, minute)) {
    const price = priceOf(state, ripple, way);
    if (price === null) continue;
    const blurred = price > 0 ? price * (1 + noise * random()) : price * (1 - noise * random());
    if (blurred < least) {
      least = blurred;
      best = way;
    }
  }
  return best;
}

/** The shortest ways, shortest first. */
function waysAt(state: State, resource: number, minute: number): Way[] {
  const active = activeDraws(state, resource, minute);
  const { rise, drop } = levelAround(state, resource, minute);
  const ways: Way[] = [];
  for (const second of active) {
    const movable = state.model.activities[second.activity]!.movable;
    for (const first of active) {
      if (first.activity === second.activity) continue;
      const by = first.to - second.from;
      if (movable) keepShortest(ways, first, second, second.activity, by);
      if (state.model.activities[first.activity]!.movable) keepShortest(ways, first, second, first.activity, -by);
    }
    if (!movable) continue;
    const wait = rise - second.from;
    const ahead = second.to - drop;
    if (wait < GREATEST_WAIT_FOR_RISE) keepShortest(ways, null, second, second.activity, wait);
    if (drop > 0 && ahead < GREATEST_WAIT_FOR_RISE) keepShortest(ways, null, second, second.activity, -ahead);
  }
  return ways;
}

/** Keeps the list sorted by length and no longer than is looked at. */
function keepShortest(ways: Way[], first: ActiveDraw | null, second: ActiveDraw, moves: number, by: number): void {
  const length = Math.abs(by);
  if (length === 0 || (ways.length === LOOKED_AT && length >= Math.abs(ways[LOOKED_AT - 1]!.by))) return;
  let at = ways.length === LOOKED_AT ? LOOKED_AT - 1 : ways.length;
  const way: Way = ways.length === LOOKED_AT ? ways[at]! : { first, second, moves, by };
  way.first = first;
  way.second = second;
  way.moves = moves;
  way.by = by;
  for (; at > 0 && Math.abs(ways[at - 1]!.by) > length; at--) ways[at] = ways[at - 1]!;
  ways[at] = way;
}

/** The span around a minute in which the capacity is no greater than there. */
function levelAround(state: State, resource: number, minute: number): { rise: number; drop: number } {
  const capacity = state.model.capacity[resource]!;
  let rise = minute;
  while (rise < state.model.horizon && rise - minute < 480 && capacity[rise]! <= capacity[minute]!) rise++;
  let drop = minute;
  while (drop > 0 && minute - drop < 480 && capacity[drop - 1]! <= capacity[minute]!) drop--;
  return { rise, drop };
}

/** Price of the minutes moved and late; null where the push fails or doesn't bring the two apart. */
function priceOf(state: State, ripple: Ripple, way: Way): number | null {
  if (!ripple.tryPush(way.moves, way.by)) return null;
  const { first, second } = way;
  if (first) {
    const ends = ripple.startAfter(first.activity) + first.offset + first.minutes;
    if (ends > ripple.startAfter(second.activity) + second.offset) return null;
  }
  let price = 0.05 * Math.abs(way.by);
  for (const a of ripple.pushed) {
    const mode = state.modes[a]!;
    price += state.placeCost(a, ripple.startAfter(a), mode) - state.placeCost(a, state.starts[a]!, mode);
  }
  return price + newlyMoved(state, ripple.pushed);
}

/** Price of the batches that would be moved for the first time. */
function newlyMoved(state: State, list: readonly number[]): number {
  const { batchMoved } = state.model.problem.prices;
  if (batchMoved === 0) return 0;
  const batches = new Set<number>();
  for (const a of list) {
    const { batch } = state.model.activities[a]!;
    if (!state.isBatchMoved(batch)) batches.add(batch);
  }
  return batches.size * batchMoved;
}

function resolve(state: State, ripple: Ripple, way: Way, log: ShiftLog): number | null {
  const { first, second } = way;
  if (first) ripple.order(first.activity, second.activity, first.offset + first.minutes - second.offset);
  return move(state, ripple, way.moves, way.by, log);
}
