import type { Interval } from '../time/interval';
import type { StepFunction } from '../time/stepFunction';
import type { CleaningKind, LimitUse, Phase } from './activity';

export type UnitKind = 'blancher' | 'kettle' | 'cooker' | 'filler' | 'retort' | 'pasteuriser' | 'other';

export interface Line {
  readonly id: string;
  readonly name: string;
}

/** What a batch or a run occupies; one at a time. */
export interface Unit {
  readonly id: string;
  readonly lineId: string;
  /** As painted on the door. */
  readonly name: string;
  readonly kind: UnitKind;
  readonly headerId: string | null;
  /** Retorts on one vent manifold and branch. */
  readonly ventGroupId: string | null;
}

/** Retorts whose vents share a manifold; the numbers are those that the distribution study validated. */
export interface VentGroup {
  readonly id: string;
  readonly name: string;
  readonly ventsAtOnce: number;
  readonly steamOnsAtOnce: number;
  /** A steam on counts for this long. [min] */
  readonly steamOnMinutes: number;
  /** Kept clear after a vent is planned to close. [min] */
  readonly marginMinutes: number;
  /** The study that validated the numbers, or "common practice, no source". */
  readonly source: string;
  /** The greatest load on the header that the study saw; null or left out: not said. [kg/h] */
  readonly studyGreatestLoadKgPerH?: number | null;
  /** The least header pressure that a vent was validated at; null or left out: not said. [bar g] */
  readonly leastHeaderBarG?: number | null;
}

export type HeaderFeed =
  | { readonly kind: 'boilers' }
  | {
      readonly kind: 'letdown';
      readonly fromHeaderId: string;
      readonly greatestKgPerH: number;
      /** Below this the valve does not hold the pressure; left out: 0. */
      readonly leastKgPerH?: number;
    };

/** Hot condensate of a higher header's users, collected at their pressure and flashed into a header. */
export interface FlashFeed {
  readonly fromHeaderId: string;
  /** Share of those users' steam that comes back as condensate to the vessel, 0 to 1. */
  readonly share: number;
  /** Pressure that the condensate comes from. [bar g] */
  readonly condensateBarG: number;
}

export interface Header {
  readonly id: string;
  readonly name: string;
  readonly pressureBarG: number;
  /** Dryness fraction x where wet or dry saturated; null where superheated. */
  readonly dryness: number | null;
  /** Superheat above saturation [K]; null where saturated. */
  readonly superheatK: number | null;
  readonly feed: HeaderFeed;
  /** null or left out: no condensate flashes into it. */
  readonly flash?: FlashFeed | null;
}

/** Hot water under pressure that carries steam over peaks. */
export interface Accumulator {
  readonly id: string;
  readonly name: string;
  readonly chargedFromHeaderId: string;
  readonly feedsHeaderId: string;
  readonly waterTonnes: number;
  readonly highBarG: number;
  readonly lowBarG: number;
  readonly greatestChargeKgPerH: number;
  readonly greatestDischargeKgPerH: number;
  /** Share of what it can give up that is in store at the week's first instant, 0 to 1. */
  readonly shareAtWeekStart: number;
}

/** Anything else that is limited across units: crates, cooling water, hoist, operators. */
export interface SharedLimit {
  readonly id: string;
  readonly name: string;
  readonly unit: string;
  readonly capacity: StepFunction;
}

/** What must happen on a unit between a run of one family and a run of another. */
export interface CleaningRule {
  readonly unitKind: UnitKind;
  readonly fromFamilyId: string;
  readonly toFamilyId: string;
  readonly minutes: number;
  readonly kind: CleaningKind;
  /** Its own steam, from the first minute of the cleaning. */
  readonly phases: readonly Phase[];
  readonly uses: readonly LimitUse[];
  /** The duty data that the phases were worked out from; null or left out: typed. */
  readonly dutyId?: string | null;
}

/** Judging rules that the plant sets. */
export interface PlantRules {
  /** An aid to the hand on the board, not to the solver. [min] */
  readonly snapMinutes: number;
  /** Part of the net export kept back, 0 to 1. */
  readonly reserveFraction: number;
  /** A step is too steep when the header would fall further than this. [bar] */
  readonly sagToleranceBar: number;
  /** Practice rules in force, released by the quality lead; left out: none is set. */
  readonly practice?: PracticeLimits;
}

/** Cleanliness as the plant's released practice rules have it; null: not set. [min] */
export interface PracticeLimits {
  /** A unit runs no longer than this between two full cleans. */
  readonly greatestRunningMin: number | null;
  /** A unit that has run is cleaned within this. */
  readonly greatestStandingDirtyMin: number | null;
  /** From the end of an allergen clean to the release of the unit. */
  readonly allergenReleaseMin: number | null;
}

/** A header over the week. `limit: null` reads "not judged", never "fits". */
export interface HeaderCapacity {
  readonly headerId: string;
  /** What the boilers in fire can send, at header conditions. [kg/h] */
  readonly exportKgPerH: StepFunction | null;
  readonly limitKgPerH: StepFunction | null;
  /** Losses and users outside the plan. [kg/h] */
  readonly baseLoadKgPerH: StepFunction;
  /** Greatest rise of the boilers in fire. [kg/h per min] */
  readonly greatestRiseKgPerHPerMin: StepFunction | null;
  /** Steam that the boiler water gives up per bar of falling pressure. [kg/bar] */
  readonly storedKgPerBar: StepFunction | null;
}

/** Everything about the plant that a week is judged with. Plain JSON. */
export interface PlantModel {
  readonly id: string;
  readonly name: string;
  readonly isDemo: boolean;
  readonly ambientBarA: number;
  readonly rules: PlantRules;
  readonly lines: readonly Line[];
  readonly units: readonly Unit[];
  readonly ventGroups: readonly VentGroup[];
  readonly headers: readonly Header[];
  readonly sharedLimits: readonly SharedLimit[];
  /** Left out: none. */
  readonly accumulators?: readonly Accumulator[];
  readonly cleaning: readonly CleaningRule[];
}

/** When a unit is crewed; an activity occupies it within one span. */
export interface UnitCalendar {
  readonly unitId: string;
  readonly open: readonly Interval[];
}

/** From the end of a cleaning until its unit may be used: the release after an allergen clean. [min] */
export function releaseAfterMin({ rules }: Pick<PlantModel, 'rules'>, { kind }: Pick<CleaningRule, 'kind'>): number {
  return kind === 'allergen' ? (rules.practice?.allergenReleaseMin ?? 0) : 0;
}
