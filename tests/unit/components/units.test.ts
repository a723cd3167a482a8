import { describe, expect, it } from 'vitest';
import { inUnits, readNumber, unitsOf } from '@/components/units';

const [si, us] = [unitsOf('si'), unitsOf('usCustomary')];

describe('figures on screens', () => {
  it('should round steam rates to 5 kg/h and 10 lb/h', () => {
    expect(si.rate(1552.6)).toBe('1\u2009555\u00a0kg/h');
    // 1552.6 kg/h are 3422.9 lb/h.
    expect(us.rate(1552.6)).toBe('3\u2009420\u00a0lb/h');
    expect(us.number('steamRate', 1552.6)).toBe('3\u2009420');
    expect(us.text('steamRate', 1552.6, 1)).toBe('3\u2009422.9\u00a0lb/h');
  });
  it('should keep a decimal of small weights only', () => {
    expect([si.mass(4.25), si.mass(2128.4), si.mass(0)]).toEqual(['4.3\u00a0kg', '2\u2009128\u00a0kg', '0\u00a0kg']);
    expect([us.mass(4), us.mass(20)]).toEqual(['8.8\u00a0lb', '44\u00a0lb']);
  });
  it('should show pressures by their gauge or absolute', () => {
    expect([si.text('gaugePressure', 7), us.text('gaugePressure', 7)]).toEqual(['7.0\u00a0bar g', '102\u00a0psig']);
    expect(us.text('gaugePressure', 0.5)).toBe('7.3\u00a0psig');
    expect(us.text('absolutePressure', 1.01325)).toBe('14.70\u00a0psia');
  });
  it('should show temperatures to a tenth, without a zero after the point', () => {
    expect([si.text('temperature', 121.1), si.text('temperature', 60)]).toEqual(['121.1\u00a0°C', '60\u00a0°C']);
    expect([us.text('temperature', 121.1), us.text('temperature', -18)]).toEqual(['250\u00a0°F', '\u22120.4\u00a0°F']);
    expect(us.text('temperatureDifference', 5)).toBe('9\u00a0°F');
  });
  it('should show a dash for what is no number', () => expect(si.rate(Number.NaN)).toBe('\u2013\u00a0kg/h'));
  it('should take a figure by the unit it comes with', () => {
    expect(inUnits(us, 2.326, 'kJ/kg').value).toBeCloseTo(1, 12);
    expect(inUnits(us, 12, 'min')).toEqual({ value: 12, unit: 'min' });
  });
});

describe('what is typed', () => {
  it('should be read with spaces or commas in thousands', () => {
    expect(
      ['1500', '1 500', '1\u2009500.5', '1,500', '1,234,567', '.5', '12.', '-3', '\u22123', '+4'].map(readNumber),
    ).toEqual([1500, 1500, 1500.5, 1500, 1_234_567, 0.5, 12, -3, -3, 4]);
  });
  it('should not be guessed where it can be read in two ways or not at all', () => {
    const texts = ['', ' ', '-', '.', '1,5', '1,50', '1 5', '12,34,567', '1.5.2', '1e3', 'abc', '5 bar', '1,500 200'];
    expect(texts.map(readNumber)).toEqual(texts.map(() => null));
  });
  it('should be kept in SI', () => {
    expect(us.parse('gaugePressure', '100')).toBeCloseTo(6.894757, 6);
    expect(us.parse('temperature', '250')).toBeCloseTo(121.1111, 4);
    expect(si.parse('steamRate', '1 500')).toBe(1500);
    expect(us.parse('steamRate', '1,5')).toBeNull();
  });
  it('should count a unit of either system', () => {
    expect(us.parse('gaugePressure', '7 bar g')).toBe(7);
    expect(us.parse('gaugePressure', '7barg')).toBe(7);
    expect(si.parse('gaugePressure', '100 psig')).toBeCloseTo(6.894757, 6);
    expect(si.parse('temperature', '250 F')).toBeCloseTo(121.1111, 4);
    expect(si.parse('steamRate', '1500 kg')).toBeNull();
  });
});

describe('a message', () => {
  it('should be told in the units shown, names of products as they are', () => {
    const text = 'Carrot dice 2.5 kg: over the steam limit by 1 550 kg/h at 7 bar g.';
    expect(us.message(text)).toBe('Carrot dice 2.5 kg: over the steam limit by 3420 lb/h at 102 psig.');
    expect(us.sentence('At least 2 kg.')).toBe('At least 4.40925 lb.');
    expect(si.message(text)).toBe(text);
  });
});
