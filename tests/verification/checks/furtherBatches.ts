/** Worked batches D to M (invented plant): one for each further duty model. */
import { workOut, type DutyModel } from '@/core/duty/model';
import { shellAtSteamOn } from '@/core/duty/shellTemperature';
import * as example from '../dutyExamples';
import { supply } from '../dutyWorkedBatches';
import { valueOf } from '../outcome';
import { relative, within, type Check, type Table } from './check';

const table = (group: string): Table => ({
  group: `Worked batch ${group} (invented plant)`,
  source: 'Worked apart from the product on python3-iapws 1.5.3',
  mark: 'independent',
});
const TOLERANCE = relative(1e-6);

/** Rates of its phases in order [kg/h]; null leaves one out. */
type Worked = readonly [group: string, duty: DutyModel, kgPerH: readonly (number | null)[]];

const WORKED: readonly Worked[] = [
  ['D, water blancher', { model: 'waterBlancher', inputs: example.waterBlancherD }, [639.0781, 659.12509, 72.063187]],
  ['E, direct injection', { model: 'injectionCooker', inputs: example.injectionE }, [502.27574, 6.1818552]],
  [
    'F, water spray retort',
    { model: 'overpressureRetort', inputs: example.sprayRetortF },
    [796.51406, 773.17198, 168.19796, 91.499504],
  ],
  [
    'G, hydrostatic cooker',
    { model: 'continuousCooker', inputs: example.hydrostaticG },
    [1650.6513, null, null, null, null, 1767.584, 1155.2595, 200.31931],
  ],
  ['H, exhaust box', { model: 'exhaustBox', inputs: example.exhaustBoxH }, [67.431677, 228.19911, 78.953568]],
  ['I, plate pasteuriser', { model: 'platePasteuriser', inputs: example.plateI }, [151.81408, 127.46322, 4.9876914]],
  ['J, tunnel pasteuriser', { model: 'tunnelPasteuriser', inputs: example.tunnelJ }, [1262.4382, 435.15694, 106.8706]],
  ['K, evaporator', { model: 'evaporator', inputs: example.evaporatorK }, [567.11776, 3269.2674, 16.202661]],
  ['L, wash-down', { model: 'hotWater', inputs: example.washDownL }, [358.01407, 136.37573]],
  [
    'M, cleaning in place',
    { model: 'cleaningInPlace', inputs: example.cipM },
    [478.28067, 93.299731, 8.4817937, 662.48725],
  ],
];

const rates = WORKED.flatMap(([group, duty, figures]) =>
  figures.flatMap((figure, i) => {
    if (figure === null) return [];
    return within(table(group), `rate of phase ${i + 1}`, 'kg/h', figure, TOLERANCE, () => {
      return valueOf(workOut(duty, supply)).phases[i]?.steamKgPerH ?? Number.NaN;
    });
  }),
);

const shell = () => valueOf(shellAtSteamOn(example.shellN));

export const furtherBatchChecks: readonly Check[] = [
  ...rates,
  within(table('N, shell'), 'time constant', 'min', 90.223902, TOLERANCE, () => shell().timeConstantMin),
  within(table('N, shell'), 'an hour after the last run', '°C', 32.714008, TOLERANCE, () => shell().shellC),
];
