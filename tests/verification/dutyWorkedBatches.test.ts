/** Worked batches A, B and C (invented plant): every listed figure within 0.05 %. */
import { describe, expect, it } from 'vitest';
import type { Duty } from '@/core/duty/duty';
import { minutesUntilRate, pieceSteamKg, rateKgPerH } from '@/core/duty/fallingRate';
import { jacketedKettle, kettleHeatUp } from '@/core/duty/jacketedKettle';
import { specificHeat } from '@/core/duty/specificHeat';
import { steamBlancher } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import { waterHeating } from '@/core/duty/waterHeating';
import type { Working } from '@/core/duty/working';
import { barGauge } from '@/core/quantity/units';
import { steamState } from '@/core/steam/steamState';
import { blancherA, kettleB, retortC, supply } from './dutyWorkedBatches';
import { expectRelative, valueOf } from './steamSupport';

const TOLERANCE = 0.0005;
const expectFigure = (value: number, listed: number) => expectRelative(value, listed, TOLERANCE);

/** The value of a step of the working; the first where several pieces repeat it. */
function stepValue({ steps }: Working, section: string, symbol: string): number {
  const step = steps.find((each) => each.section === section && each.symbol === symbol);
  if (!step) throw new Error(`no step ${symbol} under ${section}`);
  return step.value;
}

function totalValue({ totals }: Working, name: string): number {
  const total = totals.find((each) => each.name === name);
  if (!total) throw new Error(`no total ${name}`);
  return total.value;
}

function phasesOf(duty: Duty): readonly (readonly [string, number, number])[] {
  return duty.phases.map(({ kind, minutes, steamKgPerH }) => [kind, minutes, steamKgPerH]);
}

function expectPhases(duty: Duty, listed: readonly (readonly [kind: string, minutes: number, kgPerH: number])[]) {
  expect(duty.phases.map(({ kind }) => kind)).toEqual(listed.map(([kind]) => kind));
  for (const [index, [, minutes, kgPerH]] of listed.entries()) {
    expectFigure(phasesOf(duty)[index]?.[1] ?? Number.NaN, minutes);
    expectFigure(phasesOf(duty)[index]?.[2] ?? Number.NaN, kgPerH);
  }
}

describe('header of the worked batches', () => {
  it('gives 2727.4291 kJ/kg at 7 bar g, dryness 0.98', () => {
    expectRelative(supply.header.h, 2727.4291, 1e-7);
  });
});

describe('worked batch A: steam blancher', () => {
  const duty = valueOf(steamBlancher(blancherA, supply));
  const { working } = duty;

  it('draws its phases', () => {
    expectPhases(duty, [
      ['warmUp', 15, 151.7959],
      ['run', 120, 614.9366],
      ['idle', 10, 75.0049],
    ]);
    expectFigure(duty.steamKg, 1280.323);
  });

  it.each([
    ['Warm-up', 'Q_steel', 31_875],
    ['Warm-up', 'Q', 88_398.28],
    ['Warm-up', 'Δh', 2329.3978],
    ['Warm-up', 'm', 37.94898],
    ['Run', 'c_p', 3.885462],
    ['Run', 'q_product', 291.4096],
    ['Losses', 'q_loss', 9.709],
    ['Run', 'ṁ_c', 461.2025],
  ])('works out %s %s', (section, symbol, listed) => {
    expectFigure(stepValue(working, section, symbol), listed);
  });

  it('closes with steam per kg and its efficiency', () => {
    expectFigure(totalValue(working, 'Steam per kg of product'), 0.170816);
    expectFigure(totalValue(working, 'Heat in product / heat in steam while running'), 0.6403);
    expectFigure(totalValue(working, 'Duration'), 145);
  });
});

describe('worked batch B: jacketed kettle', () => {
  const duty = valueOf(jacketedKettle(kettleB, supply));
  const curve = valueOf(kettleHeatUp(kettleB, supply));
  const { working } = duty;
  const heatUp = duty.phases.filter(({ kind }) => kind === 'heatUp');

  it.each([
    ['Kettle and jacket', 'c_p', 3.74743],
    ['Kettle and jacket', 'C', 3562.6872],
    ['Kettle and jacket', 'UA', 1.68],
    ['Kettle and jacket', 'Δh', 2142.5481],
    ['Heat-up', 't', 39.4325],
    ['Heat-up', 'ṁ_0', 340.9365],
    ['Heat-up', 'ṁ_1', 115.1119],
    ['Heat-up', 'm', 136.339],
    ['Heat-up', 'ṁ', 207.4517],
    ['Boiling off', 't', 34.4452],
  ])('works out %s %s', (section, symbol, listed) => {
    expectFigure(stepValue(working, section, symbol), listed);
  });

  it('draws the exponential', () => {
    expectFigure(rateKgPerH(curve, 0), 340.9365);
    expectFigure(rateKgPerH(curve, curve.minutes / 2), 197.3229);
    expectFigure(rateKgPerH(curve, curve.minutes), 115.1119);
    expectFigure(pieceSteamKg(curve, 0, 5), 26.5216);
    expectFigure(pieceSteamKg(curve, 0, 10), 49.6);
  });

  it('falls to what two blanchers and a vent leave of the boiler', () => {
    expectFigure(minutesUntilRate(curve, 253.94) ?? Number.NaN, 10.59);
    expectFigure(minutesUntilRate(curve, 135.71) ?? Number.NaN, 33.37);
  });

  it('keeps the kg of the heat-up in its pieces and the peak in the first', () => {
    const kg = heatUp.reduce((sum, { minutes, steamKgPerH }) => sum + (minutes * steamKgPerH) / 60, 0);
    expectRelative(kg, curveKg(), 1e-12);
    expectFigure(kg, 136.339);
    expectRelative(heatUp[0]?.steamKgPerH ?? Number.NaN, 340.9365, 0.02);
  });

  const curveKg = () => pieceSteamKg(curve, 0, curve.minutes);

  it('boils off and holds', () => {
    expectPhases({ ...duty, phases: duty.phases.filter(({ kind }) => kind !== 'heatUp') }, [
      ['boilOff', 34.4452, 115.1119],
      ['hold', 30, 7.56109],
    ]);
    expectFigure(totalValue(working, 'Dryness of the steam in the jacket'), 0.997807);
    expectFigure(duty.steamKg, 206.204);
  });
});

describe('worked batch C: still retort', () => {
  const duty = valueOf(stillRetort(retortC, supply));
  const { working } = duty;

  it('draws its phases', () => {
    expectPhases(duty, [
      ['vent', 6, 1555.237],
      ['comeUp', 6, 359.2303],
      ['process', 12, 217.2079],
      ['process', 26, 119.811],
    ]);
    expectFigure(duty.steamKg, 286.806);
    expectFigure(totalValue(working, 'Average steam rate'), 344.168);
  });

  it.each([
    ['Retort and load', 'c_p', 3.6267],
    ['Retort and load', 'A', 21.1115],
    ['Retort and load', 'V_0', 4.84461],
    ['Retort and load', 'ṁ_o', 42.7604],
    ['Vent', 'Q_shell', 131_555.6],
    ['Vent', 'Q_baskets', 14_800],
    ['Vent', 'Q_cans', 2181.67],
    ['Vent', 'q_loss', 12.15084],
    ['Vent', 'Q', 189_164.02],
    ['Vent', 'Δh', 2277.8205],
    ['Vent', 'm_c', 83.0461],
    ['Vent', 'm_v', 3.66837],
    ['Vent', 'm', 155.5237],
    ['Come-up', 'Q', 65_904.08],
    ['Come-up', 'm_c', 29.7003],
    ['Come-up', 'm_v', 1.94665],
    ['Come-up', 'm', 35.923],
    ['Process time, piece 1', 'q_loss', 28.40342],
    ['Process time, piece 1', 'Q', 77_418.66],
    ['Process time, piece 1', 'm', 43.4416],
    ['Process time, piece 2', 'Q', 74_088.16],
    ['Process time, piece 2', 'm', 51.9181],
  ])('works out %s %s', (section, symbol, listed) => {
    expectFigure(stepValue(working, section, symbol), listed);
  });

  it('loses 68.8093 kg by the vents', () => {
    expectFigure((stepValue(working, 'Vent', 'ṁ_o') * 6) / 60, 68.8093);
  });

  it('takes 0.401690 kg of steam per kg of contents, 150.568 kg/h in process time', () => {
    expectFigure(duty.steamKg / 714, 0.40169);
    const process = duty.phases.filter(({ kind }) => kind === 'process');
    const kg = process.reduce((sum, { minutes, steamKgPerH }) => sum + (minutes * steamKgPerH) / 60, 0);
    expectFigure((60 * kg) / 38, 150.568);
  });
});

describe('heating water by direct steam', () => {
  const dry = (barG: number) => ({
    ...supply,
    header: valueOf(steamState({ pressure: barGauge(barG), quality: { kind: 'wet', dryness: 1 } })),
  });

  it.each([
    [82, 115.683],
    [60, 74.8526],
  ])('1000 kg from 15 to %d degC by dry steam of 7 bar g', (toC, kg) => {
    const duty = valueOf(waterHeating({ kind: 'wash', waterKg: 1000, fromC: 15, toC, minutes: 10 }, dry(7)));
    expectRelative(duty.steamKg, kg, 1e-5);
    expectRelative(duty.phases[0]?.steamKgPerH ?? Number.NaN, 6 * kg, 1e-5);
  });
});

describe('specific heats used', () => {
  it.each([
    [blancherA.product, 52.5, 3.885462],
    [kettleB.product, 60, 3.74743],
    [retortC.contents, 90, 3.6267],
  ])('composition %# at %d degC', (basis, t, listed) => {
    expectRelative(valueOf(specificHeat(basis, t)).value, listed, 1e-6);
  });
});
