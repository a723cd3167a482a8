/** The steam of a header as duties are worked out on it. */
import { ambientAtAltitude } from '../quantity/pressure';
import { barGauge } from '../quantity/units';
import { ok, type Result } from '../result';
import { steamState } from '../steam/steamState';
import type { SteamSupply } from './duty';

/** What a header's steam is described by: dryness where it is wet or dry saturated, else superheat [K]. */
export interface HeaderSteam {
  readonly pressureBarG: number;
  readonly dryness: number | null;
  readonly superheatK: number | null;
}

/**
 * Steam of a header at an altitude [m]; without either dryness or superheat it is taken as dry saturated.
 * @returns ALTITUDE-RANGE, STEAM-RANGE.
 */
export function supplyOf({ pressureBarG, dryness, superheatK }: HeaderSteam, altitudeM: number): Result<SteamSupply> {
  const ambient = ambientAtAltitude(altitudeM);
  if (!ambient.ok) return ambient;
  const quality =
    superheatK === null
      ? ({ kind: 'wet', dryness: dryness ?? 1 } as const)
      : ({ kind: 'superheated', superheatK } as const);
  const state = steamState({ pressure: barGauge(pressureBarG), quality, ambient: ambient.value });
  return state.ok ? ok({ header: state.value, ambient: ambient.value }) : state;
}
