import type { ProcessValuesDto } from '@/contracts/processData';
import type { Units } from '../units';

export interface ProcessValueText {
  readonly name: string;
  readonly value: string;
}

/** The values of a scheduled process in the order of its run, temperatures to a tenth of a degree. */
export function processValueTexts(values: ProcessValuesDto, units: Units): ProcessValueText[] {
  const celsius = (value: number): string => units.text('temperature', value);
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
