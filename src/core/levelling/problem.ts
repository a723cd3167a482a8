import type { LinkEnd, PhaseKind } from '../plant/activity';
import type { Interval } from '../time/interval';
import type { StepFunction } from '../time/stepFunction';

/** Version of the plain JSON form below. */
export const PROBLEM_VERSION = 1;

/**
 * `steam`: the load on a header or letdown, in kg/h; `process`: vents or steam-ons of a vent group, a count;
 * `shared`: any other limit across units, in its own unit.
 */
export type ResourceClass = 'steam' | 'process' | 'shared';

/** Capacity of a resource that limits nothing: it is there for its load alone. */
export const UNLIMITED = 1e12;

/** True where a resource limits nothing at any minute. */
export function isUnlimited(resource: ProblemResource): boolean {
  return resource.capacity.every((step) => step.value > UNLIMITED / 10);
}

/** Something that activities draw on together, with what is left for them at each minute. */
export interface ProblemResource {
  readonly id: string;
  readonly class: ResourceClass;
  /** Header, vent group or shared limit that it stands for. */
  readonly sourceId: string;
  /** What the plan's activities may draw: for a header its steam limit less the base load. */
  readonly capacity: StepFunction;
  /** Drawn by what is outside the plan; only for reporting peaks. */
  readonly baseLoad: StepFunction;
}

/** A draw on a resource from `offsetMin` after the start on, for `minutes`. */
export interface Use {
  readonly resourceId: string;
  readonly offsetMin: number;
  readonly minutes: number;
  readonly amount: number;
  /** The phase that draws; null for a use of a shared limit. */
  readonly phase: PhaseKind | null;
}

export interface ProblemMode {
  readonly unitId: string;
  readonly minutes: number;
  /** Those of a cold machine, where `warm` has others. */
  readonly uses: readonly Use[];
  /** Uses instead of `uses` after a gap of at most so long since the run before; ascending. Left out: none. */
  readonly warm?: readonly WarmUses[];
  /** Drawn before the run; left out: nothing. */
  readonly before?: UsesBefore;
}

/** What a run draws where its unit has been free of the run before for at most so long. */
export interface WarmUses {
  readonly gapUpToMin: number;
  readonly uses: readonly Use[];
}

/**
 * A machine kept hot between two runs, or warmed up again: by the gap since its unit is free and clean. Before the
 * first run on its unit it is warmed up.
 */
export interface UsesBefore {
  /** All through a gap that is idled. */
  readonly idle: readonly { readonly resourceId: string; readonly amount: number }[];
  readonly idleUpToMin: number;
  /** Offsets from the run's start, so less than 0. */
  readonly warmUp: readonly Use[];
}

export interface ProblemActivity {
  readonly id: string;
  /** Activities of one batch are moved and counted together. */
  readonly batchId: string;
  readonly familyId: string | null;
  /** A stored cleaning leaves no machine warm; left out: no cleaning. */
  readonly isCleaning?: boolean;
  /** Sorted by unit. */
  readonly modes: readonly ProblemMode[];
  /** Where the planner's plan has it. */
  readonly plan: { readonly unitId: string; readonly start: number };
  /** A fixed or running activity, or one outside the span: stays exactly there. */
  readonly movable: boolean;
  /** The unit is free at the activity's end, or at the link's later moment if that is later. */
  readonly takenOffBy: string | null;
  /** Between the unit's becoming free and the cleaning that follows. [min] */
  readonly cleanAfterMin: number;
  readonly earliestStart: number;
  readonly latestStart: number;
  readonly due: number | null;
  readonly weight: number;
}

/** Both ends are placed; bounds that the incoming plan passes are widened to what it has, so they can't get worse. */
export interface ProblemLink {
  readonly id: string;
  readonly from: LinkEnd;
  readonly to: LinkEnd;
  readonly leastMin: number;
  readonly greatestMin: number | null;
  /** The greatest wait as the process sets it; null where it is only a matter of time. */
  readonly processGreatestMin: number | null;
}

export interface ProblemUnit {
  readonly id: string;
  readonly open: readonly Interval[];
}

/** Cleaning between two families on some units, with its own draws from its first minute. */
export interface ProblemCleaning {
  readonly unitIds: readonly string[];
  readonly fromFamilyId: string;
  readonly toFamilyId: string;
  readonly minutes: number;
  readonly uses: readonly Use[];
}

/** Prices of changing the planner's plan; lateness and overload come before any of them. */
export interface ChangePrices {
  /** For each batch moved at all. */
  readonly batchMoved: number;
  /** For each minute that an activity's start moves. */
  readonly minuteMoved: number;
  /** For each activity put on another unit. */
  readonly unitChanged: number;
}

/** A levelling problem: plain JSON, sorted by id at the door, minutes from the week's first instant. */
export interface Problem {
  readonly version: typeof PROBLEM_VERSION;
  readonly horizonMin: number;
  readonly units: readonly ProblemUnit[];
  readonly cleaning: readonly ProblemCleaning[];
  readonly resources: readonly ProblemResource[];
  readonly activities: readonly ProblemActivity[];
  readonly links: readonly ProblemLink[];
  readonly prices: ChangePrices;
}

/** A start and a mode for each activity, in the problem's order. */
export interface Plan {
  readonly starts: readonly number[];
  readonly units: readonly string[];
}

/** The planner's own plan, which every move is measured from. */
export function planOf(problem: Problem): Plan {
  return {
    starts: problem.activities.map((a) => a.plan.start),
    units: problem.activities.map((a) => a.plan.unitId),
  };
}
