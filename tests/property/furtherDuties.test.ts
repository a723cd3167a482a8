/** What always holds of the further duty models: their heat closes to 1e-9, and more work takes more steam. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { betweenRuns } from '@/core/duty/betweenRuns';
import { cleaningInPlace } from '@/core/duty/cleaningInPlace';
import { continuousCooker } from '@/core/duty/continuousCooker';
import type { Duty, SteamSupply } from '@/core/duty/duty';
import { evaporator } from '@/core/duty/evaporator';
import { exhaustBox } from '@/core/duty/exhaustBox';
import { hotWater } from '@/core/duty/hotWater';
import { injectionCooker } from '@/core/duty/injectionCooker';
import { overpressureRetort } from '@/core/duty/overpressureRetort';
import { platePasteuriser } from '@/core/duty/platePasteuriser';
import { specificHeat, type SpecificHeatBasis } from '@/core/duty/specificHeat';
import { stillRetort } from '@/core/duty/stillRetort';
import { tunnelPasteuriser } from '@/core/duty/tunnelPasteuriser';
import { waterBlancher } from '@/core/duty/waterBlancher';
import { toAbsolute } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius } from '@/core/quantity/units';
import { liquidEnthalpy } from '@/core/steam/fluid';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { steamState } from '@/core/steam/steamState';
import * as example from '../verification/dutyExamples';
import { retortC } from '../verification/dutyWorkedBatches';
import { expectRelative, valueOf } from '../verification/steamSupport';

const CLOSES = 1e-9;
const STEEL = 0.5;
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const heatings = fc.constantFrom('direct' as const, 'exchanger' as const);

const supplies: fc.Arbitrary<SteamSupply> = fc
  .record({ barG: between(4, 16), dryness: between(0.9, 1), ambient: between(0.9, 1.05).map(barAbsolute) })
  .map(({ barG, dryness, ambient }) => {
    const header = { pressure: barGauge(barG), quality: { kind: 'wet', dryness } as const, ambient };
    return { header: valueOf(steamState(header)), ambient };
  });

const kgOf = ({ phases }: Duty, kind: string) =>
  phases
    .filter((phase) => phase.kind === kind)
    .reduce((kg, { minutes, steamKgPerH }) => kg + (minutes * steamKgPerH) / 60, 0);
const h = (t: number) => valueOf(liquidEnthalpy(celsius(t)));
const hg = (t: number) => valueOf(saturationAtTemperature(celsius(t))).hg;
const cpOf = (basis: SpecificHeatBasis, t: number) => valueOf(specificHeat(basis, t)).value;
/** Enthalpy of the condensate: hot water's own where steam is blown in, saturated in an exchanger. */
const condensateH = (input: { heating: string; exchangerPressureBarG: number }, t: number, { ambient }: SteamSupply) =>
  input.heating === 'direct'
    ? h(t)
    : valueOf(saturationAtPressure(toAbsolute(barGauge(input.exchangerPressureBarG), ambient))).hf;

/** Runs a property and says how often it ran. */
function always<T>(arbitrary: fc.Arbitrary<T>, holds: (value: T, supply: SteamSupply) => void, numRuns = 60) {
  let seen = 0;
  fc.assert(
    fc.property(arbitrary, supplies, (value, supply) => {
      holds(value, supply);
      seen += 1;
    }),
    { numRuns },
  );
  expect(seen).toBeGreaterThanOrEqual(numRuns);
}

/** Steam of an input with one change after another: each takes more than the plain one. */
function expectMore<Input>(kg: (input: Input) => number, input: Input, changes: readonly Partial<Input>[]) {
  const plain = kg(input);
  for (const change of changes) expect(kg({ ...input, ...change }), Object.keys(change).join()).toBeGreaterThan(plain);
}

describe('water blancher', () => {
  const inputs = fc
    .record({
      heating: heatings,
      exchangerPressureBarG: between(1, 3),
      productKgPerH: between(100, 10_000),
      productOutC: between(60, 90),
      warmUpMin: between(1, 60),
      runMin: between(1, 600),
      idleMin: between(1, 120),
      steelKg: between(0, 5000),
      tankWaterKg: between(0, 8000),
      bathC: between(90, 95),
      makeUpKgPerH: between(0, 5000),
      makeUpC: between(5, 60),
      evaporationKgPerM2H: between(0, 40),
      escapeFraction: between(0, 0.9),
    })
    .map((change) => ({ ...example.waterBlancherD, ...change }));

  it('closes its heat in warm-up, run and idling', () => {
    always(inputs, (input, supply) => {
      const duty = valueOf(waterBlancher(input, supply));
      const dh = supply.header.h - condensateH(input, input.bathC, supply);
      const shellKW = (input.surfaceLossWPerM2K * input.shellAreaM2 * (input.bathC - input.ambientC)) / 1000;
      const vapourKgPerH = input.openAreaM2 * input.evaporationKgPerM2H;
      const vapourKW = (vapourKgPerH * (hg(input.bathC) - h(input.bathC))) / 3600;
      const cp = cpOf(input.product, (input.productInC + input.productOutC) / 2);
      const productKW = (input.productKgPerH * cp * (input.productOutC - input.productInC)) / 3600;
      const freshKJPerKg = h(input.bathC) - h(input.makeUpC);
      const runKW = productKW + (input.makeUpKgPerH * freshKJPerKg) / 3600 + vapourKW + shellKW;
      expectRelative(kgOf(duty, 'run') * (1 - input.escapeFraction) * dh, runKW * 60 * input.runMin, CLOSES);
      const idleKW = (vapourKgPerH * freshKJPerKg) / 3600 + vapourKW + shellKW;
      expectRelative(kgOf(duty, 'idle') * (1 - input.escapeFraction) * dh, idleKW * 60 * input.idleMin, CLOSES);
      const warmKJ =
        input.steelKg * STEEL * (input.bathC - input.coldC) +
        input.tankWaterKg * (h(input.bathC) - h(input.coldC)) +
        30 * (shellKW + vapourKW) * input.warmUpMin;
      expectRelative(kgOf(duty, 'warmUp') * dh, warmKJ, CLOSES);
    });
  });

  it('takes more for more product, fresh water, evaporation, escape or water to warm', () => {
    always(inputs, (input, supply) => {
      expectMore((i: typeof input) => valueOf(waterBlancher(i, supply)).steamKg, input, [
        { productKgPerH: input.productKgPerH + 10 },
        { makeUpKgPerH: input.makeUpKgPerH + 10 },
        { evaporationKgPerM2H: input.evaporationKgPerM2H + 1 },
        { escapeFraction: input.escapeFraction + 0.01 },
        { tankWaterKg: input.tankWaterKg + 10 },
      ]);
    });
  });
});

describe('injection cooker', () => {
  const inputs = fc
    .record({
      batchKg: between(10, 5000),
      vesselSteelKg: between(0, 2000),
      startC: between(0, 60),
      endC: between(70, 135),
      heatUpMin: between(1, 60),
      heatingLossKW: between(0, 20),
      holdMin: between(1, 60),
      holdLossKW: between(0.1, 20),
      escapeFraction: between(0, 0.8),
    })
    .map((change) => ({ ...example.injectionE, ...change }));

  it('closes its heat, and adds as much water as steam condenses', () => {
    always(inputs, (input, supply) => {
      const duty = valueOf(injectionCooker(input, supply));
      const dh = supply.header.h - h(input.endC);
      const heatKJ =
        (input.batchKg * 3.9 + input.vesselSteelKg * STEEL) * (input.endC - input.startC) +
        60 * input.heatingLossKW * input.heatUpMin;
      expectRelative(kgOf(duty, 'heatUp') * (1 - input.escapeFraction) * dh, heatKJ, CLOSES);
      const holdKJ = 60 * input.holdLossKW * input.holdMin;
      expectRelative(kgOf(duty, 'hold') * (1 - input.escapeFraction) * dh, holdKJ, CLOSES);
      const added = duty.working.totals.find(({ name }) => name === 'Water added by the steam')?.value;
      expectRelative(added ?? Number.NaN, duty.steamKg * (1 - input.escapeFraction), 1e-12);
    });
  });

  it('takes more for a bigger, colder or hotter batch', () => {
    always(inputs, (input, supply) => {
      expectMore((i: typeof input) => valueOf(injectionCooker(i, supply)).steamKg, input, [
        { batchKg: input.batchKg + 1 },
        { startC: input.startC - 0 === 0 ? 0 : input.startC * 0.9, batchKg: input.batchKg + 0.1 },
        { endC: input.endC + 1 },
        { escapeFraction: input.escapeFraction + 0.01 },
      ]);
    });
  });
});

describe('still retort vented in steps', () => {
  const inputs = fc
    .record({
      ventSteps: fc.integer({ min: 2, max: 10 }),
      ventMin: between(2, 12),
      shellC: between(10, 80),
      vents: fc.integer({ min: 1, max: 8 }),
      containers: fc.integer({ min: 1, max: 2500 }),
    })
    .map((change) => ({ ...retortC, ...change }));

  it('keeps the kg of every phase, and draws no less than none', () => {
    always(inputs, (input, supply) => {
      const stepped = valueOf(stillRetort(input, supply));
      const whole = valueOf(stillRetort({ ...input, ventSteps: undefined }, supply));
      for (const kind of ['vent', 'comeUp', 'process']) {
        expectRelative(kgOf(stepped, kind), kgOf(whole, kind), CLOSES);
      }
      for (const { steamKgPerH } of stepped.phases) expect(steamKgPerH).toBeGreaterThanOrEqual(0);
      const vent = stepped.phases.filter(({ kind }) => kind === 'vent');
      const peak = Math.max(...vent.map(({ steamKgPerH }) => steamKgPerH));
      expect(peak).toBeGreaterThanOrEqual((whole.phases[0]?.steamKgPerH ?? Number.NaN) * (1 - 1e-12));
    });
  });
});

describe('over-pressure retort', () => {
  const inputs = fc
    .record({
      medium: fc.constantFrom('steamAir' as const, 'waterSpray' as const, 'waterImmersion' as const),
      heating: heatings,
      exchangerPressureBarG: between(2, 4),
      containers: fc.integer({ min: 0, max: 3000 }),
      circulatingWaterKg: between(0, 8000),
      reusedWaterShare: between(0, 1),
      shellC: between(10, 80),
      freeVolumeM3: between(0, 10),
      carriedOffKgPerH: between(0, 100),
    })
    .map((change) => ({ ...example.sprayRetortF, ...change }));

  /** First law from outside: what comes in with steam is what load, water, metal, losses, drains and free steam take. */
  it('closes its heat over the whole cycle', () => {
    always(inputs, (input, supply) => {
      const duty = valueOf(overpressureRetort(input, supply));
      const ends = [...input.comeUp.map((step) => step.mediumEndC), 121.1, 121.1];
      const heated = duty.phases.filter(({ kind }) => kind !== 'cool');
      const share = input.reusedWaterShare;
      let water = {
        kg: input.circulatingWaterKg,
        h: share * h(input.reusedWaterC) + (1 - share) * h(input.freshWaterC),
      };
      const cp = cpOf(input.contents, input.specificHeatAtC);
      let before = { mediumC: input.shellC, metal: true, contentsC: input.initialC, rho: 0 };
      const contentsEnds = [...input.comeUp, ...input.holds].map(({ contentsEndC }) => contentsEndC);
      for (const [i, { minutes, steamKgPerH }] of heated.entries()) {
        const endC = ends[i] ?? Number.NaN;
        const contentsC = contentsEnds[i] ?? Number.NaN;
        const rho = 1 / valueOf(saturationAtTemperature(celsius(endC))).vg;
        const kg = (steamKgPerH * minutes) / 60;
        const condensed = kg - input.freeVolumeM3 * (rho - before.rho) - (input.carriedOffKgPerH * minutes) / 60;
        const canKg = input.containers * input.containerKgEach * input.containerKJPerKgK;
        const metalKJ = before.metal
          ? STEEL * (input.shellKg * (endC - input.shellC) + input.basketsKg * (endC - input.basketsC)) +
            canKg * (endC - input.initialC)
          : (STEEL * (input.shellKg + input.basketsKg) + canKg) * (endC - before.mediumC);
        const meanC = (before.mediumC + endC) / 2;
        const lossKJ = 0.06 * input.surfaceLossWPerM2K * input.surfaceAreaM2 * (meanC - input.ambientC) * minutes;
        const contentsKJ = input.containers * input.contentsKgEach * cp * (contentsC - before.contentsC);
        const out = condensateH(input, endC, supply);
        const takenKJ = metalKJ + lossKJ + contentsKJ + water.kg * (h(endC) - water.h);
        expectRelative(condensed * (supply.header.h - out), takenKJ, 1e-8);
        const stays = input.heating === 'direct' && input.medium !== 'steamAir';
        water = { kg: water.kg + (stays ? condensed : 0), h: h(endC) };
        before = { mediumC: endC, metal: false, contentsC, rho };
      }
    });
  });

  it('takes less with a warmer shell or more water kept hot, more with more of anything', () => {
    always(inputs, (input, supply) => {
      const more = { ...input, reusedWaterShare: input.reusedWaterShare * 0.9 };
      expectMore((i: typeof input) => valueOf(overpressureRetort(i, supply)).steamKg, more, [
        { containers: input.containers + 10 },
        { circulatingWaterKg: input.circulatingWaterKg + 50 },
        { shellC: input.shellC - 5 },
        { carriedOffKgPerH: input.carriedOffKgPerH + 5 },
      ]);
      const kg = (i: typeof input) => valueOf(overpressureRetort(i, supply)).steamKg;
      const watery = { ...input, circulatingWaterKg: input.circulatingWaterKg + 100 };
      expect(kg({ ...watery, reusedWaterShare: 1 })).toBeLessThan(kg({ ...watery, reusedWaterShare: 0 }));
    });
  });
});

describe('continuous cooker', () => {
  const inputs = fc
    .record({
      containersPerMin: between(0, 1500),
      heatUpMin: between(30, 600),
      runMin: between(60, 5000),
      idleMin: between(1, 500),
      steelKg: between(1000, 100_000),
      waterKg: between(0, 50_000),
      legWaterKgPerH: between(0, 5000),
      bleedKgPerH: between(0, 500),
      surfaceLossWPerM2K: between(0.5, 20),
    })
    .map((change) => ({ ...example.hydrostaticG, ...change }));

  it('closes its heat while heating up, running and standing hot', () => {
    always(inputs, (input, supply) => {
      const duty = valueOf(continuousCooker(input, supply));
      const process = valueOf(saturationAtTemperature(celsius(input.processC)));
      const dh = supply.header.h - process.hf;
      const lossKW = (input.surfaceLossWPerM2K * input.surfaceAreaM2 * (input.processC - input.ambientC)) / 1000;
      const condensedKJ = (kind: string, minutes: number) =>
        (kgOf(duty, kind) - (input.bleedKgPerH * minutes) / 60) * dh;
      const heatUpKJ =
        input.steelKg * STEEL * (input.processC - input.coldC) +
        input.waterKg * (process.hf - h(input.coldC)) +
        30 * lossKW * input.heatUpMin;
      expectRelative(condensedKJ('heatUp', input.heatUpMin), heatUpKJ, CLOSES);
      const cp = cpOf(input.product, (input.inC + input.outC) / 2);
      const each = input.contentsKgEach * cp + input.containerKgEach * input.containerKJPerKgK;
      const runKW =
        (input.containersPerMin * each * (input.outC - input.inC)) / 60 +
        (input.legWaterKgPerH * (h(input.legWaterOutC) - h(input.legWaterInC))) / 3600 +
        lossKW;
      expectRelative(condensedKJ('run', input.runMin), runKW * 60 * input.runMin, CLOSES);
      expect(Math.abs(condensedKJ('idle', input.idleMin) / (lossKW * 60 * input.idleMin) - 1)).toBeLessThan(1e-8);
    });
  });

  it('keeps its greatest draw of the heat-up within 2 %', () => {
    always(inputs, (input, supply) => {
      const { phases, working } = valueOf(continuousCooker(input, supply));
      const value = (symbol: string) => working.steps.find((step) => step.symbol === symbol)?.value ?? Number.NaN;
      const even = (60 * value('m')) / input.heatUpMin;
      const atTheEnd = even + (3600 * value('q_loss')) / value('Δh') + input.bleedKgPerH;
      const drawn = Math.max(...phases.filter(({ kind }) => kind === 'heatUp').map((phase) => phase.steamKgPerH));
      expect(drawn / atTheEnd).toBeGreaterThan(0.9);
      if (value('q_loss') * input.heatUpMin * 60 < 0.2 * value('m') * value('Δh')) {
        expect(drawn / atTheEnd).toBeGreaterThan(0.98);
      }
    });
  });
});

describe('exhaust box', () => {
  const inputs = fc
    .record({
      containersPerMin: between(1, 600),
      outC: between(50, 90),
      chamberC: between(90, 96),
      escapeFraction: between(0, 0.9),
      idleEscapeKgPerH: between(0, 300),
      warmUpMin: between(1, 60),
      steelKg: between(1, 5000),
    })
    .map((change) => ({ ...example.exhaustBoxH, ...change }));

  it('closes its heat, and takes more for more containers and more escape', () => {
    always(inputs, (input, supply) => {
      const duty = valueOf(exhaustBox(input, supply));
      const dh = supply.header.h - h(input.chamberC);
      const lossKW = (input.surfaceLossWPerM2K * input.shellAreaM2 * (input.chamberC - input.ambientC)) / 1000;
      const cp = cpOf(input.product, (input.inC + input.outC) / 2);
      const each = input.contentsKgEach * cp + input.containerKgEach * input.containerKJPerKgK;
      const runKW = (input.containersPerMin * each * (input.outC - input.inC)) / 60 + lossKW;
      expectRelative(kgOf(duty, 'run') * (1 - input.escapeFraction) * dh, runKW * 60 * input.runMin, CLOSES);
      const warmKJ = input.steelKg * STEEL * (input.chamberC - input.coldC) + 30 * lossKW * input.warmUpMin;
      expectRelative(kgOf(duty, 'warmUp') * dh, warmKJ, CLOSES);
      expectMore((i: typeof input) => valueOf(exhaustBox(i, supply)).steamKg, input, [
        { containersPerMin: input.containersPerMin + 1 },
        { escapeFraction: input.escapeFraction + 0.01 },
        { idleEscapeKgPerH: input.idleEscapeKgPerH + 1 },
      ]);
    });
  });
});

describe('pasteurisers', () => {
  const plates = fc
    .record({
      productKgPerH: between(100, 50_000),
      inC: between(2, 40),
      pasteuriseC: between(60, 125),
      regeneration: between(0, 0.96),
      exchangerPressureBarG: between(2, 4),
      lossKW: between(0.1, 20),
    })
    .map((change) => ({ ...example.plateI, ...change }));
  const tunnels = fc
    .record({
      heating: heatings,
      containersPerMin: between(1, 1500),
      regeneration: between(0, 0.9),
      overflowKgPerH: between(0, 5000),
      exchangerPressureBarG: between(1, 4),
    })
    .map((change) => ({ ...example.tunnelJ, ...change }));

  it('of plates close their heat; less regeneration or more product takes more', () => {
    always(plates, (input, supply) => {
      const duty = valueOf(platePasteuriser(input, supply));
      const dh = supply.header.h - condensateH({ heating: 'exchanger', ...input }, input.pasteuriseC, supply);
      const span = (input.pasteuriseC - input.inC) * (1 - input.regeneration);
      const runKW = (input.productKgPerH * 3.9 * span) / 3600 + input.lossKW;
      expectRelative(kgOf(duty, 'run') * dh, runKW * 60 * input.runMin, CLOSES);
      expectRelative(kgOf(duty, 'idle') * dh, input.lossKW * 60 * input.idleMin, CLOSES);
      expectMore((i: typeof input) => valueOf(platePasteuriser(i, supply)).steamKg, input, [
        {
          regeneration: input.regeneration * 0.9 - 1e-6 < 0 ? 0 : input.regeneration * 0.9,
          lossKW: input.lossKW + 0.1,
        },
        { productKgPerH: input.productKgPerH + 10 },
        { pasteuriseC: input.pasteuriseC + 1 },
      ]);
    });
  });

  it('of tunnels close their heat; more containers or overflow takes more', () => {
    always(tunnels, (input, supply) => {
      const duty = valueOf(tunnelPasteuriser(input, supply));
      const dh = supply.header.h - condensateH(input, input.sprayC, supply);
      const lossKW = (input.surfaceLossWPerM2K * input.shellAreaM2 * (input.sprayC - input.ambientC)) / 1000;
      const cp = cpOf(input.product, (input.inC + input.outC) / 2);
      const each = input.contentsKgEach * cp + input.containerKgEach * input.containerKJPerKgK;
      const loadKW = (input.containersPerMin * each * (input.outC - input.inC) * (1 - input.regeneration)) / 60;
      const freshKW = (input.overflowKgPerH * (h(input.sprayC) - h(input.makeUpC))) / 3600;
      expectRelative(kgOf(duty, 'run') * dh, (loadKW + freshKW + lossKW) * 60 * input.runMin, CLOSES);
      expectMore((i: typeof input) => valueOf(tunnelPasteuriser(i, supply)).steamKg, input, [
        { containersPerMin: input.containersPerMin + 1 },
        { overflowKgPerH: input.overflowKgPerH + 10 },
        { waterKg: input.waterKg + 100 },
      ]);
    });
  });
});

describe('evaporator', () => {
  const inputs = fc
    .record({
      feedKgPerH: between(100, 50_000),
      feedC: between(10, 90),
      solidsIn: between(0.02, 0.2),
      solidsOut: between(0.25, 0.7),
      effects: fc.integer({ min: 1, max: 7 }),
      economyShare: between(0.5, 1),
      lossKW: between(0, 50),
    })
    .map((change) => ({ ...example.evaporatorK, ...change }));

  it('closes heat and solids; more effects or thinner concentrate takes less', () => {
    always(inputs, (input, supply) => {
      const duty = valueOf(evaporator(input, supply));
      const concentrate = (input.feedKgPerH * input.solidsIn) / input.solidsOut;
      const firstEffect = (input.feedKgPerH - concentrate) / (input.effects * input.economyShare);
      const { hfg } = valueOf(saturationAtTemperature(celsius(input.boilingC)));
      const cp = cpOf(input.product, (input.feedC + input.boilingC) / 2);
      const runKW = (firstEffect * hfg + input.feedKgPerH * cp * (input.boilingC - input.feedC)) / 3600 + input.lossKW;
      const dh = supply.header.h - condensateH({ heating: 'exchanger', ...input }, input.boilingC, supply);
      expectRelative(kgOf(duty, 'run') * dh, runKW * 60 * input.runMin, CLOSES);
      expectMore(
        (i: typeof input) => valueOf(evaporator(i, supply)).steamKg,
        { ...input, effects: input.effects + 1 },
        [{ effects: input.effects }, { solidsOut: input.solidsOut + 0.02 }, { feedKgPerH: input.feedKgPerH + 10 }],
      );
    });
  });
});

describe('hot water and cleaning in place', () => {
  const waters = fc
    .record({
      heating: heatings,
      waterKg: between(10, 20_000),
      hotC: between(40, 90),
      storeKg: between(0, 30_000),
      drawMin: between(1, 120),
      reheatMin: between(1, 600),
      lossKW: between(0, 20),
    })
    .map((change) => ({ ...example.washDownL, ...change }));
  const cips = fc
    .record({
      heating: heatings,
      solutionKg: between(10, 10_000),
      tankC: between(10, 60),
      setC: between(65, 90),
      circuitSteelKg: between(0, 5000),
      warmingMin: between(0.5, 20),
      washMin: between(20, 60),
      rinseMin: fc.oneof(fc.constant(0), between(0.01, 30)),
      rinseKg: between(0, 5000),
    })
    .map((change) => ({ ...example.cipM, ...change }));

  it('heat all the water once, now or later', () => {
    always(waters, (input, supply) => {
      const duty = valueOf(hotWater(input, supply));
      const minutes = duty.phases.reduce((sum, phase) => sum + phase.minutes, 0);
      const heatKJ = input.waterKg * (h(input.hotC) - h(input.coldC)) + 60 * input.lossKW * minutes;
      expectRelative(duty.steamKg * (supply.header.h - condensateH(input, input.hotC, supply)), heatKJ, CLOSES);
    });
  });

  it('add up: tank and circuit are the whole', () => {
    always(cips, (input, supply) => {
      const kg = (part: 'whole' | 'tank' | 'circuit') => valueOf(cleaningInPlace({ ...input, part }, supply)).steamKg;
      expectRelative(kg('tank') + kg('circuit'), kg('whole'), 1e-12);
    });
  });

  it('close the heat of tank, circuit and rinse', () => {
    always(cips, (input, supply) => {
      const duty = valueOf(cleaningInPlace(input, supply));
      const dh = supply.header.h - condensateH(input, input.setC, supply);
      const tankKJ = input.solutionKg * (h(input.setC) - h(input.tankC)) + 60 * input.tankLossKW * input.reheatMin;
      expectRelative(kgOf(duty, 'heatUp') * dh, tankKJ, CLOSES);
      const washKJ =
        input.circuitSteelKg * STEEL * (input.setC - input.circuitC) + 60 * input.circuitLossKW * input.washMin;
      expectRelative(kgOf(duty, 'wash') * dh, washKJ, CLOSES);
      const rinseKJ = input.rinseMin > 0 ? input.rinseKg * (h(input.rinseC) - h(input.coldWaterC)) : 0;
      const rinseDh = supply.header.h - condensateH(input, input.rinseC, supply);
      expect(Math.abs(kgOf(duty, 'rinse') * rinseDh - rinseKJ)).toBeLessThanOrEqual(CLOSES * Math.max(1, rinseKJ));
    });
  });
});

describe('between runs', () => {
  const draws = fc.record({ idleKgPerH: between(0, 500), minutes: between(1, 60), steamKgPerH: between(0, 2000) });

  it('fills the gap and never takes more than the dearer way, nor more than the cheaper one that is possible', () => {
    fc.assert(
      fc.property(draws, between(0.5, 2000), ({ idleKgPerH, minutes, steamKgPerH }, gapMin) => {
        const rates = { idleKgPerH, warmUp: [{ kind: 'warmUp' as const, minutes, steamKgPerH }] };
        const { phases, steamKg } = valueOf(betweenRuns(gapMin, rates));
        expectRelative(
          phases.reduce((sum, phase) => sum + phase.minutes, 0),
          gapMin,
          1e-12,
        );
        const idleKg = (idleKgPerH * gapMin) / 60;
        const warmKg = gapMin >= minutes ? (steamKgPerH * minutes) / 60 : Number.POSITIVE_INFINITY;
        expect(Math.abs(steamKg - Math.min(idleKg, warmKg))).toBeLessThanOrEqual(1e-9);
      }),
      { numRuns: 300 },
    );
  });
});
