import type { State } from './state';

/** A draw on a resource that is going on at a minute. */
export interface ActiveDraw {
  /** Activity that moves it. */
  readonly activity: number;
  /** From the activity's start. */
  readonly offset: number;
  readonly minutes: number;
  readonly from: number;
  readonly to: number;
}

/** Positions that a look back along a unit's queue may take: cleaning may outlast the activity that it follows. */
const LOOK_BACK = 3;

/** Draws on a resource at a minute, cleanings and warm-ups included; an idle spell has no start of its own to move. */
export function activeDraws(state: State, resource: number, minute: number): ActiveDraw[] {
  const found: ActiveDraw[] = [];
  for (let unit = 0; unit < state.queues.length; unit++) {
    const queue = state.queues[unit]!;
    const last = state.position(unit, minute + 1) - 1;
    const next = queue[last + 1];
    if (next !== undefined) collect(found, state, next, state.gaps.warmUpOf(next), 0, resource, minute);
    for (let i = last; i >= 0 && i > last - LOOK_BACK; i--) {
      const a = queue[i]!;
      collect(found, state, a, state.gaps.drawsOf(a), 0, resource, minute);
      const cleaning = state.cleaningOf(a);
      if (cleaning) collect(found, state, a, cleaning.draws, cleaning.offset, resource, minute);
    }
  }
  return found;
}

function collect(
  found: ActiveDraw[],
  state: State,
  a: number,
  draws: readonly { readonly resource: number; readonly offset: number; readonly minutes: number }[],
  shift: number,
  resource: number,
  minute: number,
): void {
  for (const d of draws) {
    if (d.resource !== resource) continue;
    const offset = d.offset + shift;
    const from = state.starts[a]! + offset;
    if (minute < from || minute >= from + d.minutes) continue;
    found.push({ activity: a, offset, minutes: d.minutes, from, to: from + d.minutes });
  }
}

/** Activities on units within so many minutes of a moment. */
export function activitiesAround(state: State, minute: number, within: number): number[] {
  const found: number[] = [];
  for (let unit = 0; unit < state.queues.length; unit++) {
    const queue = state.queues[unit]!;
    for (let i = state.position(unit, minute + within + 1) - 1; i >= 0; i--) {
      const a = queue[i]!;
      if (state.freeAt[a]! <= minute - within) break;
      found.push(a);
    }
  }
  return found;
}
