import { describe, expect, it } from 'vitest';
import { areaPath, betweenPath, greatestOf, linePath, rateMarks, stripTop, yOfRate } from '@/components/board/strip';
import { unitsOf } from '@/components/units';

const scale = { pxPerMin: 2, topKgPerH: 1000, heightPx: 100 };
const [si, us] = [unitsOf('si'), unitsOf('usCustomary')];
const view = { from: 0, to: 4 };

describe('paths of the strip', () => {
  it('should step from rate to rate', () => {
    expect(linePath([100, 100, 500, 500], view, scale)).toBe('M0 90H4V50H8');
    expect(areaPath([100, 100, 500, 500], view, scale)).toBe('M0 100V90H4V50H8V100Z');
  });
  it('should draw only the minutes in view', () => {
    expect(linePath([100, 200, 300, 400], { from: 1, to: 3 }, scale)).toBe('M2 80H4V70H6');
    expect(linePath([], view, scale)).toBe('');
    expect(areaPath([], view, scale)).toBe('');
  });
  it('should fill what passes the limit, and nothing where it is met exactly', () => {
    expect(betweenPath([400, 600, 600, 400], [500, 500, 600, 500], view, scale)).toBe('M2 50V40H4V50Z');
  });
  it('should cut rates at the top of the scale', () => expect(yOfRate(scale, 5000)).toBe(0));
});

describe('scale of the strip', () => {
  it('should end on a round number above the greatest rate', () => {
    expect(stripTop(5770, si)).toBe(7000);
    expect(stripTop(1095, si)).toBe(1200);
    expect(stripTop(0, si)).toBe(50);
  });
  it('should mark few round rates', () => {
    expect(rateMarks(7000, si)).toEqual([2000, 4000, 6000]);
    expect(rateMarks(1200, si)).toEqual([500, 1000]);
  });
  it('should end and mark on round numbers of lb/h where those are shown', () => {
    // 5 770 kg/h are 12 721 lb/h.
    expect(us.shown('steamRate', stripTop(5770, us))).toBeCloseTo(14_000, 6);
    const marks = rateMarks(stripTop(5770, us), us).map((mark) => us.shown('steamRate', mark));
    expect(marks.map(Math.round)).toEqual([5000, 10_000]);
    expect(marks[0]).toBeCloseTo(5000, 6);
  });
  it('should leave "no limit known" out of the greatest', () => expect(greatestOf([10, 1e12, 30])).toBe(30));
});
