/** Filled containers that pass through a machine: their rate, their heat, and the ranges of both. */
import * as balance from './balance';
import { checkRising, range } from './inputs';
import type { SpecificHeatBasis } from './specificHeat';
import type { WorkingSheet } from './working';

export interface ContainerFlow {
  readonly containersPerMin: number;
  readonly contentsKgEach: number;
  readonly containerKgEach: number;
  /** Of the container: steel 0.50, glass 0.84 (from memory). */
  readonly containerKJPerKgK: number;
  readonly product: SpecificHeatBasis;
  /** Mean temperature of the contents on entering the heated part and on leaving it. */
  readonly inC: number;
  readonly outC: number;
}

export const CONTAINER_FLOW_RANGES = {
  containersPerMin: range('Containers a minute', '/min', 0, 3000),
  contentsKgEach: range('Contents of a container', 'kg', 0, 10),
  containerKgEach: range('Empty container', 'kg', 0, 2),
  containerKJPerKgK: range('Specific heat of the container', 'kJ/kgK', 0.1, 3),
  inC: range('Contents on entering', '°C', 0, 100),
  outC: range('Contents on leaving', '°C', 1, 140),
};

/** @returns DUTY-ORDER when the contents are not heated, or leave hotter than what heats them [degC]. */
export const checkContainerFlow = ({ inC, outC }: ContainerFlow, name: string, field: string, heatingC: number) =>
  checkRising([
    ['Contents on entering', 'inC', inC],
    ['Contents on leaving', 'outC', outC],
    [name, field, heatingC],
  ]);

/** Contents per hour [kg/h]. */
export const contentsKgPerH = ({ containersPerMin, contentsKgEach }: ContainerFlow): number =>
  60 * containersPerMin * contentsKgEach;

/** Heat into contents and containers [kW], as two lines of working. */
export function containerHeat(sheet: WorkingSheet, flow: ContainerFlow, cp: number) {
  const { inC, outC, containerKJPerKgK, containersPerMin, containerKgEach } = flow;
  const container = { symbol: 'q_container', name: 'Heat into the containers' };
  return {
    q_product: balance.productPower(sheet, contentsKgPerH(flow), cp, inC, outC),
    q_container: balance.throughPower(
      sheet,
      container,
      60 * containersPerMin * containerKgEach,
      containerKJPerKgK,
      inC,
      outC,
    ),
  };
}
