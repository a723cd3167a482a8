import type { Fixing, Mode, Placement } from '../plant/activity';

/** What an edit can change of an activity. */
export interface PlanState {
  readonly placement: Placement | null;
  readonly fixing: Fixing;
}

/** One activity's change; `revision` is the one that was read. */
export interface Change {
  readonly activityId: string;
  readonly revision: number;
  readonly before: PlanState;
  readonly after: PlanState;
  /** Of an activity worked out anew from the library: its modes before and after. Only the server writes it. */
  readonly modes?: { readonly before: readonly Mode[]; readonly after: readonly Mode[] };
}

export type EditKind = 'place' | 'move' | 'takeOff' | 'fix' | 'slip' | 'level' | 'undo' | 'redo' | 'rework';

/** A change of the plan as a value; undo is its reverse. */
export interface Edit {
  readonly kind: EditKind;
  readonly changes: readonly Change[];
}
