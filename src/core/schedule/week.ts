import type { Activity, Link } from '../plant/activity';
import type { HeaderCapacity, PlantModel, UnitCalendar } from '../plant/plant';

/** A week to be judged or levelled: one readonly value, plain JSON, minutes from the week's first instant. */
export interface Week {
  /** 10,080; 10,020 or 10,140 in a week with a clock change. */
  readonly horizonMin: number;
  readonly plant: PlantModel;
  readonly calendars: readonly UnitCalendar[];
  readonly capacities: readonly HeaderCapacity[];
  readonly activities: readonly Activity[];
  readonly links: readonly Link[];
}
