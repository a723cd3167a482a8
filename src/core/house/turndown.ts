/** Boilers in fire that the load is too small for: they cycle, purge after purge. */
import { toMinutes, type StepFunction } from '../time/stepFunction';

/** A boiler as far as its turndown is concerned. */
export interface TurndownBoiler {
  readonly id: string;
  /** Net export when fully lit. [kg/h] */
  readonly netKgPerH: number;
  /** Greatest over least export. */
  readonly turndown: number;
  /** Share of full export that can leave, 0 where not ready. */
  readonly readyShare: StepFunction;
  /** From lit to export after a short stop. [min] */
  readonly minutesBack: number;
}

/** A span in which the load is under what the boilers in fire can turn down to. */
export interface TurndownSpan {
  readonly from: number;
  readonly to: number;
  /** The least load within it. [kg/h] */
  readonly leastLoadKgPerH: number;
  readonly greatestLoadKgPerH: number;
  /** Sum of the least exports of the boilers in fire, the greatest within the span. [kg/h] */
  readonly leastExportKgPerH: number;
  /** A boiler that could be shut meanwhile; null: none. */
  readonly couldShutId: string | null;
}

/** A boiler is shut for at least so many times the minutes that it takes to come back: common practice, no source. */
const WORTH_SHUTTING = 2;

interface BoilerMinutes {
  readonly boiler: TurndownBoiler;
  readonly share: Float64Array;
}

/**
 * Spans of a load per minute [kg/h] under the sum of the least exports (export / turndown) of the boilers that are ready.
 * A boiler could be shut where the span is at least twice as long as its way back and the others still carry the load
 * with the reserve kept; of several the one whose least export is the greatest.
 */
export function belowTurndown(
  load: ArrayLike<number>,
  boilers: readonly TurndownBoiler[],
  reserveFraction: number,
): TurndownSpan[] {
  const minutes = boilers.map((boiler) => ({ boiler, share: toMinutes(boiler.readyShare, load.length) }));
  const found: Under[] = [];
  let isOpen = false;
  for (let t = 0; t < load.length; t++) {
    const drawn = load[t] as number;
    const least = leastExportAt(minutes, t);
    const last = found.at(-1);
    if (drawn >= least) isOpen = false;
    else if (isOpen && last) found[found.length - 1] = extended(last, drawn, least);
    else {
      found.push({ from: t, to: t + 1, leastLoadKgPerH: drawn, greatestLoadKgPerH: drawn, leastExportKgPerH: least });
      isOpen = true;
    }
  }
  return found.map((span) => ({ ...span, couldShutId: couldShut(span, minutes, reserveFraction) }));
}

type Under = Omit<TurndownSpan, 'couldShutId'>;

/** The span a minute longer. */
const extended = (span: Under, drawn: number, least: number): Under => ({
  from: span.from,
  to: span.to + 1,
  leastLoadKgPerH: Math.min(span.leastLoadKgPerH, drawn),
  greatestLoadKgPerH: Math.max(span.greatestLoadKgPerH, drawn),
  leastExportKgPerH: Math.max(span.leastExportKgPerH, least),
});

const leastOf = ({ netKgPerH, turndown }: TurndownBoiler): number => netKgPerH / turndown;

function leastExportAt(minutes: readonly BoilerMinutes[], t: number): number {
  return minutes.reduce((sum, { boiler, share }) => ((share[t] as number) > 0 ? sum + leastOf(boiler) : sum), 0);
}

function couldShut(span: Under, minutes: readonly BoilerMinutes[], reserveFraction: number): string | null {
  const free = minutes.filter((one) => {
    const longEnough = span.to - span.from >= WORTH_SHUTTING * one.boiler.minutesBack;
    const inFire = one.share.subarray(span.from, span.to).every((share) => share > 0);
    return longEnough && inFire && othersCarry(span, one, minutes, reserveFraction);
  });
  const [most] = free.sort((a, b) => leastOf(b.boiler) - leastOf(a.boiler));
  return most?.boiler.id ?? null;
}

function othersCarry(
  { from, to, greatestLoadKgPerH }: Under,
  shut: BoilerMinutes,
  minutes: readonly BoilerMinutes[],
  reserveFraction: number,
): boolean {
  const others = minutes.filter((one) => one !== shut);
  for (let t = from; t < to; t++) {
    const sent = others.reduce((sum, { boiler, share }) => sum + boiler.netKgPerH * (share[t] as number), 0);
    if (sent <= 0 || sent * (1 - reserveFraction) < greatestLoadKgPerH) return false;
  }
  return true;
}
