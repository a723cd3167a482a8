import type { KeyboardEvent, PointerEvent } from 'react';
import type { Clock } from '../time';
import type { Draft, Grip } from './draft';
import type { DeskScale } from './scale';
import type { DayOfWeek } from './wallTime';

/** What every part of the desk is given on which a span can be drawn. */
export interface DeskPart {
  readonly scale: DeskScale;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
  readonly nowMin: number;
  readonly horizonMin: number;
  readonly draft: Draft | null;
  readonly canSet: boolean;
  readonly onHold: (event: PointerEvent<Element>, start: Draft, grip: Grip) => void;
  readonly onMove: (event: PointerEvent<Element>) => void;
  readonly onRelease: (event: PointerEvent<Element>) => void;
  readonly onKey: (event: KeyboardEvent, draft: Draft, grip: Grip) => void;
}
