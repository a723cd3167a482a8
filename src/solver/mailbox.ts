import type { Exchange } from '../core/levelling/exchange';
import type { Assignment } from '../core/levelling/search';

/** The two sides of a mailbox: 0 starts from the planner's plan, 1 from nothing. */
export type Side = 0 | 1;

/** What a thread is handed of the mailbox; both sides share the buffer. */
export interface MailboxPart {
  readonly shared: SharedArrayBuffer;
  readonly side: Side;
  /** Room for so many activities. */
  readonly room: number;
  /** Each meeting waits for the other side, so that the same seed and iterations give the identical plan. */
  readonly inStep: boolean;
}

/** Numbers kept for each side: meetings held, how it ended, and how many activities its plans have. */
const MEETINGS = 0;
const ENDED = 1;
const LENGTH = 2;
const HEAD = 3;
/** Plans by side: those of even and odd meetings, and the last. */
const SLOTS = 3;
const LAST_SLOT = 2;
const STILL_THERE = 0;
const LEFT_A_PLAN = 1;
const GONE = 2;

const intsOf = (room: number): number => 2 * HEAD + 2 * SLOTS * 2 * room;

/** A new mailbox for two searches of a problem of at most `room` activities. */
export function newMailbox(room: number): SharedArrayBuffer {
  return new SharedArrayBuffer(4 * intsOf(room));
}

/** Marks a side as gone, so that the other never waits for it: its thread has died. */
export function markGone({ shared, side }: MailboxPart): void {
  const ints = new Int32Array(shared);
  Atomics.compareExchange(ints, side * HEAD + ENDED, STILL_THERE, GONE);
  Atomics.notify(ints, side * HEAD + MEETINGS);
}

/** One side of a mailbox. */
export function openMailbox({ shared, side, room, inStep }: MailboxPart): Exchange {
  const ints = new Int32Array(shared);
  const other: Side = side === 0 ? 1 : 0;
  const at = (of: Side, field: number): number => Atomics.load(ints, of * HEAD + field);
  const placeOf = (of: Side, slot: number): number => 2 * HEAD + (of * SLOTS + slot) * 2 * room;
  let seen = 0;

  const write = (slot: number, { starts, modes }: Assignment): void => {
    ints.set(starts, placeOf(side, slot));
    ints.set(modes, placeOf(side, slot) + room);
    Atomics.store(ints, side * HEAD + LENGTH, starts.length);
  };
  const read = (slot: number): Assignment => {
    const from = placeOf(other, slot);
    const length = at(other, LENGTH);
    return { starts: ints.slice(from, from + length), modes: ints.slice(from + room, from + room + length) };
  };
  const wake = (): void => void Atomics.notify(ints, side * HEAD + MEETINGS);
  const waitFor = (meeting: number): void => {
    while (at(other, MEETINGS) < meeting && at(other, ENDED) === STILL_THERE) {
      Atomics.wait(ints, other * HEAD + MEETINGS, at(other, MEETINGS), WAIT_MS);
    }
  };
  /** In step: what the other said at the same meeting, or at last where it held fewer. */
  const said = (meeting: number): Assignment | null => {
    waitFor(meeting);
    if (at(other, MEETINGS) >= meeting) return read(meeting % 2);
    return at(other, ENDED) === LEFT_A_PLAN ? read(LAST_SLOT) : null;
  };
  /** Not in step: the newest, unless it is written over meanwhile. */
  const newest = (): Assignment | null => {
    const meeting = at(other, MEETINGS);
    if (meeting === seen) return null;
    const found = read(meeting % 2);
    if (at(other, MEETINGS) !== meeting) return null;
    seen = meeting;
    return found;
  };

  return {
    startsFrom: side === 0 ? 'plan' : 'nothing',
    meet: (best) => {
      const meeting = at(side, MEETINGS) + 1;
      write(meeting % 2, best);
      Atomics.store(ints, side * HEAD + MEETINGS, meeting);
      wake();
      return inStep ? said(meeting) : newest();
    },
    close: (best) => {
      write(LAST_SLOT, best);
      Atomics.store(ints, side * HEAD + ENDED, LEFT_A_PLAN);
      wake();
      if (!inStep) return at(other, ENDED) === LEFT_A_PLAN ? read(LAST_SLOT) : newest();
      if (side === 1) return null;
      waitFor(Infinity);
      return at(other, ENDED) === LEFT_A_PLAN ? read(LAST_SLOT) : null;
    },
  };
}

/** A look at whether the other side is still there, should its waking call be missed. */
const WAIT_MS = 200;
