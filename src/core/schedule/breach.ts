/**
 * Limits that a plan passes. The four classes are separate types on purpose: only a steam breach may be agreed to;
 * a process breach has no override anywhere.
 */
interface SpanBreach {
  /** Stable within one judging: class, code and place. */
  readonly id: string;
  readonly from: number;
  readonly to: number;
  /** Activities concerned, those that lead to the place first. */
  readonly activityIds: readonly string[];
}

export interface SteamBreach extends SpanBreach {
  readonly class: 'steam';
  readonly code: 'overLimit' | 'stepTooSteep' | 'letdownOver';
  readonly headerId: string;
  /** Greatest rate over the limit, or height of the step. [kg/h] */
  readonly overKgPerH: number;
  /** Steam missing over the span. [kg] */
  readonly kg: number;
  /** Estimated fall of header pressure, a warning only; null where the boiler water is not known. [bar] */
  readonly sagBar: number | null;
}

export interface ProcessBreach extends SpanBreach {
  readonly class: 'process';
  readonly code:
    | 'ventsAtOnce'
    | 'steamOnsAtOnce'
    | 'waitSinceClosing'
    | 'initialTemperature'
    | 'waitTooLong'
    | 'unreleasedData'
    | 'allergenCleaning'
    | 'allergenRelease'
    | 'runningTooLong'
    | 'standingDirty'
    | 'ventPressure';
  /** Vents or steam ons counted, minutes waited, run or of cleaning, header pressure [bar g]; null where there is none. */
  readonly found: number | null;
  readonly limit: number | null;
  readonly ventGroupId: string | null;
}

export interface SharedBreach extends SpanBreach {
  readonly class: 'shared';
  readonly code: 'sharedLimitOver';
  readonly limitId: string;
  readonly found: number;
  readonly limit: number;
}

export interface TimeBreach extends SpanBreach {
  readonly class: 'time';
  readonly code:
    | 'unitClash'
    | 'unitNotEligible'
    | 'outsideShift'
    | 'waitTooShort'
    | 'waitTooLong'
    | 'cleaningTooShort'
    | 'late'
    | 'beforeEarliest'
    | 'afterLatest';
  readonly unitId: string | null;
  /** Minutes late, waited, or of cleaning there are. */
  readonly found: number | null;
  readonly limit: number | null;
}

export type Breach = SteamBreach | ProcessBreach | SharedBreach | TimeBreach;
