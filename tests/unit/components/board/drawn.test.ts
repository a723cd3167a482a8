import { describe, expect, it } from 'vitest';
import { breachesByActivity, breachGroups, drawnByUnit, notYetPlaced, waitingGroups } from '@/components/board/drawn';
import { neighbourOf } from '@/components/board/navigate';
import type { Link } from '@/core/plant/activity';
import type { Breach } from '@/core/schedule/breach';
import { activity } from './fixture';

const at = (id: string, unitId: string, start: number) => activity(id, { placement: { unitId, start } });
const link = (from: string, to: string): Link => ({
  id: `${from}-${to}`,
  from: { activityId: from, anchor: 'end', offsetMin: 0 },
  to: { activityId: to, anchor: 'start', offsetMin: 0 },
  leastMin: 0,
  greatestMin: null,
  rule: 'flow',
  greatestBreach: 'time',
  source: null,
});
const breach = (id: string, over: Partial<Breach>): Breach =>
  ({ id, from: 0, to: 10, activityIds: [], class: 'time', code: 'late', ...over }) as Breach;

describe('drawnByUnit', () => {
  it('should list what is placed by unit in order of time, whatever the order given', () => {
    const byUnit = drawnByUnit([at('b', 'r1', 200), activity('w'), at('a', 'r1', 100), at('c', 'r2', 0)]);
    expect(byUnit.get('r1')?.map((one) => one.activity.id)).toEqual(['a', 'b']);
    expect(byUnit.get('r2')).toHaveLength(1);
  });
});

describe('what waits', () => {
  const waiting = notYetPlaced([
    activity('late', { due: 900 }),
    activity('never'),
    activity('soon', { due: 300 }),
    activity('more', { due: 900 }),
    at('placed', 'r1', 0),
  ]);
  it('should come by due time, without due time last', () => {
    expect(waiting.map((one) => one.id)).toEqual(['soon', 'late', 'more', 'never']);
  });
  it('should hang together by links, through those between as well', () => {
    const groups = waitingGroups(waiting, [link('late', 'never'), link('never', 'more'), link('soon', 'placed')]);
    expect(groups.map((group) => group.activities.map((one) => one.id))).toEqual([['soon'], ['late', 'more', 'never']]);
    expect(groups[1]?.due).toBe(900);
    expect(groups[0]?.due).toBe(300);
  });
});

describe('breaches', () => {
  const process = breach('p', { class: 'process', from: 500, to: 510, activityIds: ['a', 'b'] });
  const steam = breach('s', { class: 'steam', from: 100, to: 110, activityIds: ['a'] });
  const early = breach('e', { class: 'steam', from: 20, to: 50 });
  it('should be found by every activity concerned', () => {
    const by = breachesByActivity([process, steam]);
    expect(by.get('a')).toEqual([process, steam]);
    expect(by.get('b')).toEqual([process]);
  });
  it('should come with process limits first, in order of time, the past apart', () => {
    const groups = breachGroups([steam, process, early], 60);
    expect(groups.map((group) => group.class)).toEqual(['process', 'steam']);
    expect(groups[1]).toMatchObject({ breaches: [steam], past: [early] });
  });
});

describe('neighbourOf', () => {
  const byUnit = drawnByUnit([at('a', 'r1', 0), at('b', 'r1', 300), at('c', 'k1', 280), at('d', 'k1', 900)]);
  const units = ['r1', 'r2', 'k1'];
  it('should go along a unit and stop at its ends', () => {
    expect(neighbourOf(byUnit, units, 'a', 'right')).toBe('b');
    expect(neighbourOf(byUnit, units, 'a', 'left')).toBeNull();
    expect(neighbourOf(byUnit, units, 'd', 'first')).toBe('c');
    expect(neighbourOf(byUnit, units, 'c', 'last')).toBe('d');
  });
  it('should pass over empty units to the block nearest in time', () => {
    expect(neighbourOf(byUnit, units, 'b', 'down')).toBe('c');
    expect(neighbourOf(byUnit, units, 'd', 'up')).toBe('b');
    expect(neighbourOf(byUnit, units, 'a', 'up')).toBeNull();
  });
  it('should begin with the first block where none has the focus', () => {
    expect(neighbourOf(byUnit, units, '', 'right')).toBe('a');
  });
});
