/** Warming up a machine of steel and water, the same for all that run for hours: tanks, tunnels, cookers, exchangers. */
import * as balance from './balance';
import type { WorkingSheet } from './working';

/** What is warmed, between which temperatures, and what it loses once hot. */
export interface ColdMachine {
  readonly steelKg: number;
  readonly waterKg: number;
  readonly coldC: number;
  readonly hotC: number;
  /** Enthalpies of water at both temperatures [kJ/kg]. */
  readonly coldH: number;
  readonly hotH: number;
  readonly lossKW: number;
  readonly minutes: number;
}

/** Heat into a machine that is warmed up [kJ], half of the losses of the hot machine on the way included. */
export function warmUpHeat(sheet: WorkingSheet, machine: ColdMachine): number {
  const { steelKg, waterKg, coldC, hotC, coldH, hotH, lossKW, minutes } = machine;
  const steel = { symbol: 'Q_steel', name: 'Heat in the steel' };
  const water = { symbol: 'Q_water', name: 'Heat in the water' };
  return balance.sumOf(
    sheet,
    { symbol: 'Q', name: 'Heat in steel and water, and lost on the way', unit: 'kJ' },
    {
      Q_steel: balance.sensibleHeat(sheet, steel, steelKg, balance.STEEL_KJ_PER_KG_K, coldC, hotC),
      Q_water: balance.waterHeat(sheet, water, waterKg, coldH, hotH),
      Q_loss: balance.lostHeat(sheet, 'Lost on the way: half of what the hot machine loses', lossKW / 2, minutes),
    },
  );
}

/** Steam rate of a warm-up at an even draw [kg/h], for what a kg of steam gives up [kJ/kg]. */
export function warmUpRate(sheet: WorkingSheet, machine: ColdMachine, dh: number): number {
  const kg = balance.steamForHeat(sheet, 'm', 'Steam to warm up', warmUpHeat(sheet, machine), dh);
  return balance.averageRate(sheet, kg, machine.minutes);
}
