import { describe, expect, it } from 'vitest';
import { levelWeek } from '@/core/levelling/levelWeek';
import type { LevellingOptions } from '@/core/levelling/options';
import type { Fixing } from '@/core/plant/activity';
import { solveLp } from '@/solver/lpSolver';
import { activity, mode, phase, unit, week } from '../../../support/levellingCases';

/** Two loads whose vents stand on the same minute: 1,600 kg/h where 1,000 may be drawn. */
function vents(fixing: Fixing, earliestStart = 0, latestStart: number | null = null) {
  const uses = [phase('vent', 0, 6, 800)];
  return week({
    limitKgPerH: 1_000,
    units: [unit('R1', 'retort'), unit('R2', 'retort')],
    activities: ['R1', 'R2'].map((id) =>
      activity(`load-${id}`, {
        modes: [mode(id, 60, uses)],
        placement: { unitId: id, start: 360 },
        fixing,
        earliestStart,
        latestStart,
      }),
    ),
  });
}

const relaxations = (found: ReturnType<typeof vents>, options: LevellingOptions = {}) =>
  levelWeek(found, { budget: { iterations: 100 }, ...options }, { solveLp }).proposal.relaxations;

describe('how little more would do it', () => {
  it('names the steam that is missing and, by trial, each fixed batch whose freeing takes it away', () => {
    expect(relaxations(vents('fixed'))).toEqual([
      { kind: 'moreSteam', headerId: 'main', from: 360, to: 366, kgPerH: 600 },
      { kind: 'unfix', activityId: 'load-R1', leavesKg: 0 },
      { kind: 'unfix', activityId: 'load-R2', leavesKg: 0 },
    ]);
  });

  it('tries moves further than allowed', () => {
    // Two minutes each way leave the vents 358 to 364 and 362 to 368.
    expect(relaxations(vents('free'), { greatestShiftMin: 2 })).toEqual([
      { kind: 'moreSteam', headerId: 'main', from: 362, to: 364, kgPerH: 600 },
      { kind: 'furtherMoves', minutes: 4, leavesKg: 0 },
    ]);
  });

  it('names only steam where nothing tried helps, and nothing where all fits', () => {
    expect(relaxations(vents('done'))?.map(({ kind }) => kind)).toEqual(['moreSteam']);
    expect(relaxations(vents('free'))).toBeUndefined();
  });
});
