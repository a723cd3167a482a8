import { expect, it } from 'vitest';
import { processValueTexts } from '@/components/processData/values';
import { unitsOf } from '@/components/units';

const values = {
  processC: 121.1,
  processMinutes: 26,
  ventMinutes: 6,
  ventToC: 107.2,
  comeUpMinutes: 6,
  leastInitialC: 60,
  longestWaitSinceClosingMinutes: 60,
  longestWaitForInitialTemperatureMinutes: null,
};
const said = (system: 'si' | 'usCustomary') =>
  Object.fromEntries(processValueTexts(values, unitsOf(system)).map(({ name, value }) => [name, value]));

it('shows a scheduled process as it was entered', () => {
  expect(said('si')).toEqual({
    'initial temperature': 'at least 60\u00a0°C',
    vent: '6 min, to 107.2\u00a0°C',
    'come-up': '6 min',
    process: '26 min at 121.1\u00a0°C',
    'wait since closing': 'at most 60 min',
  });
});

it('converts its temperatures without rounding them to whole degrees', () => {
  // 121.1 degC are 249.98 degF, not 250.
  expect(said('usCustomary')).toMatchObject({
    'initial temperature': 'at least 140\u00a0°F',
    vent: '6 min, to 224.96\u00a0°F',
    process: '26 min at 249.98\u00a0°F',
  });
});
