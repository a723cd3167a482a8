import { seededRandom } from '@/core/levelling/random';
import { uniformSpread } from '@/core/header/spread/startSpread';
import type { Activity } from '@/core/plant/activity';
import { convolveSpread } from '@/core/header/spread/convolution';
import { quantileFit } from '@/core/header/spread/quantileFit';
import { spreadHeader } from '@/core/header/spread/spreadDraws';
import { createSpreadEvaluator, spreadByConvolution, spreadDraws } from '@/core/weekSpread';
import { demoWeek } from '@/server/demo/demoWeek';

const SAMPLES = 200;
const REPEATS = 101;
const SPREAD_MIN = 10;
const GRID_KG_PER_H = 10;
const CONFIDENCE = 0.95;

function timed<T>(run: () => T): { ms: number; value: T } {
  const before = performance.now();
  const value = run();
  return { ms: performance.now() - before, value };
}

function measure() {
  const week = demoWeek();
  const spread = uniformSpread(SPREAD_MIN, SPREAD_MIN);
  if (!spread.ok) throw new Error(spread.error.message);
  const spreads = new Map(week.plant.units.map(({ id }) => [id, spread.value]));
  const headerId = week.plant.headers[0]?.id ?? '';
  const options = { samples: SAMPLES, random: seededRandom(1), confidence: CONFIDENCE };
  const built = timed(() => createSpreadEvaluator(week, headerId, spreads, options));
  const placed = week.activities.filter(({ placement }) => placement !== null);
  const pick = seededRandom(2);
  const previews = Array.from({ length: REPEATS + 20 }, (_, turn) => {
    const { id, placement } = placed[Math.floor(pick() * placed.length)] as Activity;
    const start = (placement?.start ?? 0) + 5 + (turn % 30);
    return timed(() => built.value.preview([{ activityId: id, placement: placement && { ...placement, start } }])).ms;
  });
  const times = previews.slice(20).sort((a, b) => a - b);
  const convolved = timed(() => {
    return spreadByConvolution(week, headerId, spreads, { gridKgPerH: GRID_KG_PER_H, confidence: CONFIDENCE });
  });
  const sampled = built.value.asItStands;
  const largest = (a: ArrayLike<number>) => Array.from(a).reduce((most, value) => Math.max(most, value), 0);
  const apart = (a: ArrayLike<number>, b: ArrayLike<number>) =>
    largest(Array.from(a, (value, t) => Math.abs(value - (b[t] as number))));
  const fit = quantileFit(spreadHeader(week, headerId), sampled.confidentKgPerH, CONFIDENCE, (header) =>
    convolveSpread(header, spreadDraws(week, headerId, spreads), { gridKgPerH: GRID_KG_PER_H, confidence: CONFIDENCE }),
  );
  return {
    activities: week.activities.length,
    samples: SAMPLES,
    spreadMin: SPREAD_MIN,
    gridKgPerH: GRID_KG_PER_H,
    builtMs: built.ms,
    previewMedianMs: times[REPEATS >> 1],
    previewP95Ms: times[Math.floor(REPEATS * 0.95)],
    previewWorstMs: times.at(-1),
    convolutionMs: convolved.ms,
    greatestGridErrorKgPerH: largest(convolved.value.gridErrorKgPerH),
    sampledAnyOverChance: sampled.anyOverChance,
    sampledOverMin: sampled.expectedOverMin,
    convolvedOverMin: convolved.value.overChance?.reduce((sum, chance) => sum + chance, 0),
    greatestChanceApart: apart(sampled.overChance ?? [], convolved.value.overChance ?? []),
    greatestConfidentApartKgPerH: apart(sampled.confidentKgPerH, convolved.value.confidentKgPerH),
    confidentOutByChance: fit.greatestMissedChance,
    confidentOutByStandardErrors: fit.greatestMissedChance / Math.sqrt((CONFIDENCE * (1 - CONFIDENCE)) / SAMPLES),
    confidentOutAtMinute: fit.minute,
  };
}

const figures = measure();
if (process.argv.includes('--json')) console.log(JSON.stringify(figures, null, 2));
else {
  for (const [name, value] of Object.entries(figures)) console.log(name.padEnd(30), value);
  console.log(`
The two confident loads can be a whole vent apart where the ${CONFIDENCE * 100} % of the weeks end at a jump of the load's
distribution: on either side of the jump a few samples more or less decide. So the chances are compared, not the loads:
confidentOutByChance is how far the ${CONFIDENCE * 100} % lie outside what the convolution gives below and up to the sampled load.`);
}
