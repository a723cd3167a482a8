import { describe, expect, it } from 'vitest';
import { layOutRows } from '@/components/board/rows';
import { threadPath, threadsOf, waitSinceClosing } from '@/components/board/threads';
import type { Link } from '@/core/plant/activity';
import { activity, mode, PLANT } from './fixture';

const fill = activity('fill', { modes: [mode('k1', 30)], placement: { unitId: 'k1', start: 100 }, batchId: 'x' });
const retort = activity('retort', { placement: { unitId: 'r1', start: 150 }, batchId: 'x' });
const other = activity('other', { placement: { unitId: 'r2', start: 500 }, batchId: 'y' });
// The first container is closed 5 min after filling begins; steam on is 10 min after the crates go in.
const closing: Link = {
  id: 'closing',
  from: { activityId: 'fill', anchor: 'start', offsetMin: 5 },
  to: { activityId: 'retort', anchor: 'start', offsetMin: 10 },
  leastMin: 0,
  greatestMin: 60,
  rule: 'sinceClosing',
  greatestBreach: 'process',
  source: null,
};
const all = [fill, retort, other];

describe('threadsOf', () => {
  it('should measure a wait between the moments that the link names', () => {
    expect(threadsOf([closing], all, 'retort')[0]).toMatchObject({
      fromMinute: 105,
      toMinute: 160,
      waitMin: 55,
      broken: false,
      fromUnitId: 'k1',
      toUnitId: 'r1',
    });
  });
  it('should be broken past the greatest wait and before the least, not at them', () => {
    const wait = (greatestMin: number, leastMin: number) =>
      threadsOf([{ ...closing, greatestMin, leastMin }], all, 'fill')[0]?.broken;
    expect([wait(55, 55), wait(54, 0), wait(60, 56)]).toEqual([false, true, true]);
  });
  it('should leave out other batches and what has no place', () => {
    expect(threadsOf([closing], all, 'other')).toEqual([]);
    expect(threadsOf([closing], [fill, { ...retort, placement: null }], 'fill')).toEqual([]);
  });
});

describe('waitSinceClosing', () => {
  it('should be the tightest of the waits that lead to the activity', () => {
    const wide = { ...closing, id: 'wide', greatestMin: 120 };
    const flow = { ...closing, id: 'flow', rule: 'flow' as const, greatestMin: 10 };
    expect(waitSinceClosing([wide, closing, flow], all, 'retort')?.linkId).toBe('closing');
    expect(waitSinceClosing([closing], all, 'fill')).toBeNull();
  });
});

describe('threadPath', () => {
  it('should lead from unit to unit at the foot of their rows', () => {
    const [thread] = threadsOf([closing], all, 'retort');
    const rows = layOutRows(PLANT);
    // Kettle 1 is at 148 px, Retort 1 at 28 px; feet 40 px below.
    expect(threadPath(thread as NonNullable<typeof thread>, rows, 2, 40)).toBe(
      'M210.0 188C265.0 188 265.0 68 320.0 68',
    );
  });
});
