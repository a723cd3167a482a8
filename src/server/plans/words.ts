import { differenceInHours } from 'date-fns';
import { zonedText } from '@/calendar/dates';
import type { ActivityKind, Stage } from '@/core/plant/activity';

const STAGE_WORDS: Readonly<Record<Stage, string>> = {
  prepare: 'Preparation',
  blanch: 'Blancher run',
  cook: 'Cook',
  fill: 'Filler run',
  retort: 'Retort load',
  pasteurise: 'Pasteuriser run',
  other: 'Run',
};

const KIND_WORDS: Readonly<Record<ActivityKind, string>> = {
  stage: 'Run',
  cleaning: 'Cleaning',
  warmUp: 'Warm-up',
  idle: 'Idling',
};

/** What people call an activity by: "Retort load A107". */
export function activityName(activity: {
  readonly kind: ActivityKind;
  readonly stage: Stage | null;
  readonly code: string;
}): string {
  const word = activity.kind === 'stage' && activity.stage ? STAGE_WORDS[activity.stage] : KIND_WORDS[activity.kind];
  return `${word} ${activity.code}`;
}

/** An instant by the plant's clock, "Tue 06:40"; with the date where it is six days or more from `near`. */
export function dayTime(instant: Date, timeZone: string, near: Date): string {
  const far = Math.abs(differenceInHours(instant, near)) >= 6 * 24;
  return zonedText(instant, timeZone, far ? 'd MMM yyyy HH:mm' : 'EEE HH:mm');
}

/** "A", "A and B", "A, B and 3 more": at most `most` are named. */
export function someOf(names: readonly string[], most = 3): string {
  const named = names.length <= most ? names : [...names.slice(0, most), `${names.length - most} more`];
  return named.length < 2 ? (named[0] ?? '') : `${named.slice(0, -1).join(', ')} and ${named.at(-1)}`;
}
