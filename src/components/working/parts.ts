/** Which part of a duty an activity draws. Pure. */
import type { DutyPhase } from '@/core/duty/duty';
import type { ActivityKind, Mode, PhaseKind } from '@/core/plant/activity';

const WARMING: ReadonlySet<PhaseKind> = new Set(['warmUp', 'heatUp']);

const isOf = (kind: ActivityKind, mode: Mode, phase: PhaseKind): boolean => {
  if (kind === 'warmUp') return WARMING.has(phase);
  if (kind === 'idle') return phase === 'idle';
  return mode.between === undefined || (!WARMING.has(phase) && phase !== 'idle');
};

/** The duty's phases that the activity is made of: a machine that idles warms up and idles outside its run. */
export const drawnPart = (kind: ActivityKind, mode: Mode, phases: readonly DutyPhase[]): readonly DutyPhase[] =>
  phases.filter((phase) => isOf(kind, mode, phase.kind));

/** Why less is drawn here than the whole duty, or another draw; null where the two are the same. */
export function partSentence(kind: ActivityKind, mode: Mode, phases: readonly DutyPhase[]): string | null {
  if (kind === 'warmUp')
    return 'The warm-up alone: the unit was cold, or cheaper to shut than to keep hot until this run.';
  if (kind === 'idle')
    return 'The idling alone: over this gap it takes less steam to keep the unit hot than to warm it up again.';
  if (drawnPart(kind, mode, phases).length < phases.length) {
    return 'The run alone: warming up before it and idling between runs are drawn by themselves.';
  }
  if (kind === 'stage' && mode.warm) {
    return 'The working is of a cold shell; after a short gap the plan draws less, the shell being still warm.';
  }
  return null;
}
