import { describe, expect, it } from 'vitest';
import type { Activity, Link } from '@/core/plant/activity';
import type { Week } from '@/core/schedule/week';
import { steamOnBy } from '@/core/shift/steamOnBy';

const run = (id: string, start: number | null): Activity =>
  ({
    id,
    modes: [{ unitId: 'u', minutes: 60, phases: [] }],
    placement: start === null ? null : { unitId: 'u', start },
  }) as unknown as Activity;

const wait = (id: string, rule: Link['rule'], greatestMin: number | null, offsetMin = 0): Link => ({
  id,
  from: { activityId: 'filler', anchor: 'start', offsetMin },
  to: { activityId: 'retort', anchor: 'start', offsetMin: 5 },
  leastMin: 0,
  greatestMin,
  rule,
  greatestBreach: 'process',
  source: null,
});

const week = (links: readonly Link[], fillerStart: number | null = 300): Week =>
  ({
    activities: [run('filler', fillerStart), run('retort', 400)],
    links,
    calendars: [],
    plant: { units: [] },
  }) as unknown as Week;

describe('steamOnBy', () => {
  it('is the closing of the first container and the greatest wait since', () => {
    // First container closed 4 min into the filler's run at 300; 120 min later: 424.
    expect(steamOnBy(week([wait('a', 'sinceClosing', 120, 4)]), 'retort')).toEqual({
      minute: 424,
      sinceMin: 304,
      greatestMin: 120,
      rule: 'sinceClosing',
    });
  });

  it('takes the tightest of several waits whatever their order', () => {
    const links = [wait('a', 'sinceClosing', 120), wait('b', 'initialTemperature', 45), wait('c', 'flow', 10)];
    expect(steamOnBy(week(links), 'retort')?.minute).toBe(345);
    expect(steamOnBy(week([...links].reverse()), 'retort')?.rule).toBe('initialTemperature');
  });

  it('is null without a greatest wait, with a flow only, or before the filler is placed', () => {
    expect(steamOnBy(week([]), 'retort')).toBeNull();
    expect(steamOnBy(week([wait('a', 'sinceClosing', null)]), 'retort')).toBeNull();
    expect(steamOnBy(week([wait('a', 'flow', 10)]), 'retort')).toBeNull();
    expect(steamOnBy(week([wait('a', 'sinceClosing', 120)], null), 'retort')).toBeNull();
    expect(steamOnBy(week([wait('a', 'sinceClosing', 120)]), 'filler')).toBeNull();
  });
});
