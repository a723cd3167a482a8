import type { Header } from '../plant/plant';
import { OVER_TOLERANCE_KG_PER_H } from './over';

/** A span in which a letdown passes less than it can hold the pressure with. */
export interface LowFlow {
  readonly from: number;
  readonly to: number;
  /** Least flow within it. [kg/h] */
  readonly leastKgPerH: number;
}

/** Where the letdown of a header passes some steam, but less than its least flow. [kg/h per minute] A shut valve is none. */
export function belowLeast({ feed }: Pick<Header, 'feed'>, load: ArrayLike<number>): LowFlow[] {
  const least = feed.kind === 'letdown' ? (feed.leastKgPerH ?? 0) : 0;
  if (least === 0) return [];
  const found: LowFlow[] = [];
  for (let t = 0; t < load.length; t++) {
    const flow = load[t] as number;
    if (flow <= OVER_TOLERANCE_KG_PER_H || flow >= least - OVER_TOLERANCE_KG_PER_H) continue;
    const last = found.at(-1);
    if (last?.to === t) found[found.length - 1] = { ...last, to: t + 1, leastKgPerH: Math.min(last.leastKgPerH, flow) };
    else found.push({ from: t, to: t + 1, leastKgPerH: flow });
  }
  return found;
}
