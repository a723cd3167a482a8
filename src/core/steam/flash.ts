/** Steam that hot water gives off when its pressure falls: flash, and the store in boilers and accumulators. */
import { checkRange, shortNumber } from '../quantity/range';
import { barAbsolute, type BarAbsolute } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { saturationAtPressure } from './saturation';

const WATER = { name: 'Water in store', unit: 'kg', min: 0, max: 1e6 };

/**
 * Fraction of saturated water at `from` that flashes to steam at `to`: (hf1 - hf2) / hfg2 (energy balance).
 * @returns FLASH-ORDER when `to` is the higher, STEAM-RANGE.
 */
export function flashFraction(from: BarAbsolute, to: BarAbsolute): Result<number> {
  const hot = saturationAtPressure(from);
  if (!hot.ok) return hot;
  const low = saturationAtPressure(to);
  if (!low.ok) return low;
  if (to > from) return fail(risingPressure(from, to));
  return ok((hot.value.hf - low.value.hf) / low.value.hfg);
}

const risingPressure = (from: BarAbsolute, to: BarAbsolute) =>
  problem(
    'FLASH-ORDER',
    `Water flashes only when the pressure falls; from ${shortNumber(from)} to ${shortNumber(to)} bar a it rises.`,
  );

/** Fraction of the water given off per bar of fall, (dhf/dp - vf) / hfg, by central difference along saturation. */
function fractionPerBar(p: BarAbsolute): Result<number> {
  const half = p * 1e-4;
  const at = saturationAtPressure(p);
  const above = saturationAtPressure(barAbsolute(p + half));
  const below = saturationAtPressure(barAbsolute(p - half));
  if (!at.ok) return at;
  if (!above.ok) return above;
  if (!below.ok) return below;
  const slope = (above.value.hf - below.value.hf) / (2 * half);
  // 1 bar m3 is 100 kJ
  return ok((slope - 100 * at.value.vf) / at.value.hfg);
}

/**
 * Steam that boiler water gives off per bar of falling pressure [kg/bar]: M (dhf/dp - vf) / hfg.
 * Saturated liquid at equilibrium, steam leaving dry. An estimate for warnings, never capacity.
 * @returns STEAM-RANGE, STORE-RANGE outside 0 to 1 000 000 kg.
 */
export function storedSteamKgPerBar(p: BarAbsolute, waterKg: number): Result<number> {
  const bad = checkRange('STORE-RANGE', WATER, waterKg, 'waterKg');
  if (bad) return fail(bad);
  const fraction = fractionPerBar(p);
  return fraction.ok ? ok(fraction.value * waterKg) : fraction;
}

/**
 * Steam given off by a store of saturated water falling from one pressure to another [kg]:
 * dm/m = (dhf - vf dp) / hfg integrated (Simpson, 40 pieces).
 * @returns FLASH-ORDER when `to` is the higher, STEAM-RANGE, STORE-RANGE.
 */
export function accumulatorReleaseKg(from: BarAbsolute, to: BarAbsolute, waterKg: number): Result<number> {
  const bad = checkRange('STORE-RANGE', WATER, waterKg, 'waterKg');
  if (bad) return fail(bad);
  if (to > from) return fail(risingPressure(from, to));
  const pieces = 40;
  const width = (from - to) / pieces;
  let sum = 0;
  for (let i = 0; i <= pieces; i += 1) {
    const rate = fractionPerBar(barAbsolute(to + i * width));
    if (!rate.ok) return rate;
    const weight = i === 0 || i === pieces ? 1 : i % 2 === 1 ? 4 : 2;
    sum += weight * rate.value;
  }
  return ok(waterKg * (1 - Math.exp((-sum * width) / 3)));
}
