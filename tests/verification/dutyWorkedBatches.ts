/** Worked batches A, B and C (invented plant): inputs, and the header they are fed from. */
import { STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import { barGauge } from '@/core/quantity/units';
import type { SteamSupply } from '@/core/duty/duty';
import type { JacketedKettleInput } from '@/core/duty/jacketedKettleInput';
import type { SteamBlancherInput } from '@/core/duty/steamBlancher';
import type { StillRetortInput } from '@/core/duty/stillRetortInput';
import { steamState } from '@/core/steam/steamState';
import { valueOf } from './outcome';

/** 7 bar g, dryness 0.98. */
export const supply: SteamSupply = {
  header: valueOf(steamState({ pressure: barGauge(7), quality: { kind: 'wet', dryness: 0.98 } })),
  ambient: STANDARD_ATMOSPHERE,
};

/** A: diced carrots. */
export const blancherA: SteamBlancherInput = {
  productKgPerH: 3600,
  productInC: 15,
  productOutC: 90,
  product: {
    kind: 'composition',
    composition: { water: 0.8779, protein: 0.0103, fat: 0.0019, carbohydrate: 0.0714, fibre: 0.03, ash: 0.0087 },
  },
  warmUpMin: 15,
  runMin: 120,
  idleMin: 10,
  steelKg: 850,
  sumpWaterKg: 180,
  coldC: 20,
  chamberC: 95,
  shellAreaM2: 9.5,
  ambientC: 22,
  surfaceLossWPerM2K: 14,
  escapeFraction: 0.25,
  idleEscapeKgPerH: 60,
};

/** B: sauce. */
export const kettleB: JacketedKettleInput = {
  batchKg: 900,
  product: {
    kind: 'composition',
    composition: { water: 0.82, protein: 0.015, fat: 0.025, carbohydrate: 0.12, fibre: 0.01, ash: 0.01 },
  },
  kettleSteelKg: 380,
  startC: 20,
  endC: 100,
  jacketPressureBarG: 2.5,
  heatTransferWPerM2K: 700,
  jacketAreaM2: 2.4,
  heatingLossKW: 3,
  boilOffKg: 60,
  holdMin: 30,
  holdLossKW: 4.5,
};

/** C: cans of sweet corn. 225 degF is 107.2222 degC. */
export const retortC: StillRetortInput = {
  containers: 1680,
  contentsKgEach: 0.425,
  containerSteelKgEach: 0.055,
  containerVolumeM3: 0.000455,
  contents: {
    kind: 'composition',
    composition: { water: 0.7596, protein: 0.0322, fat: 0.0118, carbohydrate: 0.1632, fibre: 0.027, ash: 0.0062 },
  },
  specificHeatAtC: 90,
  basketsKg: 360,
  shellKg: 3200,
  shellDiameterM: 1.2,
  shellLengthM: 5,
  shellC: 25,
  basketsC: 25,
  initialC: 60,
  ambientC: 25,
  surfaceLossWPerM2K: 14,
  ventMin: 6,
  ventEndC: (225 - 32) / 1.8,
  contentsAfterVentC: 74,
  comeUpMin: 6,
  processC: 121.1,
  contentsAfterComeUpC: 86,
  holds: [
    { minutes: 12, contentsEndC: 108 },
    { minutes: 26, contentsEndC: 119.5 },
  ],
  coolMin: 0,
  vents: 4,
  ventBoreMm: 26.645,
  ventDischarge: 0.6,
  ventPressureBarG: 0.15,
  bleeders: 5,
  bleederBoreMm: 3.175,
};
