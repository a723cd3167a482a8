/** What a machine does between two runs: stays hot, or is shut and warmed up again, whichever takes less steam. */
import { checkRange } from '../quantity/range';
import { fail, ok, problem, type Result } from '../result';
import { steamOfPhases, type Duty, type DutyPhase } from './duty';
import { DUTY_RANGE, range } from './inputs';

/** Draws of a machine between runs. */
export interface BetweenRates {
  readonly idleKgPerH: number;
  /** Warming up from cold: what re-warming is charged with, however short the gap. */
  readonly warmUp: readonly DutyPhase[];
}

export interface BetweenRuns {
  /** `warmUp`: the first run; `idle`: kept hot; `rewarm`: shut and warmed up again; `none`: no gap. */
  readonly choice: 'warmUp' | 'idle' | 'rewarm' | 'none';
  /** Gap at which both take the same steam; null when idling takes none. [min] */
  readonly breakEvenMin: number | null;
  /** Phases of the gap in order; for a first run the warm-up alone, to end when the run begins. */
  readonly phases: readonly DutyPhase[];
  readonly steamKg: number;
  /** Why, with the figures. */
  readonly reason: string;
}

const GAP = range('Gap between two runs', 'min', 0, 10_080);

const minutesOf = (phases: readonly DutyPhase[]): number => phases.reduce((sum, { minutes }) => sum + minutes, 0);

/**
 * The draws between runs out of a machine's duty: its idling, and its warm-up or heat-up.
 * @returns DUTY-BETWEEN when the duty has no phase of idling or of warming up.
 */
export function betweenRatesOf({ phases }: Duty): Result<BetweenRates> {
  const warmUp = phases.filter(({ kind }) => kind === 'warmUp' || kind === 'heatUp');
  const idle = phases.find(({ kind }) => kind === 'idle');
  if (!idle || warmUp.length === 0) {
    const missing = idle ? 'warm-up' : 'idling';
    return fail(problem('DUTY-BETWEEN', `This duty has no ${missing}; enter its length to compare the two.`));
  }
  return ok({ idleKgPerH: idle.steamKgPerH, warmUp });
}

/**
 * Warm-up, idling or re-warming by the gap [min]; null for a first run. A gap shorter than the warm-up is idled; so is
 * one where both take the same.
 * @returns DUTY-RANGE for a gap outside 0 to 10 080 min.
 */
export function betweenRuns(gapMin: number | null, { idleKgPerH, warmUp }: BetweenRates): Result<BetweenRuns> {
  const warmKg = steamOfPhases(warmUp);
  const breakEvenMin = idleKgPerH > 0 ? (60 * warmKg) / idleKgPerH : null;
  const answer = (choice: BetweenRuns['choice'], phases: readonly DutyPhase[], reason: string) =>
    ok({ choice, breakEvenMin, phases, steamKg: steamOfPhases(phases), reason });
  if (gapMin === null) return answer('warmUp', warmUp, `First run: warming up takes ${warmKg.toFixed(1)} kg.`);
  const bad = checkRange(DUTY_RANGE, GAP, gapMin, 'gapMin');
  if (bad) return fail(bad);
  if (gapMin === 0) return answer('none', [], 'No gap.');
  const idleKg = (idleKgPerH * gapMin) / 60;
  const compared = `idling ${idleKg.toFixed(1)} kg, warming up again ${warmKg.toFixed(1)} kg`;
  const offMin = gapMin - minutesOf(warmUp);
  if (offMin < 0) return answer('idle', [idle(gapMin, idleKgPerH)], `Too short to warm up again: ${compared}.`);
  if (idleKg <= warmKg) return answer('idle', [idle(gapMin, idleKgPerH)], `Kept hot: ${compared}.`);
  const off = offMin > 0 ? [idle(offMin, 0)] : [];
  return answer('rewarm', [...off, ...warmUp], `Shut and warmed up again: ${compared}.`);
}

const idle = (minutes: number, steamKgPerH: number): DutyPhase => ({ kind: 'idle', minutes, steamKgPerH });
