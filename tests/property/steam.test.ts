/** What always holds of water and steam, whatever the pressure. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fromDisplay, toDisplay, type DisplayQuantity } from '@/core/quantity/display';
import { ambientAtAltitude, toAbsolute, toBar, toGauge, toMegapascal } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius, kelvin, toCelsius, toKelvin } from '@/core/quantity/units';
import { accumulatorReleaseKg, flashFraction, storedSteamKgPerBar } from '@/core/steam/flash';
import { liquidEnthalpy, steamAt, waterAt } from '@/core/steam/fluid';
import { openingAt, openingFlowKgPerH } from '@/core/steam/opening';
import { saturationPressure, saturationTemperature } from '@/core/steam/region4';
import { saturationAtPressure } from '@/core/steam/saturation';
import { stateFromEnthalpy, steamState, throttle } from '@/core/steam/steamState';
import { expectRelative, valueOf } from '../verification/steamSupport';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const plantPressure = between(0.1, 60).map(barAbsolute);
/** Two pressures, the higher first, apart enough to compare. */
const falling = fc.tuple(between(0.1, 40), between(0.01, 20)).map(([low, fall]) => [low + fall, low] as const);
const quality = fc.oneof(
  between(0.5, 1).map((dryness) => ({ kind: 'wet', dryness }) as const),
  between(0, 300).map((superheatK) => ({ kind: 'superheated', superheatK }) as const),
);
const header = fc.record({ pressure: between(0, 40).map(barGauge), quality });

describe('saturation', () => {
  it('goes from temperature to pressure and back within 1e-6 K', () => {
    fc.assert(
      fc.property(between(273.15, 623.15), (t) => {
        expect(Math.abs(saturationTemperature(saturationPressure(kelvin(t))) - t)).toBeLessThan(1e-6);
      }),
      { numRuns: 500 },
    );
  });

  it('gets hotter, and evaporation smaller, as pressure rises', () => {
    fc.assert(
      fc.property(falling, ([high, low]) => {
        const upper = valueOf(saturationAtPressure(barAbsolute(high)));
        const lower = valueOf(saturationAtPressure(barAbsolute(low)));
        expect(upper.temperature).toBeGreaterThan(lower.temperature);
        expect(upper.hf).toBeGreaterThan(lower.hf);
        expect(upper.hfg).toBeLessThan(lower.hfg);
        expect(upper.vg).toBeLessThan(lower.vg);
      }),
    );
  });

  it('has equal Gibbs energy in both phases within the release: g = h - T s', () => {
    fc.assert(
      fc.property(between(1, 340), (t) => {
        const p = toBar(saturationPressure(toKelvin(celsius(t))));
        const liquid = valueOf(waterAt(p, celsius(t)));
        const vapour = valueOf(steamAt(p, celsius(t)));
        const gap = liquid.h - vapour.h - toKelvin(celsius(t)) * (liquid.s - vapour.s);
        expect(Math.abs(gap)).toBeLessThan(0.2);
      }),
    );
  });
});

describe('one phase', () => {
  it('keeps u = h - p v', () => {
    fc.assert(
      fc.property(between(0.01, 5), between(155, 800), (p, t) => {
        const { h, u, v } = valueOf(steamAt(barAbsolute(p), celsius(t)));
        expectRelative(u, h - p * 100 * v, 1e-12);
      }),
    );
  });

  it('has cp as the slope of h', () => {
    fc.assert(
      fc.property(between(0.1, 10), between(190, 790), (p, t) => {
        const at = (dt: number) => valueOf(steamAt(barAbsolute(p), celsius(t + dt)));
        expectRelative((at(0.01).h - at(-0.01).h) / 0.02, at(0).cp, 1e-6);
      }),
    );
  });

  it('takes more heat to warm water further', () => {
    fc.assert(
      fc.property(between(0, 340), between(0.01, 10), (t, more) => {
        expect(valueOf(liquidEnthalpy(celsius(t + more)))).toBeGreaterThan(valueOf(liquidEnthalpy(celsius(t))));
      }),
    );
  });
});

describe('state from pressure and enthalpy', () => {
  it('finds a header state again: temperature within a tenth of a mK, and the same kind', () => {
    fc.assert(
      fc.property(header, (spec) => {
        const steam = valueOf(steamState(spec));
        const found = valueOf(stateFromEnthalpy(steam.pressure, steam.h));
        expect(Math.abs(found.temperature - steam.temperature)).toBeLessThan(1e-4);
        expect(Math.abs(found.h - steam.h)).toBeLessThan(1e-9);
        expectRelative(found.v, steam.v, 1e-6);
      }),
      { numRuns: 300 },
    );
  });
});

describe('a reducing valve', () => {
  it('keeps h by the tables after it, lowers temperature, never raises wetness', () => {
    let wetAfter = 0;
    let superheatedAfter = 0;
    fc.assert(
      fc.property(header, between(0.05, 1), (spec, share) => {
        const before = valueOf(steamState(spec));
        const after = valueOf(throttle(before, barAbsolute(before.pressure * share)));
        expect(Math.abs(after.h - before.h)).toBeLessThan(1e-8);
        expect(after.temperature).toBeLessThanOrEqual(before.temperature + 1e-9);
        if (after.kind === 'superheated') {
          superheatedAfter += 1;
          expectRelative(valueOf(steamAt(after.pressure, after.temperature)).h, before.h, 1e-10);
        } else {
          wetAfter += 1;
          expectRelative(after.hf + after.dryness * after.hfg, before.h, 1e-12);
        }
      }),
      { numRuns: 400 },
    );
    expect(wetAfter).toBeGreaterThan(40);
    expect(superheatedAfter).toBeGreaterThan(40);
  });

  it('in two steps is the same as in one', () => {
    fc.assert(
      fc.property(header, between(0.3, 1), between(0.3, 1), (spec, first, second) => {
        const before = valueOf(steamState(spec));
        const end = barAbsolute(before.pressure * first * second);
        const once = valueOf(throttle(before, end));
        const twice = valueOf(throttle(valueOf(throttle(before, barAbsolute(before.pressure * first))), end));
        expect(Math.abs(once.temperature - twice.temperature)).toBeLessThan(1e-6);
      }),
    );
  });

  it('leaves the state it was given as it was', () => {
    fc.assert(
      fc.property(header, (spec) => {
        const before = valueOf(steamState(spec));
        const copy = structuredClone(before);
        throttle(before, barAbsolute(before.pressure / 2));
        expect(before).toEqual(copy);
      }),
    );
  });
});

describe('flash and store', () => {
  it('flash more the further the pressure falls, and a store never more than that', () => {
    fc.assert(
      fc.property(falling, between(0.1, 0.9), ([high, low], part) => {
        const middle = barAbsolute(low + part * (high - low));
        const [from, to] = [barAbsolute(high), barAbsolute(low)];
        const flashed = valueOf(flashFraction(from, to));
        expect(flashed).toBeGreaterThan(valueOf(flashFraction(from, middle)));
        const released = valueOf(accumulatorReleaseKg(from, to, 1));
        expect(released).toBeLessThan(flashed);
        expect(released).toBeGreaterThan(0);
      }),
    );
  });

  it('a store emptied in two falls gives what one fall gives', () => {
    fc.assert(
      fc.property(between(2, 20), between(0.1, 0.9), (high, part) => {
        const [from, to] = [barAbsolute(high), barAbsolute(high * 0.4)];
        const middle = barAbsolute(to + part * (from - to));
        const first = valueOf(accumulatorReleaseKg(from, middle, 8000));
        const second = valueOf(accumulatorReleaseKg(middle, to, 8000 - first));
        expectRelative(first + second, valueOf(accumulatorReleaseKg(from, to, 8000)), 1e-6);
      }),
    );
  });

  it('stores in proportion to the water', () => {
    fc.assert(
      fc.property(plantPressure, between(1, 1e5), (p, kg) => {
        expectRelative(valueOf(storedSteamKgPerBar(p, kg)), kg * valueOf(storedSteamKgPerBar(p, 1)), 1e-12);
      }),
    );
  });
});

describe('an opening', () => {
  it('passes more at higher pressure and never more than choked flow', () => {
    fc.assert(
      fc.property(between(1.02, 20), between(0.001, 5), between(0.1, 1), (p, more, discharge) => {
        const outside = barAbsolute(1.01325);
        const flow = (inside: number) =>
          openingFlowKgPerH(valueOf(openingAt(barAbsolute(inside), outside, 100, discharge)));
        expect(flow(p + more)).toBeGreaterThan(flow(p));
        expect(flow(p)).toBeLessThanOrEqual(52.5154 * p * discharge * (1 + 1e-12));
      }),
    );
  });
});

describe('units', () => {
  const quantities: readonly DisplayQuantity[] = [
    'gaugePressure',
    'steamRate',
    'mass',
    'temperature',
    'temperatureDifference',
    'heatRate',
  ];

  it('come back from US customary as they went', () => {
    fc.assert(
      fc.property(fc.constantFrom(...quantities), between(-1e5, 1e5), (quantity, value) => {
        const back = fromDisplay(quantity, toDisplay(quantity, value, 'usCustomary'), 'usCustomary');
        expect(Math.abs(back - value)).toBeLessThan(1e-9 * Math.max(1, Math.abs(value)));
      }),
    );
  });

  it('come back from absolute pressure, MPa and K', () => {
    fc.assert(
      fc.property(between(-0.5, 60), between(0.5, 1.1), (gauge, ambient) => {
        const absolute = toAbsolute(barGauge(gauge), barAbsolute(ambient));
        expect(toGauge(absolute, barAbsolute(ambient))).toBeCloseTo(gauge, 12);
        expect(toBar(toMegapascal(absolute))).toBeCloseTo(absolute, 12);
        expect(toCelsius(toKelvin(celsius(gauge)))).toBeCloseTo(gauge, 12);
      }),
    );
  });

  it('have less air the higher the plant stands', () => {
    fc.assert(
      fc.property(between(-500, 4900), between(1, 100), (altitudeM, more) => {
        expect(valueOf(ambientAtAltitude(altitudeM + more))).toBeLessThan(valueOf(ambientAtAltitude(altitudeM)));
      }),
    );
  });
});
