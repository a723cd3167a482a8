import { describe, expect, it } from 'vitest';
import { comingUpSpans, firesOf, LOOK_BACK_MIN, readyShare, readySpans } from '@/core/house/readiness';

const times = { purgeMinutes: 5, warmReadyMinutes: 30, coldReadyMinutes: 120 };
const HORIZON = 10_080;
const share = (...steps: [from: number, value: number][]) => steps.map(([from, value]) => ({ from, value }));

describe('a boiler from lit to export', () => {
  it('purges and comes to pressure cold where it has been out for long', () => {
    const fires = firesOf(share([0, 0], [240, 1], [8_160, 0]), times, HORIZON);
    expect(fires).toEqual([{ litMin: 240, outMin: 8_160, readyMin: 365, start: 'cold' }]);
    expect(readySpans(fires)).toEqual([{ from: 365, to: 8_160 }]);
    expect(comingUpSpans(fires)).toEqual([{ from: 240, to: 365 }]);
  });

  it('comes up warm within half a day of having been at pressure, cold from then on', () => {
    const outFor = (minutes: number) =>
      firesOf(share([0, 1], [1_000, 0], [1_000 + minutes, 1]), times, HORIZON).map(({ start }) => start);
    expect(outFor(719)).toEqual(['cold', 'warm']);
    expect(outFor(720)).toEqual(['cold', 'cold']);
  });

  it('stays cold where the fire went out before it was at pressure', () => {
    const fires = firesOf(share([0, 0], [100, 1], [200, 0], [210, 1]), times, HORIZON);
    expect(fires.map(({ readyMin, start }) => [readyMin, start])).toEqual([
      [225, 'cold'],
      [335, 'cold'],
    ]);
    expect(readySpans(fires)).toEqual([{ from: 335, to: HORIZON }]);
    expect(comingUpSpans(fires)).toEqual([
      { from: 100, to: 200 },
      { from: 210, to: 335 },
    ]);
  });

  it('is ready all along where it has been in fire since before', () => {
    const fires = firesOf(share([-LOOK_BACK_MIN, 1], [600, 0]), times, HORIZON);
    expect(fires).toEqual([{ litMin: -LOOK_BACK_MIN, outMin: 600, readyMin: -LOOK_BACK_MIN, start: null }]);
    expect(comingUpSpans(fires)).toEqual([]);
  });

  it('remembers the week before: out on Sunday night is warm on Monday morning', () => {
    const [, second] = firesOf(share([-LOOK_BACK_MIN, 1], [-300, 0], [60, 1]), times, HORIZON);
    expect(second).toMatchObject({ start: 'warm', readyMin: 95 });
  });

  it('is one fire through a derating, and sends its share once ready', () => {
    const set = share([0, 0], [100, 1], [500, 0.5], [600, 1], [700, 0]);
    const fires = firesOf(set, times, HORIZON);
    expect(fires).toHaveLength(1);
    expect(readyShare(set, fires)).toEqual(share([0, 0], [225, 1], [500, 0.5], [600, 1], [700, 0]));
  });
});
