import { describe, expect, it } from 'vitest';
import { barAbsolute, barGauge, celsius } from '@/core/quantity/units';
import type { Result } from '@/core/result';
import { accumulatorReleaseKg, flashFraction, storedSteamKgPerBar } from '@/core/steam/flash';
import { liquidEnthalpy, steamAt, waterAt } from '@/core/steam/fluid';
import { openingAt, openingFlowKgPerH } from '@/core/steam/opening';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { stateFromEnthalpy, steamState, throttle, type SteamQuality } from '@/core/steam/steamState';

function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(result.error.message);
  return result.value;
}

/** Code, field and sentence of a problem. */
function problemOf(result: Result<unknown>) {
  if (result.ok) throw new Error('expected a problem');
  return result.error;
}

const header = (barG: number, quality: SteamQuality) => steamState({ pressure: barGauge(barG), quality });
const wet = (dryness: number): SteamQuality => ({ kind: 'wet', dryness });
const superheated = (superheatK: number): SteamQuality => ({ kind: 'superheated', superheatK });

describe('water and steam out of range', () => {
  it.each<[string, Result<unknown>, string, string]>([
    ['water below freezing', waterAt(barAbsolute(1), celsius(-1)), 'temperature', '-1 °C'],
    ['water above region 1', waterAt(barAbsolute(200), celsius(351)), 'temperature', '351 °C'],
    ['water that would boil', waterAt(barAbsolute(1), celsius(120)), 'pressure', '1 bar a'],
    ['water too high', waterAt(barAbsolute(1001), celsius(20)), 'pressure', '1001 bar a'],
    ['steam that would condense', steamAt(barAbsolute(8), celsius(150)), 'pressure', '8 bar a'],
    ['steam too hot', steamAt(barAbsolute(8), celsius(801)), 'temperature', '801 °C'],
    ['steam in region 3', steamAt(barAbsolute(400), celsius(400)), 'pressure', '400 bar a'],
    ['no pressure', steamAt(barAbsolute(0), celsius(100)), 'pressure', '0 bar a'],
    ['hot water too hot', liquidEnthalpy(celsius(400)), 'temperature', '400 °C'],
    ['saturation too low', saturationAtPressure(barAbsolute(0.001)), 'pressure', '0.001 bar a'],
    ['saturation too high', saturationAtPressure(barAbsolute(170)), 'pressure', '170 bar a'],
    ['saturation too hot', saturationAtTemperature(celsius(360)), 'temperature', '360 °C'],
    ['not a number', saturationAtTemperature(celsius(Number.NaN)), 'temperature', 'not a number'],
    ['header far too wet', header(7, wet(0.4)), 'dryness', '0.4'],
    ['header drier than dry', header(7, wet(1.01)), 'dryness', '1.01'],
    ['negative superheat', header(7, superheated(-1)), 'superheatK', '-1 K'],
    ['too much superheat', header(7, superheated(700)), 'superheatK', '700 K'],
    ['header without pressure', header(-2, wet(1)), 'pressure', '-0.98675 bar a'],
    ['enthalpy of water', stateFromEnthalpy(barAbsolute(8), 500), 'h', '500 kJ/kg'],
    ['enthalpy beyond 800 °C', stateFromEnthalpy(barAbsolute(8), 5000), 'h', '5000 kJ/kg'],
  ])('%s is STEAM-RANGE', (_what, result, field, value) => {
    const problem = problemOf(result);
    expect([problem.code, problem.field]).toEqual(['STEAM-RANGE', field]);
    expect(problem.message).toContain(`is ${value}; it must be `);
    expect(problem.message).toMatch(/it must be \S+ to \S+/);
  });

  it('checks the ambient pressure of a header', () => {
    const spec = { pressure: barGauge(7), quality: wet(1), ambient: barAbsolute(7) };
    expect(problemOf(steamState(spec)).code).toBe('AMBIENT-RANGE');
  });
});

describe('edges that are in range', () => {
  it('takes saturated states on both sides of the line', () => {
    for (const t of [5, 100, 170, 350]) {
      const { pressure, hf, hg } = valueOf(saturationAtTemperature(celsius(t)));
      expect(valueOf(waterAt(pressure, celsius(t))).h).toBeCloseTo(hf, 9);
      expect(valueOf(steamAt(pressure, celsius(t))).h).toBeCloseTo(hg, 9);
    }
  });

  it('takes steam beside region 3 and above it', () => {
    expect(steamAt(barAbsolute(250), celsius(450)).ok).toBe(true);
    expect(steamAt(barAbsolute(1000), celsius(700)).ok).toBe(true);
    expect(steamAt(barAbsolute(1001), celsius(700)).ok).toBe(false);
  });

  it('takes the enthalpy of cold water at the standard atmosphere', () => {
    const atOneAtmosphere = valueOf(waterAt(barAbsolute(1.01325), celsius(15))).h;
    expect(valueOf(liquidEnthalpy(celsius(15)))).toBe(atOneAtmosphere);
    expect(valueOf(liquidEnthalpy(celsius(150)))).toBeCloseTo(valueOf(saturationAtTemperature(celsius(150))).hf, 9);
  });
});

describe('a header', () => {
  it('without superheat is dry saturated', () => {
    expect(valueOf(header(7, superheated(0)))).toEqual(valueOf(header(7, wet(1))));
  });

  it('with superheat is hotter by it', () => {
    const dry = valueOf(header(10, wet(1)));
    const hot = valueOf(header(10, superheated(30)));
    expect(hot.temperature - dry.temperature).toBeCloseTo(30, 9);
    expect(hot.h).toBeCloseTo(valueOf(steamAt(dry.pressure, celsius(dry.temperature + 30))).h, 9);
    expect(hot.v).toBeGreaterThan(dry.v);
  });

  it('reads lower in the mountains for the same gauge', () => {
    const high = valueOf(steamState({ pressure: barGauge(7), quality: wet(1), ambient: barAbsolute(0.845) }));
    expect(high.pressure).toBeCloseTo(7.845, 12);
    expect(high.temperature).toBeLessThan(valueOf(header(7, wet(1))).temperature);
  });
});

describe('a reducing valve', () => {
  it('changes nothing when the pressure stays', () => {
    const steam = valueOf(header(7, wet(0.98)));
    const after = valueOf(throttle(steam, steam.pressure));
    expect(after).toMatchObject({ kind: 'wet', h: steam.h, temperature: steam.temperature });
  });

  it('keeps superheated steam superheated', () => {
    const after = valueOf(throttle(valueOf(header(10, superheated(50))), barAbsolute(3)));
    expect(after.kind).toBe('superheated');
  });

  it('cannot raise the pressure', () => {
    const problem = problemOf(throttle(valueOf(header(2, wet(1))), barAbsolute(8)));
    expect(problem.code).toBe('STEAM-THROTTLE');
    expect(problem.message).toContain('3.01325 bar a up to 8 bar a');
  });
});

describe('flash and store', () => {
  it('give nothing without a fall', () => {
    expect(valueOf(flashFraction(barAbsolute(5), barAbsolute(5)))).toBe(0);
    expect(valueOf(accumulatorReleaseKg(barAbsolute(5), barAbsolute(5), 8000))).toBe(0);
    expect(valueOf(storedSteamKgPerBar(barAbsolute(8), 0))).toBe(0);
  });

  it('refuse a rise, a negative store and a pressure out of range', () => {
    expect(problemOf(flashFraction(barAbsolute(2), barAbsolute(5))).code).toBe('FLASH-ORDER');
    expect(problemOf(accumulatorReleaseKg(barAbsolute(2), barAbsolute(5), 1)).code).toBe('FLASH-ORDER');
    expect(problemOf(storedSteamKgPerBar(barAbsolute(8), -1))).toMatchObject({ code: 'STORE-RANGE', field: 'waterKg' });
    expect(problemOf(accumulatorReleaseKg(barAbsolute(8), barAbsolute(2), 2e6)).code).toBe('STORE-RANGE');
    expect(problemOf(storedSteamKgPerBar(barAbsolute(200), 1)).code).toBe('STEAM-RANGE');
    expect(problemOf(flashFraction(barAbsolute(200), barAbsolute(2))).code).toBe('STEAM-RANGE');
    expect(problemOf(flashFraction(barAbsolute(2), barAbsolute(0))).code).toBe('STEAM-RANGE');
  });
});

describe('an opening', () => {
  it('passes nothing without a fall or an area', () => {
    expect(openingFlowKgPerH(valueOf(openingAt(barAbsolute(2), barAbsolute(2), 100, 1)))).toBe(0);
    expect(openingFlowKgPerH(valueOf(openingAt(barAbsolute(2), barAbsolute(1), 0, 1)))).toBe(0);
  });

  it('refuses inward flow, a negative area and a coefficient above one', () => {
    expect(problemOf(openingAt(barAbsolute(1), barAbsolute(2), 100, 1)).code).toBe('OPENING-ORDER');
    expect(problemOf(openingAt(barAbsolute(2), barAbsolute(1), -1, 1)).field).toBe('areaMm2');
    expect(problemOf(openingAt(barAbsolute(2), barAbsolute(1), 1, 1.1)).field).toBe('discharge');
  });
});
