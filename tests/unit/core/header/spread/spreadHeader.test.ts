import { describe, expect, it } from 'vitest';
import { spreadHeader } from '@/core/header/spread/spreadDraws';
import { seededRandom } from '@/core/levelling/random';
import { evaluateWeek } from '@/core/pipeline';
import type { Accumulator } from '@/core/plant/plant';
import { createSpreadEvaluator } from '@/core/weekSpread';
import { activity, capacity, flatMode, header, plant, unit, week } from '../../../../support/builders';

const low = header('low', {
  pressureBarG: 3,
  dryness: 1,
  feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 600 },
});
const store: Accumulator = {
  id: 'store',
  name: 'Accumulator',
  chargedFromHeaderId: 'main',
  feedsHeaderId: 'low',
  waterTonnes: 20,
  highBarG: 6.5,
  lowBarG: 3.2,
  greatestChargeKgPerH: 500,
  greatestDischargeKgPerH: 900,
  shareAtWeekStart: 1,
};
const source = (changes: { limits?: readonly [string, number][]; accumulators?: readonly Accumulator[] }) =>
  week({
    horizonMin: 120,
    plant: plant({
      headers: [header('main'), low],
      units: [unit('r1'), unit('k1', { headerId: 'low' })],
      accumulators: changes.accumulators ?? [],
    }),
    capacities: (changes.limits ?? []).map(([id, kgPerH]) => capacity(id, kgPerH)),
    activities: ['r1', 'k1'].map((id) =>
      activity(id, { modes: [flatMode(id, 30, 700)], placement: { unitId: id, start: 40 } }),
    ),
  });

describe('what a header under early and late starts is judged by', () => {
  it('is the steam limit where boilers feed it, and nothing where none is set', () => {
    expect(spreadHeader(source({ limits: [['main', 900]] }), 'main').limitKgPerH?.[50]).toBe(900);
    expect(spreadHeader(source({}), 'main').limitKgPerH).toBeNull();
  });

  it('is the lower of what its letdown passes and its limit', () => {
    expect(spreadHeader(source({}), 'low').limitKgPerH?.[50]).toBe(600);
    expect(spreadHeader(source({ limits: [['low', 400]] }), 'low').limitKgPerH?.[50]).toBe(400);
    expect(spreadHeader(source({ limits: [['low', 4_000]] }), 'low').limitKgPerH?.[50]).toBe(600);
  });

  it('counts what is drawn, not what an accumulator leaves of it', () => {
    const carried = source({ limits: [['main', 900]], accumulators: [store] });
    const judged = evaluateWeek(carried).headers;
    expect(judged.some(({ carried: by }) => (by?.dischargeKgPerH[50] ?? 0) > 0)).toBe(true);
    for (const { headerId, drawnKgPerH } of judged) {
      const options = { samples: 1, random: seededRandom(1) };
      const { asItStands } = createSpreadEvaluator(carried, headerId, new Map(), options);
      expect([...asItStands.confidentKgPerH]).toEqual([...drawnKgPerH]);
    }
  });
});
