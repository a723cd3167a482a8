import type { Phase } from '@/core/plant/activity';
import type { UnitKind } from '@/core/plant/plant';
import type { Random } from '@/core/levelling/random';

/** A stage of a batch as it runs on a unit of its kind. */
export interface StageRun {
  readonly kind: UnitKind;
  readonly minutes: number;
  readonly phases: Phase[];
  /** From and for how long an operator is needed. */
  readonly operators: readonly (readonly [number, number])[];
}

/** Blanching and cooking for some, a retort load for all. */
export function stagesOf(random: Random): StageRun[] {
  const stages: StageRun[] = [];
  if (random() < 0.4) {
    const minutes = 5 * whole(random, 8, 12);
    const warm = phase('warmUp', 0, 10, 5 * whole(random, 160, 200));
    const run = phase('run', 10, minutes - 10, 5 * whole(random, 100, 130));
    stages.push({ kind: 'blancher', minutes, phases: [warm, run], operators: [[0, 10]] });
  }
  if (random() < 0.7) {
    const heat = 5 * whole(random, 2, 4);
    const hold = 5 * whole(random, 6, 12);
    const phases = [
      phase('heatUp', 10, heat, 5 * whole(random, 200, 280)),
      phase('hold', 10 + heat, hold, 5 * whole(random, 60, 100)),
    ];
    stages.push({ kind: 'kettle', minutes: 15 + heat + hold, phases, operators: [[0, 10]] });
  }
  const vent = whole(random, 7, 10);
  const comeUp = whole(random, 8, 12);
  const process = 5 * whole(random, 8, 13);
  const cool = 5 * whole(random, 3, 4);
  const phases = [
    phase('vent', 10, vent, 5 * whole(random, 520, 700)),
    phase('comeUp', 10 + vent, comeUp, 5 * whole(random, 340, 440)),
    phase('process', 10 + vent + comeUp, process, 5 * whole(random, 60, 100)),
  ];
  const empty = 10 + vent + comeUp + process + cool;
  stages.push({
    kind: 'retort',
    minutes: empty + 5,
    phases,
    operators: [
      [0, 10],
      [empty, 5],
    ],
  });
  return stages;
}

const phase = (kind: Phase['kind'], offsetMin: number, minutes: number, steamKgPerH: number): Phase => ({
  kind,
  offsetMin,
  minutes,
  steamKgPerH,
});

/** A whole number from one to another, both included. */
export const whole = (random: Random, from: number, to: number): number =>
  from + Math.floor(random() * (to - from + 1));
