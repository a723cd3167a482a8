import { describe, expect, it } from 'vitest';
import { phasesKg } from '@/core/demand/activityLoad';
import { gridMinutes, toGrid } from '@/core/demand/grid';
import type { DutyPhase } from '@/core/duty/duty';

const duty = (kind: DutyPhase['kind'], minutes: number, steamKgPerH: number): DutyPhase => {
  return { kind, minutes, steamKgPerH };
};

describe('duty phases on whole minutes', () => {
  it('leaves whole minutes as they are', () => {
    expect(toGrid([duty('vent', 6, 1555.237), duty('comeUp', 6, 359.2303)])).toEqual([
      { kind: 'vent', offsetMin: 0, minutes: 6, steamKgPerH: 1555.237 },
      { kind: 'comeUp', offsetMin: 6, minutes: 6, steamKgPerH: 359.2303 },
    ]);
  });

  it('weights a minute that two phases share, and keeps the kind of the longer part', () => {
    // Minute 1: half at 600 and half at 300; minute 2 half at 300, then nothing.
    expect(toGrid([duty('heatUp', 1.5, 600), duty('hold', 1, 300)])).toEqual([
      { kind: 'heatUp', offsetMin: 0, minutes: 1, steamKgPerH: 600 },
      { kind: 'heatUp', offsetMin: 1, minutes: 1, steamKgPerH: 450 },
      { kind: 'hold', offsetMin: 2, minutes: 1, steamKgPerH: 150 },
    ]);
  });

  it('weights several phases within one minute', () => {
    // 0.25 x 100 + 0.25 x 200 + 0.5 x 400 = 275
    const phases = toGrid([duty('run', 0.25, 100), duty('idle', 0.25, 200), duty('hold', 0.5, 400)]);
    expect(phases).toEqual([{ kind: 'hold', offsetMin: 0, minutes: 1, steamKgPerH: 275 }]);
  });

  it('calls a minute a vent minute as soon as the vent is open in it', () => {
    const kinds = toGrid([duty('warmUp', 0.9, 100), duty('vent', 0.3, 1500), duty('comeUp', 0.8, 300)]).map(
      (p) => p.kind,
    );
    expect(kinds).toEqual(['vent', 'vent']);
  });

  it('joins equal neighbours of one kind only', () => {
    const phases = toGrid([duty('run', 2, 100), duty('run', 3, 100), duty('idle', 1, 100)]);
    expect(phases).toEqual([
      { kind: 'run', offsetMin: 0, minutes: 5, steamKgPerH: 100 },
      { kind: 'idle', offsetMin: 5, minutes: 1, steamKgPerH: 100 },
    ]);
  });

  it('rounds the duration up, but not for rounding errors of the sum', () => {
    expect(gridMinutes([duty('run', 39.4325, 1)])).toBe(40);
    expect(gridMinutes([duty('run', 0.1, 1), duty('run', 0.2, 1), duty('run', 0.7, 1)])).toBe(1);
    expect(gridMinutes([])).toBe(0);
    expect(toGrid([])).toEqual([]);
    expect(toGrid([duty('run', 0, 500)])).toEqual([]);
  });

  it('keeps phases without steam', () => {
    expect(toGrid([duty('process', 2, 0), duty('cool', 3, 0)]).map(({ kind, minutes }) => [kind, minutes])).toEqual([
      ['process', 2],
      ['cool', 3],
    ]);
  });

  it('conserves the kg of worked batch B (invented plant)', () => {
    // Heat-up 39.4325 min at a mean of 207.4517, boil-off 34.4452 min at 115.1119, hold 30 min at 7.56109.
    const phases = toGrid([
      duty('heatUp', 39.4325, 207.4517),
      duty('boilOff', 34.4452, 115.1119),
      duty('hold', 30, 7.56109),
    ]);
    expect(phasesKg(phases)).toBeCloseTo((39.4325 * 207.4517 + 34.4452 * 115.1119 + 30 * 7.56109) / 60, 9);
    expect(phasesKg(phases)).toBeCloseTo(206.204, 2);
  });
});
