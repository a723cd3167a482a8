/** What always holds of a duty: its kilograms and its heat close, and more work takes more steam. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boilerExport } from '@/core/duty/boilerExport';
import type { Duty, SteamSupply } from '@/core/duty/duty';
import { heatUpPieces, minutesUntilRate, pieceSteamKg, rateKgPerH } from '@/core/duty/fallingRate';
import { jacketedKettle, kettleHeatUp } from '@/core/duty/jacketedKettle';
import type { JacketedKettleInput } from '@/core/duty/jacketedKettleInput';
import { specificHeat } from '@/core/duty/specificHeat';
import { steamBlancher, type SteamBlancherInput } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import type { StillRetortInput } from '@/core/duty/stillRetortInput';
import { waterHeating } from '@/core/duty/waterHeating';
import { toAbsolute } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius } from '@/core/quantity/units';
import type { Result } from '@/core/result';
import { liquidEnthalpy } from '@/core/steam/fluid';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { steamState } from '@/core/steam/steamState';
import { blancherA, kettleB, retortC } from '../verification/dutyWorkedBatches';
import { expectRelative, valueOf } from '../verification/steamSupport';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

const supplies: fc.Arbitrary<SteamSupply> = fc
  .record({ barG: between(3, 16), dryness: between(0.9, 1), ambient: between(0.75, 1.05).map(barAbsolute) })
  .map(({ barG, dryness, ambient }) => {
    const header = { pressure: barGauge(barG), quality: { kind: 'wet', dryness } as const, ambient };
    return { header: valueOf(steamState(header)), ambient };
  });

const blanchers: fc.Arbitrary<SteamBlancherInput> = fc.record({
  productKgPerH: between(100, 10_000),
  productInC: between(2, 40),
  productOutC: between(60, 94),
  product: fc.constant(blancherA.product),
  warmUpMin: between(1, 60),
  runMin: between(1, 600),
  idleMin: between(1, 120),
  steelKg: between(50, 5000),
  sumpWaterKg: between(0, 1000),
  coldC: between(5, 60),
  chamberC: between(94, 100),
  shellAreaM2: between(1, 50),
  ambientC: between(5, 45),
  surfaceLossWPerM2K: between(1, 20),
  escapeFraction: between(0, 0.9),
  idleEscapeKgPerH: between(0, 500),
});

const kettles: fc.Arbitrary<JacketedKettleInput> = fc.record({
  batchKg: between(20, 2000),
  product: fc.constant(kettleB.product),
  kettleSteelKg: between(0, 1000),
  startC: between(4, 60),
  endC: between(70, 102),
  jacketPressureBarG: between(1, 3),
  heatTransferWPerM2K: between(200, 1500),
  jacketAreaM2: between(0.3, 6),
  heatingLossKW: between(0, 10),
  boilOffKg: between(0, 19),
  holdMin: fc.oneof(fc.constant(0), between(0.01, 120)),
  holdLossKW: between(0, 10),
});

const retorts: fc.Arbitrary<StillRetortInput> = fc
  .record({
    containers: fc.integer({ min: 0, max: 2500 }),
    shellKg: between(500, 8000),
    shellC: between(10, 80),
    initialC: between(20, 70),
    ventMin: between(4, 12),
    comeUpMin: between(2, 15),
    vents: fc.integer({ min: 0, max: 8 }),
    bleeders: fc.integer({ min: 0, max: 10 }),
    minutes: between(5, 60),
    processC: between(112, 130),
  })
  .map(({ minutes, ...some }) => ({ ...retortC, ...some, holds: [{ minutes, contentsEndC: 111 }] }));

const kgOf = ({ phases }: Duty, ...kinds: string[]) =>
  phases
    .filter(({ kind }) => kinds.length === 0 || kinds.includes(kind))
    .reduce((kg, { minutes, steamKgPerH }) => kg + (minutes * steamKgPerH) / 60, 0);

/** Every model on random inputs, as one draw. */
const duties: fc.Arbitrary<readonly [object, SteamSupply, () => Result<Duty>]> = supplies.chain((supply) =>
  fc.oneof(
    blanchers.map((input) => [input, supply, () => steamBlancher(input, supply)] as const),
    kettles.map((input) => [input, supply, () => jacketedKettle(input, supply)] as const),
    retorts.map((input) => [input, supply, () => stillRetort(input, supply)] as const),
  ),
);

describe('every duty', () => {
  it('weighs what its phases weigh, each with a length and no negative draw', () => {
    let seen = 0;
    fc.assert(
      fc.property(duties, ([, , work]) => {
        const duty = valueOf(work());
        expectRelative(kgOf(duty), duty.steamKg, 1e-12);
        for (const { minutes, steamKgPerH } of duty.phases) {
          expect(minutes).toBeGreaterThan(0);
          expect(steamKgPerH).toBeGreaterThanOrEqual(0);
        }
        seen += 1;
      }),
      { numRuns: 200 },
    );
    expect(seen).toBeGreaterThanOrEqual(200);
  });

  it('leaves its input and its steam as they were, and answers the same again', () => {
    fc.assert(
      fc.property(duties, ([input, supply, work]) => {
        const before = structuredClone({ input, supply });
        const first = work();
        expect({ input, supply }).toEqual(before);
        expect(work()).toEqual(first);
      }),
    );
  });
});

describe('blancher', () => {
  it('closes its heat: what steam gives up is what product, steel, sump and shell take', () => {
    fc.assert(
      fc.property(blanchers, supplies, (input, supply) => {
        const duty = valueOf(steamBlancher(input, supply));
        const { h } = supply.header;
        const water = (t: number) => valueOf(liquidEnthalpy(celsius(t)));
        const cp = valueOf(specificHeat(input.product, (input.productInC + input.productOutC) / 2)).value;
        const lossKW = (input.surfaceLossWPerM2K * input.shellAreaM2 * (input.chamberC - input.ambientC)) / 1000;
        const productKJ =
          (input.productKgPerH * input.runMin * cp * (input.productOutC - input.productInC)) / 60 +
          lossKW * input.runMin * 60;
        expectRelative(
          kgOf(duty, 'run') * (1 - input.escapeFraction) * (h - water(input.productOutC)),
          productKJ,
          1e-9,
        );
        const warmKJ =
          input.steelKg * 0.5 * (input.chamberC - input.coldC) +
          input.sumpWaterKg * (water(input.chamberC) - water(input.coldC));
        expectRelative(kgOf(duty, 'warmUp') * (h - water(input.chamberC)), warmKJ, 1e-9);
        const idleKg = kgOf(duty, 'idle') - (input.idleEscapeKgPerH * input.idleMin) / 60;
        expectRelative(idleKg * (h - water(input.chamberC)), lossKW * 60 * input.idleMin, 1e-6);
      }),
    );
  });

  it('takes more steam for more product, hotter product, or wetter steam', () => {
    fc.assert(
      fc.property(blanchers, supplies, between(1, 500), (input, supply, more) => {
        const kg = (change: Partial<SteamBlancherInput>) =>
          valueOf(steamBlancher({ ...input, ...change }, supply)).steamKg;
        const plain = kg({});
        expect(kg({ productKgPerH: input.productKgPerH + more })).toBeGreaterThan(plain);
        expect(kg({ productInC: input.productInC - 1 })).toBeGreaterThan(plain);
        expect(kg({ escapeFraction: input.escapeFraction + 0.01 })).toBeGreaterThan(plain);
        const wetter = { ...supply, header: { ...supply.header, h: supply.header.h - 20 } };
        expect(valueOf(steamBlancher(input, wetter)).steamKg).toBeGreaterThan(plain);
      }),
    );
  });
});

describe('kettle', () => {
  it('closes its heat: steam gives up what batch, steel, losses and vapour take', () => {
    fc.assert(
      fc.property(kettles, supplies, (input, supply) => {
        const duty = valueOf(jacketedKettle(input, supply));
        const jacket = toAbsolute(barGauge(input.jacketPressureBarG), supply.ambient);
        const dh = supply.header.h - valueOf(saturationAtPressure(jacket)).hf;
        const cp = valueOf(specificHeat(input.product, (input.startC + input.endC) / 2)).value;
        const minutes = duty.phases
          .filter(({ kind }) => kind === 'heatUp' || kind === 'boilOff')
          .reduce((sum, phase) => sum + phase.minutes, 0);
        const takenKJ =
          (input.batchKg * cp + input.kettleSteelKg * 0.5) * (input.endC - input.startC) +
          input.boilOffKg * valueOf(saturationAtTemperature(celsius(input.endC))).hfg +
          60 * (input.heatingLossKW * minutes + input.holdLossKW * input.holdMin);
        expectRelative(duty.steamKg * dh, takenKJ, 1e-9);
      }),
      { numRuns: 200 },
    );
  });

  it('starts within 2 % of its peak, never rises while heating up, and no piece hides more than 4 %', () => {
    fc.assert(
      fc.property(kettles, supplies, (input, supply) => {
        const curve = valueOf(kettleHeatUp(input, supply));
        const pieces = heatUpPieces(curve);
        const mean = (index: number) => {
          const { startMin, endMin } = pieces[index] ?? { startMin: Number.NaN, endMin: Number.NaN };
          return (60 * pieceSteamKg(curve, startMin, endMin)) / (endMin - startMin);
        };
        expectRelative(mean(0), curve.peakKgPerH, 0.02);
        for (const [index, { startMin, endMin }] of pieces.entries()) {
          expect(mean(index) / rateKgPerH(curve, startMin)).toBeGreaterThan(0.96);
          expect(rateKgPerH(curve, endMin)).toBeLessThanOrEqual(mean(index));
        }
        expect(pieces.at(-1)?.endMin).toBe(curve.minutes);
        const kg = pieces.reduce((sum, { startMin, endMin }) => sum + pieceSteamKg(curve, startMin, endMin), 0);
        expectRelative(kg, pieceSteamKg(curve, 0, curve.minutes), 1e-12);
      }),
      { numRuns: 200 },
    );
  });

  it('says when it has fallen to a rate', () => {
    fc.assert(
      fc.property(kettles, supplies, between(0.01, 0.99), (input, supply, share) => {
        const curve = valueOf(kettleHeatUp(input, supply));
        const at = share * curve.minutes;
        expectRelative(minutesUntilRate(curve, rateKgPerH(curve, at)) ?? Number.NaN, at, 1e-6);
        expect(minutesUntilRate(curve, curve.peakKgPerH + 1)).toBe(0);
        expect(minutesUntilRate(curve, rateKgPerH(curve, curve.minutes) * 0.999 - 0.001)).toBeNull();
      }),
    );
  });

  it('takes longer with a bigger batch and less jacket', () => {
    fc.assert(
      fc.property(kettles, supplies, between(1, 100), (input, supply, more) => {
        const minutes = (change: Partial<JacketedKettleInput>) =>
          valueOf(kettleHeatUp({ ...input, ...change }, supply)).minutes;
        expect(minutes({ batchKg: input.batchKg + more })).toBeGreaterThan(minutes({}));
        expect(minutes({ jacketAreaM2: input.jacketAreaM2 * 0.9 })).toBeGreaterThan(minutes({}));
      }),
    );
  });
});

describe('retort', () => {
  it('closes its steam: condensed by heat, filling the void, and flown out', () => {
    fc.assert(
      fc.property(retorts, supplies, (input, supply) => {
        const { phases, working } = valueOf(stillRetort(input, supply));
        for (const section of ['Vent', 'Come-up', 'Process time']) {
          const value = (symbol: string) =>
            working.steps.find((step) => step.section === section && step.symbol === symbol)?.value ?? 0;
          expectRelative(value('m_c') * value('Δh'), value('Q'), 1e-12);
        }
        const fills = working.steps.filter(({ symbol }) => symbol === 'm_v').reduce((kg, { value }) => kg + value, 0);
        const voidM3 = working.steps.find(({ symbol }) => symbol === 'V_0')?.value ?? Number.NaN;
        expectRelative(fills * valueOf(saturationAtTemperature(celsius(input.processC))).vg, voidM3, 1e-9);
        const vent = working.steps.find(({ section, symbol }) => section === 'Vent' && symbol === 'm')?.value;
        expectRelative(((phases[0]?.steamKgPerH ?? 0) * input.ventMin) / 60, vent ?? Number.NaN, 1e-12);
      }),
    );
  });

  it('takes less steam with fewer vents, a warmer shell or a warmer load', () => {
    fc.assert(
      fc.property(retorts, supplies, (input, supply) => {
        const kg = (change: Partial<StillRetortInput>) => valueOf(stillRetort({ ...input, ...change }, supply)).steamKg;
        const plain = kg({});
        expect(kg({ vents: input.vents + 1 })).toBeGreaterThan(plain);
        expect(kg({ shellKg: input.shellKg + 100 })).toBeGreaterThan(plain);
        expect(kg({ initialC: input.initialC - 5, containers: input.containers + 1 })).toBeGreaterThan(plain);
      }),
    );
  });
});

describe('water', () => {
  it('blown hot holds the heat of steam and cold water, within 1 % of the tables', () => {
    fc.assert(
      fc.property(between(10, 5000), between(5, 40), between(50, 95), supplies, (waterKg, fromC, toC, supply) => {
        const duty = valueOf(waterHeating({ kind: 'rinse', waterKg, fromC, toC, minutes: 10 }, supply));
        const h = (t: number) => valueOf(liquidEnthalpy(celsius(t)));
        const before = waterKg * h(fromC) + duty.steamKg * supply.header.h;
        expectRelative(before, (waterKg + duty.steamKg) * h(toC), 0.01);
      }),
    );
  });
});

describe('boiler export', () => {
  const houses = fc.record({
    ratingFromAndAtKgPerH: between(500, 20_000),
    boilerPressureBarG: between(6, 16),
    feedTankPressureBarG: between(0, 0.5),
    blowdownFraction: between(0, 0.1),
    condensateReturnFraction: between(0, 0.9),
    condensateC: between(50, 98),
    makeUpC: between(5, 30),
  });

  it('closes mass and heat round boiler and feed tank', () => {
    fc.assert(
      fc.property(houses, supplies, (house, supply) => {
        const out = valueOf(boilerExport(house, supply));
        expectRelative(out.netKgPerH + out.feedTankSteamKgPerH, out.grossKgPerH, 1e-12);
        expectRelative(out.feedKgPerH * (1 - house.blowdownFraction), out.grossKgPerH, 1e-12);
        const tank = valueOf(saturationAtPressure(toAbsolute(barGauge(house.feedTankPressureBarG), supply.ambient)));
        const water = (t: number) => valueOf(liquidEnthalpy(celsius(t)));
        const r = house.condensateReturnFraction;
        const cold = out.feedKgPerH - out.feedTankSteamKgPerH;
        const inKW = cold * (r * water(house.condensateC) + (1 - r) * water(house.makeUpC));
        expectRelative(inKW + out.feedTankSteamKgPerH * supply.header.h, out.feedKgPerH * tank.hf, 1e-9);
      }),
    );
  });

  it('sends out more with more condensate back and hotter make-up', () => {
    fc.assert(
      fc.property(houses, supplies, (house, supply) => {
        const net = (change: Partial<typeof house>) => valueOf(boilerExport({ ...house, ...change }, supply)).netKgPerH;
        const plain = net({});
        expect(net({ condensateReturnFraction: house.condensateReturnFraction + 0.05 })).toBeGreaterThan(plain);
        expect(net({ makeUpC: house.makeUpC + 5 })).toBeGreaterThan(plain);
        expect(net({ blowdownFraction: house.blowdownFraction + 0.01 })).toBeLessThan(plain);
        expect(net({ ratingFromAndAtKgPerH: house.ratingFromAndAtKgPerH * 1.1 })).toBeGreaterThan(plain);
      }),
    );
  });
});
