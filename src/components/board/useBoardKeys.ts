import { useEffect, type KeyboardEvent as ReactKeyboardEvent } from 'react';
import { useLatest } from './useLatest';
import type { Direction } from './navigate';

export interface KeyActions {
  readonly carryingByKeys: boolean;
  readonly mayEdit: boolean;
  readonly snapMinutes: number;
  readonly go: (direction: Direction) => void;
  readonly select: () => void;
  readonly lift: () => void;
  readonly stepMinutes: (minutes: number) => void;
  readonly stepUnits: (by: 1 | -1) => void;
  readonly drop: () => void;
  readonly cancel: () => void;
  readonly toggleFix: () => void;
  readonly takeOff: () => void;
  readonly undo: () => void;
  readonly redo: () => void;
  readonly clear: () => void;
}

const DIRECTIONS: Readonly<Record<string, Direction>> = {
  ArrowLeft: 'left',
  ArrowRight: 'right',
  ArrowUp: 'up',
  ArrowDown: 'down',
  Home: 'first',
  End: 'last',
};

/** True where keys belong to a field that is being typed in. */
function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement && target.closest('input, textarea, select, dialog[open], [contenteditable]') !== null
  );
}

/** Keys of the board: everything that the mouse does. Gives the handler for keys pressed on a block. */
export function useBoardKeys(actions: KeyActions): (event: ReactKeyboardEvent) => void {
  const latest = useLatest(actions);
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      const now = latest.current;
      const handled = now.carryingByKeys ? carryKey(event, now) : !isTyping(event.target) && historyKey(event, now);
      if (!handled) return;
      event.preventDefault();
      event.stopPropagation();
    };
    window.addEventListener('keydown', onKey, { capture: true });
    return () => window.removeEventListener('keydown', onKey, { capture: true });
  }, [latest]);

  return (event) => {
    if (event.ctrlKey || event.metaKey || event.altKey || latest.current.carryingByKeys) return;
    if (blockKey(event.key, latest.current)) event.preventDefault();
  };
}

function historyKey(event: KeyboardEvent, now: KeyActions): boolean {
  if (!(event.ctrlKey || event.metaKey) || event.altKey) return false;
  const key = event.key.toLowerCase();
  if (key === 'z' && !event.shiftKey) now.undo();
  else if ((key === 'z' && event.shiftKey) || key === 'y') now.redo();
  else return false;
  return true;
}

/** While an activity is carried by keys, every key is for it. */
function carryKey(event: KeyboardEvent, now: KeyActions): boolean {
  if (event.ctrlKey || event.metaKey) return true;
  const by = event.shiftKey || event.altKey ? 1 : now.snapMinutes;
  switch (event.key) {
    case 'ArrowLeft':
      now.stepMinutes(-by);
      return true;
    case 'ArrowRight':
      now.stepMinutes(by);
      return true;
    case 'PageUp':
      now.stepMinutes(-60);
      return true;
    case 'PageDown':
      now.stepMinutes(60);
      return true;
    case 'ArrowUp':
      now.stepUnits(-1);
      return true;
    case 'ArrowDown':
      now.stepUnits(1);
      return true;
    case 'Enter':
    case ' ':
      now.drop();
      return true;
    case 'Escape':
    case 'Tab':
      now.cancel();
      return true;
    default:
      return event.key.length === 1;
  }
}

function blockKey(key: string, now: KeyActions): boolean {
  const direction = DIRECTIONS[key];
  if (direction) {
    now.go(direction);
    return true;
  }
  if (key === ' ') now.select();
  else if (key === 'Escape') now.clear();
  else if (!now.mayEdit) return false;
  else if (key === 'Enter' || key.toLowerCase() === 'm') now.lift();
  else if (key.toLowerCase() === 'f') now.toggleFix();
  else if (key === 'Delete' || key === 'Backspace') now.takeOff();
  else return false;
  return true;
}
