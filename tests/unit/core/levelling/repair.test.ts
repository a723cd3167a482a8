import { describe, expect, it } from 'vitest';
import { repairWeek, type Repair } from '@/core/levelling/repair';
import type { FloorTrouble } from '@/core/levelling/trouble';
import type { Week } from '@/core/schedule/week';
import { solveLp } from '@/solver/lpSolver';
import { activity, link, mode, phase, unit, week } from '../../../support/levellingCases';

const SPAN = { from: 360, to: 720 };
const repair = (plan: Week, trouble: FloorTrouble): Repair =>
  repairWeek(plan, trouble, { span: SPAN, budget: { iterations: 600 } }, { solveLp });

const startsOf = ({ week: { activities } }: Repair): Record<string, number | undefined> =>
  Object.fromEntries(activities.map((a) => [a.id, a.placement?.start]));

const VENT = [phase('vent', 0, 6, 800)];

/** Two loads whose vents fit together under 2,000 kg/h, and one that has started before. */
function vents(): Week {
  return week({
    limitKgPerH: 2_000,
    units: ['R1', 'R2', 'R3'].map((id) => unit(id, 'retort')),
    activities: [
      activity('load-1', { modes: [mode('R1', 60, VENT)], placement: { unitId: 'R1', start: 400 } }),
      activity('load-2', { modes: [mode('R2', 60, VENT)], placement: { unitId: 'R2', start: 400 } }),
      activity('running', {
        modes: [mode('R3', 200, [phase('process', 0, 200, 300)])],
        placement: { unitId: 'R3', start: 300 },
        fixing: 'started',
      }),
    ],
  });
}

describe('repairing a plan on the floor', () => {
  it('keeps two vents apart when a boiler trips: one moves by the six minutes of the other', () => {
    // 2 x 800 + 300 = 1,900 kg/h where 1,200 are left; one vent and the running load take 1,100.
    const trouble: FloorTrouble = { kind: 'boilerTripped', headerId: 'main', lostKgPerH: 800, span: SPAN };
    const found = repair(vents(), trouble);
    expect(found.troubled.over.kg).toBeCloseTo(70, 6);
    expect(found.repaired.over.kg).toBe(0);
    expect(found.moves).toHaveLength(1);
    expect(found.moves[0]).toMatchObject({ why: 'steam' });
    const starts = startsOf(found);
    expect(Math.abs((starts['load-1'] ?? 0) - (starts['load-2'] ?? 0))).toBe(6);
    expect(starts['running']).toBe(300);
  });

  it('pushes what follows a late batch by no more than it must, along its waits and on its unit', () => {
    const plan = week({
      limitKgPerH: 2_000,
      units: [unit('K1', 'kettle'), unit('F1', 'filler')],
      activities: [
        activity('cook', { stage: 'cook', modes: [mode('K1', 30)], placement: { unitId: 'K1', start: 370 } }),
        activity('fill', { stage: 'fill', modes: [mode('F1', 20)], placement: { unitId: 'F1', start: 405 } }),
        activity('next', { stage: 'fill', modes: [mode('F1', 20)], placement: { unitId: 'F1', start: 430 } }),
        activity('far', { stage: 'fill', modes: [mode('F1', 20)], placement: { unitId: 'F1', start: 500 } }),
      ],
      links: [link('filled', 'cook', 'fill', 0, null)],
    });
    const found = repair(plan, { kind: 'batchLate', activityId: 'cook', byMin: 20 });
    // cook ends 420: fill 405 -> 420, ends 440: next 430 -> 440; far has room.
    expect(startsOf(found)).toEqual({ cook: 390, fill: 420, next: 440, far: 500 });
    expect(found.moves.map(({ activityId, why }) => [activityId, why])).toEqual([
      ['fill', 'pushed'],
      ['next', 'pushed'],
    ]);
    expect(found.repaired.breaches).toEqual([]);
  });

  it('takes a load to another retort when its own is lost, and leaves what is running', () => {
    const plan = week({
      limitKgPerH: 2_000,
      units: [unit('R1', 'retort'), unit('R2', 'retort')],
      activities: [
        activity('load', {
          modes: [mode('R1', 60, VENT), mode('R2', 60, VENT)],
          placement: { unitId: 'R1', start: 420 },
        }),
        activity('busy', { modes: [mode('R2', 40, VENT)], placement: { unitId: 'R2', start: 365 } }),
      ],
    });
    const found = repair(plan, { kind: 'unitLost', unitId: 'R1', span: { from: 360, to: 1_440 } });
    expect(found.moves).toEqual([
      {
        activityId: 'load',
        from: { unitId: 'R1', start: 420 },
        to: { unitId: 'R2', start: 420 },
        why: 'pushed',
      },
    ]);
    expect(found.repaired.breaches).toEqual([]);
  });

  it('says what it could not do, and moves nothing outside the rest of the shift', () => {
    const trouble: FloorTrouble = { kind: 'boilerTripped', headerId: 'main', lostKgPerH: 1_300, span: SPAN };
    const found = repair(vents(), trouble);
    expect(found.unresolved.length).toBeGreaterThan(0);
    expect(found.repaired.over.kg).toBeLessThanOrEqual(found.troubled.over.kg);
    for (const { from, to } of found.moves) {
      expect(Math.min(from.start, to.start)).toBeGreaterThanOrEqual(SPAN.from);
      expect(to.start).toBeLessThan(SPAN.to);
    }
  });
});
