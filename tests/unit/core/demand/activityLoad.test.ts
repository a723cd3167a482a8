import { describe, expect, it } from 'vitest';
import {
  addableKgPerH,
  drawAt,
  ownSpan,
  phasesPeakKgPerH,
  placedPhases,
  steamOnMinute,
} from '@/core/demand/activityLoad';
import { activity, phase } from '../../../support/builders';

const loading = activity('a', {
  modes: [
    {
      unitId: 'unit1',
      minutes: 60,
      phases: [phase(0, 10, 0, 'idle'), phase(10, 6, 1500, 'vent'), phase(16, 20, 200, 'process')],
      uses: [],
      dutyId: null,
    },
  ],
  placement: { unitId: 'unit1', start: 100 },
});

describe('a placed activity', () => {
  it('draws from its phases only, half-open', () => {
    expect([99, 109, 110, 115, 116, 135, 136].map((minute) => drawAt(loading, minute))).toEqual([
      0, 0, 1500, 1500, 200, 200, 0,
    ]);
    expect(placedPhases(loading)[1]).toEqual({ kind: 'vent', from: 110, to: 116, steamKgPerH: 1500 });
    expect(phasesPeakKgPerH(loading.modes[0]?.phases ?? [])).toBe(1500);
  });

  it('has steam on at its first phase with steam', () => {
    expect(steamOnMinute(loading)).toBe(110);
    expect(steamOnMinute(activity('b', { modes: [] }))).toBeNull();
  });

  it('lasts for the length of its mode', () => {
    expect(ownSpan(loading)).toEqual({ from: 100, to: 160 });
  });

  it('draws nothing while it is not placed', () => {
    const loose = { ...loading, placement: null };
    expect([placedPhases(loose), drawAt(loose, 110), ownSpan(loose), steamOnMinute(loose)]).toEqual([
      [],
      0,
      null,
      null,
    ]);
  });

  it('draws as in its first mode on a unit that is not eligible', () => {
    expect(drawAt({ ...loading, placement: { unitId: 'other', start: 0 } }, 10)).toBe(1500);
  });
});

it('rounds rates by less than a milligram an hour', () => {
  expect(Math.abs(addableKgPerH(1555.237) - 1555.237)).toBeLessThan(1e-6);
  expect(addableKgPerH(0.1) + addableKgPerH(0.2) - addableKgPerH(0.1) - addableKgPerH(0.2)).toBe(0);
});
