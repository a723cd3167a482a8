import type { Breach } from './breach';

/** Limits that no move may break: process limits and shared limits. */
export type HardBreach = Extract<Breach, { readonly class: 'process' | 'shared' }>;

/** Breaches of hard limits that are new or worse: the same limit passed by the same activities no further is neither. */
export function newlyBroken(before: readonly Breach[], after: readonly Breach[]): HardBreach[] {
  const known = new Map<string, number>();
  for (const breach of before.filter(isHard)) {
    const key = keyOf(breach);
    known.set(key, Math.max(known.get(key) ?? 0, sizeOf(breach)));
  }
  return after.filter(isHard).filter((breach) => sizeOf(breach) > (known.get(keyOf(breach)) ?? -1));
}

const isHard = (breach: Breach): breach is HardBreach => breach.class === 'process' || breach.class === 'shared';

function keyOf(breach: HardBreach): string {
  const place = breach.class === 'shared' ? breach.limitId : (breach.ventGroupId ?? '');
  return JSON.stringify([breach.code, place, [...breach.activityIds].sort()]);
}

/** How far a breach goes: the excess over its limit, over its time. */
function sizeOf(breach: HardBreach): number {
  const minutes = breach.to - breach.from;
  return breach.found === null || breach.limit === null ? minutes : Math.abs(breach.found - breach.limit) * minutes;
}
