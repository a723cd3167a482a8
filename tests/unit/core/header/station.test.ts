import { describe, expect, it } from 'vitest';
import { boilerOutlet, headerSteam } from '@/core/header/headerSteam';
import { headerStateFrom, stationBalance, type StationInput } from '@/core/header/station';
import { STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import { barAbsolute } from '@/core/quantity/units';
import { expectRelative, failureOf, valueOf } from '../../../verification/steamSupport';

const AMBIENT = STANDARD_ATMOSPHERE;
const header = (pressureBarG: number, dryness: number | null, superheatK: number | null = null) =>
  valueOf(headerSteam({ pressureBarG, dryness, superheatK }, AMBIENT));
const boiler = valueOf(boilerOutlet(10, AMBIENT));
const station = (changes: Partial<StationInput> = {}): StationInput => ({
  upstreamName: 'Boiler 1',
  upstream: boiler,
  headerName: 'Main header',
  stated: header(7, 0.98),
  kgPerH: 3546.94,
  ambient: AMBIENT,
  ...changes,
});

describe('a boiler of 10 bar g into a header of 7 bar g, dryness 0.98', () => {
  // Figures by python3-iapws 1.5.3: h_g(10 bar g) 2780.7110, 7 bar g with 0.98: 2727.4291 kJ/kg.
  const found = valueOf(stationBalance(station()));

  it('arrives superheated by the valve alone', () => {
    expect(found.afterValve).toMatchObject({ kind: 'superheated' });
    expectRelative(found.afterValve.temperature, 175.311135, 1e-8);
    expect(found.afterValve.h).toBe(boiler.h);
  });

  it('needs mains that lose 53.28 kJ/kg, 52.5 kW, and 2 % of the steam condenses', () => {
    expectRelative(found.lostKJPerKg, 53.281907, 1e-7);
    expectRelative(found.lostKW, 52.496591, 1e-7);
    expect(found.condensedFraction).toBeCloseTo(0.02, 12);
    expect(found.condensedKgPerH).toBeCloseTo(0.02 * 3546.94, 8);
  });

  it('or a boiler that carries water over: dryness 0.9733', () => {
    expect(found.upstreamNeeded).toMatchObject({ kind: 'wet' });
    expectRelative(found.upstreamNeeded.kind === 'wet' ? found.upstreamNeeded.dryness : 0, 0.97334941, 1e-7);
    expectRelative(found.carriedOverKgPerH, (1 - 0.97334941) * 3546.94, 1e-6);
  });

  it('says all of it in sentences', () => {
    expect(found.says).toHaveLength(4);
    expect(found.says.join(' ')).toMatch(/4\.8 K above saturation.*53\.3 kJ\/kg less.*52\.5 kW.*2\.0 %.*0\.9733/);
  });

  it('closes in heat either way', () => {
    const through = found.kgPerH * boiler.h;
    expectRelative(found.kgPerH * header(7, 0.98).h + 3600 * found.lostKW, through, 1e-12);
    expectRelative(valueOf(headerStateFrom(found.upstreamNeeded, 7, AMBIENT)).h, header(7, 0.98).h, 1e-12);
  });

  it('writes down what it worked out', () => {
    const values = found.working.steps.map(({ symbol, value }) => [symbol, value]);
    expect(values).toContainEqual(['Δh', found.lostKJPerKg]);
    expect(values).toContainEqual(['q_m', found.lostKW]);
    expect(values).toContainEqual(['ṁ_w', found.carriedOverKgPerH]);
  });
});

describe('a header that is stated as the valve gives it', () => {
  it('loses nothing: 7 bar g with 0.98 arrives at 3 bar g with 0.9949, stated as 0.995', () => {
    const found = valueOf(stationBalance(station({ upstream: header(7, 0.98), stated: header(3, 0.995) })));
    expectRelative(found.afterValve.kind === 'wet' ? found.afterValve.dryness : 0, 0.99494705, 1e-7);
    expect(found.says).toHaveLength(2);
    expect(Math.abs(found.lostKJPerKg)).toBeLessThan(0.2);
  });

  it('may lose superheat and stay dry', () => {
    const found = valueOf(stationBalance(station({ stated: header(7, null, 2) })));
    expect(found.condensedFraction).toBe(0);
    expect(found.upstreamNeeded.kind).toBe('wet');
    expect(found.says.join(' ')).toContain('stays dry');
    const hot = valueOf(stationBalance(station({ upstream: header(10, null, 20), stated: header(7, null, 15) })));
    expect(hot.upstreamNeeded.kind).toBe('superheated');
    expect(hot.carriedOverKgPerH).toBe(0);
    expect(hot.says.join(' ')).toContain('K of superheat only');
  });
});

describe('a header that cannot be', () => {
  it('is hotter than what feeds it', () => {
    const dry = stationBalance(
      station({ upstreamName: 'Main header', upstream: header(7, 0.96), stated: header(3, 1) }),
    );
    expect(failureOf(dry)).toMatchObject({ code: 'STATION-HOTTER', field: 'dryness' });
    expect(failureOf(dry).message).toContain('dryness 0.9758');
    const hot = stationBalance(station({ stated: header(7, null, 30) }));
    expect(failureOf(hot)).toMatchObject({ code: 'STATION-HOTTER', field: 'superheatK' });
  });

  it('has a higher pressure than what feeds it', () => {
    const up = failureOf(stationBalance(station({ stated: header(11, 0.98) })));
    expect(up).toMatchObject({ code: 'STEAM-THROTTLE', field: 'pressureBarG' });
    expect(up.message).toBe('10 bar g cannot feed 11 bar g; lower the pressure of this header.');
    expect(failureOf(headerStateFrom(boiler, 10.5, AMBIENT)).field).toBe('pressureBarG');
  });
});

it('stands at the ambient pressure of the plant, in balance as in sentence', () => {
  const ambient = barAbsolute(0.845);
  const upstream = valueOf(boilerOutlet(10, ambient));
  const stated = valueOf(headerSteam({ pressureBarG: 7, dryness: 0.98, superheatK: null }, 0.845));
  const found = valueOf(stationBalance(station({ upstream, stated, ambient })));
  expect(upstream.pressure).toBeCloseTo(10.845, 12);
  expect(found.afterValve.pressure).toBeCloseTo(7.845, 12);
  expect(found.says[0]).toContain('10 bar g, dry saturated');
});
