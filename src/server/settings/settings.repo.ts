import { eq, sql } from 'drizzle-orm';
import type { OwnSettings, PlantSettings, PlantSettingsDto } from '@/contracts/settings';
import type { Db } from '@/db/client';
import { people, plants, type PersonSettings } from '@/db/schema/index';
import { storedUnits, unitSystemOf } from '../auth/choices';

const ownOf = (settings: PersonSettings): OwnSettings => ({
  theme: settings.theme ?? 'system',
  units: settings.units ? unitSystemOf(settings.units) : null,
});

/** What a person has chosen; locks the row where it is about to be written. */
export async function ownSettings(tx: Db, personId: string, lock = false): Promise<OwnSettings | null> {
  const rows = tx.select({ settings: people.settings }).from(people).where(eq(people.id, personId));
  const [row] = await (lock ? rows.for('update') : rows);
  return row ? ownOf(row.settings) : null;
}

/** Writes what a person has chosen. */
export async function writeOwnSettings(tx: Db, personId: string, { theme, units }: OwnSettings): Promise<void> {
  const settings: PersonSettings = { theme, ...(units ? { units: storedUnits(units) } : {}) };
  const kept = sql`(${people.settings} - 'units') || ${JSON.stringify(settings)}::jsonb`;
  await tx.update(people).set({ settings: kept }).where(eq(people.id, personId));
}

/** The plant's settings; locks the row where it is about to be written. */
export async function plantSettings(tx: Db, plantId: string, lock = false): Promise<PlantSettingsDto | null> {
  const rows = tx.select().from(plants).where(eq(plants.id, plantId));
  const [row] = await (lock ? rows.for('update') : rows);
  if (!row) return null;
  const { altitudeM, snapMinutes, reserveFraction, sagToleranceBar, fuelPricePerKWh, currency, timeZone } = row;
  const units = unitSystemOf(row.displayUnits);
  return {
    values: { units, altitudeM, snapMinutes, reserveFraction, sagToleranceBar, fuelPricePerKWh, currency },
    timeZone,
  };
}

/** Writes the plant's settings. */
export async function writePlantSettings(tx: Db, plantId: string, values: PlantSettings): Promise<void> {
  const { units, ...rest } = values;
  await tx
    .update(plants)
    .set({ ...rest, displayUnits: storedUnits(units) })
    .where(eq(plants.id, plantId));
}
