import type { Placement } from '../plant/activity';

/** What holds a start where the proposal puts it, or pushed it from where it was. */
export interface MoveReason {
  readonly kind:
    'steam' | 'vents' | 'sharedLimit' | 'unit' | 'cleaning' | 'wait' | 'shift' | 'boiler' | 'due' | 'other';
  /** The other activity concerned, if one is. */
  readonly activityId: string | null;
  /** When it bites, minutes since the week's first instant. */
  readonly minute: number | null;
}

export interface ProposedMove {
  readonly activityId: string;
  /** The revision that the proposal was worked out from. */
  readonly revision: number;
  readonly from: Placement;
  readonly to: Placement;
  readonly reason: MoveReason;
}

/** Figures of a plan before or after levelling. */
export interface LevelFigures {
  /** Over the limit, all headers. [kg] */
  readonly overKg: number;
  readonly overMinutes: number;
  readonly worstDeficitKg: number;
  /** Greatest load by header. [kg/h] */
  readonly peakKgPerH: Readonly<Record<string, number>>;
  readonly lateMinutes: number;
  readonly lateActivities: number;
  readonly processBreaches: number;
  readonly sharedBreaches: number;
}

/** What levelling proposes: never an edit until a planner accepts it. Plain JSON. */
export interface LevellingProposal {
  readonly moves: readonly ProposedMove[];
  readonly before: LevelFigures;
  readonly after: LevelFigures;
  readonly movedBatches: number;
  readonly meanMoveMin: number;
  /** What stays over the limit and why, strongest first; empty where nothing does. */
  readonly unresolved: readonly {
    readonly headerId: string;
    readonly from: number;
    readonly to: number;
    readonly kg: number;
    readonly why: string;
  }[];
  /** Where something stays over: how little more would take it away, each tried. Left out: nothing was tried. */
  readonly relaxations?: readonly Relaxation[];
}

/** How little more would take away, or lessen, what stays over the limit. Plain JSON. */
export type Relaxation =
  | {
      readonly kind: 'moreSteam';
      readonly headerId: string;
      readonly from: number;
      readonly to: number;
      /** [kg/h] */
      readonly kgPerH: number;
    }
  | { readonly kind: 'unfix'; readonly activityId: string; readonly leavesKg: number }
  | { readonly kind: 'furtherMoves'; readonly minutes: number; readonly leavesKg: number }
  | { readonly kind: 'otherUnits'; readonly leavesKg: number };
