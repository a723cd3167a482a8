import type { UnitSystem } from '@/core/quantity/display';
import type { PersonSettings } from '@/db/schema/index';

/** What the person chose for the account, and what the plant shows where nothing was chosen. */
export interface Choices {
  readonly theme: 'light' | 'dark' | 'system' | null;
  readonly units: UnitSystem;
}

/** The unit system of a stored choice. */
export const unitSystemOf = (stored: 'si' | 'us'): UnitSystem => (stored === 'us' ? 'usCustomary' : 'si');

/** A unit system as it is stored. */
export const storedUnits = (system: UnitSystem): 'si' | 'us' => (system === 'usCustomary' ? 'us' : 'si');

/** The person's own choices over those of the plant. */
export const choicesOf = (settings: PersonSettings, plant: { readonly displayUnits: 'si' | 'us' }): Choices => ({
  theme: settings.theme ?? null,
  units: unitSystemOf(settings.units ?? plant.displayUnits),
});
