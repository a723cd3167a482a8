import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import { activity, capacity, flatMode, header, plant, unit, week } from '../support/builders';

/**
 * Invented plant. The main header, 10 bar g dry, may bring 2 000 kg/h; a blancher draws 1 000 of it all day. Vents of
 * 3 500 kg/h for 6 min stand on a header of 4 bar g below it. An accumulator of 5 t of water between 10 and 5 bar g is
 * full: 5 000 x 0.052426 = 262.13 kg (share of the water by python3-iapws 1.5.3). It is charged at 600 kg/h at most.
 *
 * A vent takes the load to 4 500: 2 500 over, 41.667 kg a minute, 250 kg in its 6 min. The first is carried whole and
 * leaves 262.13 - 250 = 12.13 kg. In the 10 min to the second, 600 kg/h are taken in: 10 kg a minute, of which each
 * makes 1 / 0.995173 = 1.004851 kg to give up (h_g 2770.823 and h_f 732.400 at 7.5 bar g, steam of 2780.711 kJ/kg), so
 * 100.485 kg: 112.615 kg in store. The second vent needs 250 kg: two minutes take 83.333 and leave 29.282, which is all
 * that the third gets, 1 756.9 kg/h. Over are 41.667 - 29.282 in the third and 3 x 41.667 after it: 137.385 kg.
 */
const FIRST = 60;
const SECOND = 76;
const VENT_MIN = 6;

const works = plant({
  headers: [
    header('main', { pressureBarG: 10, dryness: 1 }),
    header('low', {
      pressureBarG: 4,
      dryness: null,
      feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 9000 },
    }),
  ],
  units: [unit('blancher'), unit('retort1', { headerId: 'low' }), unit('retort2', { headerId: 'low' })],
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
const run = (id: string, unitId: string, start: number, minutes: number, kgPerH: number) =>
  activity(id, { modes: [flatMode(unitId, minutes, kgPerH)], placement: { unitId, start } });

function judged(second: number, plantModel = works) {
  const activities = [
    run('blanch', 'blancher', 0, 1440, 1000),
    run('one', 'retort1', FIRST, VENT_MIN, 3500),
    run('two', 'retort2', second, VENT_MIN, 3500),
  ];
  const [main] = evaluateWeek(
    week({ horizonMin: 1440, plant: plantModel, capacities: [capacity('main', 2000)], activities }),
  ).headers;
  if (!main) throw new Error('no main header');
  return main;
}

describe('two vents over an accumulator, worked by hand', () => {
  const main = judged(SECOND);
  const store = (minute: number) => main.carried?.storeKg[minute] ?? NaN;

  it('without it both are over, 250 kg each', () => {
    expect(judged(SECOND, { ...works, accumulators: [] }).over?.kg).toBeCloseTo(500, 9);
  });

  it('the first is carried whole and all but empties it', () => {
    expect(store(FIRST)).toBeCloseTo(262.13, 2);
    expect(store(FIRST + VENT_MIN)).toBeCloseTo(12.13, 2);
    expect(main.over?.spans.every((span) => span.from > SECOND)).toBe(true);
    expect(main.loadKgPerH[FIRST]).toBeCloseTo(2000, 9);
    expect(main.drawnKgPerH[FIRST]).toBe(4500);
  });

  it('is charged between them with what is taken in, not with more', () => {
    expect(main.carried?.chargeKgPerH[70]).toBe(600);
    expect(store(SECOND) - store(FIRST + VENT_MIN)).toBeCloseTo(100.485, 2);
    expect(store(SECOND)).toBeCloseTo(112.615, 2);
  });

  it('the second finds less: carried for 2 min and 29.28 kg, then 137.385 kg over', () => {
    const given = [0, 1, 2, 3].map((minute) => main.carried?.dischargeKgPerH[SECOND + minute] ?? NaN);
    expect(given[0]).toBeCloseTo(2500, 9);
    expect(given[1]).toBeCloseTo(2500, 9);
    expect(given[2]).toBeCloseTo(1756.9, 0);
    expect(given[3]).toBe(0);
    expect(main.over?.spans).toMatchObject([{ from: SECOND + 2, to: SECOND + VENT_MIN }]);
    expect(main.over?.kg).toBeCloseTo(137.385, 2);
    expect(main.over?.peakOverKgPerH).toBeCloseTo(2500, 9);
  });

  it('an hour later it has filled again, and nothing is over', () => {
    // 250 / 1.004851 / 10 = 24.9 min to fill.
    const later = judged(FIRST + 66);
    expect(later.carried?.storeKg[FIRST + VENT_MIN + 25]).toBeCloseTo(262.13, 2);
    expect(later.over?.minutes).toBe(0);
  });
});
