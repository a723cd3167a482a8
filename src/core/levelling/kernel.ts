import {
  FAR,
  linkBase,
  type Cleaning,
  type Draw,
  type Group,
  type GroupMember,
  type LinkArc,
  type Mode,
} from './model';
import type { State } from './state';

/** How far and where a group may be put back. */
export interface Window {
  /** Minutes to either side of the centre. */
  readonly radius: number;
  /** Start that the window of each member is laid around; null: where the planner's plan has it. */
  readonly centres: readonly number[] | null;
  /** Minutes that a place may overlap the activity behind it, which is then pushed later. */
  readonly push: number;
}

/** The cheapest place found for each member, in the group's order. */
export interface Placing {
  readonly cost: number;
  readonly starts: readonly number[];
  readonly modes: readonly number[];
}

/** Price of a minute of pushing the activity behind. */
const PUSH_PRICE = 2;

/**
 * Puts a group of linked activities back at the least price: every start minute of every member is priced against
 * what is left under the limits with sliding sums, kept to the gaps, cleaning and shifts of the eligible units, and
 * the members are joined by dynamic programming over their links with sliding-window minima.
 *
 * Exact for the present prices up to three things: draws of members that overlap one another, and of a cleaning with
 * the members beside it, are priced as if each were alone; and every place is priced as one of a cold machine, warmed
 * up before it, whatever the gap: the state then draws what the gap asks for.
 */
export class Kernel {
  private readonly slots: Slot[] = [];
  private price = new Float64Array(0);
  private after = new Float64Array(0);
  private deque = new Int32Array(0);

  constructor(private readonly state: State) {}

  /** null where no place was found. The members must have been taken out. */
  best(group: Group, window: Window): Placing | null {
    const { members } = group;
    for (let k = 0; k < members.length; k++) if (!this.open(members, k, window)) return null;
    for (let k = members.length - 1; k >= 0; k--) if (!this.fill(members, k, window)) return null;
    return this.choose(group);
  }

  private open(members: readonly GroupMember[], k: number, window: Window): boolean {
    const { state } = this;
    const member = members[k]!;
    const activity = state.model.activities[member.activity]!;
    const slot = (this.slots[k] ??= new Slot());
    const centre = window.centres?.[k] ?? activity.home.start;
    let lo = Math.max(activity.earliest, centre - window.radius);
    let hi = Math.min(activity.latest, centre + window.radius);
    slot.limits = activity.lengths.map((minutes) => this.limitsFor(member, members, minutes));
    lo = Math.max(lo, Math.min(...slot.limits.map((l) => l.lo)));
    hi = Math.min(hi, Math.max(...slot.limits.map((l) => l.hi)));
    if (member.parent >= 0) {
      const parent = this.slots[member.parent]!;
      const waits = this.waitRange(members, member);
      lo = Math.max(lo, parent.lo + waits.lo);
      hi = Math.min(hi, parent.lo + parent.count - 1 + waits.hi);
    }
    slot.reset(lo, hi - lo + 1, activity.lengths.length);
    return hi >= lo;
  }

  /** Bounds on the start from activities that stay where they are. */
  private limitsFor(member: GroupMember, members: readonly GroupMember[], minutes: number): { lo: number; hi: number } {
    const { state } = this;
    const { model } = state;
    const activity = model.activities[member.activity]!;
    let lo = 0;
    let hi = Math.min(model.horizon - minutes, state.latestToFree(member.activity, minutes));
    for (const k of activity.links) {
      const link = model.links[k]!;
      const other = link.from === member.activity ? link.to : link.from;
      if (!state.placed[other] || members.some((m) => m.activity === other)) continue;
      if (link.from === member.activity) {
        const own = (link.fromEnd ? minutes : 0) + link.fromOffset;
        lo = Math.max(lo, state.momentTo(link) - link.greatest - own);
        hi = Math.min(hi, state.momentTo(link) - link.least - own);
      } else {
        const own = (link.toEnd ? minutes : 0) + link.toOffset;
        lo = Math.max(lo, state.momentFrom(link) + link.least - own);
        hi = Math.min(hi, state.momentFrom(link) + link.greatest - own);
      }
    }
    return { lo, hi };
  }

  /** Start of the member less that of its parent, over all lengths of both. */
  private waitRange(members: readonly GroupMember[], member: GroupMember): { lo: number; hi: number } {
    const { activities } = this.state.model;
    const parent = members[member.parent]!;
    let lo = FAR;
    let hi = -FAR;
    for (const p of activities[parent.activity]!.lengths) {
      for (const c of activities[member.activity]!.lengths) {
        const range = this.waits(member, p, c);
        lo = Math.min(lo, range.lo);
        hi = Math.max(hi, range.hi);
      }
    }
    return { lo, hi };
  }

  private waits(member: GroupMember, parentMinutes: number, minutes: number): { lo: number; hi: number } {
    let lo = -FAR;
    let hi = FAR;
    for (const k of member.links) {
      const link = this.state.model.links[k]!;
      const forward = link.to === member.activity;
      const base = forward ? linkBase(link, parentMinutes, minutes) : linkBase(link, minutes, parentMinutes);
      lo = Math.max(lo, forward ? base + link.least : -(base + link.greatest));
      hi = Math.min(hi, forward ? base + link.greatest : -(base + link.least));
    }
    return { lo, hi };
  }

  /** Prices all starts of one member, with the best of everything that hangs on it. */
  private fill(members: readonly GroupMember[], k: number, window: Window): boolean {
    const { state } = this;
    const member = members[k]!;
    const activity = state.model.activities[member.activity]!;
    const slot = this.slots[k]!;
    const taker = this.takerAmong(members, member);
    let shape = -1;
    let found = false;
    for (let m = 0; m < activity.modes.length; m++) {
      const mode = activity.modes[m]!;
      if (mode.shape !== shape) {
        shape = mode.shape;
        this.priceStarts(mode.priced, slot.lo, slot.count);
      }
      if (mode.unit < 0) found = this.fillSpan(members, k, m, null, taker) || found;
      else found = this.fillGaps(members, k, m, window, taker) || found;
    }
    if (!found) return false;
    for (const c of member.children) if (c !== taker) this.joinChild(members, k, c);
    return true;
  }

  /** The child that takes this member off its unit, as a position in the group; -1 where there is none. */
  private takerAmong(members: readonly GroupMember[], member: GroupMember): number {
    const by = this.state.model.activities[member.activity]!.takenOffBy;
    if (by < 0) return -1;
    return member.children.find((c) => members[c]!.links.includes(by)) ?? -1;
  }

  /** Walks the gaps of a mode's unit that the member's window reaches. */
  private fillGaps(members: readonly GroupMember[], k: number, m: number, window: Window, taker: number): boolean {
    const { state } = this;
    const slot = this.slots[k]!;
    const a = members[k]!.activity;
    const activity = state.model.activities[a]!;
    const mode = activity.modes[m]!;
    const queue = state.queues[mode.unit]!;
    const hi = slot.lo + slot.count - 1;
    let found = false;
    for (let g = Math.max(-1, state.position(mode.unit, slot.lo) - 1); g < queue.length; g++) {
      const prev = g < 0 ? -1 : queue[g]!;
      const next = queue[g + 1] ?? -1;
      const from = prev < 0 ? -FAR : this.freeBehind(mode.unit, g) + state.changeover(mode.unit, prev, a);
      if (from > hi) break;
      const to = next < 0 ? FAR : state.starts[next]! - state.changeover(mode.unit, a, next);
      const pushedTo = next < 0 ? FAR : Math.min(state.starts[next]! - 1 + mode.minutes, to + window.push);
      if (pushedTo - mode.minutes < slot.lo || pushedTo - mode.minutes < from) continue;
      const gap: Gap = { prev, next, from, to, pushedTo: window.push > 0 ? pushedTo : to };
      found = this.fillShifts(members, k, m, gap, taker) || found;
    }
    return found;
  }

  /** The parts of a gap in which the unit is open; where the plan itself is outside its shift, that start too. */
  private fillShifts(members: readonly GroupMember[], k: number, m: number, gap: Gap, taker: number): boolean {
    const activity = this.state.model.activities[members[k]!.activity]!;
    const mode = activity.modes[m]!;
    const { home } = activity;
    let found = false;
    for (const [opens, closes] of this.state.model.open[mode.unit]!) {
      if (opens > gap.pushedTo) break;
      if (closes <= gap.from) continue;
      const open: Gap = {
        ...gap,
        from: Math.max(gap.from, opens),
        to: Math.min(gap.to, closes),
        pushedTo: Math.min(gap.pushedTo, closes),
      };
      found = this.fillSpan(members, k, m, open, taker) || found;
    }
    if (activity.homeOutsideShift && m === home.mode && home.start >= gap.from) {
      const only: Gap = { ...gap, from: home.start, pushedTo: Math.min(gap.pushedTo, home.start + mode.minutes) };
      found = this.fillSpan(members, k, m, only, taker) || found;
    }
    return found;
  }

  /** When the unit is free behind a queue position; a clash in the plan may keep it busy with an earlier activity. */
  private freeBehind(unit: number, g: number): number {
    const { state } = this;
    const queue = state.queues[unit]!;
    let free = state.freeAt[queue[g]!]!;
    for (let i = g - 1; i >= 0 && i >= g - 2; i--) free = Math.max(free, state.freeAt[queue[i]!]!);
    return free;
  }

  private fillSpan(members: readonly GroupMember[], k: number, m: number, gap: Gap | null, taker: number): boolean {
    const { state } = this;
    const slot = this.slots[k]!;
    const a = members[k]!.activity;
    const activity = state.model.activities[a]!;
    const mode = activity.modes[m]!;
    const limits = slot.limits[mode.length]!;
    const freedAt = this.freedFromOutside(members, a, taker);
    if (gap && freedAt > gap.pushedTo) return false;
    const hi = slot.lo + slot.count - 1;
    const from = Math.max(slot.lo, limits.lo, gap?.from ?? -FAR);
    const to = Math.min(hi, limits.hi, (gap?.pushedTo ?? FAR) - mode.minutes);
    if (to < from) return false;
    const fixed = gap ? this.changeoverPrice(mode.unit, a, gap) : 0;
    const cleaning = gap && gap.next >= 0 ? state.cleaningBetween(mode.unit, a, gap.next) : null;
    const cleans = cleaning !== null && cleaning.draws.length > 0 ? cleaning : null;
    if (taker >= 0) this.joinTaker(members, k, taker, mode, from, to, gap, cleans);
    else if (cleans)
      this.priceCleaning(cleans, activity.cleanAfter + mode.minutes, from, to, freedAt + activity.cleanAfter);
    const job: SpanJob = { slot, a, m, mode, gap, fixed, priced: cleans !== null || taker >= 0, taker };
    return this.fillTimes(job, from, to);
  }

  /** Moment at which an activity outside the group frees the unit; -FAR where none does. */
  private freedFromOutside(members: readonly GroupMember[], a: number, taker: number): number {
    const { state } = this;
    const by = state.model.activities[a]!.takenOffBy;
    if (by < 0 || taker >= 0) return -FAR;
    const link = state.model.links[by]!;
    return state.placed[link.to] && !members.some((m) => m.activity === link.to) ? state.momentTo(link) : -FAR;
  }

  private fillTimes(job: SpanJob, first: number, last: number): boolean {
    const { slot, a, m, mode, gap, fixed, priced, taker } = job;
    const { home, weight, due } = this.state.model.activities[a]!;
    const { minuteMoved } = this.state.model.problem.prices;
    const costs = slot.costs[mode.length]!;
    const chosen = slot.chosen[mode.length]!;
    const perMinute = weight * minuteMoved;
    const atHome = this.state.moveCost(a, home.start, m);
    const latePrice = weight * this.state.latePrice;
    const unpushed = gap ? gap.to - mode.minutes : FAR;
    let found = false;
    for (let t = first; t <= last; t++) {
      const z = t - slot.lo;
      let cost = this.price[z]! + fixed + atHome + perMinute * Math.abs(t - home.start);
      if (t + mode.minutes > due) cost += latePrice * (t + mode.minutes - due);
      if (t > unpushed) cost += PUSH_PRICE * (t - unpushed);
      if (priced) cost += this.after[t - first]!;
      if (t === home.start && m === home.mode) slot.homeCost = Math.min(slot.homeCost, cost);
      if (cost < costs[z]!) {
        costs[z] = cost;
        chosen[z] = m;
        if (taker >= 0) this.slots[taker]!.arguments[mode.length]![z] = this.takerArguments[t - first]!;
        found = true;
      }
    }
    return found;
  }

  /** Adds the best of a child to every start of its parent. */
  private joinChild(members: readonly GroupMember[], k: number, c: number): void {
    const slot = this.slots[k]!;
    const { lengths } = this.state.model.activities[members[k]!.activity]!;
    for (let d = 0; d < lengths.length; d++) {
      const costs = slot.costs[d]!;
      this.slots[c]!.openArguments(lengths.length, slot.count);
      const best = this.bestOfChild(members, k, c, d, slot.lo, slot.count, null, this.slots[c]!.arguments[d]!);
      for (let z = 0; z < slot.count; z++) costs[z]! += best[z]!;
    }
  }

  private takerArguments = new Int32Array(0);

  /** Best of the child that takes the member off, within one gap: the unit must be free again before the gap ends. */
  private joinTaker(
    members: readonly GroupMember[],
    k: number,
    c: number,
    mode: Mode,
    from: number,
    to: number,
    gap: Gap | null,
    cleaning: Cleaning | null,
  ): void {
    const slot = this.slots[k]!;
    const activity = this.state.model.activities[members[k]!.activity]!;
    this.slots[c]!.openArguments(activity.lengths.length, slot.count);
    const count = to - from + 1;
    if (this.takerArguments.length < count) this.takerArguments = new Int32Array(2 * count);
    const link = this.state.model.links[activity.takenOffBy]!;
    const takeOff: TakeOff = { link, by: gap?.to ?? FAR, cleaning, cleanAfter: activity.cleanAfter };
    const best = this.bestOfChild(members, k, c, mode.length, from, count, takeOff, this.takerArguments);
    if (this.after.length < count) this.after = new Float64Array(2 * count);
    this.after.set(best.subarray(0, count));
  }

  private bestBuffer = new Float64Array(0);

  /**
   * For `count` starts of the parent from `from` on: the least cost of the child within the waits, and in `args` the
   * child's length and start that give it.
   */
  private bestOfChild(
    members: readonly GroupMember[],
    k: number,
    c: number,
    parentLength: number,
    from: number,
    count: number,
    takeOff: TakeOff | null,
    args: Int32Array,
  ): Float64Array {
    const child = this.slots[c]!;
    const { activities } = this.state.model;
    const parentMinutes = activities[members[k]!.activity]!.lengths[parentLength]!;
    const { lengths } = activities[members[c]!.activity]!;
    if (this.bestBuffer.length < count) this.bestBuffer = new Float64Array(2 * count);
    const best = this.bestBuffer;
    best.fill(Infinity, 0, count);
    for (let d = 0; d < lengths.length; d++) {
      const range = this.waits(members[c]!, parentMinutes, lengths[d]!);
      const costs = takeOff ? this.withCleaning(child, d, lengths[d]!, takeOff) : child.costs[d]!;
      const last = takeOff ? takeOff.by - takeOff.link.toOffset - (takeOff.link.toEnd ? lengths[d]! : 0) : FAR;
      this.slide(costs, child, d, from, count, range, last, best, args);
    }
    return best;
  }

  /** Sliding-window minimum of the child's costs over [start + lo, min(start + hi, last)]. */
  private slide(
    costs: Float64Array,
    child: Slot,
    d: number,
    from: number,
    count: number,
    range: { readonly lo: number; readonly hi: number },
    last: number,
    best: Float64Array,
    args: Int32Array,
  ): void {
    if (this.deque.length < child.count) this.deque = new Int32Array(2 * child.count);
    const { deque } = this;
    let head = 0;
    let tail = 0;
    let next = 0;
    for (let i = 0; i < count; i++) {
      const t = from + i;
      const upTo = Math.min(t + range.hi, last) - child.lo;
      for (; next <= upTo && next < child.count; next++) {
        const cost = costs[next]!;
        if (cost === Infinity) continue;
        while (tail > head && costs[deque[tail - 1]!]! >= cost) tail--;
        deque[tail++] = next;
      }
      const least = t + range.lo - child.lo;
      while (head < tail && deque[head]! < least) head++;
      if (head < tail && costs[deque[head]!]! < best[i]!) {
        best[i] = costs[deque[head]!]!;
        args[i] = d * ARGUMENT_STRIDE + deque[head]!;
      }
    }
  }

  private cleaningBuffer = new Float64Array(0);

  private withCleaning(child: Slot, d: number, minutes: number, takeOff: TakeOff): Float64Array {
    const { cleaning, link, cleanAfter } = takeOff;
    if (!cleaning) return child.costs[d]!;
    if (this.cleaningBuffer.length < child.count) this.cleaningBuffer = new Float64Array(2 * child.count);
    const sums = this.cleaningBuffer;
    const shift = link.toOffset + (link.toEnd ? minutes : 0) + cleanAfter;
    sums.fill(0, 0, child.count);
    this.addPrices(cleaning.draws, child.lo + shift, child.count, sums);
    const own = child.costs[d]!;
    for (let z = 0; z < child.count; z++) sums[z]! += own[z]!;
    return sums;
  }

  /** Price of the cleaning behind the member for each start, into `after`. */
  private priceCleaning(cleaning: Cleaning, shift: number, from: number, to: number, notBefore: number): void {
    const count = to - from + 1;
    if (this.after.length < count) this.after = new Float64Array(2 * count);
    this.after.fill(0, 0, count);
    if (notBefore > from + shift) {
      const constant = this.priceAt(cleaning.draws, notBefore);
      this.after.fill(constant, 0, count);
      return;
    }
    this.addPrices(cleaning.draws, from + shift, count, this.after);
  }

  /** What it costs to clean for the member in a gap, instead of for the activity that follows now. */
  private changeoverPrice(unit: number, a: number, gap: Gap): number {
    const { state } = this;
    if (gap.prev < 0) return 0;
    const now = gap.next < 0 ? null : state.cleaningBetween(unit, gap.prev, gap.next);
    const then = state.cleaningBetween(unit, gap.prev, a);
    if (now === then || ((now?.draws.length ?? 0) === 0 && (then?.draws.length ?? 0) === 0)) return 0;
    const at = state.freeAt[gap.prev]! + state.model.activities[gap.prev]!.cleanAfter;
    const before = state.cost();
    if (now) state.draw(now.draws, at, -1);
    if (then) state.draw(then.draws, at, 1);
    const change = state.cost() - before;
    if (then) state.draw(then.draws, at, -1);
    if (now) state.draw(now.draws, at, 1);
    return change;
  }

  private priceAt(draws: readonly Draw[], start: number): number {
    const one = new Float64Array(1);
    this.addPrices(draws, start, 1, one);
    return one[0]!;
  }

  private priceStarts(draws: readonly Draw[], lo: number, count: number): void {
    if (this.price.length < count) this.price = new Float64Array(2 * count);
    this.price.fill(0, 0, count);
    this.addPrices(draws, lo, count, this.price);
  }

  /** Adds to `into` what the draws would add to the overload for each of `count` starts from `lo` on. */
  private addPrices(draws: readonly Draw[], lo: number, count: number, into: Float64Array): void {
    const { state } = this;
    for (const d of draws) {
      const price = state.prices[d.resource]!;
      const excess = state.excess[d.resource]!;
      const q = d.amount;
      let left = lo + d.offset;
      let right = left + d.minutes;
      let sum = 0;
      for (let t = Math.max(0, left); t < right && t < excess.length; t++) {
        const over = excess[t]! + q;
        if (over > 0) sum += over < q ? over : q;
      }
      into[0]! += price * sum;
      const end = Math.min(count, excess.length - right);
      let i = 1;
      for (; i < end; i++, left++, right++) {
        const entering = excess[right]! + q;
        if (entering > 0) sum += entering < q ? entering : q;
        const leaving = excess[left]! + q;
        if (leaving > 0) sum -= leaving < q ? leaving : q;
        into[i]! += price * sum;
      }
      state.work += count + d.minutes;
    }
  }

  /** The cheapest combination; staying exactly where the planner's plan is doesn't pay the price of a moved batch. */
  private choose(group: Group): Placing | null {
    const { state } = this;
    const root = this.slots[0]!;
    let cost = Infinity;
    let at = -1;
    let length = 0;
    for (let d = 0; d < root.costs.length; d++) {
      const costs = root.costs[d]!;
      for (let z = 0; z < root.count; z++) {
        if (costs[z]! < cost) {
          cost = costs[z]!;
          at = z;
          length = d;
        }
      }
    }
    if (at < 0) return null;
    const placing = this.trace(group, at, length, cost);
    const price = state.isBatchMoved(group.batch) ? 0 : state.model.problem.prices.batchMoved;
    const home = this.homeCost(group);
    if (home <= cost + price) return this.homePlacing(group, home);
    return { ...placing, cost: cost + price };
  }

  private homeCost(group: Group): number {
    let sum = 0;
    for (let k = 0; k < group.members.length; k++) {
      const member = group.members[k]!;
      const taker = this.takerAmong(group.members, member);
      if (taker >= 0 && !this.homeFreesInTime(member)) return Infinity;
      sum += taker >= 0 ? this.homeCostWithTaker(group, k, taker) : this.slots[k]!.homeCost;
    }
    return sum;
  }

  /** `homeCost` of a member with a taker holds the taker's best too, so it is worked out again by itself. */
  private homeCostWithTaker(group: Group, k: number, taker: number): number {
    const { state } = this;
    const member = group.members[k]!;
    const { home, modes, cleanAfter } = state.model.activities[member.activity]!;
    const mode = modes[home.mode]!;
    if (this.slots[k]!.homeCost === Infinity) return Infinity;
    const own = this.priceAt(mode.priced, home.start) + state.placeCost(member.activity, home.start, home.mode);
    const gap = this.gapAt(mode.unit, home.start);
    if (!gap) return own;
    const cleaning = gap.next < 0 ? null : state.cleaningBetween(mode.unit, member.activity, gap.next);
    const moment = this.homeMomentOfTaker(group.members[taker]!.activity, member.activity);
    const clean = cleaning ? this.priceAt(cleaning.draws, Math.max(moment, home.start + mode.minutes) + cleanAfter) : 0;
    return own + clean + this.changeoverPrice(mode.unit, member.activity, gap);
  }

  private homeMomentOfTaker(taker: number, taken: number): number {
    const { activities, links } = this.state.model;
    const link = links[activities[taken]!.takenOffBy]!;
    const { home, modes } = activities[taker]!;
    return home.start + (link.toEnd ? modes[home.mode]!.minutes : 0) + link.toOffset;
  }

  private homeFreesInTime(member: GroupMember): boolean {
    const { state } = this;
    const { home, modes, takenOffBy } = state.model.activities[member.activity]!;
    const unit = modes[home.mode]!.unit;
    const gap = this.gapAt(unit, home.start);
    if (!gap || gap.next < 0) return true;
    const moment = this.homeMomentOfTaker(state.model.links[takenOffBy]!.to, member.activity);
    return moment <= state.starts[gap.next]! - state.changeover(unit, member.activity, gap.next);
  }

  private gapAt(unit: number, start: number): Gap | null {
    if (unit < 0) return null;
    const queue = this.state.queues[unit]!;
    const at = this.state.position(unit, start);
    return { prev: queue[at - 1] ?? -1, next: queue[at] ?? -1, from: -FAR, to: FAR, pushedTo: FAR };
  }

  private homePlacing(group: Group, cost: number): Placing {
    const homes = group.members.map((m) => this.state.model.activities[m.activity]!.home);
    return { cost, starts: homes.map((h) => h.start), modes: homes.map((h) => h.mode) };
  }

  private trace(group: Group, at: number, length: number, cost: number): Placing {
    const starts: number[] = [];
    const modes: number[] = [];
    const places: number[] = [at];
    const lengths: number[] = [length];
    group.members.forEach((member, k) => {
      const slot = this.slots[k]!;
      const z = places[k]!;
      starts.push(slot.lo + z);
      modes.push(slot.chosen[lengths[k]!]![z]!);
      for (const c of member.children) {
        const argument = this.slots[c]!.arguments[lengths[k]!]![z]!;
        lengths[c] = Math.floor(argument / ARGUMENT_STRIDE);
        places[c] = argument % ARGUMENT_STRIDE;
      }
    });
    return { cost, starts, modes };
  }
}

const ARGUMENT_STRIDE = 65_536;

interface Gap {
  readonly prev: number;
  readonly next: number;
  readonly from: number;
  /** When the unit must be free again; `pushedTo` if the activity behind may be pushed. */
  readonly to: number;
  readonly pushedTo: number;
}

interface TakeOff {
  readonly link: LinkArc;
  readonly by: number;
  readonly cleaning: Cleaning | null;
  readonly cleanAfter: number;
}

interface SpanJob {
  readonly slot: Slot;
  readonly a: number;
  readonly m: number;
  readonly mode: Mode;
  readonly gap: Gap | null;
  readonly fixed: number;
  readonly priced: boolean;
  readonly taker: number;
}

/** Working arrays of one member: costs by length and start, the mode chosen, and its own place for its parent's. */
class Slot {
  lo = 0;
  count = 0;
  homeCost = Infinity;
  limits: { lo: number; hi: number }[] = [];
  readonly costs: Float64Array[] = [];
  readonly chosen: Int16Array[] = [];
  readonly arguments: Int32Array[] = [];

  reset(lo: number, count: number, lengths: number): void {
    this.lo = lo;
    this.count = Math.max(0, count);
    this.homeCost = Infinity;
    this.costs.length = lengths;
    for (let d = 0; d < lengths; d++) {
      if ((this.costs[d]?.length ?? 0) < this.count) {
        this.costs[d] = new Float64Array(2 * this.count);
        this.chosen[d] = new Int16Array(2 * this.count);
      }
      this.costs[d]!.fill(Infinity, 0, this.count);
    }
  }

  openArguments(lengths: number, count: number): void {
    for (let d = 0; d < lengths; d++) {
      if ((this.arguments[d]?.length ?? 0) < count) {
        const grown = new Int32Array(2 * count);
        if (this.arguments[d]) grown.set(this.arguments[d]!);
        this.arguments[d] = grown;
      }
    }
  }
}
