import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import { demoWeek } from '@/server/demo/demoWeek';
import { DEMO_PRODUCTS } from '@/server/demo/products';
import { DEMO_UNITS } from '@/server/demo/plant';

const week = demoWeek();
const judged = evaluateWeek(week);
const main = judged.headers.find((h) => h.headerId === 'demo-main');
const count = (which: (a: Activity) => boolean): number => week.activities.filter(which).length;

describe('the demo week', () => {
  it('has the units of a small cannery', () => {
    const kinds = (kind: string) => DEMO_UNITS.filter((u) => u.kind === kind).length;
    expect([kinds('blancher'), kinds('kettle'), kinds('filler'), kinds('retort')]).toEqual([2, 4, 3, 6]);
    expect(new Set(DEMO_UNITS.map((u) => u.lineId)).size).toBe(3);
    expect(new Set(DEMO_UNITS.flatMap((u) => u.ventGroupId ?? [])).size).toBe(2);
    expect(DEMO_PRODUCTS).toHaveLength(10);
  });

  it('holds some 150 batches and loads, and about 350 activities with cleaning', () => {
    const placed = count((a) => a.placement !== null);
    const batchesAndLoads = count((a) => a.placement !== null && (a.stage === 'retort' || a.stage === 'fill'));
    expect(batchesAndLoads).toBeGreaterThan(140);
    expect(batchesAndLoads).toBeLessThan(200);
    expect(placed + judged.cleanings.length).toBeGreaterThan(320);
    expect(placed + judged.cleanings.length).toBeLessThan(380);
    expect(count((a) => a.placement === null)).toBeGreaterThan(15);
  });

  it('occupies retorts for 75 to 90 minutes door to door', () => {
    const minutes = week.activities.filter((a) => a.stage === 'retort').flatMap((a) => a.modes.map((m) => m.minutes));
    expect(Math.min(...minutes)).toBeGreaterThanOrEqual(75);
    expect(Math.max(...minutes)).toBeLessThanOrEqual(90);
  });

  it('passes the steam limit by more than half at several times on several days', () => {
    const load = main?.loadKgPerH ?? [];
    const limit = main?.limitKgPerH ?? [];
    const far = Array.from({ length: week.horizonMin }, (_, t) => (load[t] ?? 0) > 1.5 * (limit[t] ?? Infinity));
    const starts = far.flatMap((over, t) => (over && !far[t - 1] ? [t] : []));
    expect(starts.length).toBeGreaterThanOrEqual(5);
    expect(new Set(starts.map((t) => Math.floor(t / 1440))).size).toBeGreaterThanOrEqual(3);
  });

  it('draws at most 60 % of the limit on average, so that a week under it exists', () => {
    expect(main?.loadFactor.meanOfLimit).toBeLessThanOrEqual(0.6);
  });

  it('passes no process, shared or time limit: the hand only does not see steam', () => {
    expect(judged.breaches.filter((b) => b.class !== 'steam')).toEqual([]);
  });

  it('keeps one product without released data, and leaves it unplaced', () => {
    const unreleased = week.activities.filter((a) => a.processData && !a.processData.released);
    expect(unreleased.length).toBeGreaterThan(0);
    expect(unreleased.every((a) => a.placement === null)).toBe(true);
  });

  it('is the same every time', () => {
    expect(demoWeek()).toEqual(week);
  });
});
