import type { ProcessValuesDto } from '@/contracts/processData';
import type { Units } from '../units';

export interface ProcessValueText {
  readonly name: string;
  readonly value: string;
}

/** The values of a scheduled process in the order of its run, temperatures to 0.01 of a degree. */
export function processValueTexts(values: ProcessValuesDto, units: Units): ProcessValueText[] {
  const celsius = (value: number): string =>
    `${units.number('temperature', value, 2).replace(/\.?0+$/, '')}\u00a0${units.symbol('temperature')}`;
  const warm = values.longestWaitForInitialTemperatureMinutes;
  return [
    { name: 'initial temperature', value: `at least ${celsius(values.leastInitialC)}` },
    { name: 'vent', value: `${values.ventMinutes} min, to ${celsius(values.ventToC)}` },
    { name: 'come-up', value: `${values.comeUpMinutes} min` },
    { name: 'process', value: `${values.processMinutes} min at ${celsius(values.processC)}` },
    { name: 'wait since closing', value: `at most ${values.longestWaitSinceClosingMinutes} min` },
    ...(warm === null ? [] : [{ name: 'wait, for initial temperature', value: `at most ${warm} min` }]),
  ];
}
