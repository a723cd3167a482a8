import type { Working } from './working';

export type PhaseKind =
  'warmUp' | 'run' | 'idle' | 'heatUp' | 'boilOff' | 'hold' | 'vent' | 'comeUp' | 'process' | 'cool' | 'rinse' | 'wash';
/** A draw of real length; `demand` puts it on the minute grid. */
export interface DutyPhase {
  readonly kind: PhaseKind;
  readonly minutes: number;
  readonly steamKgPerH: number;
}
/** What a stage asks of the header, with its working. */
export interface Duty {
  readonly phases: readonly DutyPhase[];
  readonly steamKg: number;
  readonly working: Working;
}
