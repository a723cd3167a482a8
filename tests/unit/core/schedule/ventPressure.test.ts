import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { VentGroup } from '@/core/plant/plant';
import { limitAboveStudy } from '@/core/schedule/limitAboveStudy';
import { breachSentence, namesOf } from '@/core/schedule/sentences';
import { capacity, header, plant, unit, ventGroup } from '../../../support/builders';
import { cannery, canneryWeek, retortLoad, STORED_KG_PER_BAR } from '../../../support/workedBatches';

const group = (changes: Partial<VentGroup>) => ventGroup('manifold', { ventsAtOnce: 4, ...changes });

/** Two vents together pass the limit by 793.40 kg/h for 6 min: 79.3 kg, 0.90 bar (worked batches, invented plant). */
function week(changes: Partial<VentGroup>, secondStart: number, pressureBarG = 7) {
  const loads = [retortLoad('load1', 'retort1', 360), retortLoad('load2', 'retort2', secondStart)];
  const limit = 3546.94;
  return canneryWeek(loads, 0, {
    plant: cannery({ ventGroups: [group(changes)], headers: [header('main', { pressureBarG })] }),
    capacities: [capacity('main', limit, { storedKgPerBar: [{ from: 0, value: STORED_KG_PER_BAR }] })],
  });
}
const lowVents = (source: ReturnType<typeof week>) =>
  evaluateWeek(source).breaches.filter(({ code }) => code === 'ventPressure');

describe('vents at too low a header pressure', () => {
  it('are those during which the header would sag below what was validated', () => {
    const source = week({ leastHeaderBarG: 6.2 }, 360);
    const found = lowVents(source);
    expect(found).toMatchObject([
      { class: 'process', from: 360, to: 366, activityIds: ['load1'], found: expect.closeTo(6.1, 2), limit: 6.2 },
      { activityIds: ['load2'] },
    ]);
    expect(found[0] && breachSentence(found[0], namesOf(source), (t) => `minute ${t}`)).toEqual({
      title: 'Header too low to vent: 6.1 bar g, minute 360 to minute 366',
      detail: 'Retort 1: Manifold manifold was validated at 6.2 bar g or more.',
    });
  });

  it('are none where the header holds, where they are apart, or where nothing is said', () => {
    expect(lowVents(week({ leastHeaderBarG: 6 }, 360))).toEqual([]);
    expect(lowVents(week({ leastHeaderBarG: 6.2 }, 400))).toEqual([]);
    expect(lowVents(week({}, 360))).toEqual([]);
    expect(lowVents(week({ leastHeaderBarG: null }, 360))).toEqual([]);
  });

  it('are all of them, as one, where the header is set lower', () => {
    expect(lowVents(week({ leastHeaderBarG: 7.5 }, 400))).toMatchObject([
      { from: 360, to: 406, activityIds: ['load1', 'load2'], found: 7, limit: 7.5 },
    ]);
  });
});

describe('a steam limit above what a study saw', () => {
  const studied = plant({
    units: [
      unit('r1', { ventGroupId: 'north' }),
      unit('r2', { ventGroupId: 'south' }),
      unit('r3', { headerId: 'low' }),
    ],
    ventGroups: [
      ventGroup('north', { studyGreatestLoadKgPerH: 3000, source: 'study DS-1' }),
      ventGroup('south', { studyGreatestLoadKgPerH: 2800, source: 'study DS-2' }),
      ventGroup('other', { studyGreatestLoadKgPerH: 10 }),
    ],
  });

  it('is said with the smallest of them on the header', () => {
    expect(limitAboveStudy(studied, 'main', 2850)).toBe(
      'The limit of 2 850 kg/h is above what was validated: the study of Manifold south (study DS-2) saw at most 2 800 kg/h. Ask the quality lead.',
    );
    expect(limitAboveStudy(studied, 'main', 3100)).toContain('3 100 kg/h');
  });

  it('is not said of what a study saw, on other headers, or without a study', () => {
    expect(limitAboveStudy(studied, 'main', 2800)).toBeNull();
    expect(limitAboveStudy(studied, 'low', 9000)).toBeNull();
    expect(limitAboveStudy(plant({ ventGroups: [ventGroup('north')] }), 'main', 9000)).toBeNull();
  });
});
