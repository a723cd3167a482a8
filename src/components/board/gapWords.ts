import { drawnMode, type Activity } from '../../core/plant/activity';
import type { PlantModel } from '../../core/plant/plant';
import type { GapDraw } from '../../core/schedule/gapDraws';
import { spanText } from '../time';
import { isRun } from './carry';
import { unitName } from './words';

/** Why a machine is kept hot or warmed up before a run; null for anything else. */
export function gapReason(
  activity: Activity,
  gapDraws: readonly GapDraw[],
  drawn: readonly Activity[],
  plant: PlantModel,
): string | null {
  const gap = gapDraws.find((one) => one.activity.id === activity.id);
  const run = gap && drawn.find(({ id }) => id === gap.runId);
  const between = run && drawnMode(run)?.between;
  if (!run?.placement || !between) return null;
  const { start, unitId } = run.placement;
  const breakEven = `the ${spanText(between.idleUpToMin)} up to which keeping hot takes less steam than warming up again`;
  if (activity.kind === 'idle') {
    const minutes = drawnMode(activity)?.minutes ?? 0;
    return `${spanText(minutes)} until ${run.code}: not longer than ${breakEven}.`;
  }
  const unit = unitName(plant, unitId);
  const before = drawn.filter((one) => one.placement?.unitId === unitId && isRun(one) && one.placement.start < start);
  if (before.length === 0) return `${run.code} is the first run of the week on ${unit}.`;
  const free = drawn
    .filter((one) => one.placement?.unitId === unitId && one.id !== run.id && !isGapDraw(one))
    .map((one) => (one.placement?.start ?? 0) + (drawnMode(one)?.minutes ?? 0))
    .filter((end) => end <= start);
  const since = start - Math.max(...free);
  return `${unit} has then been out of use for ${spanText(since)}: longer than ${breakEven}.`;
}

const isGapDraw = ({ kind }: Activity): boolean => kind === 'idle' || kind === 'warmUp';

/** Why a run takes less than when the machine is cold; null where it takes what it was planned with. */
export function warmWords(activity: Activity, planned: readonly Activity[]): string | null {
  const stored = planned.find(({ id }) => id === activity.id);
  if (!stored || drawnMode(stored)?.phases === drawnMode(activity)?.phases) return null;
  return 'the machine is still warm from the run before';
}
