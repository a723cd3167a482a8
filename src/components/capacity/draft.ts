/** What the utilities lead is about to set: a value for a span, as a value that drags, keys and fields change alike. */
export type Subject =
  { readonly kind: 'limit'; readonly headerId: string } | { readonly kind: 'firing'; readonly boilerId: string };

export interface Draft {
  readonly subject: Subject;
  readonly fromMin: number;
  readonly toMin: number;
  /** kg/h of a limit; share of a boiler's full output, 0 to 1; null takes a set limit back. */
  readonly value: number | null;
}

/** What the hand has hold of. */
export type Grip = 'draw' | 'from' | 'to' | 'level' | 'span';

export interface DraftBounds {
  readonly horizonMin: number;
  readonly snapMin: number;
  readonly topKgPerH: number;
  /** The step in which a limit moves. */
  readonly snapKgPerH: number;
}

const LEAST_SPAN_MIN = 5;

const clamp = (value: number, least: number, most: number): number => Math.min(most, Math.max(least, value));
const snapTo = (value: number, step: number): number => Math.round(value / step) * step;

/**
 * The draft after a drag of so many minutes and kg/h since it was taken hold of: always from the draft as it was then,
 * so that nothing drifts. `draw` pulls the span open from where the hand came down.
 */
export function dragDraft(
  start: Draft,
  grip: Grip,
  moved: { readonly minutes: number; readonly kgPerH: number },
  bounds: DraftBounds,
): Draft {
  const { horizonMin, snapMin } = bounds;
  const to = (minute: number): number => clamp(snapTo(minute + moved.minutes, snapMin), 0, horizonMin);
  switch (grip) {
    case 'draw': {
      const other = to(start.fromMin);
      const [fromMin, toMin] = other < start.fromMin ? [other, start.fromMin] : [start.fromMin, other];
      return { ...start, fromMin, toMin: Math.max(toMin, fromMin + snapMin), value: levelled(start, moved, bounds) };
    }
    case 'from':
      return { ...start, fromMin: Math.min(to(start.fromMin), start.toMin - LEAST_SPAN_MIN) };
    case 'to':
      return { ...start, toMin: Math.max(to(start.toMin), start.fromMin + LEAST_SPAN_MIN) };
    case 'level':
      return { ...start, value: levelled(start, moved, bounds) };
    case 'span': {
      const length = start.toMin - start.fromMin;
      const fromMin = clamp(to(start.fromMin), 0, horizonMin - length);
      return { ...start, fromMin, toMin: fromMin + length };
    }
  }
}

function levelled(start: Draft, moved: { readonly kgPerH: number }, bounds: DraftBounds): number | null {
  if (start.subject.kind !== 'limit' || start.value === null) return start.value;
  if (moved.kgPerH === 0) return start.value;
  return clamp(snapTo(start.value + moved.kgPerH, bounds.snapKgPerH), 0, bounds.topKgPerH);
}

/** The draft after a press of an arrow key on a grip; null where the key does nothing there. */
export function nudgeDraft(draft: Draft, grip: Grip, key: string, large: boolean, bounds: DraftBounds): Draft | null {
  const minutes = large ? 60 : bounds.snapMin;
  const kgPerH = large ? 10 * bounds.snapKgPerH : bounds.snapKgPerH;
  const across = { ArrowLeft: -minutes, ArrowRight: minutes }[key];
  const down = { ArrowUp: kgPerH, ArrowDown: -kgPerH }[key];
  if (grip === 'level') return down === undefined ? null : dragDraft(draft, grip, { minutes: 0, kgPerH: down }, bounds);
  return across === undefined ? null : dragDraft(draft, grip, { minutes: across, kgPerH: 0 }, bounds);
}

/** A first draft where nothing has been chosen by hand: two hours from the next full hour. */
export function firstDraft(subject: Subject, nowMin: number, horizonMin: number, value: number | null): Draft {
  const fromMin = clamp(Math.ceil((nowMin + 1) / 60) * 60, 0, horizonMin - 120);
  return { subject, fromMin, toMin: fromMin + 120, value };
}
