import { describe, expect, it } from 'vitest';
import { pushOn } from '@/core/levelling/pushOn';
import type { Activity } from '@/core/plant/activity';
import { activity, flatMode, plant, unit, week } from '../../../support/builders';

const run = (id: string, start: number, changes: Partial<Activity> = {}) =>
  activity(id, { modes: [flatMode('kettle1', 60, 0)], placement: { unitId: 'kettle1', start }, ...changes });
const starts = (source: ReturnType<typeof week>) =>
  pushOn(source, 0).activities.map(({ id, placement }) => [id, placement?.start]);

describe('pushing on what can’t stay', () => {
  const rule = {
    unitKind: 'kettle',
    fromFamilyId: 'nut',
    toFamilyId: 'nutFree',
    minutes: 30,
    kind: 'allergen',
  } as const;
  const bare = plant({ units: [unit('kettle1', { kind: 'kettle' })], cleaning: [{ ...rule, phases: [], uses: [] }] });

  it('leaves a cooker that takes hours to heat up where it is', () => {
    const cooker = run('cooker', 130, { modes: [{ ...flatMode('kettle1', 60, 0), neverMoved: true }] });
    const late = run('late', 100, { fixing: 'started' });
    expect(starts(week({ plant: bare, activities: [late, cooker] }))).toEqual([
      ['late', 100],
      ['cooker', 130],
    ]);
    expect(starts(week({ plant: bare, activities: [late, run('other', 130)] }))[1]).toEqual(['other', 160]);
  });

  it('waits for the release after an allergen clean', () => {
    const practice = { greatestRunningMin: null, greatestStandingDirtyMin: null, allergenReleaseMin: 45 };
    const pair = [run('a', 0, { familyId: 'nut' }), run('b', 95, { familyId: 'nutFree' })];
    expect(starts(week({ plant: bare, activities: pair }))[1]).toEqual(['b', 95]);
    const released = { ...bare, rules: { ...bare.rules, practice } };
    expect(starts(week({ plant: released, activities: pair }))[1]).toEqual(['b', 135]);
  });
});
