/** Steam per kilogram of product: written down, and doubted when it is less than blanchers are known to take. */
import type { WorkingSheet } from './working';

/**
 * Least that a blancher is believed to take without a question [kg/kg]: 300 Btu/lb of product, the low end of tubular
 * water blanchers (GRI-03/0075), over the 2329 kJ that a kg of steam at 7 bar g gives up at 95 degC. Steam blanchers
 * with open ends take more (energy survey of spinach processing, Trans. ASAE 23(2)).
 */
export const LEAST_BLANCHING_STEAM_KG_PER_KG = 0.3;

/** Writes steam per kg of product [kg/kg], with a warning below 0.30; nothing when no product runs. */
export function warnOfLittleSteam(sheet: WorkingSheet, steamKgPerH: number, productKgPerH: number, lookAt: string) {
  if (productKgPerH === 0) return;
  const perKg = sheet.total('Steam per kg of product', steamKgPerH / productKgPerH, 'kg/kg');
  if (perKg >= LEAST_BLANCHING_STEAM_KG_PER_KG) return;
  const found = `${perKg.toFixed(3)} kg of steam per kg of product is less than the 0.30 to 0.40 kg/kg`;
  sheet.warn(`${found} of tubular water blanchers (GRI-03/0075); check ${lookAt} against a steam meter.`);
}
