import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitsAt, fittingStarts } from '@/components/board/fits';
import { phase } from './fixture';

const flat = (value: number, minutes: number) => new Float64Array(minutes).fill(value);

describe('fittingStarts', () => {
  it('should leave out starts whose vent meets the one that is there', () => {
    // Limit 2000, one vent of 1500 in [30, 36): another of 600 may not overlap it.
    const load = flat(0, 60).fill(1500, 30, 36);
    const spans = fittingStarts([phase(0, 6, 600)], 10, [{ loadKgPerH: load, limitKgPerH: flat(2000, 60) }], 60);
    // It overlaps for starts 25 to 35; the last start that ends in the week is 50.
    expect(spans).toEqual([
      { from: 0, to: 25 },
      { from: 36, to: 51 },
    ]);
  });
  it('should fit where the limit is met exactly', () => {
    const rooms = [{ loadKgPerH: flat(1400, 30), limitKgPerH: flat(2000, 30) }];
    expect(fittingStarts([phase(0, 5, 600)], 5, rooms, 30)).toEqual([{ from: 0, to: 26 }]);
    expect(fittingStarts([phase(0, 5, 600.1)], 5, rooms, 30)).toEqual([]);
  });
  it('should hold every header that the steam passes through', () => {
    const wide = { loadKgPerH: flat(0, 30), limitKgPerH: flat(5000, 30) };
    const narrow = { loadKgPerH: flat(0, 30), limitKgPerH: flat(100, 30) };
    expect(fittingStarts([phase(0, 5, 600)], 5, [wide, narrow], 30)).toEqual([]);
  });
  it('should agree with trying every start, whatever the load', () => {
    let cases = 0;
    const phases = fc.array(
      fc.record({
        offset: fc.integer({ min: 0, max: 12 }),
        minutes: fc.integer({ min: 1, max: 9 }),
        rate: fc.integer({ min: 0, max: 40 }),
      }),
      { minLength: 1, maxLength: 4 },
    );
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 0, max: 60 }), { minLength: 40, maxLength: 40 }),
        phases,
        (load, drawn) => {
          cases++;
          const limit = flat(70, 40);
          const list = drawn.map((d) => phase(d.offset, d.minutes, d.rate));
          const minutes = Math.max(...drawn.map((d) => d.offset + d.minutes));
          const spans = fittingStarts(list, minutes, [{ loadKgPerH: load, limitKgPerH: limit }], 40);
          for (let start = 0; start < 40; start++) {
            const inside = start + minutes <= 40;
            const fits = list.every((p) =>
              Array.from({ length: p.minutes }, (_, i) => start + p.offsetMin + i).every(
                (t) => p.steamKgPerH === 0 || (load[t] ?? 0) + p.steamKgPerH <= 70,
              ),
            );
            expect(fitsAt(spans, start), `start ${start}`).toBe(inside && fits);
          }
        },
      ),
      { numRuns: 300 },
    );
    expect(cases).toBeGreaterThanOrEqual(300);
  });
});
