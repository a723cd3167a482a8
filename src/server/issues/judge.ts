import { zonedText } from '@/calendar/dates';
import { evaluateWeek } from '@/core/pipeline';
import type { Breach, ProcessBreach, SteamBreach } from '@/core/schedule/breach';
import { breachSentence, namesOf, type BreachSentence, type Clock } from '@/core/schedule/sentences';
import type { Week } from '@/core/schedule/week';
import { instantOf, type WeekTime } from '../weeks/weekTime';

/** What stands between a plan and the floor. */
export interface Verdict {
  /** Never overridden by anybody. */
  readonly process: readonly ProcessBreach[];
  /** Carried only under a utilities lead's agreement. */
  readonly steam: readonly SteamBreach[];
  /** In the floor's words. */
  sentences(breaches: readonly Breach[]): BreachSentence[];
}

/** Judges a week as it would go on the floor. */
export function judgeForFloor(week: Week, time: WeekTime): Verdict {
  const { breaches } = evaluateWeek(week);
  const done = new Set(week.activities.filter(({ fixing }) => fixing === 'done').map(({ id }) => id));
  // Data withdrawn after a load is done says nothing against the loads still to come.
  const past = (breach: ProcessBreach): boolean =>
    breach.code === 'unreleasedData' && breach.activityIds.every((id) => done.has(id));
  const names = namesOf(week);
  return {
    process: breaches.filter((breach) => breach.class === 'process').filter((breach) => !past(breach)),
    steam: breaches.filter((breach) => breach.class === 'steam'),
    sentences: (found) => found.map((breach) => breachSentence(breach, names, weekClock(time))),
  };
}

/** A minute of the week by the plant's clock: "Tue 06:40". */
export const weekClock =
  (time: WeekTime): Clock =>
  (minute) =>
    zonedText(instantOf(time, minute), time.timeZone, 'EEE HH:mm');
