/** Steam as a header of the plant has it, and as a boiler sends it out. */
import type { HeaderSteam } from '../duty/supply';
import { barAbsolute, barGauge } from '../quantity/units';
import type { BarAbsolute } from '../quantity/units';
import type { Result } from '../result';
import { steamState, type SteamQuality, type SteamState } from '../steam/steamState';

/** Dryness or superheat as entered; neither is dry saturated steam. */
const qualityOf = ({ dryness, superheatK }: HeaderSteam): SteamQuality =>
  superheatK === null ? { kind: 'wet', dryness: dryness ?? 1 } : { kind: 'superheated', superheatK };

/**
 * The state that a header is stated with, at the plant's ambient pressure [bar a].
 * @returns STEAM-RANGE naming value and range, AMBIENT-RANGE.
 */
export function headerSteam(header: HeaderSteam, ambientBarA: number): Result<SteamState> {
  const ambient = barAbsolute(ambientBarA);
  return steamState({ pressure: barGauge(header.pressureBarG), quality: qualityOf(header), ambient });
}

/**
 * Steam at a boiler's outlet: dry saturated at its pressure [bar g], or as wet as its carry-over makes it.
 * @returns STEAM-RANGE, AMBIENT-RANGE.
 */
export function boilerOutlet(pressureBarG: number, ambient: BarAbsolute, dryness = 1): Result<SteamState> {
  return steamState({ pressure: barGauge(pressureBarG), quality: { kind: 'wet', dryness }, ambient });
}
