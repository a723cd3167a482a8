import type { Activity } from '../plant/activity';
import { changeovers, drawnActivities, type Changeover } from './changeovers';
import { occupationsByUnit, type Occupation } from './occupation';
import type { Week } from './week';

/** A week with what follows from it, worked out once for all judging. */
export interface JudgedWeek {
  readonly week: Week;
  readonly changeovers: readonly Changeover[];
  /** Stored activities and the cleanings that follow from the sequence. */
  readonly drawn: readonly Activity[];
  /** Occupations of the stored activities. */
  readonly occupations: ReadonlyMap<string, readonly Occupation[]>;
}

/** Works out the cleanings and occupations of a week. */
export function prepareWeek(week: Week): JudgedWeek {
  const found = changeovers(week);
  return {
    week,
    changeovers: found,
    drawn: drawnActivities(week, found),
    occupations: occupationsByUnit(week.activities, week),
  };
}
