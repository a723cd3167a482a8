import { displaySymbol, toDisplay, type UnitSystem } from './display';

/** Figures as sentences say them: rounded, with a space between thousands. */
export interface Saying {
  /** A steam rate [kg/h]: to 10 kg/h or 25 lb/h; what is there at all stays at least that. */
  rate(kgPerH: number): string;
  /** Steam [kg]: whole kg or lb, at least 1. */
  mass(kg: number): string;
  /** How far a pressure falls [bar]: one digit after the point. */
  pressureFall(bar: number): string;
  /** A gauge pressure [bar g]: one digit after the point. */
  pressure(barG: number): string;
}

const RATE_STEPS: Readonly<Record<UnitSystem, number>> = { si: 10, usCustomary: 25 };

const spaced = (whole: number): string => String(whole).replace(/\B(?=(\d{3})+$)/g, ' ');

/** Figures of sentences in a system of units. */
export function sayingIn(system: UnitSystem): Saying {
  const step = RATE_STEPS[system];
  return {
    rate: (kgPerH) => {
      const rounded = Math.round(toDisplay('steamRate', kgPerH, system) / step) * step;
      return `${spaced(Math.max(kgPerH > 0 ? step : 0, rounded))} ${displaySymbol('steamRate', system)}`;
    },
    mass: (kg) => {
      const whole = Math.max(1, Math.round(toDisplay('mass', kg, system)));
      return `${spaced(whole)} ${displaySymbol('mass', system)}`;
    },
    pressure: (barG) =>
      `${toDisplay('gaugePressure', barG, system).toFixed(1)} ${displaySymbol('gaugePressure', system)}`,
    pressureFall: (bar) =>
      `${toDisplay('pressureDifference', bar, system).toFixed(1)} ${displaySymbol('pressureDifference', system)}`,
  };
}
