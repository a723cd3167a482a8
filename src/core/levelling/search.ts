import { activeDraws, activitiesAround } from './active';
import { pullAndFlatten, takeBack, type ShiftLog } from './flatten';
import { Kernel, type Placing } from './kernel';
import { baselineOf, isBetter, keyOf, limitsOver, type Baseline, type Key } from './key';
import type { Model } from './model';
import { shuffle, wholeBelow, type Random } from './random';
import { Ripple } from './ripple';
import { LATE_PRICE, State } from './state';

/** Starts and modes by activity. */
export interface Assignment {
  readonly starts: Int32Array;
  readonly modes: Int32Array;
}

export interface Incumbent extends Assignment {
  readonly key: Key;
}

export interface SearchSettings {
  /** Temperature at the start and the end: a worsening of so much is still taken about one time in three. */
  readonly hot: number;
  readonly cold: number;
  /** Price at the start of drawing as much as a whole limit too much for a minute. */
  readonly overPrice: number;
  readonly pullShare: number;
  readonly rippleShare: number;
  readonly pushShare: number;
}

export const DEFAULT_SETTINGS: SearchSettings = {
  hot: 30,
  cold: 1,
  overPrice: 100,
  pullShare: 0.4,
  rippleShare: 0.3,
  pushShare: 0.6,
};

const OVER = 1e-6;
/** Iterations between two adjustments of the overload's price. */
const OSCILLATION = 50;
/** All that is over on one resource costs at most about this. */
const DEAREST_OVER = 20_000;
const DEAREST_LATE = 400;

/**
 * Large-neighbourhood search with simulated annealing: take a few batches out and put each back at its best place,
 * shift with pushing, or pull a span back to the plan and flatten it. The price of what is over rises while there is
 * something over and falls while there is nothing, so the search keeps close to the border of the limits.
 */
export class Search {
  readonly state: State;
  readonly baseline: Baseline;
  best: Incumbent;
  iterations = 0;
  private readonly kernel: Kernel;
  private readonly ripple: Ripple;
  private readonly movable: number[];
  private readonly lateBefore: number;
  private current: number;
  private temperature: number;
  private pullWork = 0;
  private progress = 0;

  constructor(
    readonly model: Model,
    private readonly random: Random,
    private readonly settings: SearchSettings = DEFAULT_SETTINGS,
  ) {
    this.state = new State(model);
    this.state.load(
      model.activities.map((a) => a.home.start),
      model.activities.map((a) => a.home.mode),
    );
    this.kernel = new Kernel(this.state);
    this.ripple = new Ripple(this.state);
    this.movable = model.activities.filter((a) => a.movable).map((a) => a.index);
    this.baseline = baselineOf(this.state);
    this.lateBefore = this.state.late;
    for (let r = 0; r < model.scale.length; r++) this.state.prices[r] = settings.overPrice / model.scale[r]!;
    this.temperature = settings.hot;
    this.best = this.snapshot(keyOf(this.state, this.baseline));
    this.current = this.state.cost();
  }

  /** Nothing to do: nothing may move, or nothing is over or late. */
  get idle(): boolean {
    if (this.movable.length === 0) return true;
    const { process, steamKg, shared } = limitsOver(this.state);
    return process + steamKg + shared <= OVER && this.state.late === 0 && this.state.change === 0;
  }

  /** A first answer: what is over is flattened from left to right. */
  flatten(): void {
    pullAndFlatten(this.state, this.ripple, this.random, { pull: null, budget: 20_000, noise: 0 });
    this.accept();
  }

  /** A start from nothing: all groups are taken out and put back in the plan's order at a stiff price of overload. */
  construct(): boolean {
    const { state } = this;
    const prices = state.prices.slice();
    for (let r = 0; r < prices.length; r++) state.prices[r] = (3 * this.settings.overPrice) / this.model.scale[r]!;
    const groups = this.model.groups.map((_, i) => i);
    const startOf = (g: number): number =>
      this.model.activities[this.model.groups[g]!.members[0]!.activity]!.home.start;
    groups.sort((a, b) => startOf(a) - startOf(b) || a - b);
    const kept = this.takeOut(groups);
    let done = 0;
    while (done < groups.length && this.putBack(groups[done]!, WIDENING)) done++;
    const ok = done === groups.length;
    if (!ok) {
      for (let i = done - 1; i >= 0; i--) this.removeGroup(groups[i]!);
      this.restore(groups, kept);
    }
    state.prices.set(prices);
    this.accept();
    return ok;
  }

  /** One step; `progress` from 0 to 1 sets the temperature. */
  step(progress: number): void {
    this.progress = progress;
    this.temperature = this.settings.hot * Math.pow(this.settings.cold / this.settings.hot, progress);
    this.iterations++;
    if (this.iterations % OSCILLATION === 0) this.oscillate();
    if (this.iterations % 4096 === 0) this.resync();
    if (this.pullWork <= this.settings.pullShare * this.state.work) this.pullStep();
    else if (this.random() < this.settings.rippleShare) this.rippleStep();
    else this.rebuildStep();
  }

  /** Goes on from another plan. */
  restart(from: Assignment): void {
    const { state } = this;
    for (const a of this.movable) state.remove(a);
    for (const a of this.movable) state.insert(a, from.starts[a]!, from.modes[a]!);
    this.resync();
  }

  /** Takes over a plan that was found elsewhere, if it is better. */
  offer(plan: Assignment): boolean {
    const before: Assignment = { starts: this.state.starts.slice(), modes: this.state.modes.slice() };
    this.restart(plan);
    const key = keyOf(this.state, this.baseline);
    const better = isBetter(key, this.best.key);
    if (better) this.best = this.snapshot(key);
    else this.restart(before);
    return better;
  }

  private resync(): void {
    this.state.resync();
    this.current = this.state.cost();
  }

  private snapshot(key: Key): Incumbent {
    return { starts: this.state.starts.slice(), modes: this.state.modes.slice(), key };
  }

  private oscillate(): void {
    const { state, model, settings } = this;
    const least = (settings.overPrice / 3) * (this.progress > 0.85 ? 10 : 1);
    for (let r = 0; r < state.prices.length; r++) {
      const costs = state.prices[r]! * state.over[r]!;
      if (state.over[r]! > OVER) {
        // A trace that costs less than what the temperature lets pass would stay for ever.
        if (costs < DEAREST_OVER) state.prices[r]! *= costs < 10 * this.temperature ? 1.4 : 1.1;
      } else if (state.prices[r]! * model.scale[r]! > least) state.prices[r]! *= 0.92;
    }
    if (state.late > this.lateBefore + OVER) state.latePrice = Math.min(DEAREST_LATE, state.latePrice * 1.1);
    else state.latePrice = Math.max(LATE_PRICE, state.latePrice * 0.95);
    this.current = this.state.cost();
  }

  /** True where the changed state is kept; then it may be a new incumbent. */
  private judge(): boolean {
    const cost = this.state.cost();
    if (cost > this.current - this.temperature * Math.log(1 - this.random() + 1e-300)) return false;
    this.accept();
    return true;
  }

  private accept(): void {
    this.current = this.state.cost();
    if (!this.mayBeBetter()) return;
    const key = keyOf(this.state, this.baseline);
    if (isBetter(key, this.best.key)) this.best = this.snapshot(key);
  }

  /** A cheap test before the whole key is worked out. */
  private mayBeBetter(): boolean {
    const { process, steamKg, shared } = limitsOver(this.state);
    const { key } = this.best;
    if (process !== key.process) return process < key.process;
    if (Math.abs(steamKg - key.steamKg) > OVER) return steamKg < key.steamKg || key.sharedWorse > 0;
    if (Math.abs(shared - key.shared) > OVER) return shared < key.shared;
    if (key.lateWorse > 0) return true;
    if (Math.abs(this.state.late - key.late) > OVER) return this.state.late < key.late;
    return this.state.change < key.change - OVER;
  }

  private pullStep(): void {
    const { state, random } = this;
    const before = state.work;
    const middle = random() < 0.6 ? state.starts[this.dearest(4)]! : state.starts[this.any()]!;
    const pull = { middle, within: 20 + wholeBelow(random, random() * 500 + 1), share: 0.3 + 0.7 * random() };
    const log = pullAndFlatten(state, this.ripple, random, { pull, budget: 60, noise: 0.8 * random() });
    if (!this.judge()) takeBack(state, log);
    this.pullWork += state.work - before;
  }

  private rippleStep(): void {
    const { state, random } = this;
    const pick = random();
    const a = pick < 0.5 ? this.dearest(3) : pick < 0.8 ? (this.atSomethingOver() ?? this.any()) : this.any();
    const push = this.ripple.push(a, this.someShift(a));
    if (!push) return;
    const log: ShiftLog = [{ list: push.list, starts: push.list.map((b) => state.starts[b]!) }];
    state.shift(push.list, push.starts);
    if (!this.judge()) takeBack(state, log);
  }

  private someShift(a: number): number {
    const { random } = this;
    const home = this.model.activities[a]!.home.start - this.state.starts[a]!;
    if (home !== 0 && random() < 0.6) {
      if (random() < 0.5) return home;
      return Math.trunc(home * random()) || Math.sign(home);
    }
    const by = 1 + Math.floor(random() * random() * 40);
    return random() < 0.5 ? -by : by;
  }

  private rebuildStep(): void {
    const groups = this.chooseGroups();
    if (groups.length === 0) return;
    const kept = this.takeOut(groups);
    const order = this.orderOf(groups);
    const undo: Undo[] = [];
    const push = this.random() < this.settings.pushShare;
    const radius = this.someRadius();
    let ok = true;
    for (const g of order) {
      if (!this.rebuild(g, radius, push, undo, kept.get(g)!)) {
        ok = false;
        break;
      }
    }
    if (ok && this.judge()) return;
    this.undo(undo);
    this.restore(groups, kept);
  }

  private rebuild(g: number, radius: number, push: boolean, undo: Undo[], kept: Kept): boolean {
    if (push && this.random() < 0.7 && this.putBackPushing(g, radius, undo)) return true;
    const widening = WIDENING.filter((r) => r > radius);
    if (this.putBack(g, [radius, ...widening]) || this.putBackAround(g, kept.starts)) {
      undo.push({ group: g, log: null });
      return true;
    }
    return false;
  }

  /** Into a place that overlaps what follows, which is then pushed on. */
  private putBackPushing(g: number, radius: number, undo: Undo[]): boolean {
    const group = this.model.groups[g]!;
    const push = 10 + Math.floor(this.random() * this.random() * 130);
    const placing = this.kernel.best(group, { radius, centres: null, push });
    if (!placing) return false;
    this.place(g, placing);
    const log: ShiftLog = [];
    const greatest = this.ripple.greatest;
    this.ripple.greatest = 150;
    let ok = true;
    for (const { activity } of group.members) {
      const pushed = this.ripple.push(activity, 0, true);
      if (!pushed) {
        ok = false;
        break;
      }
      const before = pushed.list.map((a) => this.state.starts[a]!);
      if (pushed.list.length === 1 && before[0] === pushed.starts[0]) continue;
      log.push({ list: pushed.list, starts: before });
      this.state.shift(pushed.list, pushed.starts);
    }
    this.ripple.greatest = greatest;
    if (ok) {
      undo.push({ group: g, log });
      return true;
    }
    takeBack(this.state, log);
    this.removeGroup(g);
    return false;
  }

  private putBack(g: number, radii: readonly number[]): boolean {
    for (const radius of radii) {
      const placing = this.kernel.best(this.model.groups[g]!, { radius, centres: null, push: 0 });
      if (!placing) continue;
      this.place(g, placing);
      return true;
    }
    return false;
  }

  private putBackAround(g: number, centres: readonly number[]): boolean {
    const placing = this.kernel.best(this.model.groups[g]!, { radius: 360, centres, push: 0 });
    if (!placing) return false;
    this.place(g, placing);
    return true;
  }

  private place(g: number, placing: Placing): void {
    this.model.groups[g]!.members.forEach((m, k) => {
      this.state.insert(m.activity, placing.starts[k]!, placing.modes[k]!);
    });
  }

  private removeGroup(g: number): void {
    const { members } = this.model.groups[g]!;
    for (let k = members.length - 1; k >= 0; k--) this.state.remove(members[k]!.activity);
  }

  private takeOut(groups: readonly number[]): Map<number, Kept> {
    const kept = new Map<number, Kept>();
    for (const g of groups) {
      const activities = this.model.groups[g]!.members.map((m) => m.activity);
      kept.set(g, {
        starts: activities.map((a) => this.state.starts[a]!),
        modes: activities.map((a) => this.state.modes[a]!),
      });
    }
    for (const g of groups) this.removeGroup(g);
    return kept;
  }

  private restore(groups: readonly number[], kept: ReadonlyMap<number, Kept>): void {
    for (const g of groups) {
      const { starts, modes } = kept.get(g)!;
      this.place(g, { cost: 0, starts, modes });
    }
  }

  /** Strictly in reverse order: a push may have moved what was put back before it. */
  private undo(undo: readonly Undo[]): void {
    for (let i = undo.length - 1; i >= 0; i--) {
      const { group, log } = undo[i]!;
      if (log) takeBack(this.state, log);
      this.removeGroup(group);
    }
  }

  private orderOf(groups: readonly number[]): number[] {
    const order = [...groups];
    const pick = this.random();
    if (pick < 0.5) shuffle(this.random, order);
    else {
      const rank = pick < 0.75 ? this.planned : this.due;
      order.sort((a, b) => rank(a) - rank(b) || a - b);
    }
    return order;
  }

  private readonly planned = (g: number): number =>
    this.model.activities[this.model.groups[g]!.members[0]!.activity]!.home.start;

  private readonly due = (g: number): number =>
    Math.min(...this.model.groups[g]!.members.map((m) => this.model.activities[m.activity]!.due));

  private someRadius(): number {
    const { random } = this;
    if (random() < 0.5) return 90;
    if (random() < 0.6) return 240;
    return random() < 0.8 ? 600 : 1440;
  }

  private any(): number {
    return this.movable[wholeBelow(this.random, this.movable.length)]!;
  }

  /** Of a few at random, the activity whose place costs most. */
  private dearest(tries: number): number {
    const { state } = this;
    let chosen = -1;
    let most = -1;
    for (let i = 0; i < tries; i++) {
      const a = this.any();
      const cost = state.placeCost(a, state.starts[a]!, state.modes[a]!);
      if (cost > most) {
        most = cost;
        chosen = a;
      }
    }
    return chosen;
  }

  private atSomethingOver(): number | null {
    const over = this.somethingOver();
    if (!over) return null;
    const active = activeDraws(this.state, over.resource, over.minute).map((d) => d.activity);
    const movable = active.filter((a) => this.model.activities[a]!.movable);
    return movable.length === 0 ? null : movable[wholeBelow(this.random, movable.length)]!;
  }

  private somethingOver(): { minute: number; resource: number } | null {
    const { state, random } = this;
    const resources: number[] = [];
    for (let r = 0; r < state.over.length; r++) if (state.over[r]! > OVER) resources.push(r);
    if (resources.length === 0) return null;
    const resource = resources[wholeBelow(random, resources.length)]!;
    const excess = state.excess[resource]!;
    const from = wholeBelow(random, this.model.horizon);
    for (let i = 0; i < this.model.horizon; i++) {
      const minute = (from + i) % this.model.horizon;
      if (excess[minute]! > OVER) return { minute, resource };
    }
    return null;
  }

  /** Which groups to take out: around something over, around a dear place, around any activity, or a run on a unit. */
  private chooseGroups(): number[] {
    const { random, state } = this;
    const count = 2 + wholeBelow(random, 5) + (random() < 0.1 ? wholeBelow(random, 8) : 0);
    const pick = random();
    const chosen = new Set<number>();
    const over = pick < 0.7 ? this.somethingOver() : null;
    if (over) {
      const active = activeDraws(state, over.resource, over.minute).map((d) => d.activity);
      shuffle(random, active);
      this.addGroups(chosen, active, 1 + wholeBelow(random, 3));
      this.addAround(chosen, over.minute, 60 + wholeBelow(random, 120), count);
    } else if (pick < 0.55) {
      const a = this.dearest(4);
      this.addGroups(chosen, [a], 1);
      const inside = wholeBelow(random, state.mode(a).minutes + 1);
      const at = (random() < 0.5 ? this.model.activities[a]!.home.start : state.starts[a]!) + inside;
      this.addAround(chosen, at, 20 + wholeBelow(random, 100), count);
    } else if (pick < 0.8) {
      const a = this.any();
      this.addGroups(chosen, [a], 1);
      const at = state.starts[a]! + wholeBelow(random, state.mode(a).minutes + 1);
      this.addAround(chosen, at, 30 + wholeBelow(random, 150), count);
    } else {
      const queue = state.queues[wholeBelow(random, state.queues.length)]!;
      const from = wholeBelow(random, queue.length + 1);
      this.addGroups(chosen, queue.slice(from, from + 5), Math.min(count, 5));
    }
    return [...chosen];
  }

  private addAround(chosen: Set<number>, minute: number, within: number, count: number): void {
    const around = activitiesAround(this.state, minute, within);
    shuffle(this.random, around);
    this.addGroups(chosen, around, count);
  }

  private addGroups(chosen: Set<number>, activities: readonly number[], upTo: number): void {
    for (const a of activities) {
      if (chosen.size >= upTo) return;
      const { group } = this.model.activities[a]!;
      if (group >= 0) chosen.add(group);
    }
  }
}

/** Half-widths that are tried one after another. [min] */
const WIDENING = [90, 270, 810, 1440];

interface Kept {
  readonly starts: readonly number[];
  readonly modes: readonly number[];
}

interface Undo {
  readonly group: number;
  readonly log: ShiftLog | null;
}
