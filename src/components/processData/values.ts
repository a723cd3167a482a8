import type { ProcessValuesDto } from '@/contracts/processData';

export interface ProcessValueText {
  readonly name: string;
  readonly value: string;
}

/** The values of a scheduled process in the order of its run. */
export function processValueTexts(values: ProcessValuesDto): ProcessValueText[] {
  const warm = values.longestWaitForInitialTemperatureMinutes;
  return [
    { name: 'initial temperature', value: `at least ${values.leastInitialC} °C` },
    { name: 'vent', value: `${values.ventMinutes} min, to ${values.ventToC} °C` },
    { name: 'come-up', value: `${values.comeUpMinutes} min` },
    { name: 'process', value: `${values.processMinutes} min at ${values.processC} °C` },
    { name: 'wait since closing', value: `at most ${values.longestWaitSinceClosingMinutes} min` },
    ...(warm === null ? [] : [{ name: 'wait, for initial temperature', value: `at most ${warm} min` }]),
  ];
}
