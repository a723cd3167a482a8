import { FAR, type LinkArc } from './model';
import type { State } from './state';

/** Starts that a push would lead to, for `State.shift`. */
export interface Push {
  readonly list: number[];
  readonly starts: number[];
}

/** A temporary order: the later activity starts at least `wait` after the start of the earlier. */
interface Order {
  readonly other: number;
  readonly wait: number;
}

/**
 * Shifts one activity and, in the same direction, whatever would otherwise be run into: the neighbour on its unit,
 * activities it is linked to, units that it frees, closed time, and temporary orders. Nothing is changed; the caller
 * applies the push. Orders on units stay as they are.
 */
export class Ripple {
  /** Give up when more activities than this would move. */
  greatest = 60;
  private readonly next: Int32Array;
  private readonly stamp: Int32Array;
  private run = 0;
  private readonly later: Order[][];
  private readonly earlier: Order[][];
  private ordered: number[] = [];
  /** Activities of the last push. */
  readonly pushed: number[] = [];
  private readonly stack: number[] = [];

  constructor(private readonly state: State) {
    const n = state.model.activities.length;
    this.next = new Int32Array(n);
    this.stamp = new Int32Array(n);
    this.later = Array.from({ length: n }, () => []);
    this.earlier = Array.from({ length: n }, () => []);
  }

  /** Start of an activity after the push that was last worked out. */
  startAfter(a: number): number {
    return this.stamp[a] === this.run ? this.next[a]! : this.state.starts[a]!;
  }

  /** Keeps `before` and `after` in order until `clearOrders`. */
  order(before: number, after: number, wait: number): void {
    this.later[before]!.push({ other: after, wait });
    this.earlier[after]!.push({ other: before, wait });
    this.ordered.push(before, after);
  }

  clearOrders(): void {
    for (const a of this.ordered) {
      this.later[a]!.length = 0;
      this.earlier[a]!.length = 0;
    }
    this.ordered = [];
  }

  /** Where everything would be if `a` moved by `minutes`; null if something can't give way. */
  push(a: number, minutes: number, pushLater = minutes > 0): Push | null {
    if (!this.tryPush(a, minutes, pushLater)) return null;
    return { list: this.pushed.slice(), starts: this.pushed.map((b) => this.next[b]!) };
  }

  /** The same without building the answer: `pushed` and `startAfter` hold until the next push. */
  tryPush(a: number, minutes: number, pushLater = minutes > 0): boolean {
    this.run++;
    this.pushed.length = 0;
    this.stack.length = 0;
    this.set(a, this.state.starts[a]! + minutes);
    let steps = 0;
    while (this.stack.length > 0) {
      this.state.work += 8;
      if (this.pushed.length > this.greatest || ++steps > 20 * this.greatest) return false;
      const b = this.stack.pop()!;
      if (!this.settle(b, pushLater)) return false;
      if (pushLater) this.pushLater(b);
      else this.pushEarlier(b);
    }
    for (const b of this.pushed) if (!this.keepsShift(b)) return false;
    return true;
  }

  private set(a: number, start: number): void {
    if (this.stamp[a] !== this.run) {
      this.stamp[a] = this.run;
      this.pushed.push(a);
    }
    this.next[a] = start;
    this.stack.push(a);
  }

  /** Onto open time and within its own bounds. */
  private settle(a: number, later: boolean): boolean {
    const activity = this.state.model.activities[a]!;
    if (!activity.movable || !this.state.placed[a]) return false;
    const start = this.state.fit(a, this.next[a]!, later);
    if (start < activity.earliest || start > activity.latest) return false;
    this.next[a] = start;
    return start + this.state.mode(a).minutes <= this.state.model.horizon;
  }

  /** Units that are taken off later than an activity's end must be free within the shift. */
  private keepsShift(a: number): boolean {
    const { state } = this;
    const activity = state.model.activities[a]!;
    if (activity.takenOffBy >= 0 && this.freeAfter(a) > state.shiftEnd(a, this.next[a]!)) return false;
    if (activity.frees.length === 0) return true;
    return activity.frees.every(
      (freed) => !state.placed[freed] || this.freeAfter(freed) <= state.shiftEnd(freed, this.startAfter(freed)),
    );
  }

  private atLeast(a: number, start: number): void {
    if (this.startAfter(a) < start) this.set(a, start);
  }

  private atMost(a: number, start: number): void {
    if (this.startAfter(a) > start) this.set(a, start);
  }

  private pushLater(a: number): void {
    const { state } = this;
    const { links } = state.model;
    const start = this.next[a]!;
    const activity = state.model.activities[a]!;
    for (const k of activity.links) {
      const link = links[k]!;
      if (!state.placed[link.from] || !state.placed[link.to]) continue;
      const base = state.linkBaseNow(link);
      if (link.from === a) this.atLeast(link.to, start + base + link.least);
      else if (link.greatest < FAR) this.atLeast(link.from, start - base - link.greatest);
    }
    for (const o of this.later[a]!) this.atLeast(o.other, start + o.wait);
    this.clearUnitBehind(a);
    for (const freed of activity.frees) if (state.placed[freed]) this.clearUnitBehind(freed);
  }

  /** The unit must be free of `a`, and clean, before the activity behind it starts. */
  private clearUnitBehind(a: number): void {
    const { state } = this;
    const unit = state.unitOf(a);
    if (unit < 0) return;
    const next = state.queues[unit]![state.positionOf(a) + 1];
    if (next === undefined) return;
    this.atLeast(next, this.freeAfter(a) + state.changeover(unit, a, next));
  }

  private freeAfter(a: number): number {
    const { state } = this;
    const end = this.startAfter(a) + state.mode(a).minutes;
    const by = state.model.activities[a]!.takenOffBy;
    if (by < 0) return end;
    const link = state.model.links[by]!;
    if (!state.placed[link.to]) return Math.max(end, state.freeAt[a]!);
    return Math.max(end, this.startAfter(link.to) + (state.momentTo(link) - state.starts[link.to]!));
  }

  private pushEarlier(a: number): void {
    const { state } = this;
    const { links } = state.model;
    const start = this.next[a]!;
    for (const k of state.model.activities[a]!.links) {
      const link = links[k]!;
      if (!state.placed[link.from] || !state.placed[link.to]) continue;
      const base = state.linkBaseNow(link);
      if (link.to === a) this.atMost(link.from, start - base - link.least);
      else if (link.greatest < FAR) this.atMost(link.to, start + base + link.greatest);
    }
    for (const o of this.earlier[a]!) this.atMost(o.other, start - o.wait);
    this.clearUnitBefore(a, start);
  }

  private clearUnitBefore(a: number, start: number): void {
    const { state } = this;
    const unit = state.unitOf(a);
    if (unit < 0) return;
    const at = state.positionOf(a);
    const prev = at > 0 ? state.queues[unit]![at - 1] : undefined;
    if (prev === undefined) return;
    const free = start - state.changeover(unit, prev, a);
    this.atMost(prev, free - state.mode(prev).minutes);
    const by = state.model.activities[prev]!.takenOffBy;
    if (by >= 0) this.takeOffBy(state.model.links[by]!, free);
  }

  private takeOffBy(link: LinkArc, free: number): void {
    const { state } = this;
    if (!state.placed[link.to]) return;
    this.atMost(link.to, free - (state.momentTo(link) - state.starts[link.to]!));
  }
}
