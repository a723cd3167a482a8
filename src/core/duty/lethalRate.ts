/**
 * Lethal rate, for holding a reference sheet against its source. It is not a release decision and no screen shows one:
 * a scheduled process and its deviations belong to the process authority.
 * Source: Bigelow; L = 10^((T - 121.1) / 10), minutes at 121.1 degC by the trapezoid rule.
 */

const REFERENCE_C = 121.1;
const Z_K = 10;

/** Lethal rate at a temperature [degC], in minutes at 121.1 degC per minute. */
export const lethalRate = (tC: number): number => 10 ** ((tC - REFERENCE_C) / Z_K);

/** Minutes at 121.1 degC that a record of temperatures [degC] over minutes, ascending, amounts to. */
export function minutesAt121(record: readonly (readonly [minute: number, tC: number])[]): number {
  return record.slice(1).reduce((sum, [minute, tC], index) => {
    const [before, beforeC] = record[index] as readonly [number, number];
    return sum + ((minute - before) * (lethalRate(beforeC) + lethalRate(tC))) / 2;
  }, 0);
}
