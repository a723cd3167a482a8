import { describe, expect, it } from 'vitest';
import { figureText, figureValue, spanSaid, unitShown } from '@/components/ui/form/figure';
import { unitsOf } from '@/components/units';

const [si, us] = [unitsOf('si'), unitsOf('usCustomary')];
const pressure = { quantity: 'gaugePressure' } as const;

describe('a figure of a form', () => {
  it('should be shown and read back in the units shown', () => {
    expect([figureText(si, pressure, 7), figureText(us, pressure, 7)]).toEqual(['7', '101.526']);
    expect(figureValue(us, pressure, '100')).toBeCloseTo(6.894757, 6);
    expect(figureText(us, pressure, figureValue(us, pressure, '100'))).toBe('100');
  });
  it('should take its quantity from the unit of a range', () => {
    expect([unitShown(us, { unit: 'kg/h' }), unitShown(si, { unit: 'kg/h' })]).toEqual(['lb/h', 'kg/h']);
    expect([unitShown(us, { unit: 'min' }), unitShown(us, {})]).toEqual(['min', '']);
    expect(figureValue(us, { unit: '°C' }, '212')).toBe(100);
  });
  it('should be missing where nothing stands, and never a number where it can’t be read', () => {
    expect([figureValue(si, pressure, ''), figureValue(si, pressure, '  ')]).toEqual([null, null]);
    expect(['-', '7,5', 'seven', '7 bar a'].map((text) => figureValue(si, pressure, text))).toEqual(Array(4).fill(NaN));
    expect([figureText(si, pressure, null), figureText(si, pressure, NaN)]).toEqual(['', '']);
  });
  it('should say its range in the units shown, with ends that can be typed', () => {
    expect(spanSaid(si, pressure, 0.5, 16)).toBe('0.5 to 16 bar g');
    expect(spanSaid(us, pressure, 1.5, 16)).toBe('21.7557 to 232.06 psig');
    expect(figureValue(us, pressure, '21.7557')).toBeGreaterThanOrEqual(1.5);
    expect(figureValue(us, pressure, '232.06')).toBeLessThanOrEqual(16);
    expect([spanSaid(si, { unit: 'min' }, 0), spanSaid(si, { unit: 'min' }, undefined, 9)]).toEqual([
      'at least 0 min',
      'at most 9 min',
    ]);
    expect(spanSaid(si, {})).toBe('');
  });
});
