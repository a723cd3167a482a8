import { describe, expect, it } from 'vitest';
import { processDifferences, type ScheduledProcess } from '@/core/duty/processDifferences';
import { sprayRetortF } from '../../../verification/dutyExamples';
import { blancherA, retortC } from '../../../verification/dutyWorkedBatches';

/** As worked batch C (invented plant) is cooked, with the vent to a tenth of a degree. */
const released: ScheduledProcess = {
  processC: 121.1,
  processMinutes: 38,
  ventMinutes: 6,
  ventToC: 107.2,
  comeUpMinutes: 6,
  leastInitialC: 50,
};
const differences = (change: Partial<typeof retortC>) =>
  processDifferences({ model: 'stillRetort', inputs: { ...retortC, ...change } }, released);

describe('processDifferences', () => {
  it('finds none where the duty cooks as released, to the digits that a document gives', () => {
    expect(differences({})).toEqual([]);
    expect(processDifferences({ model: 'steamBlancher', inputs: blancherA }, released)).toEqual([]);
  });

  it.each([
    [{ ventMin: 5 }, 'Vent is 5 min here and 6 min in the process data.'],
    [{ ventEndC: 105 }, 'Vent temperature is 105 °C here and 107.2 °C in the process data.'],
    [{ comeUpMin: 7 }, 'Come-up is 7 min here and 6 min in the process data.'],
    [{ processC: 120 }, 'Process temperature is 120 °C here and 121.1 °C in the process data.'],
    [{ holds: retortC.holds.slice(1) }, 'Process time is 26 min here and 38 min in the process data.'],
    [{ initialC: 45 }, 'Initial temperature is 45 °C here; the process data allows no less than 50 °C.'],
  ])('names what differs: %j', (change, sentence) => {
    expect(differences(change)).toEqual([sentence]);
  });

  it('compares temperature, time and initial temperature of an over-pressure retort', () => {
    expect(processDifferences({ model: 'overpressureRetort', inputs: sprayRetortF }, released)).toEqual([
      'Process time is 35 min here and 38 min in the process data.',
      'Initial temperature is 40 °C here; the process data allows no less than 50 °C.',
    ]);
  });
});
