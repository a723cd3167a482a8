import { describe, expect, it } from 'vitest';
import { plainNetwork } from '@/core/header/network';
import { evaluateWeek } from '@/core/pipeline';
import type { PlantModel } from '@/core/plant/plant';
import { disagreement, overKgOf, tryMoves } from '@/server/levelling/checkProposal';
import { levelWeek } from '@/solver/levelWeek';
import { activity, capacity, flatMode, header, plant, unit, week } from '../../../support/builders';

const works: PlantModel = plant({
  headers: [
    header('main', { pressureBarG: 10, dryness: 1 }),
    header('low', {
      pressureBarG: 4,
      dryness: null,
      feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 9000 },
      flash: { fromHeaderId: 'main', share: 0.5, condensateBarG: 8 },
    }),
  ],
  units: [unit('blancher'), unit('r1', { headerId: 'low' }), unit('r2', { headerId: 'low' })],
  accumulators: [
    {
      id: 'acc',
      name: 'Accumulator',
      chargedFromHeaderId: 'main',
      feedsHeaderId: 'low',
      waterTonnes: 5,
      highBarG: 10,
      lowBarG: 5,
      greatestChargeKgPerH: 600,
      greatestDischargeKgPerH: 3000,
      shareAtWeekStart: 1,
    },
  ],
});
const run = (id: string, unitId: string, start: number, minutes: number, kgPerH: number, fixed = false) =>
  activity(id, {
    modes: [flatMode(unitId, minutes, kgPerH)],
    placement: { unitId, start },
    fixing: fixed ? 'fixed' : 'free',
  });
const crowded = week({
  horizonMin: 720,
  plant: works,
  capacities: [capacity('main', 2000)],
  activities: [
    run('blanch', 'blancher', 0, 720, 500, true),
    run('one', 'r1', 300, 20, 1200),
    run('two', 'r2', 300, 20, 1200),
  ],
});

describe('a proposal on a plant with flash steam and accumulators', () => {
  it('is held against judging without them, which the solver does not know', () => {
    const { proposal } = levelWeek(crowded, { budget: { iterations: 300 }, seed: 1 }, { now: undefined });
    expect(proposal.before.overKg).toBeCloseTo(300, 6);
    expect(proposal.after.overKg).toBe(0);
    expect(disagreement(crowded, proposal)).toBeNull();
    const off = { ...proposal, after: { ...proposal.after, overKg: 5 } };
    expect(disagreement(crowded, off)).toBe('0.00 kg over the limit, 5.00 kg said');
  });

  it('shows figures with them: what is carried is not over', () => {
    expect(overKgOf(evaluateWeek({ ...crowded, plant: plainNetwork(works) }))).toBeCloseTo(300, 6);
    expect(overKgOf(tryMoves(crowded, []).evaluation)).toBeLessThan(60);
  });
});
