import { describe, expect, it } from 'vitest';
import {
  boilerHorsepower,
  DISPLAY_QUANTITIES,
  displaySymbol,
  fromDisplay,
  quantityOfUnit,
  toDisplay,
  type DisplayQuantity,
} from '@/core/quantity/display';
import { sayingIn } from '@/core/quantity/saying';
import { sentenceIn } from '@/core/quantity/sentence';
import { shortEnd } from '@/core/quantity/range';

describe('US customary units', () => {
  /** One unit in SI: NIST SP 811 (2008), appendix B.8; gallon: NIST Handbook 44, appendix C. */
  it.each<[DisplayQuantity, number, string]>([
    ['absolutePressure', 0.06894757, 'psia'],
    ['pressureDifference', 0.06894757, 'psi'],
    ['heat', 1.055056, 'BTU'],
    ['length', 0.3048, 'ft'],
    ['shortLength', 25.4, 'in'],
    ['area', 0.09290304, 'ft²'],
    ['shortArea', 645.16, 'in²'],
    ['volume', 0.02831685, 'ft³'],
    ['liquidVolume', 3.785412, 'gal'],
    ['liquidRate', 6.30902e-5 * 3600, 'gal/min'],
    ['density', 16.01846, 'lb/ft³'],
    ['specificHeat', 4.1868, 'BTU/lb°F'],
    ['enthalpy', 2.326, 'BTU/lb'],
    ['heatTransferCoefficient', 5.678263, 'BTU/h ft²°F'],
    ['heatCapacity', 1.899101, 'BTU/°F'],
    ['heatConductance', 0.2930711e-3 * 1.8, 'BTU/h°F'],
    ['massFlux', 1.35623e-3 * 3600, 'lb/ft²h'],
    ['energy', 293.0711, 'million BTU'],
    ['boilerPower', 9.8095, 'boiler hp'],
    ['temperatureRise', 1 / 1.8, '°F/min'],
    ['steamRateRise', 0.45359237, 'lb/h per min'],
    ['largeMass', 0.45359237e-3, 'lb'],
  ])('one of %s is %d, as NIST has it', (quantity, si, symbol) => {
    const shown = toDisplay(quantity, si, 'usCustomary');
    // The boiler horsepower of SP 811 is 0.011 % less than the trade's 33 475 BTU/h.
    expect(Math.abs(shown - 1)).toBeLessThan(quantity === 'boilerPower' ? 1.2e-4 : 5e-6);
    expect(displaySymbol(quantity, 'usCustomary')).toBe(symbol);
  });

  it('prices fuel and its emissions by the million BTU', () => {
    expect(toDisplay('energyPrice', 0.05, 'usCustomary')).toBeCloseTo(0.05 * 293.0711, 5);
    expect(toDisplay('emissionFactor', 0.18, 'usCustomary')).toBeCloseTo((0.18 * 293.0711) / 0.45359237, 4);
  });

  /** ASME PTC and the trade: 34.5 lb/h from and at 212 degF, latent heat 970.3 BTU/lb, 33 475 BTU/h. */
  it('has a boiler horsepower of 33 475 BTU/h or 34.5 lb/h from and at', () => {
    const oneHpKW = fromDisplay('boilerPower', 1, 'usCustomary');
    expect(toDisplay('heatRate', oneHpKW, 'usCustomary')).toBeCloseTo(33_475, 8);
    expect(boilerHorsepower(fromDisplay('steamRate', 34.5, 'usCustomary'))).toBeCloseTo(1, 12);
    expect(boilerHorsepower(fromDisplay('steamRate', 27_600, 'usCustomary'))).toBeCloseTo(800, 9);
    expect(34.5 * 970.3).toBeCloseTo(33_475, -1);
  });

  it('shows fractions in per cent in both', () => {
    expect([toDisplay('share', 0.07, 'si'), fromDisplay('share', 7, 'usCustomary')]).toEqual([7.000000000000001, 0.07]);
  });
});

describe('quantityOfUnit', () => {
  it('knows the units of ranges and workings', () => {
    expect(['kg/h', 'bar g', 'bar a', 'bar', '°C', 'K', 'kJ/kgK', 'W/m²K', 'kW', 'm²'].map(quantityOfUnit)).toEqual([
      'steamRate',
      'gaugePressure',
      'absolutePressure',
      'pressureDifference',
      'temperature',
      'temperatureDifference',
      'specificHeat',
      'heatTransferCoefficient',
      'heatRate',
      'area',
    ]);
  });
  it('leaves minutes, counts and shares', () => {
    expect(['', 'min', '%', '/min', 'crates'].map(quantityOfUnit)).toEqual(Array(5).fill(undefined));
  });
  it('finds every quantity that a symbol of its own stands for', () => {
    const unfound = DISPLAY_QUANTITIES.filter((quantity) => quantityOfUnit(displaySymbol(quantity, 'si')) !== quantity);
    expect(unfound).toEqual(['boilerPower', 'share']);
  });
});

describe('sentences', () => {
  const us = (sentence: string) => sentenceIn('usCustomary', sentence);

  it('stay as they are in SI', () => expect(sentenceIn('si', 'It is 5.5 bar g.')).toBe('It is 5.5 bar g.'));
  it('say a figure with as many digits as it had, at least three', () => {
    expect(us('Limit 4300 kg/h.')).toBe('Limit 9480 lb/h.');
    expect(us('It is 5.5\u00a0bar g now')).toBe('It is 79.8\u00a0psig now');
    expect(us('1\u2009234\u2009567 kg')).toBe('2721750 lb');
    expect(us('\u221218 °C and 5 K')).toBe('-0.4 °F and 9 °F');
  });
  it('say a range with ends that lie in it', () => {
    // 50 000 kg/h are 110 231.13 lb/h; 1.5 bar g are 21.75566 psig; 16 bar g are 232.06038 psig.
    expect(us('It must be 0 to 50000 kg/h.')).toBe('It must be 0 to 110231 lb/h.');
    expect(us('1.5 to 16 bar g')).toBe('21.7557 to 232.06 psig');
    expect(us('0 or 0.01 to 480 kW')).toBe('0 or 34.1215 to 1637820 BTU/h');
    expect(us('at least 60 °C')).toBe('at least 140 °F');
    expect(us('at most 1.5 bar g')).toBe('at most 21.7556 psig');
  });
  it('leave what is no figure with a unit', () => {
    const other = 'A107 Carrots 2.5 kg tins at 06:40 for 12 min, x 0.98, 20 %, kg/h, boiler2 kg';
    expect(us(other)).toBe(other.replace('2.5 kg', '5.51 lb'));
    expect(us('3 kg/m²h')).toBe('0.614 lb/ft²h');
    expect(us('3 kg/h2')).toBe('3 kg/h2');
  });
});

describe('ends of ranges', () => {
  it('are rounded into the range', () => {
    expect([shortEnd(21.75566, 'least'), shortEnd(21.75566, 'most')]).toEqual(['21.7557', '21.7556']);
    expect([shortEnd(0, 'least'), shortEnd(212, 'most'), shortEnd(-4.0000001, 'least')]).toEqual(['0', '212', '-4']);
    expect([shortEnd(-4.0000001, 'most'), shortEnd(99.99996, 'least')]).toEqual(['-4.00001', '100']);
  });
});

describe('figures as sentences say them', () => {
  const us = sayingIn('usCustomary');
  it('are rounded to 25 lb/h, whole lb and a tenth of a psi', () => {
    // 604 kg/h are 1331.6 lb/h.
    expect([us.rate(604), us.rate(1), us.rate(0)]).toEqual(['1 325 lb/h', '25 lb/h', '0 lb/h']);
    expect([us.mass(41), us.mass(0.1), us.mass(2000)]).toEqual(['90 lb', '1 lb', '4 409 lb']);
    expect(us.pressureFall(0.3)).toBe('4.4 psi');
  });
});
