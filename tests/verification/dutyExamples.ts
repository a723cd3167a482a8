/** One sound input for each further duty model (invented plant). */
import type { CleaningInPlaceInput } from '@/core/duty/cleaningInPlace';
import type { ContinuousCookerInput } from '@/core/duty/continuousCooker';
import type { EvaporatorInput } from '@/core/duty/evaporator';
import type { ExhaustBoxInput } from '@/core/duty/exhaustBox';
import type { HotWaterInput } from '@/core/duty/hotWater';
import type { InjectionCookerInput } from '@/core/duty/injectionCooker';
import type { OverpressureRetortInput } from '@/core/duty/overpressureRetortInput';
import type { PlatePasteuriserInput } from '@/core/duty/platePasteuriser';
import type { ShellCoolingInput } from '@/core/duty/shellTemperature';
import type { TunnelPasteuriserInput } from '@/core/duty/tunnelPasteuriser';
import type { WaterBlancherInput } from '@/core/duty/waterBlancher';
import { blancherA, retortC } from './dutyWorkedBatches';

const { product } = blancherA;

export const waterBlancherD: WaterBlancherInput = {
  heating: 'direct',
  exchangerPressureBarG: 3,
  productKgPerH: 3600,
  productInC: 15,
  productOutC: 90,
  product,
  warmUpMin: 30,
  runMin: 120,
  idleMin: 10,
  steelKg: 1500,
  tankWaterKg: 2000,
  coldC: 15,
  bathC: 93,
  makeUpKgPerH: 600,
  makeUpC: 15,
  openAreaM2: 2,
  evaporationKgPerM2H: 15,
  shellAreaM2: 20,
  ambientC: 20,
  surfaceLossWPerM2K: 14,
  escapeFraction: 0.1,
};

export const injectionE: InjectionCookerInput = {
  batchKg: 1000,
  product: { kind: 'given', kJPerKgK: 3.9, source: 'worked example' },
  vesselSteelKg: 0,
  startC: 20,
  endC: 95,
  heatUpMin: 15,
  heatingLossKW: 0,
  holdMin: 10,
  holdLossKW: 4,
  escapeFraction: 0,
  recipeRoomKg: 130,
};

export const sprayRetortF: OverpressureRetortInput = {
  medium: 'waterSpray',
  heating: 'direct',
  exchangerPressureBarG: 5,
  containers: 1200,
  contentsKgEach: 0.4,
  containerKgEach: 0.25,
  containerKJPerKgK: 0.84,
  contents: retortC.contents,
  specificHeatAtC: 80,
  basketsKg: 400,
  shellKg: 3500,
  surfaceAreaM2: 22,
  freeVolumeM3: 3,
  shellC: 30,
  basketsC: 25,
  initialC: 40,
  ambientC: 25,
  surfaceLossWPerM2K: 14,
  circulatingWaterKg: 400,
  freshWaterC: 20,
  reusedWaterShare: 0.5,
  reusedWaterC: 60,
  carriedOffKgPerH: 20,
  comeUp: [
    { minutes: 8, mediumEndC: 90, contentsEndC: 52 },
    { minutes: 7, mediumEndC: 121.1, contentsEndC: 78 },
  ],
  holds: [
    { minutes: 15, contentsEndC: 110 },
    { minutes: 20, contentsEndC: 120 },
  ],
  coolMin: 25,
};

export const hydrostaticG: ContinuousCookerInput = {
  kind: 'hydrostatic',
  containersPerMin: 400,
  contentsKgEach: 0.425,
  containerKgEach: 0.055,
  containerKJPerKgK: 0.5,
  product: retortC.contents,
  inC: 70,
  outC: 119,
  heatUpMin: 180,
  runMin: 960,
  idleMin: 60,
  steelKg: 40_000,
  waterKg: 20_000,
  coldC: 20,
  processC: 121.1,
  legWaterKgPerH: 1000,
  legWaterInC: 20,
  legWaterOutC: 85,
  bleedKgPerH: 60,
  surfaceAreaM2: 150,
  ambientC: 25,
  surfaceLossWPerM2K: 6,
};

export const exhaustBoxH: ExhaustBoxInput = {
  containersPerMin: 84,
  contentsKgEach: 0.425,
  containerKgEach: 0.055,
  containerKJPerKgK: 0.5,
  product: retortC.contents,
  inC: 40,
  outC: 75,
  warmUpMin: 10,
  runMin: 120,
  idleMin: 10,
  steelKg: 600,
  coldC: 20,
  chamberC: 95,
  shellAreaM2: 12,
  ambientC: 22,
  surfaceLossWPerM2K: 14,
  escapeFraction: 0.4,
  idleEscapeKgPerH: 60,
};

export const plateI: PlatePasteuriserInput = {
  productKgPerH: 10_000,
  product: { kind: 'given', kJPerKgK: 3.9, source: 'worked example' },
  inC: 4,
  pasteuriseC: 72,
  regeneration: 0.9,
  exchangerPressureBarG: 2,
  warmUpMin: 20,
  runMin: 240,
  idleMin: 15,
  steelKg: 800,
  waterKg: 400,
  coldC: 20,
  lossKW: 3,
};

export const tunnelJ: TunnelPasteuriserInput = {
  heating: 'exchanger',
  exchangerPressureBarG: 3,
  containersPerMin: 200,
  contentsKgEach: 0.35,
  containerKgEach: 0.2,
  containerKJPerKgK: 0.84,
  product,
  inC: 30,
  outC: 80,
  regeneration: 0.4,
  warmUpMin: 60,
  runMin: 480,
  idleMin: 30,
  steelKg: 12_000,
  waterKg: 8000,
  coldC: 20,
  sprayC: 85,
  overflowKgPerH: 500,
  makeUpC: 15,
  shellAreaM2: 100,
  ambientC: 22,
  surfaceLossWPerM2K: 10,
};

export const evaporatorK: EvaporatorInput = {
  feedKgPerH: 6000,
  feedC: 60,
  product,
  solidsIn: 0.06,
  solidsOut: 0.3,
  boilingC: 95,
  effects: 2,
  economyShare: 0.85,
  exchangerPressureBarG: 1,
  warmUpMin: 30,
  runMin: 600,
  idleMin: 20,
  steelKg: 4000,
  waterKg: 1500,
  coldC: 20,
  lossKW: 10,
};

export const washDownL: HotWaterInput = {
  use: 'washDown',
  heating: 'exchanger',
  exchangerPressureBarG: 3,
  waterKg: 5000,
  coldC: 15,
  hotC: 60,
  drawMin: 30,
  storeKg: 3000,
  reheatMin: 120,
  lossKW: 2,
};

export const cipM: CleaningInPlaceInput = {
  part: 'whole',
  heating: 'exchanger',
  exchangerPressureBarG: 3,
  solutionKg: 2000,
  tankC: 40,
  setC: 80,
  reheatMin: 20,
  tankLossKW: 3,
  circuitSteelKg: 500,
  circuitC: 20,
  warmingMin: 5,
  washMin: 20,
  circuitLossKW: 5,
  rinseMin: 10,
  rinseKg: 800,
  coldWaterC: 15,
  rinseC: 85,
};

export const shellN: ShellCoolingInput = {
  endC: 40,
  ambientC: 25,
  minutesSinceEnd: 60,
  shellKg: 3200,
  areaM2: 21.1115,
  surfaceLossWPerM2K: 14,
};
