import type { KeyboardEvent, PointerEvent } from 'react';
import { minuteAt, type TimeScale } from './timeScale';

interface Walk {
  readonly scale: TimeScale;
  /** Where one is; null: nowhere yet. */
  readonly pointedMin: number | null;
  readonly onPoint: (minute: number | null) => void;
}

/** Walking along the minutes of a drawn week: with the pointer, or with arrow and page keys; Escape leaves. */
export function minuteWalk({ scale, pointedMin, onPoint }: Walk) {
  const last = scale.horizonMin - 1;
  const at = pointedMin ?? Math.floor(scale.horizonMin / 2);
  const point = (event: PointerEvent<HTMLElement>): void => {
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    onPoint(Math.min(last, Math.floor(minuteAt(scale, x))));
  };
  const walk = (event: KeyboardEvent): void => {
    const by = { ArrowLeft: -1, ArrowRight: 1, PageUp: -60, PageDown: 60 }[event.key];
    if (event.key === 'Escape') return onPoint(null);
    if (by === undefined) return;
    event.preventDefault();
    const step = event.shiftKey ? by : by * (Math.abs(by) === 1 ? 5 : 1);
    onPoint(Math.max(0, Math.min(last, at + step)));
  };
  return {
    at,
    props: {
      role: 'slider',
      tabIndex: 0,
      'aria-valuemin': 0,
      'aria-valuemax': last,
      'aria-valuenow': at,
      onPointerMove: point,
      onPointerLeave: () => onPoint(null),
      onKeyDown: walk,
      onBlur: () => onPoint(null),
    },
  } as const;
}
