import { describe, expect, it } from 'vitest';
import { displaySymbol, fromDisplay, toDisplay, type DisplayQuantity } from '@/core/quantity/display';
import {
  ambientAtAltitude,
  checkAmbient,
  STANDARD_ATMOSPHERE,
  toAbsolute,
  toBar,
  toGauge,
  toMegapascal,
} from '@/core/quantity/pressure';
import { checkRange, shortNumber } from '@/core/quantity/range';
import { barAbsolute, barGauge, celsius, kelvin, megapascalAbs, toCelsius, toKelvin } from '@/core/quantity/units';

describe('gauge and absolute pressure', () => {
  it('differ by the ambient pressure', () => {
    expect(toAbsolute(barGauge(7))).toBeCloseTo(8.01325, 12);
    expect(toAbsolute(barGauge(7), barAbsolute(0.845))).toBeCloseTo(7.845, 12);
    expect(toGauge(barAbsolute(8.01325))).toBeCloseTo(7, 12);
    expect(toGauge(barAbsolute(1), barAbsolute(0.845))).toBeCloseTo(0.155, 12);
  });

  it('goes to MPa and back', () => {
    expect(toMegapascal(barAbsolute(80))).toBe(8);
    expect(toBar(megapascalAbs(8))).toBe(80);
  });
});

describe('temperature', () => {
  it('has its zero at 273.15 K', () => {
    expect(toKelvin(celsius(0))).toBe(273.15);
    expect(toCelsius(kelvin(373.15))).toBe(100);
  });
});

describe('altitude', () => {
  /** ICAO Doc 7488, table of pressures. */
  it.each([
    [-500, 1.0748],
    [1000, 0.8987],
    [3000, 0.7011],
  ])('%d m has %d bar a', (altitudeM, bar) => {
    const ambient = ambientAtAltitude(altitudeM);
    expect(ambient.ok && ambient.value).toBeCloseTo(bar, 3);
  });

  it.each([-501, 5001, Number.NaN, Number.POSITIVE_INFINITY])('refuses %d m', (altitudeM) => {
    const answer = ambientAtAltitude(altitudeM);
    expect(answer).toMatchObject({ ok: false, error: { code: 'ALTITUDE-RANGE', field: 'altitudeM' } });
  });
});

describe('ambient pressure', () => {
  it('is accepted where plants stand', () => {
    expect(checkAmbient(STANDARD_ATMOSPHERE)).toEqual({ ok: true, value: 1.01325 });
  });

  it('refuses a gauge pressure given by mistake', () => {
    const answer = checkAmbient(barAbsolute(0));
    expect(answer).toMatchObject({
      error: { code: 'AMBIENT-RANGE', message: 'Ambient pressure is 0 bar a; it must be 0.5 to 1.1 bar a.' },
    });
  });
});

describe('ranges', () => {
  const range = { name: 'Product rate', unit: 'kg/h', min: 0, max: 50_000 };

  it('includes both ends', () => {
    expect(checkRange('X', range, 0)).toBeUndefined();
    expect(checkRange('X', range, 50_000)).toBeUndefined();
  });

  it('names value, range and field', () => {
    expect(checkRange('X', range, 50_000.5, 'productKgPerH')).toEqual({
      code: 'X',
      message: 'Product rate is 50000.5 kg/h; it must be 0 to 50000 kg/h.',
      field: 'productKgPerH',
    });
    expect(checkRange('X', { ...range, unit: '' }, -1)?.message).toBe('Product rate is -1; it must be 0 to 50000.');
  });

  it('refuses what is not a number', () => {
    expect(checkRange('X', range, Number.NaN)?.message).toBe(
      'Product rate is not a number; it must be 0 to 50000 kg/h.',
    );
  });

  it('shows six digits', () => {
    expect([0.35, 170.4819, 1200, 1 / 3].map(shortNumber)).toEqual(['0.35', '170.482', '1200', '0.333333']);
  });
});

describe('units on screens', () => {
  /** Exact by definition: 1 lb, 1 psi, 1 Btu (International Table). */
  it.each<[DisplayQuantity, number, number, string]>([
    ['gaugePressure', 0.06894757293168361, 1, 'psig'],
    ['steamRate', 0.45359237, 1, 'lb/h'],
    ['mass', 45.359237, 100, 'lb'],
    ['temperature', 100, 212, '°F'],
    ['temperature', -40, -40, '°F'],
    ['temperatureDifference', 5, 9, '°F'],
    ['heatRate', 1.05505585262, 3600, 'BTU/h'],
  ])('%s: %d inside is %d %s', (quantity, inside, shown, symbol) => {
    expect(toDisplay(quantity, inside, 'usCustomary')).toBeCloseTo(shown, 9);
    expect(fromDisplay(quantity, shown, 'usCustomary')).toBeCloseTo(inside, 9);
    expect(displaySymbol(quantity, 'usCustomary')).toBe(symbol);
  });

  it.each<[DisplayQuantity, string]>([
    ['gaugePressure', 'bar g'],
    ['steamRate', 'kg/h'],
    ['mass', 'kg'],
    ['temperature', '°C'],
    ['temperatureDifference', 'K'],
    ['heatRate', 'kW'],
  ])('%s in SI stays as it is, in %s', (quantity, symbol) => {
    expect(toDisplay(quantity, 12.5, 'si')).toBe(12.5);
    expect(fromDisplay(quantity, 12.5, 'si')).toBe(12.5);
    expect(displaySymbol(quantity, 'si')).toBe(symbol);
  });
});
