import { uniformSpread, type StartSpread } from '@/core/header/spread/startSpread';

/** A uniform spread; throws where it can't be had. */
export function uniform(earlyMin: number, lateMin: number): StartSpread {
  const spread = uniformSpread(earlyMin, lateMin);
  if (!spread.ok) throw new Error(spread.error.message);
  return spread.value;
}
