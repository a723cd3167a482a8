import type { DutyPhase } from '../duty/duty';
import type { Phase, PhaseKind } from '../plant/activity';

/** Ends this near to a whole minute are that minute: sums of real lengths carry rounding errors. [min] */
const WHOLE_MINUTE_TOLERANCE = 1e-9;

interface RealSpan {
  readonly kind: PhaseKind;
  readonly from: number;
  readonly to: number;
  readonly steamKgPerH: number;
}

/**
 * Puts phases of real length on whole minutes [min, kg/h]. A minute that several phases share gets the mean of their
 * rates weighted by the part that each has of it, so that the kg are those of the duty; its kind is that of the
 * longest part, but a minute in which a vent is open at all is a vent minute. Equal neighbours are joined.
 */
export function toGrid(duty: readonly DutyPhase[]): Phase[] {
  const spans = realSpans(duty);
  const minutes = Math.ceil(spans.at(-1)?.to ?? 0);
  const phases: Phase[] = [];
  let first = 0;
  for (let minute = 0; minute < minutes; minute++) {
    while ((spans[first] as RealSpan).to <= minute) first++;
    appendMinute(phases, minute, sharing(spans, first, minute));
  }
  return phases;
}

/** Minutes that phases of real length occupy, rounded up. */
export function gridMinutes(duty: readonly DutyPhase[]): number {
  return Math.ceil(realSpans(duty).at(-1)?.to ?? 0);
}

function realSpans(duty: readonly DutyPhase[]): RealSpan[] {
  let real = 0;
  let from = 0;
  return duty
    .map((phase) => {
      real += phase.minutes;
      const whole = Math.round(real);
      const to = Math.abs(real - whole) <= WHOLE_MINUTE_TOLERANCE ? whole : real;
      const span = { kind: phase.kind, from, to, steamKgPerH: phase.steamKgPerH };
      from = to;
      return span;
    })
    .filter((span) => span.to > span.from);
}

interface MinuteShare {
  readonly kind: PhaseKind;
  readonly part: number;
  readonly steamKgPerH: number;
}

function sharing(spans: readonly RealSpan[], first: number, minute: number): MinuteShare[] {
  const shares: MinuteShare[] = [];
  for (let i = first; i < spans.length; i++) {
    const span = spans[i] as RealSpan;
    if (span.from >= minute + 1) break;
    const part = Math.min(span.to, minute + 1) - Math.max(span.from, minute);
    shares.push({ kind: span.kind, part, steamKgPerH: span.steamKgPerH });
  }
  return shares;
}

function appendMinute(phases: Phase[], minute: number, shares: readonly MinuteShare[]): void {
  const steamKgPerH = shares.reduce((sum, share) => sum + share.part * share.steamKgPerH, 0);
  const kind = kindOfMinute(shares);
  const last = phases.at(-1);
  if (last && last.kind === kind && last.steamKgPerH === steamKgPerH) {
    phases[phases.length - 1] = { ...last, minutes: last.minutes + 1 };
  } else {
    phases.push({ kind, offsetMin: minute, minutes: 1, steamKgPerH });
  }
}

function kindOfMinute(shares: readonly MinuteShare[]): PhaseKind {
  const vent = shares.find((share) => share.kind === 'vent');
  if (vent) return vent.kind;
  return shares.reduce((longest, share) => (share.part > longest.part ? share : longest)).kind;
}
