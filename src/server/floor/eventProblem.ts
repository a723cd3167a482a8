import type { Activity } from '@/core/plant/activity';
import type { FloorEventKind } from '@/core/shift/floorEvent';
import { badInput, conflict, type HttpProblem } from '../http/problem';
import { activityName, dayTime } from '../plans/words';
import type { WeekTime } from '../weeks/weekTime';
import { EVENT_WORDS, eventsOf, orderProblem, type Recorded } from './eventRules';

const TOLERANCE_MS = 60_000;

interface Reported {
  readonly activity: Activity;
  readonly event: FloorEventKind;
  readonly at: Date;
  readonly recorded: readonly Recorded[];
  readonly time: WeekTime;
  readonly now: Date;
}

/** Why an event can't be recorded, as the floor would be told; null where it can. */
export function eventProblem(reported: Reported): HttpProblem | null {
  const { activity, event, at, recorded, time, now } = reported;
  const name = activityName(activity);
  if (!eventsOf(activity.stage).includes(event)) {
    const message = `${name} has no “${EVENT_WORDS[event]}”; nothing was recorded.`;
    return badInput('EVENT-KIND', message, 'event');
  }
  if (at.getTime() > now.getTime() + TOLERANCE_MS) {
    return badInput('EVENT-TIME', 'That moment is still to come; nothing was recorded.', 'at');
  }
  if (at < time.firstInstant) {
    return badInput('EVENT-TIME', 'That moment is before this plan’s week; nothing was recorded.', 'at');
  }
  const wrong = orderProblem(activity.stage, recorded, event, at);
  if (!wrong) return null;
  if (wrong.kind === 'needsSteamOn') {
    return conflict('EVENT-ORDER', `${name}: record steam on before ${EVENT_WORDS[event]}. Nothing was recorded.`);
  }
  const was = `${EVENT_WORDS[wrong.recorded.event]} was recorded at ${dayTime(wrong.recorded.happenedAt, time.timeZone, now)}`;
  if (wrong.kind === 'beforePrevious') {
    return badInput('EVENT-TIME', `${name}: ${was}, after the moment given. Nothing was recorded.`, 'at');
  }
  return conflict(
    'EVENT-ORDER',
    `${name}: ${was} already; ${EVENT_WORDS[event]} can’t follow it. Nothing was recorded.`,
  );
}
