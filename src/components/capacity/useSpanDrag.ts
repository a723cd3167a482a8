import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { dragDraft, nudgeDraft, type Draft, type DraftBounds, type Grip } from './draft';

interface Held {
  readonly start: Draft;
  readonly grip: Grip;
  readonly x: number;
  readonly y: number;
}

interface SpanDrag {
  /** Takes hold of a draft, or of a new one. */
  readonly hold: (event: PointerEvent<Element>, start: Draft, grip: Grip) => void;
  readonly move: (event: PointerEvent<Element>) => void;
  readonly release: (event: PointerEvent<Element>) => void;
  readonly key: (event: KeyboardEvent, draft: Draft, grip: Grip) => void;
}

/** A drag on the desk: a snapshot and where the hand came down; every move is worked out from both. */
export function useSpanDrag(
  perPx: { readonly minutes: number; readonly kgPerH: number },
  bounds: DraftBounds,
  onChange: (draft: Draft | null) => void,
  present: Draft | null,
): SpanDrag {
  const held = useRef<(Held & { readonly before: Draft | null }) | null>(null);

  const hold: SpanDrag['hold'] = (event, start, grip) => {
    if (event.button !== 0) return;
    event.preventDefault();
    event.stopPropagation();
    event.currentTarget.setPointerCapture(event.pointerId);
    if (event.currentTarget instanceof SVGElement) event.currentTarget.focus();
    held.current = { start, grip, x: event.clientX, y: event.clientY, before: present };
    onChange(dragDraft(start, grip, { minutes: 0, kgPerH: 0 }, bounds));
  };
  const move: SpanDrag['move'] = (event) => {
    if (!held.current) return;
    const { start, grip, x, y } = held.current;
    const minutes = (event.clientX - x) * perPx.minutes;
    // A hand that draws a span wavers; the level follows only once it is meant.
    const down = Math.abs(event.clientY - y) < 4 && grip === 'draw' ? 0 : event.clientY - y;
    onChange(dragDraft(start, grip, { minutes, kgPerH: -down * perPx.kgPerH }, bounds));
  };
  const release: SpanDrag['release'] = () => {
    held.current = null;
  };
  const key: SpanDrag['key'] = (event, draft, grip) => {
    if (event.key === 'Escape') {
      onChange(held.current ? held.current.before : null);
      held.current = null;
      return;
    }
    const nudged = nudgeDraft(draft, grip, event.key, event.shiftKey, bounds);
    if (!nudged) return;
    event.preventDefault();
    onChange(nudged);
  };
  return { hold, move, release, key };
}
