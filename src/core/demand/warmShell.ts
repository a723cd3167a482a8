/** A retort's cycle while its shell is still warm from the load before, for classes of gaps. */
import type { DutyPhase, SteamSupply } from '../duty/duty';
import { workOut, type DutyModel } from '../duty/model';
import { SHELL_COOLING_DEFAULTS, shellAtSteamOn } from '../duty/shellTemperature';

/** Classes of gaps: common practice, no source. [min] */
const GAP_CLASSES_MIN = [15, 30, 60, 120] as const;

/** A warm shell this little above the cold one is not worth a class. [K] */
const LEAST_GAIN_K = 1;

/** When a run's steam goes on and when its unit is free after the last phase. [min] */
export interface RunEnds {
  readonly leadMin: number;
  readonly afterMin: number;
}

/** A cycle after a gap of at most so long. */
export interface WarmDuty {
  readonly gapUpToMin: number;
  readonly phases: readonly DutyPhase[];
}

/**
 * A retort's duty by gap, ascending. Each class takes the shell as it is at the longest gap of the class, at its
 * coldest, with unloading before and loading after counted in, so that it errs to more steam. Empty where the duty is
 * no retort's, or its cold shell is as warm already.
 */
export function warmDuties(duty: DutyModel, supply: SteamSupply, { leadMin, afterMin }: RunEnds): WarmDuty[] {
  return GAP_CLASSES_MIN.flatMap((gapUpToMin): WarmDuty[] => {
    const warm = withWarmShell(duty, afterMin + gapUpToMin + leadMin);
    const worked = warm && workOut(warm, supply);
    return worked?.ok ? [{ gapUpToMin, phases: worked.value.phases }] : [];
  });
}

/** The duty with the shell as it is so long after the last cycle; null where that is not warmer. */
function withWarmShell(duty: DutyModel, minutesSinceEnd: number): DutyModel | null {
  if (duty.model !== 'stillRetort' && duty.model !== 'overpressureRetort') return null;
  const { shellKg, ambientC, surfaceLossWPerM2K, shellC } = duty.inputs;
  const cooled = shellAtSteamOn({
    endC: SHELL_COOLING_DEFAULTS.values.endC ?? 0,
    ambientC,
    minutesSinceEnd,
    shellKg,
    areaM2: shellAreaM2(duty),
    surfaceLossWPerM2K,
  });
  if (!cooled.ok || cooled.value.shellC < shellC + LEAST_GAIN_K) return null;
  return duty.model === 'stillRetort'
    ? { ...duty, inputs: { ...duty.inputs, shellC: cooled.value.shellC } }
    : { ...duty, inputs: { ...duty.inputs, shellC: cooled.value.shellC } };
}

function shellAreaM2(duty: Extract<DutyModel, { model: 'stillRetort' | 'overpressureRetort' }>): number {
  if (duty.model === 'overpressureRetort') return duty.inputs.surfaceAreaM2;
  const { shellDiameterM, shellLengthM } = duty.inputs;
  return Math.PI * shellDiameterM * shellLengthM + (Math.PI / 2) * shellDiameterM ** 2;
}
