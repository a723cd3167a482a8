import { describe, expect, it } from 'vitest';
import { plainNetwork } from '@/core/header/network';
import { evaluateWeek } from '@/core/pipeline';
import type { PlantModel } from '@/core/plant/plant';
import { overKgOf } from '@/server/levelling/checkProposal';
import { withFullFigures } from '@/server/levelling/fullFigures';
import { levelWeek } from '@/solver/levelWeek';
import { activity, capacity, flatMode, header, plant, unit, week } from '../../../support/builders';

const works: PlantModel = plant({
  headers: [
    header('main', { pressureBarG: 10, dryness: 1 }),
    header('low', { pressureBarG: 4, feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 9000 } }),
  ],
  units: [unit('blancher'), unit('r1', { headerId: 'low' })],
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
const fixedRun = (id: string, unitId: string, start: number, minutes: number, kgPerH: number) =>
  activity(id, { modes: [flatMode(unitId, minutes, kgPerH)], placement: { unitId, start }, fixing: 'fixed' });

/** 700 kg/h over for 20 min: 233.3 kg, all of which the accumulator carries; then 233.3 kg again, when it is empty. */
const crowded = (starts: readonly number[]) =>
  week({
    horizonMin: 720,
    plant: works,
    capacities: [capacity('main', 2000)],
    activities: [
      fixedRun('blanch', 'blancher', 0, 720, 1500),
      ...starts.map((start) => fixedRun(`load${start}`, 'r1', start, 20, 1200)),
    ],
  });
const proposed = (source: ReturnType<typeof crowded>) =>
  levelWeek(source, { budget: { iterations: 50 } }, { now: undefined }).proposal;

describe('figures of a proposal', () => {
  it('are those of the week as other pages show it, what is carried taken off', () => {
    const source = crowded([300]);
    const plain = proposed(source);
    expect(plain.after.overKg).toBeCloseTo(700 / 3, 6);
    const full = withFullFigures(source, plain);
    expect(full.after).toMatchObject({ overKg: 0, overMinutes: 0, worstDeficitKg: 0 });
    expect(full.unresolved).toEqual([]);
  });

  it('keep what stays over, with the steam that does', () => {
    const source = crowded([300, 320]);
    const full = withFullFigures(source, proposed(source));
    const kg = overKgOf(evaluateWeek(source));
    expect(kg).toBeGreaterThan(100);
    expect(kg).toBeLessThan(300);
    expect(full.before.overKg).toBe(kg);
    expect(full.unresolved.map((left) => [left.headerId, left.kg])).toEqual([['main', kg]]);
    expect(full.after.peakKgPerH['main']).toBe(evaluateWeek(source).headers[0]?.peak.kgPerH);
  });

  it('stay as they are on a plant with neither', () => {
    const source = { ...crowded([300]), plant: plainNetwork(works) };
    const proposal = proposed(source);
    expect(withFullFigures(source, proposal)).toBe(proposal);
  });
});
