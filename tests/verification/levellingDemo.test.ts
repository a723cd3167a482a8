import { describe, expect, it } from 'vitest';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import type { Week } from '@/core/schedule/week';
import { demoWeek } from '@/server/demo/demoWeek';
import { levelWeek } from '@/solver/levelWeek';

const OPTIONS = { budget: { iterations: 700 } };

function levelled(week: Week) {
  const { proposal, withheld } = levelWeek(week, OPTIONS, { now: undefined });
  const moves = proposal.moves.map((m) => ({ activityId: m.activityId, placement: m.to }));
  return { proposal, withheld, week: withPlacements(week, moves) };
}

describe('the demo week', () => {
  const week = demoWeek();
  const before = evaluateWeek(week);
  const { proposal, withheld, week: moved } = levelled(week);
  const after = evaluateWeek(moved);

  it('starts well over the limit and ends with nothing over', () => {
    expect(before.over.kg).toBeGreaterThan(1000);
    expect(after.over.kg).toBe(0);
    expect(withheld).toBe(false);
    expect(proposal.unresolved).toEqual([]);
  });

  it('breaks no process, shared or time limit that held, and makes nothing late', () => {
    const known = new Set(before.breaches.map((b) => b.id));
    const appeared = after.breaches.filter((b) => b.class !== 'steam' && !known.has(b.id));
    expect(appeared).toEqual([]);
    expect(after.lateMinutes).toBe(before.lateMinutes);
  });

  it('is judged by levelling as the ordinary pipeline judges it', () => {
    expect(proposal.before.overKg).toBeCloseTo(before.over.kg, 2);
    expect(proposal.before.overMinutes).toBe(before.over.minutes);
    expect(proposal.before.worstDeficitKg).toBeCloseTo(before.over.worstDeficitKg, 2);
    for (const [figures, evaluation] of [
      [proposal.before, before],
      [proposal.after, after],
    ] as const) {
      for (const header of evaluation.headers) {
        expect(figures.peakKgPerH[header.headerId]).toBeCloseTo(header.peak.kgPerH, 2);
      }
      expect(figures.lateMinutes).toBe(evaluation.lateMinutes);
      expect(figures.processBreaches).toBe(evaluation.breaches.filter((b) => b.class === 'process').length);
      expect(figures.sharedBreaches).toBe(evaluation.breaches.filter((b) => b.class === 'shared').length);
    }
  });

  it('gives the same proposal whatever the order of its parts', () => {
    const reversed: Week = {
      ...week,
      activities: [...week.activities].reverse(),
      links: [...week.links].reverse(),
      plant: { ...week.plant, units: [...week.plant.units].reverse() },
    };
    expect(levelled(reversed).proposal).toEqual(proposal);
  });

  it('leaves the week that it was given as it was', () => {
    expect(week).toEqual(demoWeek());
  });
});
