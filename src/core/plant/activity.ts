/** A stage run of a batch, a cleaning, a warm-up or an idle spell: whatever occupies a unit or draws steam. */
export type ActivityKind = 'stage' | 'cleaning' | 'warmUp' | 'idle';

/** How much a cleaning cleans, least first: anything but a rinse is a full clean. */
export type CleaningKind = 'rinse' | 'wash' | 'allergen';

export type Stage = 'prepare' | 'blanch' | 'cook' | 'fill' | 'retort' | 'pasteurise' | 'other';

/** What goes on while steam is drawn; the rules look for vents among them. */
export type PhaseKind =
  'warmUp' | 'run' | 'idle' | 'heatUp' | 'boilOff' | 'hold' | 'vent' | 'comeUp' | 'process' | 'cool' | 'rinse' | 'wash';

/** A steady draw on the minute grid: whole minutes after the activity's start. */
export interface Phase {
  readonly kind: PhaseKind;
  readonly offsetMin: number;
  readonly minutes: number;
  readonly steamKgPerH: number;
}

/** Use of a shared limit for a while after the activity's start. */
export interface LimitUse {
  readonly limitId: string;
  readonly offsetMin: number;
  readonly minutes: number;
  readonly amount: number;
}

/** How an activity runs on one eligible unit; duration and demand depend on the unit. */
export interface Mode {
  readonly unitId: string;
  /** Door to door. [min] */
  readonly minutes: number;
  readonly phases: readonly Phase[];
  readonly uses: readonly LimitUse[];
  /** The duty data that the phases were worked out from; null for typed profiles without one. */
  readonly dutyId: string | null;
  /** What the unit draws before this run; left out: nothing. */
  readonly between?: BetweenDraws;
  /** Phases instead of `phases` after a short gap, ascending in gap: the machine is still warm. Left out: always cold. */
  readonly warm?: readonly WarmPhases[];
  /** Hours of heating up, then a steady draw: levelling and slipping leave it where the planner put it. */
  readonly neverMoved?: boolean;
  /** Duty inputs that hang on the run's quantity and stand instead of the duty's own, such as `runMin`. */
  readonly sized?: Readonly<Record<string, number>>;
}

/** Draws of a machine that is kept hot, or shut and warmed up again, between the run before and this one. */
export interface BetweenDraws {
  readonly idleKgPerH: number;
  /** Warming up, offsets from its own start; it ends when the run begins. */
  readonly warmUp: readonly Phase[];
  /** A gap of at most this is idled; a longer one is shut and warmed up again. [min] */
  readonly idleUpToMin: number;
}

/** A run's phases where the unit has been free of the run before for at most so long. */
export interface WarmPhases {
  readonly gapUpToMin: number;
  readonly phases: readonly Phase[];
}

/** Where and when. A cleaning that follows starts `cleanAfterMin` minutes after the unit is free. */
export interface Placement {
  readonly unitId: string;
  /** Minutes since the week's first instant. */
  readonly start: number;
  readonly cleanAfterMin?: number;
}

/** `free` may be moved; `fixed` by the planner's hand; `started` and `done` by the floor. */
export type Fixing = 'free' | 'fixed' | 'started' | 'done';

/** Thermal-process data that an activity is planned with. */
export interface ProcessDataRef {
  readonly id: string;
  readonly document: string;
  readonly issue: string;
  readonly released: boolean;
}

export interface Activity {
  readonly id: string;
  readonly kind: ActivityKind;
  readonly stage: Stage | null;
  /** Of a cleaning that was planned by hand; left out of one: its length alone says what it stands in for. */
  readonly cleaning?: CleaningKind;
  /** Groups the stage runs that the solver places together. */
  readonly batchId: string | null;
  /** Short number that people call it by, such as "A107". */
  readonly code: string;
  readonly title: string;
  readonly productId: string | null;
  readonly familyId: string | null;
  readonly modes: readonly Mode[];
  /** null: not yet placed. */
  readonly placement: Placement | null;
  readonly fixing: Fixing;
  /** The unit is free at the activity's end, or when the named link's later activity has taken it off. */
  readonly occupiesUntil: 'end' | { readonly linkId: string };
  readonly earliestStart: number;
  readonly latestStart: number | null;
  /** The activity should have ended by then. */
  readonly due: number | null;
  /** Importance of its lateness and of leaving it in place; 1 is usual. */
  readonly weight: number;
  readonly processData: ProcessDataRef | null;
  /** Counts every change; a save names the one that it read. */
  readonly revision: number;
}

export type LinkRule = 'flow' | 'sinceClosing' | 'initialTemperature';

/** A moment of an activity: its start or its end, and so many minutes after. */
export interface LinkEnd {
  readonly activityId: string;
  readonly anchor: 'start' | 'end';
  readonly offsetMin: number;
}

/** The wait from one moment to another lies between least and greatest. Batches form nets of these. */
export interface Link {
  readonly id: string;
  readonly from: LinkEnd;
  readonly to: LinkEnd;
  readonly leastMin: number;
  /** null: as long as you like. */
  readonly greatestMin: number | null;
  readonly rule: LinkRule;
  /** What passing the greatest wait is: a process limit or a matter of time. */
  readonly greatestBreach: 'process' | 'time';
  /** Where the greatest wait comes from. */
  readonly source: string | null;
}

/** The mode for the unit an activity is placed on; undefined where it is not placed or the unit is not eligible. */
export function placedMode(activity: Activity): Mode | undefined {
  const unitId = activity.placement?.unitId;
  return activity.modes.find((mode) => mode.unitId === unitId);
}

/** The mode drawn and judged: that of the placed unit or, where it is not eligible, the first. */
export function drawnMode(activity: Activity): Mode | undefined {
  return placedMode(activity) ?? activity.modes[0];
}

/** True where levelling and slipping leave the activity where the planner has put it. */
export function isNeverMoved(activity: Activity): boolean {
  return drawnMode(activity)?.neverMoved === true;
}
