import { GapBook } from './gapBook';
import { FAR, linkBase, type Cleaning, type Draw, type LinkArc, type Mode, type Model } from './model';

/** Least price of a minute late, against 1 for a minute moved. */
export const LATE_PRICE = 20;

/**
 * The search's working plan: starts and modes, who follows whom on each unit, and the excess over each limit by
 * minute, kept up to date as activities are taken out and put back. Cleaning draws follow their predecessors; what hangs
 * on the gap before a run is kept by the gap book.
 */
export class State {
  readonly starts: Int32Array;
  readonly modes: Int32Array;
  readonly placed: Uint8Array;
  /** When the activity's unit is free of it. */
  readonly freeAt: Int32Array;
  /** By unit, activities in order of start. */
  readonly queues: number[][];
  /** By resource and minute: load less capacity. */
  readonly excess: Float64Array[];
  /** By resource: sum of what is over, amount times minutes. */
  readonly over: Float64Array;
  /** By resource: price of one unit of amount over for a minute. */
  readonly prices: Float64Array;
  /** Price of a minute late. */
  latePrice = LATE_PRICE;
  /** Minutes late times weight. */
  late = 0;
  /** What the changes of the plan cost, the price for each batch moved included. */
  change = 0;
  /** Rough count of elementary steps, to share the budget between kinds of moves without a clock. */
  work = 0;

  readonly gaps: GapBook;
  private readonly cleanings: (Cleaning | null)[];
  private readonly cleaningFrom: Int32Array;
  private readonly movedInBatch: Int32Array;

  constructor(readonly model: Model) {
    const n = model.activities.length;
    this.starts = new Int32Array(n);
    this.modes = new Int32Array(n);
    this.placed = new Uint8Array(n);
    this.freeAt = new Int32Array(n);
    this.queues = model.problem.units.map(() => []);
    this.excess = model.capacity.map((c) => c.map((v) => -v));
    this.over = new Float64Array(model.capacity.length);
    this.prices = new Float64Array(model.capacity.length);
    this.cleanings = new Array<Cleaning | null>(n).fill(null);
    this.cleaningFrom = new Int32Array(n);
    this.movedInBatch = new Int32Array(model.batchCount);
    this.gaps = new GapBook(this);
    this.resync();
  }

  /** Puts every activity where the given plan has it; only for an empty state. */
  load(starts: ArrayLike<number>, modes: ArrayLike<number>): void {
    for (const a of this.model.activities) this.insert(a.index, starts[a.index]!, modes[a.index]!);
  }

  /** The price of the whole plan under the present prices. */
  cost(): number {
    let sum = this.change + this.latePrice * this.late;
    for (let r = 0; r < this.over.length; r++) sum += this.prices[r]! * this.over[r]!;
    return sum;
  }

  mode(a: number): Mode {
    return this.model.activities[a]!.modes[this.modes[a]!]!;
  }

  unitOf(a: number): number {
    return this.mode(a).unit;
  }

  endOf(a: number): number {
    return this.starts[a]! + this.mode(a).minutes;
  }

  isMoved(a: number): boolean {
    const home = this.model.activities[a]!.home;
    return this.starts[a] !== home.start || this.modes[a] !== home.mode;
  }

  isBatchMoved(batch: number): boolean {
    return this.movedInBatch[batch]! > 0;
  }

  /** What one activity's place costs by itself: minutes moved, another unit, late. */
  placeCost(a: number, start: number, mode: number): number {
    const { weight, due, modes } = this.model.activities[a]!;
    const late = Math.max(0, start + modes[mode]!.minutes - due);
    return this.moveCost(a, start, mode) + weight * this.latePrice * late;
  }

  /** Minutes moved and another unit alone. */
  moveCost(a: number, start: number, mode: number): number {
    const { home, weight } = this.model.activities[a]!;
    const { minuteMoved, unitChanged } = this.model.problem.prices;
    return weight * (minuteMoved * Math.abs(start - home.start) + (mode === home.mode ? 0 : unitChanged));
  }

  cleaningBetween(unit: number, a: number, b: number): Cleaning | null {
    const { activities, cleaning, families } = this.model;
    const from = activities[a]!.family;
    const to = activities[b]!.family;
    return from < 0 || to < 0 || unit < 0 ? null : (cleaning[unit]![from * families + to] ?? null);
  }

  /** Minutes between the unit's becoming free of `a` and the earliest start of `b` behind it. */
  changeover(unit: number, a: number, b: number): number {
    const cleaning = this.cleaningBetween(unit, a, b);
    return cleaning ? this.model.activities[a]!.cleanAfter + cleaning.minutes : 0;
  }

  /** Position of the first activity in the unit's queue that starts at or after the minute. */
  position(unit: number, minute: number): number {
    const queue = this.queues[unit]!;
    let low = 0;
    let high = queue.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (this.starts[queue[middle]!]! < minute) low = middle + 1;
      else high = middle;
    }
    return low;
  }

  /** Position of a placed activity in its unit's queue. */
  positionOf(a: number): number {
    const queue = this.queues[this.unitOf(a)]!;
    let at = this.position(this.unitOf(a), this.starts[a]!);
    while (at < queue.length && queue[at] !== a) at++;
    return queue[at] === a ? at : queue.indexOf(a);
  }

  insert(a: number, start: number, mode: number): void {
    this.starts[a] = start;
    this.modes[a] = mode;
    this.placed[a] = 1;
    this.count(a, 1);
    this.freeAt[a] = this.freeMoment(a);
    const unit = this.unitOf(a);
    if (unit >= 0) {
      const at = this.position(unit, start);
      this.queues[unit]!.splice(at, 0, a);
      this.gaps.take(a);
      if (at > 0) this.refreshCleaning(this.queues[unit]![at - 1]!);
      this.refreshCleaning(a);
    } else this.gaps.take(a);
    this.refreshFreed(a);
  }

  remove(a: number): void {
    const unit = this.unitOf(a);
    this.gaps.give(a);
    if (unit >= 0) {
      const at = this.positionOf(a);
      this.queues[unit]!.splice(at, 1);
      this.setCleaning(a, null, 0);
      if (at > 0) this.refreshCleaning(this.queues[unit]![at - 1]!);
      else this.gaps.refreshFrom(unit, 0);
    }
    this.count(a, -1);
    this.placed[a] = 0;
  }

  /** Moves several placed activities to new starts on their units at once; their order on each unit may change. */
  shift(list: readonly number[], starts: readonly number[]): void {
    for (const a of list) {
      this.count(a, -1);
      this.gaps.give(a);
    }
    for (let i = 0; i < list.length; i++) this.starts[list[i]!] = starts[i]!;
    for (const a of list) {
      this.count(a, 1);
      this.freeAt[a] = this.freeMoment(a);
    }
    for (const a of list) this.restoreOrder(this.unitOf(a));
    for (const a of list) this.gaps.take(a);
    for (const a of list) {
      const unit = this.unitOf(a);
      if (unit >= 0) {
        const at = this.positionOf(a);
        if (at > 0) this.refreshCleaning(this.queues[unit]![at - 1]!);
        this.refreshCleaning(a);
      }
      this.refreshFreed(a);
    }
  }

  /** Moment of one end of a link under the present plan. */
  momentFrom(link: LinkArc): number {
    return (link.fromEnd ? this.endOf(link.from) : this.starts[link.from]!) + link.fromOffset;
  }

  momentTo(link: LinkArc): number {
    return (link.toEnd ? this.endOf(link.to) : this.starts[link.to]!) + link.toOffset;
  }

  linkBaseNow(link: LinkArc): number {
    return linkBase(link, this.mode(link.from).minutes, this.mode(link.to).minutes);
  }

  /** The latest that an activity may start for the sake of the units that it frees. */
  latestToFree(a: number, minutes: number): number {
    let latest = FAR;
    for (const freed of this.model.activities[a]!.frees) {
      if (!this.placed[freed]) continue;
      const link = this.model.links[this.model.activities[freed]!.takenOffBy]!;
      latest = Math.min(latest, this.freeBy(freed) - link.toOffset - (link.toEnd ? minutes : 0));
    }
    return latest;
  }

  /** When the unit must be free of an activity: for the next one, and for the end of its shift. */
  freeBy(a: number): number {
    const unit = this.unitOf(a);
    if (unit < 0) return FAR;
    const next = this.queues[unit]![this.positionOf(a) + 1];
    const forNext = next === undefined ? FAR : this.starts[next]! - this.changeover(unit, a, next);
    return Math.min(forNext, this.shiftEnd(a, this.starts[a]!));
  }

  /** End of the open span that an activity would run in; no bound where the plan itself has it outside. */
  shiftEnd(a: number, start: number): number {
    if (this.model.activities[a]!.homeOutsideShift) return FAR;
    const span = this.model.open[this.unitOf(a)]?.find(([from, to]) => from <= start && start < to);
    return span ? span[1] : FAR;
  }

  /** The span of a unit's calendar that holds an activity, or where it would next fit in the given direction. */
  fit(a: number, start: number, later: boolean): number {
    const activity = this.model.activities[a]!;
    const { unit, minutes } = this.mode(a);
    if (activity.homeOutsideShift && this.modes[a] === activity.home.mode && start === activity.home.start)
      return start;
    const open = this.model.open[unit] ?? [];
    if (later) {
      for (const [from, to] of open)
        if (to - minutes >= start) if (Math.max(start, from) + minutes <= to) return Math.max(start, from);
      return -1;
    }
    for (let i = open.length - 1; i >= 0; i--) {
      const [from, to] = open[i]!;
      const at = Math.min(start, to - minutes);
      if (at >= from) return at;
    }
    return -1;
  }

  /** Recomputes what is over from the excess, against drift of the running sums. */
  resync(): void {
    for (let r = 0; r < this.excess.length; r++) {
      const excess = this.excess[r]!;
      let sum = 0;
      for (let t = 0; t < this.model.horizon; t++) if (excess[t]! > 0) sum += excess[t]!;
      this.over[r] = sum;
    }
  }

  /** Adds (sign 1) or takes away (sign -1) draws that begin at a minute. */
  draw(draws: readonly Draw[], start: number, sign: number): void {
    for (const d of draws) {
      const excess = this.excess[d.resource]!;
      const amount = d.amount * sign;
      const from = Math.max(0, start + d.offset);
      const to = Math.min(excess.length, start + d.offset + d.minutes);
      let change = 0;
      for (let t = from; t < to; t++) {
        const before = excess[t]!;
        const after = before + amount;
        change += (after > 0 ? after : 0) - (before > 0 ? before : 0);
        excess[t] = after;
      }
      this.over[d.resource]! += change;
      this.work += d.minutes;
    }
  }

  /** Cleaning behind an activity as it draws now; `offset` counts from the activity's start. */
  cleaningOf(a: number): { readonly draws: readonly Draw[]; readonly offset: number } | null {
    const cleaning = this.cleanings[a];
    return cleaning ? { draws: cleaning.draws, offset: this.cleaningFrom[a]! - this.starts[a]! } : null;
  }

  private freeMoment(a: number): number {
    const end = this.endOf(a);
    const by = this.model.activities[a]!.takenOffBy;
    if (by < 0) return end;
    const link = this.model.links[by]!;
    if (!this.placed[link.to]) return Math.max(end, this.momentFrom(link) + Math.max(0, link.least));
    return Math.max(end, this.momentTo(link));
  }

  private refreshFreed(a: number): void {
    for (const freed of this.model.activities[a]!.frees) {
      if (!this.placed[freed]) continue;
      this.freeAt[freed] = this.freeMoment(freed);
      this.refreshCleaning(freed);
    }
  }

  private refreshCleaning(a: number): void {
    const unit = this.unitOf(a);
    if (unit < 0) return;
    const at = this.positionOf(a) + 1;
    const next = this.queues[unit]![at];
    const cleaning = next === undefined ? null : this.cleaningBetween(unit, a, next);
    this.setCleaning(a, cleaning, this.freeAt[a]! + this.model.activities[a]!.cleanAfter);
    this.gaps.refreshFrom(unit, at);
  }

  private setCleaning(a: number, cleaning: Cleaning | null, from: number): void {
    const before = this.cleanings[a] ?? null;
    if (before === cleaning && (cleaning === null || this.cleaningFrom[a] === from)) return;
    if (before) this.draw(before.draws, this.cleaningFrom[a]!, -1);
    if (cleaning) this.draw(cleaning.draws, from, 1);
    this.cleanings[a] = cleaning;
    this.cleaningFrom[a] = from;
  }

  private restoreOrder(unit: number): void {
    const queue = this.queues[unit];
    if (!queue) return;
    for (let i = 1; i < queue.length; i++) {
      if (this.starts[queue[i - 1]!]! <= this.starts[queue[i]!]!) continue;
      queue.sort((x, y) => this.starts[x]! - this.starts[y]! || x - y);
      for (const a of queue) this.refreshCleaning(a);
      return;
    }
  }

  private count(a: number, sign: number): void {
    const { home, weight, due, batch } = this.model.activities[a]!;
    const { batchMoved, minuteMoved, unitChanged } = this.model.problem.prices;
    const late = weight * Math.max(0, this.endOf(a) - due);
    this.late += sign * late;
    if (!this.isMoved(a)) return;
    const moved =
      minuteMoved * Math.abs(this.starts[a]! - home.start) + (this.modes[a] === home.mode ? 0 : unitChanged);
    this.change += sign * weight * moved;
    const before = this.movedInBatch[batch]!;
    this.movedInBatch[batch] = before + sign;
    if (before === 0 && sign > 0) this.change += batchMoved;
    if (before === 1 && sign < 0) this.change -= batchMoved;
  }
}
