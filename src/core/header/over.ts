import { NOT_JUDGED_KG_PER_H } from './capacity';

/** A load is over when it passes the limit by more than this: rounding, not steam. [kg/h] */
export const OVER_TOLERANCE_KG_PER_H = 1e-3;

/** A span over the limit. */
export interface OverSpan {
  readonly from: number;
  readonly to: number;
  readonly peakMinute: number;
  /** Greatest rate over the limit. [kg/h] */
  readonly peakOverKgPerH: number;
  /** Steam over the limit. [kg] */
  readonly kg: number;
  /** Greatest running deficit within the span, what an earlier span left unrecovered included. [kg] */
  readonly worstDeficitKg: number;
  /** Estimated fall of header pressure at the worst; null where the stored steam is not known. [bar] */
  readonly sagBar: number | null;
}

/** What is judged of a load, worst running deficit first. */
export interface OverMeasure {
  readonly worstDeficitKg: number;
  readonly kg: number;
  readonly minutes: number;
  readonly peakOverKgPerH: number;
}

/** How a load stands against its limit over the week. */
export interface OverSummary extends OverMeasure {
  readonly spans: readonly OverSpan[];
  readonly sagBar: number | null;
  /** Minutes for which a limit is known. */
  readonly judgedMinutes: number;
}

/** Nothing over. */
export const NOTHING_OVER: OverMeasure = { worstDeficitKg: 0, kg: 0, minutes: 0, peakOverKgPerH: 0 };

/**
 * Spans of a load over its limit [kg/h per minute]. The running deficit grows by load less limit and recovers by limit
 * less load down to 0; the fall of pressure is the deficit over the steam that the boiler water gives up per bar.
 */
export function overLimit(
  load: ArrayLike<number>,
  limit: ArrayLike<number>,
  storedKgPerBar: ArrayLike<number> | null,
): OverSummary {
  const spans: OverSpan[] = [];
  let deficitKg = 0;
  let judgedMinutes = 0;
  let open: OpenSpan | null = null;
  for (let t = 0; t < load.length; t++) {
    const bound = limit[t] as number;
    if (bound < NOT_JUDGED_KG_PER_H) judgedMinutes++;
    const excess = (load[t] as number) - bound;
    if (excess > OVER_TOLERANCE_KG_PER_H) {
      deficitKg += excess / 60;
      open = open ?? newSpan(t);
      extend(open, t, excess, deficitKg);
    } else {
      if (excess < 0) deficitKg = Math.max(0, deficitKg + excess / 60);
      if (open) spans.push(closeSpan(open, t, storedKgPerBar));
      open = null;
    }
  }
  if (open) spans.push(closeSpan(open, load.length, storedKgPerBar));
  return { ...measure(spans), spans, sagBar: worstSag(spans), judgedMinutes };
}

interface OpenSpan {
  from: number;
  peakMinute: number;
  peakOverKgPerH: number;
  kg: number;
  worstDeficitKg: number;
  worstMinute: number;
}

function newSpan(from: number): OpenSpan {
  return { from, peakMinute: from, peakOverKgPerH: 0, kg: 0, worstDeficitKg: 0, worstMinute: from };
}

function extend(span: OpenSpan, t: number, excess: number, deficitKg: number): void {
  span.kg += excess / 60;
  if (excess > span.peakOverKgPerH) {
    span.peakOverKgPerH = excess;
    span.peakMinute = t;
  }
  if (deficitKg > span.worstDeficitKg) {
    span.worstDeficitKg = deficitKg;
    span.worstMinute = t;
  }
}

function closeSpan(span: OpenSpan, to: number, storedKgPerBar: ArrayLike<number> | null): OverSpan {
  const { from, peakMinute, peakOverKgPerH, kg, worstDeficitKg } = span;
  const stored = storedKgPerBar?.[span.worstMinute] ?? 0;
  const sagBar = stored > 0 ? worstDeficitKg / stored : null;
  return { from, to, peakMinute, peakOverKgPerH, kg, worstDeficitKg, sagBar };
}

function measure(spans: readonly OverSpan[]): OverMeasure {
  return spans.reduce<OverMeasure>(
    (sum, span) => ({
      worstDeficitKg: Math.max(sum.worstDeficitKg, span.worstDeficitKg),
      kg: sum.kg + span.kg,
      minutes: sum.minutes + span.to - span.from,
      peakOverKgPerH: Math.max(sum.peakOverKgPerH, span.peakOverKgPerH),
    }),
    NOTHING_OVER,
  );
}

function worstSag(spans: readonly OverSpan[]): number | null {
  const known = spans.flatMap((span) => (span.sagBar === null ? [] : [span.sagBar]));
  return known.length === 0 ? null : Math.max(...known);
}
