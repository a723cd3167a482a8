import { describe, expect, it } from 'vitest';
import { buffersOf, createSpreadDesk, SAMPLES, type SpreadAsk } from '@/components/board/spreadDesk';
import { createQueue } from '@/components/board/useStartSpread';
import { seededRandom } from '@/core/levelling/random';
import { createSpreadEvaluator } from '@/core/weekSpread';
import { activity, capacity, flatMode, plant, unit, week } from '../../../support/builders';
import { uniform } from '../../../support/spreads';

const run = (id: string, start: number) =>
  activity(id, { modes: [flatMode(id, 10, 700)], placement: { unitId: id, start } });
const source = week({
  horizonMin: 300,
  plant: plant({ units: [unit('r1'), unit('r2')] }),
  capacities: [capacity('main', 1_000)],
  activities: [run('r1', 100), run('r2', 112)],
});
const startSpreads = { r1: uniform(5, 5), r2: uniform(5, 5) };
const weekAsk = (changes: SpreadAsk['changes'] = []): SpreadAsk & { kind: 'week' } => {
  return { kind: 'week', week: source, startSpreads, headerIds: ['main'], confidence: 0.95, changes };
};
const apart = [{ activityId: 'r2', placement: { unitId: 'r2', start: 200 } }];

describe('the desk of sampled weeks', () => {
  it('answers as an evaluator built of the same week does, and follows what is tried', () => {
    const desk = createSpreadDesk();
    const options = { samples: SAMPLES, random: seededRandom(1), confidence: 0.95 };
    const evaluator = createSpreadEvaluator(source, 'main', new Map(Object.entries(startSpreads)), options);
    expect(desk(weekAsk()).byHeader.main).toEqual(evaluator.asItStands);
    expect(evaluator.asItStands.anyOverChance).toBeGreaterThan(0);
    expect(desk({ kind: 'try', changes: apart }).byHeader.main?.anyOverChance).toBe(0);
    expect(desk({ kind: 'try', changes: [] }).byHeader.main).toEqual(evaluator.asItStands);
  });

  it('keeps its own figures when those of an answer are handed over', () => {
    const desk = createSpreadDesk();
    const first = desk(weekAsk());
    const kept = structuredClone(first.byHeader);
    structuredClone(first, { transfer: buffersOf(first) });
    expect(first.byHeader.main?.confidentKgPerH.length).toBe(0);
    expect(desk({ kind: 'try', changes: [] }).byHeader).toEqual(kept);
  });

  it('answers nothing before the first week', () => {
    expect(createSpreadDesk()({ kind: 'try', changes: [] })).toEqual({ byHeader: {} });
  });
});

describe('the queue to the desk', () => {
  it('asks one thing at a time, and after it the newest only', () => {
    const sent: SpreadAsk[] = [];
    const queue = createQueue((ask) => sent.push(ask));
    const tries = [1, 2, 3].map((start): SpreadAsk => {
      return { kind: 'try', changes: [{ activityId: 'r2', placement: { unitId: 'r2', start } }] };
    });
    for (const ask of tries) queue.ask(ask);
    expect(sent).toEqual([tries[0]]);
    expect(queue.answered()).toBe(tries[0]);
    expect(sent).toEqual([tries[0], tries[2]]);
    expect(queue.answered()).toBe(tries[2]);
    expect(queue.answered()).toBeNull();
    expect(sent).toHaveLength(2);
  });

  it('never loses a week to a try that comes after it', () => {
    const sent: SpreadAsk[] = [];
    const queue = createQueue((ask) => sent.push(ask));
    queue.ask({ kind: 'try', changes: [] });
    queue.ask(weekAsk());
    queue.ask({ kind: 'try', changes: apart });
    queue.answered();
    expect(sent[1]).toEqual(weekAsk(apart));
  });
});
