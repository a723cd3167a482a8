import type { Activity } from '../../core/plant/activity';
import { drawnMode } from '../../core/plant/activity';
import type { SharedLimit } from '../../core/plant/plant';
import { limitUsage, usesByLimit, type LimitUsage } from '../../core/schedule/limitUse';
import type { Use } from '../../core/schedule/usage';
import { spanText, type Clock } from '../time';

/** A shared limit with its use, as strip and table show it. */
export interface ShownLimit {
  readonly limit: SharedLimit;
  readonly usage: LimitUsage;
  readonly uses: readonly Use[];
}

const NONE: readonly Use[] = [];

/** The shared limits with what is used of them by activities as drawn. */
export function shownLimits(
  limits: readonly SharedLimit[],
  drawn: readonly Activity[],
  horizonMin: number,
): readonly ShownLimit[] {
  if (limits.length === 0) return [];
  const byLimit = usesByLimit(drawn);
  return limits.map((limit) => {
    const uses = byLimit.get(limit.id) ?? NONE;
    return { limit, uses, usage: limitUsage(limit, uses, horizonMin) };
  });
}

/** '12', '0.25': what is counted in whole things shows no point. */
export function amountText(amount: number): string {
  return String(Math.round(amount * 100) / 100);
}

export interface LimitWords {
  readonly isOver: boolean;
  readonly figure: string;
  readonly line: string;
}

/** How a shared limit stands, in a figure and a line. */
export function limitWords({ usage, limit }: Pick<ShownLimit, 'usage' | 'limit'>, clock: Clock): LimitWords {
  const { greatest, over } = usage;
  if (!greatest) return { isOver: false, figure: 'not used', line: limit.unit };
  const worst = over.reduce<(typeof over)[number] | null>(
    (most, span) => (most === null || span.found - span.limit > most.found - most.limit ? span : most),
    null,
  );
  if (!worst) {
    const figure = `${amountText(greatest.amount)} of ${amountText(greatest.limit)}`;
    return { isOver: false, figure, line: `at most, ${clock.dayTime(greatest.minute)}` };
  }
  const minutes = over.reduce((sum, span) => sum + span.to - span.from, 0);
  return {
    isOver: true,
    figure: `${amountText(worst.found)} of ${amountText(worst.limit)}`,
    line: `over by ${amountText(worst.found - worst.limit)} from ${clock.dayTime(worst.from)}, ${spanText(minutes)} in all`,
  };
}

/** The top of a limit's strip: above the most that is used and the limit by a little. */
export function limitTop({ used, limit }: LimitUsage): number {
  let most = 1;
  for (const values of [used, limit])
    for (let t = 0; t < values.length; t++) most = Math.max(most, values[t] as number);
  return most * 1.12;
}

/** What an activity uses of the limits while it stands where it does; unplaced ones by minutes after their start. */
export function usesOf(activity: Activity, limits: readonly SharedLimit[], clock: Clock): string[] {
  const start = activity.placement?.start;
  return (drawnMode(activity)?.uses ?? []).flatMap(({ limitId, offsetMin, minutes, amount }) => {
    const limit = limits.find(({ id }) => id === limitId);
    if (!limit || amount === 0) return [];
    const span =
      start === undefined
        ? `for ${spanText(minutes)}`
        : `${clock.time(start + offsetMin)} to ${clock.time(start + offsetMin + minutes)}`;
    return [`${amountText(amount)} ${limit.unit}, ${span}`];
  });
}
