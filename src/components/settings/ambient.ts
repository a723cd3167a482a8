import { ambientAtAltitude } from '../../core/quantity/pressure';
import { saturationAtPressure } from '../../core/steam/saturation';
import type { Units } from '../units';

/** What an altitude [m] means for gauges and kettles, in a sentence; null where no plant stands. */
export function altitudeMeans(altitudeM: number | null, units: Units): string | null {
  if (altitudeM === null || !Number.isFinite(altitudeM)) return null;
  const ambient = ambientAtAltitude(altitudeM);
  if (!ambient.ok) return null;
  const boiling = saturationAtPressure(ambient.value);
  if (!boiling.ok) return null;
  const pressure = units.text('absolutePressure', ambient.value);
  return `Ambient pressure ${pressure}, on average; water boils at ${units.text('temperature', boiling.value.temperature)}.`;
}
