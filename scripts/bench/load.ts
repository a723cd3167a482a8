import { overLimit } from '@/core/header/over';
import { capacityMinutes } from '@/core/header/capacityMinutes';
import { loadOf } from '@/core/header/loadCurve';
import { createEvaluator, evaluateWeek } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { Week } from '@/core/schedule/week';
import { generatedWeek, linearCongruential } from './generatedWeek';

interface LoadFigures {
  readonly activities: number;
  /** The load of all activities, built anew. [ms] */
  readonly scratchMs: number;
  /** The same load after one activity has moved. [ms] */
  readonly incrementalMs: number;
  readonly ratio: number;
  /** Judging a load against its limit. [ms] */
  readonly overMs: number;
  /** The whole week judged: load, what is over, every breach. [ms] */
  readonly weekMs: number;
  /** The same while a hand moves one activity. [ms] */
  readonly previewMs: number;
}

const SIZES = [150, 500, 2000];
const REPEATS = 51;
/** Timed together, so that the clock's grain does not show; few, so that other work seldom comes between. */
const MOVES = 100;

function medianMs(run: (turn: number) => void, perTurn = 1): number {
  for (let turn = 0; turn < 15; turn++) run(turn);
  const times = Array.from({ length: REPEATS }, (_, turn) => {
    const before = performance.now();
    run(turn);
    return (performance.now() - before) / perTurn;
  });
  return times.sort((a, b) => a - b)[REPEATS >> 1] as number;
}

function measure(count: number): LoadFigures {
  const week = generatedWeek(count);
  const scratchMs = medianMs(() => loadOf(week));
  const incrementalMs = incremental(week);
  const load = loadOf(week).kgPerH('main');
  const limit = capacityMinutes(week.capacities[0] as Week['capacities'][number], week.horizonMin).limitKgPerH ?? [];
  const evaluator = createEvaluator(week);
  const random = linearCongruential(7);
  const previewMs = medianMs(() => {
    const { id, placement } = pick(week, random);
    evaluator.preview([{ activityId: id, placement: placement && { ...placement, start: placement.start + 5 } }]);
  });
  return {
    activities: count,
    scratchMs,
    incrementalMs,
    ratio: scratchMs / incrementalMs,
    overMs: medianMs(() => overLimit(load, limit, null)),
    weekMs: medianMs(() => evaluateWeek({ ...week })),
    previewMs,
  };
}

function incremental(week: Week): number {
  const curve = loadOf(week);
  const random = linearCongruential(11);
  const picked = Array.from({ length: MOVES }, () => pick(week, random));
  const run = (turn: number) => {
    for (const activity of picked) {
      const { placement } = activity;
      curve.move(activity, placement && { ...placement, start: placement.start + (turn % 2 === 0 ? 5 : 0) });
    }
  };
  return medianMs(run, MOVES);
}

function pick(week: Week, random: () => number): Activity {
  return week.activities[Math.floor(random() * week.activities.length)] as Activity;
}

function table(figures: readonly LoadFigures[]): string {
  const rows = figures.map((f) =>
    [
      String(f.activities).padStart(10),
      ...[f.scratchMs, f.incrementalMs, f.ratio, f.overMs, f.weekMs, f.previewMs].map((n) =>
        n.toPrecision(3).padStart(12),
      ),
    ].join(''),
  );
  const heads = ['scratch ms', 'moved ms', 'ratio', 'over ms', 'week ms', 'preview ms'];
  return ['activities' + heads.map((head) => head.padStart(12)).join(''), ...rows].join('\n');
}

const figures = SIZES.map(measure);
console.log(process.argv.includes('--json') ? JSON.stringify(figures, null, 2) : table(figures));
