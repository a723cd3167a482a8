/** Worked batches A, B and C (invented plant): the order and length of their phases. Their figures are outside checks. */
import { describe, expect, it } from 'vitest';
import type { Duty } from '@/core/duty/duty';
import { pieceSteamKg } from '@/core/duty/fallingRate';
import { jacketedKettle, kettleHeatUp } from '@/core/duty/jacketedKettle';
import { steamBlancher } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import { blancherA, kettleB, retortC, supply } from './dutyWorkedBatches';
import { expectRelative, valueOf } from './steamSupport';

const spells = ({ phases }: Duty) => phases.map(({ kind, minutes }) => [kind, minutes]);

describe('phases', () => {
  it('of the blancher are warm-up, run and idling', () => {
    expect(spells(valueOf(steamBlancher(blancherA, supply)))).toEqual([
      ['warmUp', 15],
      ['run', 120],
      ['idle', 10],
    ]);
  });

  it('of the kettle keep the kg of the heat-up in its pieces, then boil off and hold', () => {
    const duty = valueOf(jacketedKettle(kettleB, supply));
    const curve = valueOf(kettleHeatUp(kettleB, supply));
    const heatUp = duty.phases.filter(({ kind }) => kind === 'heatUp');
    const kg = heatUp.reduce((sum, { minutes, steamKgPerH }) => sum + (minutes * steamKgPerH) / 60, 0);
    expectRelative(kg, pieceSteamKg(curve, 0, curve.minutes), 1e-12);
    expect(spells(duty).slice(heatUp.length)).toEqual([
      ['boilOff', expect.closeTo(34.4452, 3)],
      ['hold', 30],
    ]);
  });

  it('of the retort are vent, come-up and two pieces of process time', () => {
    expect(spells(valueOf(stillRetort(retortC, supply)))).toEqual([
      ['vent', 6],
      ['comeUp', 6],
      ['process', 12],
      ['process', 26],
    ]);
  });
});
