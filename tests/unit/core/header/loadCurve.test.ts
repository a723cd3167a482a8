import { describe, expect, it } from 'vitest';
import { LoadCurve, loadOf } from '@/core/header/loadCurve';
import { countsOn, feedPath } from '@/core/header/network';
import { drawFinder, whoDraws } from '@/core/header/whoDraws';
import { activity, capacity, flatMode, header, phase, placedAt, plant, unit, week } from '../../../support/builders';

const letdown = (id: string, fromHeaderId: string) =>
  header(id, { feed: { kind: 'letdown', fromHeaderId, greatestKgPerH: 500 } });

const twoLevels = plant({
  headers: [header('main'), letdown('low', 'main'), letdown('lowest', 'low')],
  units: [
    unit('top'),
    unit('mid', { headerId: 'low' }),
    unit('bottom', { headerId: 'lowest' }),
    unit('dry', { headerId: null }),
  ],
});

const on = (unitId: string, kgPerH: number, start = 10) =>
  placedAt(activity(`on-${unitId}`, { modes: [flatMode(unitId, 20, kgPerH)] }), start);

describe('the load on a header', () => {
  it('is the sum of the phases, half-open', () => {
    const source = week({ activities: [on('unit1', 100), { ...on('unit1', 50, 30), id: 'later' }] });
    expect(loadOf(source).steps('main')).toEqual([
      { from: 0, value: 0 },
      { from: 10, value: 100 },
      { from: 30, value: 50 },
      { from: 50, value: 0 },
    ]);
  });

  it('counts on every header that feeds it, the mass unchanged', () => {
    const source = week({
      plant: twoLevels,
      activities: [on('top', 100), on('mid', 30), on('bottom', 7), on('dry', 1000)],
    });
    const load = loadOf(source);
    expect(['main', 'low', 'lowest'].map((id) => load.kgPerH(id)[10])).toEqual([137, 37, 7]);
  });

  it('carries base load upwards too', () => {
    const base = (headerId: string, value: number) =>
      capacity(headerId, 1000, { baseLoadKgPerH: [{ from: 0, value }] });
    const load = loadOf(week({ plant: twoLevels, capacities: [base('main', 200), base('lowest', 40)] }));
    expect(['main', 'low', 'lowest'].map((id) => load.kgPerH(id)[5])).toEqual([240, 40, 40]);
  });

  it('cuts off what lies outside the week', () => {
    const load = loadOf(
      week({ horizonMin: 20, activities: [on('unit1', 100, -10), { ...on('unit1', 50, 15), id: 'b' }] }),
    );
    expect(load.steps('main')).toEqual([
      { from: 0, value: 100 },
      { from: 10, value: 0 },
      { from: 15, value: 50 },
    ]);
  });

  it('is 0 without activities, and for a header that there is not', () => {
    expect(loadOf(week()).steps('main')).toEqual([{ from: 0, value: 0 }]);
    expect(new LoadCurve(week()).kgPerH('unknown').every((kgPerH) => kgPerH === 0)).toBe(true);
  });

  it('leaves nothing behind when an activity is moved, replaced or removed', () => {
    const kept = on('unit1', 0.1);
    const moved = { ...on('unit1', 0.2), id: 'moved' };
    const load = loadOf(week({ activities: [kept] }));
    load.add(moved);
    expect(load.move(moved, { unitId: 'unit1', start: 25 }).placement?.start).toBe(25);
    load.add({ ...moved, placement: { unitId: 'unit1', start: 400 } });
    expect(load.kgPerH('main')[400]).toBeCloseTo(0.2, 6);
    load.move(moved, null);
    load.remove('unknown');
    expect(load.steps('main')).toEqual(loadOf(week({ activities: [kept] })).steps('main'));
  });
});

describe('letdown networks', () => {
  it('lead upwards', () => {
    expect(feedPath(twoLevels, 'lowest')).toEqual(['lowest', 'low', 'main']);
    expect(countsOn(twoLevels, 'bottom', 'main')).toBe(true);
    expect(countsOn(twoLevels, 'top', 'low')).toBe(false);
  });

  it('end where they would run in a ring', () => {
    expect(feedPath(plant({ headers: [letdown('a', 'b'), letdown('b', 'a')] }), 'a')).toEqual(['a', 'b']);
  });
});

describe('who draws', () => {
  it('names the greatest first, and equals by name', () => {
    const source = { plant: twoLevels, activities: [on('top', 20), on('bottom', 90), on('mid', 20), on('dry', 500)] };
    expect(whoDraws(source, 'main', 10).map(({ activityId, kgPerH }) => [activityId, kgPerH])).toEqual([
      ['on-bottom', 90],
      ['on-mid', 20],
      ['on-top', 20],
    ]);
    expect(whoDraws(source, 'low', 29).map((share) => share.unitId)).toEqual(['bottom', 'mid']);
    expect(whoDraws(source, 'main', 30)).toEqual([]);
  });

  it('names those that rise at a minute, not those that go on', () => {
    const rising = activity('rising', {
      modes: [{ unitId: 'top', minutes: 20, phases: [phase(0, 5, 10), phase(5, 15, 300)], uses: [], dutyId: null }],
    });
    const finder = drawFinder({ plant: twoLevels, activities: [on('mid', 400, 0), rising] });
    expect(finder.whoRises('main', 5)).toEqual([{ activityId: 'rising', unitId: 'top', kgPerH: 290 }]);
    expect(finder.whoRises('main', 0).map((share) => share.activityId)).toEqual(['on-mid', 'rising']);
    expect(finder.whoRises('main', 6)).toEqual([]);
  });
});
