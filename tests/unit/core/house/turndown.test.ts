import { describe, expect, it } from 'vitest';
import { belowTurndown, type TurndownBoiler } from '@/core/house/turndown';

const boiler = (id: string, netKgPerH: number, changes: Partial<TurndownBoiler> = {}): TurndownBoiler => ({
  id,
  netKgPerH,
  turndown: 4,
  readyShare: [{ from: 0, value: 1 }],
  minutesBack: 35,
  ...changes,
});
/** 600 minutes of a load, some spans of it changed. */
const load = (kgPerH: number, ...spans: [from: number, to: number, value: number][]) => {
  const minutes = new Float64Array(600).fill(kgPerH);
  for (const [from, to, value] of spans) minutes.fill(value, from, to);
  return minutes;
};
const PAIR = [boiler('one', 2_000), boiler('two', 2_400)];

describe('load under what the boilers in fire can turn down to', () => {
  it('is listed with its span and figures: 2 000 / 4 + 2 400 / 4 kg/h', () => {
    expect(belowTurndown(load(1_500, [100, 200, 900], [150, 160, 700]), PAIR, 0.1)).toEqual([
      {
        from: 100,
        to: 200,
        leastLoadKgPerH: 700,
        greatestLoadKgPerH: 900,
        leastExportKgPerH: 1_100,
        couldShutId: 'two',
      },
    ]);
  });

  it('is not under at the very least export', () => {
    expect(belowTurndown(load(1_100), PAIR, 0)).toEqual([]);
  });

  it('names no boiler to shut for less than twice the time that it takes to come back', () => {
    expect(belowTurndown(load(1_500, [100, 169, 900]), PAIR, 0)[0]?.couldShutId).toBeNull();
    expect(belowTurndown(load(1_500, [100, 170, 900]), PAIR, 0)[0]?.couldShutId).toBe('two');
  });

  it('names none that the others could not stand in for with the reserve kept', () => {
    const small = [boiler('small', 900), boiler('large', 6_000)];
    // With the large one shut, 900 kg/h less the reserve are left for 850 kg/h.
    expect(belowTurndown(load(5_000, [0, 100, 850]), small, 0)[0]?.couldShutId).toBe('large');
    expect(belowTurndown(load(5_000, [0, 100, 850]), small, 0.1)[0]?.couldShutId).toBe('small');
  });

  it('keeps the last boiler in fire', () => {
    expect(belowTurndown(load(200), [boiler('one', 2_000)], 0)).toMatchObject([
      { from: 0, to: 600, couldShutId: null },
    ]);
  });

  it('counts the boilers that are ready, derated or not, and none while all are out', () => {
    const later = [boiler('one', 2_000, { readyShare: [{ from: 300, value: 0.5 }] })];
    expect(belowTurndown(load(400), later, 0)).toMatchObject([{ from: 300, to: 600, leastExportKgPerH: 500 }]);
  });
});
