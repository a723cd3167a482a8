import { describe, expect, it } from 'vitest';
import { levelWeek } from '@/solver/levelWeek';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import type { LevellingOptions } from '@/core/levelling/options';
import type { Week } from '@/core/schedule/week';
import { activity, mode, phase, unit, ventGroup, week } from '../support/levellingCases';

/** Worked retort batch C and boiler chain (invented plant): net export, two blanchers running. [kg/h] */
const NET_KG_PER_H = 3546.94;
const BLANCHERS_KG_PER_H = 1229.87;
const RETORT = [
  phase('vent', 0, 6, 1555.24),
  phase('comeUp', 6, 6, 359.23),
  phase('process', 12, 12, 217.21),
  phase('process', 24, 26, 119.81),
];
const SIX = 360;

/** So many retorts planned at 06:00, ready 05:00, with a reserve in percent and a margin between vents. */
function retorts(count: number, reservePercent: number, marginMinutes: number): Week {
  const ids = Array.from({ length: count }, (_, i) => `R${i + 1}`);
  return week({
    horizonMin: 720,
    units: [...ids.map((id) => unit(id, 'retort', { ventGroupId: 'group' })), unit('B', 'blancher')],
    ventGroups: [ventGroup({ marginMinutes })],
    limitKgPerH: NET_KG_PER_H * (1 - reservePercent / 100),
    activities: [
      ...ids.map((id) =>
        activity(`load-${id}`, {
          modes: [mode(id, 60, RETORT)],
          placement: { unitId: id, start: SIX },
          earliestStart: 300,
        }),
      ),
      activity('blanchers', {
        stage: 'blanch',
        fixing: 'fixed',
        modes: [mode('B', 720, [phase('run', 0, 720, BLANCHERS_KG_PER_H)])],
        placement: { unitId: 'B', start: 0 },
      }),
    ],
  });
}

const OPTIONS: LevellingOptions = { budget: { iterations: 1500 }, prices: { batchMoved: 0 } };

function solve(plan: Week, options: LevellingOptions = OPTIONS) {
  const { proposal } = levelWeek(plan, options, { now: undefined });
  const moved = withPlacements(
    plan,
    proposal.moves.map((m) => ({ activityId: m.activityId, placement: m.to })),
  );
  const starts = moved.activities.filter((a) => a.stage === 'retort').map((a) => (a.placement?.start ?? 0) - SIX);
  return { proposal, starts: starts.sort((a, b) => a - b), evaluation: evaluateWeek(moved) };
}

const total = (offsets: readonly number[]): number => offsets.reduce((sum, o) => sum + Math.abs(o), 0);
const peakOfRetorts = (evaluation: ReturnType<typeof evaluateWeek>): number =>
  (evaluation.headers[0]?.peak.kgPerH ?? 0) - BLANCHERS_KG_PER_H;

describe('two retorts planned at the same minute', () => {
  it.each([
    [0, 0, 6, 1914.47],
    [10, 0, 6, 1914.47],
    [15, 0, 12, 1772.44],
    [20, 0, 50, 1555.24],
    [0, 2, 8, 1914.47],
    [10, 2, 8, 1914.47],
    [15, 2, 12, 1772.44],
    [20, 2, 50, 1555.24],
  ])('at a reserve of %i %% and a margin of %i min move %i min in all', (reserve, margin, minutes, peak) => {
    const { starts, evaluation, proposal } = solve(retorts(2, reserve, margin));
    expect(total(starts)).toBe(minutes);
    expect((starts[1] ?? 0) - (starts[0] ?? 0)).toBe(minutes);
    expect(evaluation.over.kg).toBe(0);
    expect(evaluation.breaches.filter((b) => b.class === 'process')).toEqual([]);
    // The phases are typed to two decimals, so their sums are good to two hundredths.
    expect(Math.abs(peakOfRetorts(evaluation) - peak)).toBeLessThan(0.02);
    expect(proposal.unresolved).toEqual([]);
    expect(proposal.after.overKg).toBe(0);
  });

  it.each([0, 2])('at a reserve of 25 %% have no start, and what is missing is named (margin %i)', (margin) => {
    const { proposal, evaluation } = solve(retorts(2, 25, margin));
    expect(evaluation.over.kg).toBeGreaterThan(0);
    expect(evaluation.over.kg).toBeCloseTo(proposal.after.overKg, 3);
    expect(proposal.unresolved.length).toBeGreaterThan(0);
    expect(proposal.unresolved[0]?.why).toMatch(/No start exists for load-R\d: it needs 15\d\d kg\/h.* 125 kg\/h more/);
  });
});

describe('three retorts planned at the same minute, reserve 10 %', () => {
  it('move 24 min in all', () => {
    const { starts, evaluation } = solve(retorts(3, 10, 0));
    expect(total(starts)).toBe(24);
    expect(evaluation.over.kg).toBe(0);
    expect(evaluation.breaches.filter((b) => b.class === 'process')).toEqual([]);
    const [first = 0, second = 0, third = 0] = starts;
    expect([second - first, third - second]).toEqual([6, 18]);
    const atThird = (evaluation.headers[0]?.loadKgPerH[SIX + third] ?? 0) - BLANCHERS_KG_PER_H;
    expect(atThird).toBeCloseTo(1892.26, 2);
    expect(peakOfRetorts(evaluation)).toBeLessThan(1962.37);
  });

  it('move 30 min in all where only later is allowed', () => {
    const { starts, evaluation } = solve(retorts(3, 10, 0), { ...OPTIONS, mayMoveEarlier: false });
    expect(starts).toEqual([0, 6, 24]);
    expect(evaluation.over.kg).toBe(0);
  });
});
