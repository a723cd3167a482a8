/** What a stage asks of its header: phases of steam over time, with the working behind them. */
import type { PhaseKind } from '../plant/activity';
import type { BarAbsolute } from '../quantity/units';
import type { SteamState } from '../steam/steamState';
import type { Working, WorkingSheet } from './working';

/** A spell of constant draw; real minutes, not yet on a grid. */
export interface DutyPhase {
  readonly kind: PhaseKind;
  readonly minutes: number;
  readonly steamKgPerH: number;
}

/** Phases in order of time; steamKg is their sum. */
export interface Duty {
  readonly phases: readonly DutyPhase[];
  readonly steamKg: number;
  readonly working: Working;
  /** The machine takes hours to heat up: once it runs it is neither moved nor stopped. */
  readonly neverMoved?: boolean;
}

/** The steam a stage is fed with, and the air pressure around it. */
export interface SteamSupply {
  readonly header: SteamState;
  readonly ambient: BarAbsolute;
}

/** Steam of phases [kg]. */
export const steamOfPhases = (phases: readonly DutyPhase[]): number =>
  phases.reduce((kg, { minutes, steamKgPerH }) => kg + (steamKgPerH * minutes) / 60, 0);

/** Closes a page of working and makes the duty of it; spells of no length are left out. */
export function closeDuty(sheet: WorkingSheet, phases: readonly DutyPhase[]): Duty {
  const kept = phases.filter(({ minutes }) => minutes > 0);
  const minutes = kept.reduce((sum, phase) => sum + phase.minutes, 0);
  const steamKg = sheet.total('Steam', steamOfPhases(kept), 'kg');
  sheet.total('Duration', minutes, 'min');
  if (minutes > 0) sheet.total('Average steam rate', (60 * steamKg) / minutes, 'kg/h');
  return { phases: kept, steamKg, working: sheet.finish() };
}

/** On every page of working: a plan is not a gauge. */
export const ESTIMATE_CAUTION =
  'An estimate to plan by, good to about a fifth: gauges, instruments and interlocks decide.';

/** On every page about a thermal process. */
export const PROCESS_CAUTION =
  'Vent, come-up and process time stand as the process authority set them; this page works out their steam, no more.';
