/** A retort's duty held against the thermal process that was released for its product. */
import { shortNumber } from '../quantity/range';
import type { DutyModel } from './model';

/** A scheduled process as its document states it [degC, min]. */
export interface ScheduledProcess {
  readonly processC: number;
  readonly processMinutes: number;
  readonly ventMinutes: number;
  readonly ventToC: number;
  readonly comeUpMinutes: number;
  readonly leastInitialC: number;
}

/** Documents give temperatures to a tenth of a degree [K], times to the minute or a tenth of one [min]. */
const TEMPERATURE_TOLERANCE_K = 0.05;
const TIME_TOLERANCE_MIN = 0.05;

function differs(name: string, unit: string, duty: number, released: number): string[] {
  const tolerance = unit === 'min' ? TIME_TOLERANCE_MIN : TEMPERATURE_TOLERANCE_K;
  if (Math.abs(duty - released) <= tolerance) return [];
  return [`${name} is ${shortNumber(duty)} ${unit} here and ${shortNumber(released)} ${unit} in the process data.`];
}

const sumOf = (pieces: readonly { readonly minutes: number }[]): number =>
  pieces.reduce((sum, { minutes }) => sum + minutes, 0);

function tooCold(initialC: number, leastInitialC: number): string[] {
  if (initialC >= leastInitialC - TEMPERATURE_TOLERANCE_K) return [];
  const least = `the process data allows no less than ${shortNumber(leastInitialC)} °C`;
  return [`Initial temperature is ${shortNumber(initialC)} °C here; ${least}.`];
}

/** Each way in which a duty's thermal process is another than the product's, as a sentence; none for other machines. */
export function processDifferences(duty: DutyModel, released: ScheduledProcess): string[] {
  if (duty.model === 'stillRetort') {
    const { inputs } = duty;
    return [
      ...differs('Vent', 'min', inputs.ventMin, released.ventMinutes),
      ...differs('Vent temperature', '°C', inputs.ventEndC, released.ventToC),
      ...differs('Come-up', 'min', inputs.comeUpMin, released.comeUpMinutes),
      ...differs('Process temperature', '°C', inputs.processC, released.processC),
      ...differs('Process time', 'min', sumOf(inputs.holds), released.processMinutes),
      ...tooCold(inputs.initialC, released.leastInitialC),
    ];
  }
  if (duty.model === 'overpressureRetort') {
    const { inputs } = duty;
    return [
      ...differs('Process temperature', '°C', inputs.comeUp.at(-1)?.mediumEndC ?? 0, released.processC),
      ...differs('Process time', 'min', sumOf(inputs.holds), released.processMinutes),
      ...tooCold(inputs.initialC, released.leastInitialC),
    ];
  }
  return [];
}
