/** Every check against figures from outside, shared by the verification tests and `npm run verify`. */
import { boilerHouseChecks } from './boilerHouse';
import type { Check } from './check';
import { dutyChecks } from './duties';
import { furtherBatchChecks } from './furtherBatches';
import { networkChecks } from './network';
import { openingChecks } from './openings';
import { ratingChecks } from './rating';
import { releaseChecks } from './release';
import { specificHeatChecks } from './specificHeat';
import { storageChecks } from './storage';
import { steamTableChecks } from './steamTables';
import { workedBatchChecks } from './workedBatches';

export const ALL_CHECKS: readonly Check[] = [
  ...releaseChecks,
  ...steamTableChecks,
  ...storageChecks,
  ...openingChecks,
  ...specificHeatChecks,
  ...ratingChecks,
  ...boilerHouseChecks,
  ...networkChecks,
  ...dutyChecks,
  ...workedBatchChecks,
  ...furtherBatchChecks,
];

/** What the same sources also give, and why no formula of the product answers it. */
export const NOT_ANSWERED: readonly { readonly what: string; readonly why: string }[] = [
  { what: 'Ideal critical pressure ratio', why: 'Openings are choked by Napier’s rule, which needs none.' },
  { what: 'Bare-pipe convection and radiation', why: 'Losses are a coefficient of the plant; no pipe is modelled.' },
  { what: 'Retort, spinach and milk plant totals', why: 'Measured on plants whose inputs are not published.' },
  { what: 'Spreader hole counts of still retorts', why: 'The inlet pipe limits the flow, not the spreader.' },
];
