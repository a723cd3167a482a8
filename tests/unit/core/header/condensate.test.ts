import { describe, expect, it } from 'vitest';
import { flashCredit, flashCredits } from '@/core/header/condensate';
import { evaluateWeek } from '@/core/pipeline';
import { plainNetwork } from '@/core/header/network';
import { activity, capacity, flatMode, header, plant, unit, week } from '../../../support/builders';
import { expectRelative, failureOf, valueOf } from '../../../verification/steamSupport';

const low = header('low', {
  pressureBarG: 3,
  dryness: 0.995,
  feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 1000, leastKgPerH: 80 },
  flash: { fromHeaderId: 'main', share: 0.7, condensateBarG: 7 },
});
const works = plant({
  headers: [header('main'), low],
  units: [unit('kettle'), unit('washer', { headerId: 'low' })],
});
const draw = (id: string, unitId: string, start: number, minutes: number, kgPerH: number) =>
  activity(id, { modes: [flatMode(unitId, minutes, kgPerH)], placement: { unitId, start } });
const judged = (...activities: ReturnType<typeof draw>[]) => {
  const capacities = [capacity('main', 1500, { baseLoadKgPerH: [{ from: 0, value: 100 }] }), capacity('low', null)];
  return evaluateWeek(week({ plant: works, capacities, activities })).headers;
};

describe('flash steam of a header’s condensate', () => {
  // h_f 721.319 and 605.236, h_fg 2132.97 kJ/kg (python3-iapws 1.5.3).
  it('is the share collected times what flashes', () => {
    const credit = valueOf(flashCredit(low, 1.01325));
    expectRelative(credit?.steamPerDraw ?? 0, 0.7 * 0.054422728767598, 1e-8);
    expect(credit?.working.steps.map(({ symbol }) => symbol)).toEqual(['x_f', 'c']);
  });

  it('is none where none is collected, and a sentence where the condensate is colder than the header', () => {
    expect(flashCredit(header('main'), 1.01325)).toEqual({ ok: true, value: null });
    const cold = { ...low, flash: { fromHeaderId: 'main', share: 0.7, condensateBarG: 2 } };
    expect(failureOf(flashCredit(cold, 1.01325)).code).toBe('FLASH-ORDER');
    expect(flashCredits(plant({ headers: [cold] })).size).toBe(0);
  });

  it('relieves letdown and boilers, but not of the base load’s condensate nor of the lower header’s', () => {
    const [main, lower] = judged(draw('a', 'kettle', 0, 60, 1000), draw('b', 'washer', 0, 120, 500));
    const credit = 1000 * 0.7 * 0.054422728767598;
    expect(lower?.loadKgPerH[30]).toBeCloseTo(500 - credit, 6);
    expect(lower?.flashKgPerH?.[30]).toBeCloseTo(credit, 6);
    expect(main?.loadKgPerH[30]).toBeCloseTo(1600 - credit, 6);
    expect(main?.drawnKgPerH[30]).toBe(1600);
    expect(main?.flashKgPerH?.[30]).toBeCloseTo(credit, 6);
    // The kettle has stopped: nothing flashes.
    expect(lower?.loadKgPerH[90]).toBe(500);
    expect(main?.loadKgPerH[90]).toBe(600);
  });

  it('is credited up to the lower header’s own load, the rest is lost', () => {
    const [main, lower] = judged(draw('a', 'kettle', 0, 60, 1000), draw('b', 'washer', 0, 60, 20));
    expect(lower?.loadKgPerH[30]).toBe(0);
    expect(main?.loadKgPerH[30]).toBe(1100);
  });

  it('is not on the plain network', () => {
    const plain = plainNetwork(works);
    expect(plainNetwork(works)).toBe(plain);
    expect(plainNetwork(plain)).toBe(plain);
    const bare = plant();
    expect(plainNetwork(bare)).toBe(bare);
    const activities = [draw('a', 'kettle', 0, 60, 1000), draw('b', 'washer', 0, 120, 500)];
    const [main] = evaluateWeek(week({ plant: plain, capacities: [], activities })).headers;
    expect(main?.loadKgPerH[30]).toBe(1500);
    expect(main?.flashKgPerH).toBeNull();
  });
});

describe('a letdown', () => {
  it('is over its greatest flow only by what flash steam leaves', () => {
    const [, alone] = judged(draw('b', 'washer', 0, 60, 1030));
    expect(alone?.letdown?.peakOverKgPerH).toBeCloseTo(30, 9);
    const [, relieved] = judged(draw('a', 'kettle', 0, 60, 1000), draw('b', 'washer', 0, 60, 1030));
    expect(relieved?.letdown?.minutes).toBe(0);
  });

  it('is noted where it passes less than it can hold, shut excepted', () => {
    const [main, lower] = judged(
      draw('b', 'washer', 0, 30, 79),
      draw('c', 'washer', 30, 30, 60),
      draw('d', 'washer', 90, 9, 80),
    );
    expect(lower?.letdownLow).toEqual([{ from: 0, to: 60, leastKgPerH: 60 }]);
    expect(main?.letdownLow).toEqual([]);
  });
});
