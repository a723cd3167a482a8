import type { SampledSpread } from '../../core/header/spread/sampledLoads';
import type { StartSpread } from '../../core/header/spread/startSpread';
import { seededRandom } from '../../core/levelling/random';
import type { TriedPlacement } from '../../core/pipeline';
import type { Week } from '../../core/schedule/week';
import { createSpreadEvaluator, type SpreadEvaluator } from '../../core/weekSpread';

/** Sampled weeks: a chance of one half is then met within 2.5 % (one standard error), one of 5 % within 1.1 %. */
export const SAMPLES = 400;

/** The same for everyone and every time: the same week always shows the same chances. */
const SEED = 1;

/** What is asked of the desk. */
export type SpreadAsk =
  | {
      readonly kind: 'week';
      readonly week: Week;
      readonly startSpreads: Readonly<Record<string, StartSpread>>;
      readonly headerIds: readonly string[];
      readonly confidence: number;
      readonly changes: readonly TriedPlacement[];
    }
  | { readonly kind: 'try'; readonly changes: readonly TriedPlacement[] };

export interface SpreadAnswer {
  readonly byHeader: Readonly<Record<string, SampledSpread>>;
}

/** Keeps the sampled weeks of the headers and answers what tried placements do to them; nothing before the first week. */
export function createSpreadDesk(): (ask: SpreadAsk) => SpreadAnswer {
  let evaluators: readonly (readonly [string, SpreadEvaluator])[] = [];
  return (ask) => {
    if (ask.kind === 'week') {
      const { week, headerIds, confidence } = ask;
      const spreads = new Map(Object.entries(ask.startSpreads));
      evaluators = headerIds.map((headerId) => {
        const options = { samples: SAMPLES, random: seededRandom(SEED), confidence };
        return [headerId, createSpreadEvaluator(week, headerId, spreads, options)] as const;
      });
    }
    const answers = evaluators.map(([headerId, evaluator]) => [headerId, evaluator.preview(ask.changes)] as const);
    return { byHeader: Object.fromEntries(answers) };
  };
}

/** The buffers of an answer: they are handed over, not copied. */
export function buffersOf({ byHeader }: SpreadAnswer): ArrayBuffer[] {
  return Object.values(byHeader).flatMap(({ overChance, confidentKgPerH, expectedKgPerH }) =>
    [overChance, confidentKgPerH, expectedKgPerH].flatMap((values) => (values ? [values.buffer as ArrayBuffer] : [])),
  );
}
