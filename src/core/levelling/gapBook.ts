import type { Draw, Mode } from './model';
import type { State } from './state';

const NOTHING = 0;
const IDLES = 1;
const WARMS_UP = 2;
/** The draws of a cold machine. */
const COLD = -1;
const NO_DRAWS: readonly Draw[] = [];

/**
 * What each activity draws itself, and before its start, as the gap before it has it: a machine still warm, kept hot, or
 * warmed up again. A gap changes with whatever is before it on the unit, so the state has it looked at again whenever
 * that changes.
 */
export class GapBook {
  private readonly drawn: Uint8Array;
  /** Position among the mode's warm draws. */
  private readonly warmth: Int8Array;
  private readonly before: Uint8Array;
  /** Length of what is idled. */
  private readonly idled: Int32Array;
  private readonly inUse: boolean;

  constructor(private readonly state: State) {
    const { activities } = state.model;
    this.drawn = new Uint8Array(activities.length);
    this.warmth = new Int8Array(activities.length).fill(COLD);
    this.before = new Uint8Array(activities.length);
    this.idled = new Int32Array(activities.length);
    this.inUse = activities.some((a) => a.modes.some(hangsOnGap));
  }

  /** An activity's own draws as they are. */
  drawsOf(a: number): readonly Draw[] {
    return ownDraws(this.state.mode(a), this.warmth[a]!);
  }

  /** The warm-up before an activity, offsets from its start; empty where there is none. */
  warmUpOf(a: number): readonly Draw[] {
    return this.before[a] === WARMS_UP ? this.state.mode(a).before!.warmUp : NO_DRAWS;
  }

  /** Draws a placed activity for the first time; it is in its queue. */
  take(a: number): void {
    const { state } = this;
    const mode = state.mode(a);
    this.drawn[a] = 1;
    this.warmth[a] = COLD;
    this.before[a] = NOTHING;
    if (this.inUse && mode.unit >= 0 && hangsOnGap(mode)) this.settle(a, mode, state.positionOf(a));
    state.draw(ownDraws(mode, this.warmth[a]), state.starts[a]!, 1);
    this.drawBefore(a, mode, 1);
  }

  /** Takes an activity's draws away; it stands where it was drawn. */
  give(a: number): void {
    const { state } = this;
    const mode = state.mode(a);
    state.draw(ownDraws(mode, this.warmth[a]!), state.starts[a]!, -1);
    this.drawBefore(a, mode, -1);
    this.drawn[a] = 0;
    this.before[a] = NOTHING;
  }

  /** Looks again at the gap of the first run from a queue position on: what is before it has changed. */
  refreshFrom(unit: number, at: number): void {
    if (!this.inUse) return;
    const { activities } = this.state.model;
    const queue = this.state.queues[unit]!;
    for (let i = at; i < queue.length; i++) {
      const a = queue[i]!;
      this.refresh(a, i);
      if (!activities[a]!.isCleaning) return;
    }
  }

  private refresh(a: number, at: number): void {
    const { state } = this;
    const mode = state.mode(a);
    if (this.drawn[a] === 0 || !hangsOnGap(mode)) return;
    const warmth = this.warmth[a]!;
    const before = this.before[a]!;
    const idled = this.idled[a]!;
    this.settle(a, mode, at);
    if (this.warmth[a] !== warmth) {
      state.draw(ownDraws(mode, warmth), state.starts[a]!, -1);
      state.draw(ownDraws(mode, this.warmth[a]!), state.starts[a]!, 1);
    }
    if (this.before[a] === before && (before !== IDLES || this.idled[a] === idled)) return;
    const [now, nowIdled] = [this.before[a]!, this.idled[a]!];
    this.before[a] = before;
    this.idled[a] = idled;
    this.drawBefore(a, mode, -1);
    this.before[a] = now;
    this.idled[a] = nowIdled;
    this.drawBefore(a, mode, 1);
  }

  /** Works out what the gap before a queue position asks for. */
  private settle(a: number, mode: Mode, at: number): void {
    const { state } = this;
    const queue = state.queues[mode.unit]!;
    const prev = at > 0 ? queue[at - 1]! : -1;
    let run = at - 1;
    while (run >= 0 && state.model.activities[queue[run]!]!.isCleaning) run--;
    const start = state.starts[a]!;
    const sinceRun = run < 0 ? -1 : start - state.freeAt[queue[run]!]!;
    this.warmth[a] = sinceRun < 0 ? COLD : mode.warm.findIndex((w) => sinceRun <= w.gapUpTo);
    this.before[a] = NOTHING;
    if (!mode.before) return;
    if (run < 0) this.before[a] = WARMS_UP;
    else {
      const sinceReady = start - state.freeAt[prev]! - state.changeover(mode.unit, prev, a);
      this.idled[a] = sinceReady;
      if (sinceReady > 0) this.before[a] = sinceReady <= mode.before.idleUpTo ? IDLES : WARMS_UP;
    }
  }

  private drawBefore(a: number, mode: Mode, sign: number): void {
    const { state } = this;
    if (this.before[a] === NOTHING || !mode.before) return;
    if (this.before[a] === WARMS_UP) return state.draw(mode.before.warmUp, state.starts[a]!, sign);
    const minutes = this.idled[a]!;
    const draws = mode.before.idle.map(({ resource, amount }) => ({ resource, amount, offset: -minutes, minutes }));
    state.draw(draws, state.starts[a]!, sign);
  }
}

const hangsOnGap = (mode: Mode): boolean => mode.before !== null || mode.warm.length > 0;

const ownDraws = (mode: Mode, warmth: number): readonly Draw[] =>
  warmth === COLD ? mode.draws : mode.warm[warmth]!.draws;
