import type { OverMeasure } from './over';
import { NOTHING_OVER } from './over';

/** Differences below this are rounding. [kg, min, kg/h] */
const SAME = 1e-6;

/**
 * Which of two plans is judged better: negative where `a` is, positive where `b` is, 0 where neither. Worst running deficit
 * first, then the sum in kg, the minutes and the peak.
 */
export function judgeOrder(a: OverMeasure, b: OverMeasure): number {
  const differences = [
    a.worstDeficitKg - b.worstDeficitKg,
    a.kg - b.kg,
    a.minutes - b.minutes,
    a.peakOverKgPerH - b.peakOverKgPerH,
  ];
  return differences.find((difference) => Math.abs(difference) > SAME) ?? 0;
}

/** Several headers as one: greatest of the worst deficits and peaks, sum of the kg and minutes. */
export function overTogether(measures: readonly OverMeasure[]): OverMeasure {
  return measures.reduce<OverMeasure>(
    (sum, one) => ({
      worstDeficitKg: Math.max(sum.worstDeficitKg, one.worstDeficitKg),
      kg: sum.kg + one.kg,
      minutes: sum.minutes + one.minutes,
      peakOverKgPerH: Math.max(sum.peakOverKgPerH, one.peakOverKgPerH),
    }),
    NOTHING_OVER,
  );
}
