/**
 * Random states of water and steam against Debian's python3-iapws, another hand's implementation of IAPWS-IF97: 300 of a
 * seeded stream, or 10 000 of the same stream with STEADMAIN_LONG=1 (npm run test:long).
 */
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { barAbsolute, celsius } from '@/core/quantity/units';
import { steamAt, steamTemperature, waterAt, waterTemperature } from '@/core/steam/fluid';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { stateFromEnthalpy, steamState } from '@/core/steam/steamState';
import { toGauge } from '@/core/quantity/pressure';
import { valueOf } from './outcome';

type Kind = 'saturated' | 'wet' | 'superheated' | 'subcooled';
type State = readonly [kind: Kind, barA: number, tC: number, dryness: number | null, h: number, v: number];

const SEED = '97';
const COUNT = process.env['STEADMAIN_LONG'] ? 10_000 : 300;
const ENTHALPY = 1e-8;
const MILLIKELVIN = 1e-3;

function libraryStates(): readonly State[] {
  const script = fileURLToPath(new URL('../support/iapws_states.py', import.meta.url));
  const python = process.env['IAPWS_PYTHON'] ?? '/usr/bin/python3';
  const { status, stdout, stderr, error } = spawnSync(python, [script, SEED, String(COUNT)], {
    encoding: 'utf8',
    maxBuffer: 64e6,
  });
  if (status !== 0) {
    const why = error?.message ?? stderr.trim().split('\n').at(-1) ?? '';
    throw new Error(
      `No states from python3-iapws (${python}: ${why}). As root, run:\n` +
        '  apt-get update && apt-get install -y --no-install-recommends python3-iapws\n' +
        'or set IAPWS_PYTHON to a Python that has the iapws package.',
    );
  }
  return stdout
    .trim()
    .split('\n')
    .map((line) => JSON.parse(line) as State);
}

/** Enthalpy and specific volume of the same state by the product. */
function ours([kind, barA, tC, dryness]: State): { h: number; v: number } {
  const pressure = barAbsolute(barA);
  if (kind === 'subcooled') return valueOf(waterAt(pressure, celsius(tC)));
  if (kind === 'superheated') return valueOf(steamAt(pressure, celsius(tC)));
  const sat = valueOf(saturationAtPressure(pressure));
  const x = dryness ?? Number.NaN;
  return { h: sat.hf + x * sat.hfg, v: sat.vf + x * (sat.vg - sat.vf) };
}

/** Temperature from pressure and the library's enthalpy, by every way that promises an exact inverse. */
function temperatures([kind, barA, , dryness, h]: State): readonly number[] {
  const pressure = barAbsolute(barA);
  if (kind === 'subcooled') return [valueOf(waterTemperature(pressure, h))];
  if (kind === 'superheated') {
    return [valueOf(steamTemperature(pressure, h)), valueOf(stateFromEnthalpy(pressure, h)).temperature];
  }
  const boiling = valueOf(saturationAtPressure(pressure)).temperature;
  return dryness === 0 ? [boiling] : [boiling, valueOf(stateFromEnthalpy(pressure, h)).temperature];
}

describe(`${COUNT} random states from 0 to 16 bar g, by python3-iapws`, () => {
  const states = libraryStates();
  const ofKind = (kind: Kind) => states.filter((state) => state[0] === kind);
  const worst = (of: readonly State[], measure: (state: State) => number) => Math.max(...of.map(measure));

  it('are as many as asked for, a quarter of each kind, and span the range', () => {
    expect(states).toHaveLength(COUNT);
    for (const kind of ['saturated', 'wet', 'superheated', 'subcooled'] as const) {
      expect(ofKind(kind)).toHaveLength(COUNT / 4);
      const pressures = ofKind(kind).map(([, barA]) => barA);
      expect(Math.min(...pressures)).toBeLessThan(2.5);
      expect(Math.max(...pressures)).toBeGreaterThan(15.5);
    }
    expect(worst(ofKind('superheated'), ([, , tC]) => tC)).toBeGreaterThan(340);
  });

  it.each<Kind>(['saturated', 'wet', 'superheated', 'subcooled'])('%s: enthalpy and volume to 1e-8', (kind) => {
    const off = (pick: 'h' | 'v') => (state: State) =>
      Math.abs(ours(state)[pick] / (pick === 'h' ? state[4] : state[5]) - 1);
    expect(worst(ofKind(kind), off('h'))).toBeLessThanOrEqual(ENTHALPY);
    expect(worst(ofKind(kind), off('v'))).toBeLessThanOrEqual(ENTHALPY);
  });

  it.each<Kind>(['saturated', 'wet', 'superheated', 'subcooled'])('%s: temperature from (p, h) to 1 mK', (kind) => {
    const off = (state: State) => Math.max(...temperatures(state).map((tC) => Math.abs(tC - state[2])));
    expect(worst(ofKind(kind), off)).toBeLessThanOrEqual(MILLIKELVIN);
  });

  it('saturated: pressure from temperature', () => {
    const off = ([, barA, tC]: State) => Math.abs(valueOf(saturationAtTemperature(celsius(tC))).pressure / barA - 1);
    expect(worst(ofKind('saturated'), off)).toBeLessThanOrEqual(ENTHALPY);
  });

  it('wet and superheated: through the door that a header goes', () => {
    const off = ([kind, barA, tC, dryness, h]: State) => {
      const boiling = valueOf(saturationAtPressure(barAbsolute(barA))).temperature;
      const quality =
        kind === 'wet'
          ? ({ kind: 'wet', dryness: dryness ?? Number.NaN } as const)
          : ({ kind: 'superheated', superheatK: tC - boiling } as const);
      return Math.abs(valueOf(steamState({ pressure: toGauge(barAbsolute(barA)), quality })).h / h - 1);
    };
    expect(worst([...ofKind('wet'), ...ofKind('superheated')], off)).toBeLessThanOrEqual(ENTHALPY);
  });
});
