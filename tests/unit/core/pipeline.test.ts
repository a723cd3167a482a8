import { describe, expect, it } from 'vitest';
import { createEvaluator, evaluateWeek, whoDraws, withPlacements } from '@/core/pipeline';
import { activity, capacity, flatMode, header, phase, placedAt, plant, unit, week } from '../../support/builders';

const twoHeaders = plant({
  headers: [header('main'), header('other')],
  units: [unit('unit1'), unit('unit2', { headerId: 'other' })],
});
const heavy = (id: string, unitId: string, start: number) =>
  placedAt(activity(id, { modes: [flatMode(unitId, 60, 1100)] }), start);

describe('a week judged', () => {
  it('takes what is over on all headers together', () => {
    const capacities = [capacity('main', 1000), capacity('other', 900)];
    const { over, headers } = evaluateWeek(
      week({ plant: twoHeaders, capacities, activities: [heavy('a', 'unit1', 0), heavy('b', 'unit2', 0)] }),
    );
    // 100 and 200 kg over in an hour.
    expect(headers.map((judged) => judged.over?.kg)).toEqual([expect.closeTo(100, 9), expect.closeTo(200, 9)]);
    expect(over).toMatchObject({
      kg: expect.closeTo(300, 9),
      worstDeficitKg: expect.closeTo(200, 9),
      minutes: 120,
      peakOverKgPerH: 200,
    });
  });

  it('does not judge a header without a capacity', () => {
    const { headers, breaches } = evaluateWeek(week({ plant: twoHeaders, activities: [heavy('b', 'unit2', 0)] }));
    expect(headers[1]).toMatchObject({ headerId: 'other', over: null, peak: { kgPerH: 1100 } });
    expect(breaches).toEqual([]);
  });

  it('names cleanings among those that draw', () => {
    const wash = {
      unitKind: 'other',
      fromFamilyId: 'A',
      toFamilyId: 'B',
      minutes: 10,
      kind: 'wash',
      phases: [phase(0, 10, 50)],
      uses: [],
    } as const;
    const runs = [placedAt(activity('a', { familyId: 'A' }), 0), placedAt(activity('b', { familyId: 'B' }), 90)];
    expect(whoDraws(week({ plant: plant({ cleaning: [wash] }), activities: runs }), 'main', 65)).toEqual([
      { activityId: 'clean:a', unitId: 'unit1', kgPerH: 50 },
    ]);
  });
});

describe('placements tried out', () => {
  const source = week({ activities: [heavy('a', 'unit1', 0), activity('loose', { placement: null })] });

  it('say which breaches appear and which are gone, and leave the week alone', () => {
    const evaluator = createEvaluator(source);
    const ids = (breaches: readonly { id: string }[]) => breaches.map(({ id }) => id);
    expect(ids(evaluator.evaluation.breaches)).toEqual(['overLimit:main:0']);
    const moved = evaluator.preview([{ activityId: 'a', placement: { unitId: 'unit1', start: 30 } }]);
    expect([ids(moved.appeared), ids(moved.gone)]).toEqual([['overLimit:main:30'], ['overLimit:main:0']]);
    const placed = evaluator.preview([{ activityId: 'loose', placement: { unitId: 'unit1', start: 20 } }]);
    expect([ids(placed.appeared), ids(placed.gone)]).toEqual([['unitClash:a:loose'], []]);
    const off = evaluator.preview([{ activityId: 'a', placement: null }]);
    expect([ids(off.appeared), ids(off.gone)]).toEqual([[], ['overLimit:main:0']]);
    expect(evaluator.preview([]).evaluation).toEqual(evaluator.evaluation);
  });

  it('pass over activities that there are not', () => {
    const tried = withPlacements(source, [{ activityId: 'nobody', placement: null }]);
    expect(tried.activities).toEqual(source.activities);
    expect(tried.activities[0]).toBe(source.activities[0]);
  });
});
