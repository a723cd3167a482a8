import { z } from 'zod';
import { UNIT_SYSTEMS, type UnitSystem } from '../core/quantity/display';
import { ambientAtAltitude } from '../core/quantity/pressure';
import { shortNumber, type Range } from '../core/quantity/range';

export const THEMES = ['light', 'dark', 'system'] as const;
export type Theme = (typeof THEMES)[number];

/** What a person chooses for the own account; units null: as the plant shows them. */
export const ownSettingsSchema = z.object({
  theme: z.enum(THEMES),
  units: z.enum(UNIT_SYSTEMS).nullable(),
});
export type OwnSettings = z.infer<typeof ownSettingsSchema>;

/** POST /api/settings/own: what is left out stays as it is. */
export const ownSettingsRequestSchema = ownSettingsSchema.partial();
export type OwnSettingsRequest = z.infer<typeof ownSettingsRequestSchema>;

/** What holds after saving. */
export interface OwnSettingsDto {
  readonly own: OwnSettings;
  /** The own choice, else the plant's. */
  readonly units: UnitSystem;
}

const range = (name: string, unit: string, min: number, max: number): Range => ({ name, unit, min, max });

/** Ranges of the plant's settings, as the form shows them. */
export const PLANT_RANGES = {
  altitudeM: range('Altitude', 'm', -500, 5000),
  snapMinutes: range('Snap', 'min', 1, 60),
  reserveFraction: range('Reserve', '', 0, 0.5),
  sagToleranceBar: range('Pressure sag', 'bar', 0.05, 3),
  fuelPricePerKWh: range('Fuel price', 'per kWh', 0, 10),
} as const;

function within({ name, unit, min, max }: Range) {
  const sentence = `${name}: ${shortNumber(min)} to ${shortNumber(max)}${unit === '' ? '' : ` ${unit}`}.`;
  return z.number().min(min, sentence).max(max, sentence);
}

/** The reserve is a share inside and per cent to people. */
const reserve = z.number().min(0, 'Reserve: 0 to 50 %.').max(0.5, 'Reserve: 0 to 50 %.');

/** Where core knows an ambient pressure. */
const altitude = z.number().superRefine((altitudeM, context) => {
  const ambient = ambientAtAltitude(altitudeM);
  if (!ambient.ok) context.addIssue({ code: 'custom', message: ambient.error.message });
});

/** What the administrator sets for a plant. */
export const plantSettingsSchema = z.object({
  units: z.enum(UNIT_SYSTEMS),
  altitudeM: altitude,
  snapMinutes: within(PLANT_RANGES.snapMinutes).int('Whole minutes.'),
  reserveFraction: reserve,
  sagToleranceBar: within(PLANT_RANGES.sagToleranceBar),
  /** Of a kWh of fuel, on the heating value of the boilers' factor; null: not said. */
  fuelPricePerKWh: within(PLANT_RANGES.fuelPricePerKWh).nullable(),
  currency: z.string().regex(/^[A-Z]{3}$/, 'Three capital letters, such as EUR.'),
});
export type PlantSettings = z.infer<typeof plantSettingsSchema>;

/** POST /api/settings/plant: a form, and what it was filled with. */
export const plantSettingsRequestSchema = z.object({ values: plantSettingsSchema, was: plantSettingsSchema });
export type PlantSettingsRequest = z.infer<typeof plantSettingsRequestSchema>;

/** The plant's settings as they stand. */
export interface PlantSettingsDto {
  readonly values: PlantSettings;
  readonly timeZone: string;
}
