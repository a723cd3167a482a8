import { describe, expect, it } from 'vitest';
import { applyEdit, changeOf, editOf, editWeek, reverseEdit, squashEdits, staleChanges } from '@/core/schedule/edits';
import { fixActivity, moveActivity, moveBatch, slipLine, takeOffActivity } from '@/core/schedule/hand';
import { placeBatch } from '@/core/schedule/placeBatch';
import type { Edit } from '@/core/schedule/edit';
import type { Result } from '@/core/result';
import { activity, flatMode, link, placedAt, plant, unit, week } from '../../../support/builders';

const one = activity('one');
const two = placedAt(activity('two'), 100);
const start = (edit: Edit) => edit.changes.map(({ activityId, after }) => [activityId, after.placement?.start]);

function done(result: Result<Edit>): Edit {
  if (!result.ok) throw new Error(result.error.message);
  return result.value;
}

describe('edits as values', () => {
  const edit = editOf('move', [changeOf(one, { placement: { unitId: 'unit1', start: 30 } })]);

  it('change what they name and count its revision', () => {
    const [moved, other] = applyEdit([one, two], edit);
    expect(moved).toMatchObject({ placement: { start: 30 }, revision: 2 });
    expect(other).toBe(two);
    expect(one.placement?.start).toBe(0);
  });

  it('are taken back by their reverse', () => {
    const undone = applyEdit(applyEdit([one, two], edit), reverseEdit(edit));
    expect(undone).toEqual([{ ...one, revision: 3 }, two]);
    expect(staleChanges(applyEdit([one], edit), reverseEdit(edit))).toEqual([]);
  });

  it('leave out changes that change nothing', () => {
    expect(editOf('move', [changeOf(one, { placement: one.placement, fixing: 'free' })]).changes).toEqual([]);
    expect(editOf('fix', [changeOf(one, { fixing: 'fixed' })]).changes).toHaveLength(1);
    expect(
      editOf('move', [changeOf(one, { placement: { unitId: 'unit1', start: 0, cleanAfterMin: 5 } })]).changes,
    ).toHaveLength(1);
  });

  it('are stale where the activity has moved, changed its revision or gone', () => {
    expect(staleChanges([one, two], edit)).toEqual([]);
    expect(staleChanges([{ ...one, revision: 2 }], edit)).toHaveLength(1);
    expect(staleChanges([placedAt(one, 5)], edit)).toHaveLength(1);
    expect(staleChanges([two], edit)).toHaveLength(1);
  });

  it('become one, from the first state to the last', () => {
    const after = applyEdit([one, two], edit)[0] ?? one;
    const again = editOf('move', [changeOf(after, { placement: { unitId: 'unit1', start: 45 } })]);
    const squashed = squashEdits([edit, again]);
    expect(squashed.changes).toMatchObject([
      { activityId: 'one', revision: 1, before: { placement: { start: 0 } }, after: { placement: { start: 45 } } },
    ]);
    const back = editOf('move', [changeOf(after, { placement: one.placement })]);
    expect(squashEdits([edit, back]).changes).toEqual([]);
    expect(squashEdits([]).changes).toEqual([]);
  });
});

describe('a line slipped from a time', () => {
  const lines = plant({ units: [unit('unit1'), unit('unit2', { lineId: 'line2' })] });
  const other = placedAt(activity('other', { modes: [flatMode('unit2', 60, 0)] }), 300);
  const fixed = placedAt(activity('fixed', { fixing: 'fixed' }), 300);
  const source = week({
    plant: lines,
    activities: [one, two, placedAt(activity('three'), 200), other, fixed, activity('loose', { placement: null })],
    links: [link('l', 'three', 'other')],
  });

  it('moves the free activities on its units that start at or after it', () => {
    expect(start(slipLine(source, 'line1', 100, 15))).toEqual([
      ['two', 115],
      ['three', 215],
    ]);
    expect(start(slipLine(source, 'line1', 101, -15))).toEqual([['three', 185]]);
    expect(slipLine(source, 'line1', 0, 0).changes).toEqual([]);
    expect(slipLine(source, 'line1', 100, 15).kind).toBe('slip');
  });

  it('leaves a cooker that takes hours to heat up; the hand may still move it', () => {
    const mode = { ...flatMode('unit1', 60, 100), neverMoved: true };
    const cooker = placedAt(activity('cooker', { modes: [mode] }), 300);
    const both = week({ plant: lines, activities: [placedAt(activity('three'), 200), cooker] });
    expect(start(slipLine(both, 'line1', 100, 15))).toEqual([['three', 215]]);
    expect(moveActivity(both, 'cooker', { unitId: 'unit1', start: 400 }).ok).toBe(true);
  });
});

describe('moves by hand', () => {
  const batch = [
    placedAt(activity('a', { batchId: 'batch' }), 0),
    placedAt(activity('b', { batchId: 'batch', fixing: 'started' }), 90),
  ];
  const cleaned = activity('cleaned', { placement: { unitId: 'unit1', start: 500, cleanAfterMin: 20 } });
  const source = week({ activities: [...batch, cleaned, activity('loose', { placement: null, fixing: 'fixed' })] });
  const to = { unitId: 'unit2', start: 40 };

  it('place or move, and keep how long after the cleaning is', () => {
    expect(done(moveActivity(source, 'a', to))).toMatchObject({
      kind: 'move',
      changes: [{ after: { placement: to } }],
    });
    expect(done(moveActivity(source, 'loose', to)).kind).toBe('place');
    expect(done(moveActivity(source, 'cleaned', to)).changes[0]?.after.placement).toEqual({ ...to, cleanAfterMin: 20 });
    expect(
      done(moveActivity(source, 'cleaned', { ...to, cleanAfterMin: 0 })).changes[0]?.after.placement?.cleanAfterMin,
    ).toBe(0);
  });

  it('leave alone what the floor has started, and say so', () => {
    expect(moveActivity(source, 'b', to)).toMatchObject({ ok: false, error: { code: 'EDIT_STARTED' } });
    expect(takeOffActivity(source, 'nobody')).toMatchObject({ ok: false, error: { code: 'EDIT_UNKNOWN_ACTIVITY' } });
    expect(start(moveBatch(source, 'batch', 10))).toEqual([['a', 10]]);
  });

  it('take off and fix', () => {
    expect(done(takeOffActivity(source, 'a')).changes[0]?.after).toEqual({ placement: null, fixing: 'free' });
    expect(done(fixActivity(source, 'a', 'fixed')).changes[0]?.after).toMatchObject({ fixing: 'fixed' });
    expect(takeOffActivity(source, 'b').ok).toBe(false);
    expect(fixActivity(source, 'b', 'free').ok).toBe(false);
  });
});

describe('a batch placed at first', () => {
  const cook = activity('cook', {
    batchId: 'batch',
    placement: null,
    modes: [flatMode('kettle1', 60, 0), flatMode('kettle2', 50, 0)],
  });
  const fill = activity('fill', { batchId: 'batch', placement: null, modes: [flatMode('filler', 30, 0)] });
  const busy = placedAt(activity('busy', { modes: [flatMode('kettle1', 60, 0)] }), 0);
  const source = week({
    activities: [fill, cook, busy],
    links: [link('l', 'cook', 'fill', { leastMin: 10 })],
    calendars: [
      {
        unitId: 'filler',
        open: [
          { from: 0, to: 80 },
          { from: 100, to: 200 },
        ],
      },
    ],
  });

  it('follows its links onto the units that are free and open first', () => {
    // Kettle 2 is free at 5: to 55; 10 minutes; the filler has no 30 minutes before 100.
    const edit = done(placeBatch(source, 'batch', 5));
    expect(edit.kind).toBe('place');
    expect(start(edit)).toEqual([
      ['fill', 100],
      ['cook', 5],
    ]);
    expect(editWeek(source, edit).activities.find((a) => a.id === 'cook')?.placement?.unitId).toBe('kettle2');
  });

  it('keeps to the earliest start of its material', () => {
    const late = { ...source, activities: [fill, { ...cook, earliestStart: 70 }, busy] };
    expect(start(done(placeBatch(late, 'batch', 5)))).toEqual([
      ['fill', 130],
      ['cook', 70],
    ]);
  });

  it('says where there is no room', () => {
    expect(placeBatch(source, 'batch', 150)).toMatchObject({ ok: false, error: { code: 'PLACE_NO_ROOM' } });
  });
});
