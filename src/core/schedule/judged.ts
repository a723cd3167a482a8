import type { Activity } from '../plant/activity';
import { cleaningsOf, type Cleanings } from './changeovers';
import { gapDraws, runGaps, warmRuns, type GapDraw } from './gapDraws';
import { occupationsByUnit, type Occupation } from './occupation';
import type { Week } from './week';

/** A week with what follows from it, worked out once for all judging. */
export interface JudgedWeek extends Cleanings {
  readonly week: Week;
  /** Idle spells and warm-ups between the runs. */
  readonly gapDraws: readonly GapDraw[];
  /**
   * What draws steam and uses limits: stored activities, those after a short gap with the phases of a warm machine, and
   * the cleanings, idle spells and warm-ups that follow from the sequence.
   */
  readonly drawn: readonly Activity[];
  /** Occupations of the stored activities: what follows from a run occupies nothing. */
  readonly occupations: ReadonlyMap<string, readonly Occupation[]>;
}

/** Works out what follows from a week's sequence on the units. */
export function prepareWeek(week: Week): JudgedWeek {
  const occupations = occupationsByUnit(week.activities, week);
  const cleanings = cleaningsOf(week, occupations);
  const gaps = runGaps(week, occupations, cleanings.changeovers);
  const between = gapDraws(gaps);
  const warm = warmRuns(gaps);
  const drawn = [
    ...week.activities.map((activity) => warm.get(activity.id) ?? activity),
    ...cleanings.changeovers.map(({ cleaning }) => cleaning),
    ...between.map(({ activity }) => activity),
  ];
  return { week, ...cleanings, gapDraws: between, drawn, occupations };
}

/** A week's activities with what follows from its sequence: what draws steam and uses limits. */
export const drawnActivities = (week: Week): readonly Activity[] => prepareWeek(week).drawn;
