import { seededRandom } from '@/core/levelling/random';
import { uniformSpread } from '@/core/header/spread/startSpread';
import type { Activity } from '@/core/plant/activity';
import { createSpreadEvaluator, spreadByConvolution } from '@/core/weekSpread';
import { demoWeek } from '@/server/demo/demoWeek';

const SAMPLES = 200;
const REPEATS = 101;
const SPREAD_MIN = 10;
const GRID_KG_PER_H = 10;

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
  const options = { samples: SAMPLES, random: seededRandom(1) };
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
    return spreadByConvolution(week, headerId, spreads, { gridKgPerH: GRID_KG_PER_H, confidence: 0.95 });
  });
  const sampled = built.value.asItStands;
  const largest = (a: ArrayLike<number>) => Array.from(a).reduce((most, value) => Math.max(most, value), 0);
  const apart = (a: ArrayLike<number>, b: ArrayLike<number>) =>
    largest(Array.from(a, (value, t) => Math.abs(value - (b[t] as number))));
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
  };
}

const figures = measure();
if (process.argv.includes('--json')) console.log(JSON.stringify(figures, null, 2));
else for (const [name, value] of Object.entries(figures)) console.log(name.padEnd(30), value);
