import type { UnitSystem } from '../../core/quantity/display';
import type { Theme } from '../../contracts/settings';

export const UNIT_WORDS: Readonly<Record<UnitSystem, string>> = {
  si: 'SI: kg/h, bar g, °C, kW',
  usCustomary: 'US customary: lb/h, psig, °F, BTU/h',
};

export const THEME_WORDS: Readonly<Record<Theme, string>> = {
  light: 'Light',
  dark: 'Dark',
  system: 'As the device',
};

/** A table of words as the options of a choice. */
export const optionsOf = (words: Readonly<Record<string, string>>) =>
  Object.entries(words).map(([value, label]) => ({ value, label }));
