import fc from 'fast-check';
import { expect, it } from 'vitest';
import { createEvaluator, evaluateWeek, withPlacements } from '@/core/pipeline';
import type { Breach } from '@/core/schedule/breach';
import type { Week } from '@/core/schedule/week';
import { applyEdit, changeOf, editOf, reverseEdit, squashEdits, staleChanges } from '@/core/schedule/edits';
import { slipLine } from '@/core/schedule/hand';
import { placement, weeks } from '../support/arbitraryWeeks';

const plain = (week: Week) => {
  const { headers, drawn, ...rest } = evaluateWeek(week);
  return {
    ...rest,
    drawn: [...drawn].sort((a, b) => (a.id < b.id ? -1 : 1)),
    headers: headers.map((header) => ({ ...header, loadKgPerH: [...header.loadKgPerH], limitKgPerH: null })),
  };
};
const tried = fc.array(fc.record({ pick: fc.nat(), placement: fc.option(placement) }), { maxLength: 4 });
const changesOf = (
  week: Week,
  picks: readonly { pick: number; placement: { unitId: string; start: number } | null }[],
) =>
  week.activities.length === 0
    ? []
    : picks.map((one) => {
        const activityId = week.activities[one.pick % week.activities.length]?.id ?? '';
        return { activityId, placement: one.placement };
      });

it('trying placements out judges as judging the changed week, and leaves the week as it was', () => {
  let changed = 0;
  const seen = { idle: 0, warmUp: 0, warm: 0 };
  fc.assert(
    fc.property(weeks, fc.array(tried, { minLength: 1, maxLength: 3 }), (week, rounds) => {
      const before = structuredClone(week);
      const evaluator = createEvaluator(week);
      const base = evaluateWeek(week);
      for (const picks of rounds) {
        const changes = changesOf(week, picks);
        changed += changes.length;
        const preview = evaluator.preview(changes);
        const scratch = evaluateWeek(withPlacements(week, changes));
        expect(preview.evaluation.breaches).toEqual(scratch.breaches);
        expect(preview.evaluation.drawn).toEqual(scratch.drawn);
        for (const { activity } of scratch.gapDraws) seen[activity.kind as 'idle' | 'warmUp'] += 1;
        seen.warm += preview.week.activities.filter((one, at) => one !== preview.evaluation.drawn[at]).length;
        preview.evaluation.headers.forEach((header, i) => {
          expect([...header.loadKgPerH]).toEqual([...(scratch.headers[i]?.loadKgPerH ?? [])]);
        });
        const ids = (breaches: readonly Breach[]) => breaches.map((breach) => breach.id);
        const known = new Set(ids(base.breaches));
        expect(ids(preview.appeared)).toEqual(ids(scratch.breaches).filter((id) => !known.has(id)));
        expect(ids(preview.gone)).toEqual(ids(base.breaches).filter((id) => !ids(scratch.breaches).includes(id)));
      }
      expect(week).toEqual(before);
      expect(evaluator.preview([]).evaluation.breaches).toEqual(base.breaches);
    }),
    // The same draws each time, since cases are counted.
    { numRuns: 80, seed: 20_260 },
  );
  expect(changed).toBeGreaterThan(60);
  expect(Math.min(seen.idle, seen.warmUp, seen.warm)).toBeGreaterThan(10);
});

it('the order in which activities, links and capacities are listed does not matter', () => {
  fc.assert(
    fc.property(weeks, (week) => {
      const turned = {
        ...week,
        activities: [...week.activities].reverse(),
        links: [...week.links].reverse(),
        capacities: [...week.capacities].reverse(),
      };
      expect(plain(turned)).toEqual(plain(week));
    }),
    { numRuns: 100 },
  );
});

it('moving the whole week moves its breaches', () => {
  fc.assert(
    fc.property(weeks, fc.integer({ min: 1, max: 600 }), (week, byMinutes) => {
      // Room before and after, so that nothing is cut off, and no base load, whose start at 0 does not move.
      const capacities = week.capacities.map((capacity) => ({ ...capacity, baseLoadKgPerH: [] }));
      const shifted = (by: number): Week => ({
        ...week,
        horizonMin: 4000,
        capacities,
        activities: week.activities.map((activity) => ({
          ...activity,
          due: activity.due === null ? null : activity.due + by,
          placement: activity.placement && { ...activity.placement, start: activity.placement.start + by },
        })),
      });
      const places = (source: Week, by: number) =>
        evaluateWeek(source).breaches.map(({ id: _, ...breach }) => ({
          ...breach,
          from: breach.from - by,
          to: breach.to - by,
        }));
      const near = (breaches: readonly object[]) =>
        JSON.parse(
          JSON.stringify(breaches, (_, value) => (typeof value === 'number' ? Math.round(value * 1e6) / 1e6 : value)),
        );
      expect(near(places(shifted(600 + byMinutes), byMinutes))).toEqual(near(places(shifted(600), 0)));
    }),
    { numRuns: 100 },
  );
});

it('breach ids are one of a kind', () => {
  let breaches = 0;
  const codes = new Set<string>();
  fc.assert(
    fc.property(weeks, (week) => {
      const found = evaluateWeek(week).breaches;
      const ids = found.map((breach) => breach.id);
      expect(new Set(ids).size).toBe(ids.length);
      breaches += ids.length;
      for (const { code } of found) codes.add(code);
    }),
    { numRuns: 100, seed: 20_260 },
  );
  expect(breaches).toBeGreaterThan(100);
  const rules = ['allergenRelease', 'runningTooLong', 'standingDirty', 'ventPressure'];
  expect(rules.filter((code) => !codes.has(code))).toEqual([]);
});

it('an edit and its reverse leave the plan as it was; edits in a row are one edit', () => {
  let changed = 0;
  fc.assert(
    fc.property(weeks, tried, tried, (week, first, second) => {
      const editFrom = (activities: Week['activities'], picks: typeof first) => {
        const byId = new Map(changesOf(week, picks).map((change) => [change.activityId, change.placement]));
        const changed = activities.filter((activity) => byId.has(activity.id));
        return editOf(
          'move',
          changed.map((activity) => changeOf(activity, { placement: byId.get(activity.id) ?? null })),
        );
      };
      const plans = (activities: Week['activities']) => activities.map(({ revision: _, ...rest }) => rest);
      const one = editFrom(week.activities, first);
      const after = applyEdit(week.activities, one);
      expect(staleChanges(after, reverseEdit(one))).toEqual([]);
      expect(plans(applyEdit(after, reverseEdit(one)))).toEqual(plans(week.activities));
      const two = editFrom(after, second);
      changed += one.changes.length + two.changes.length;
      expect(plans(applyEdit(week.activities, squashEdits([one, two])))).toEqual(plans(applyEdit(after, two)));
    }),
    { numRuns: 150 },
  );
  expect(changed).toBeGreaterThan(100);
});

it('a slip moves free activities of the line only, all by the same minutes', () => {
  let slipped = 0;
  fc.assert(
    fc.property(weeks, fc.nat(1440), fc.integer({ min: -60, max: 60 }), (week, from, by) => {
      const edit = slipLine(week, 'line2', from, by);
      for (const { before, after } of edit.changes) {
        expect(['k1', 'k2']).toContain(before.placement?.unitId);
        expect(before.placement?.start).toBeGreaterThanOrEqual(from);
        expect(after.placement).toEqual({ ...before.placement, start: (before.placement?.start ?? 0) + by });
      }
      const onLine = week.activities.filter((activity) => {
        return activity.placement?.unitId.startsWith('k') && activity.placement.start >= from;
      });
      expect(edit.changes).toHaveLength(by === 0 ? 0 : onLine.length);
      slipped += edit.changes.length;
    }),
    { numRuns: 100 },
  );
  expect(slipped).toBeGreaterThan(10);
});
