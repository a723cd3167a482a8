import { describe, expect, it } from 'vitest';
import { FLOOR_EVENTS, type FloorEventKind } from '@/core/shift/floorEvent';
import { eventsOf, orderProblem, type Recorded } from '@/server/floor/eventRules';

const at = (minute: number): Date => new Date(Date.UTC(2026, 10, 30, 9, minute));
const recorded = (...events: readonly (readonly [FloorEventKind, number])[]): Recorded[] =>
  events.map(([event, minute]) => ({ event, happenedAt: at(minute) }));

describe('the order of floor events', () => {
  it('lets a retort go through its whole cycle, at one moment or later', () => {
    const done: Recorded[] = [];
    FLOOR_EVENTS.forEach((event, i) => {
      expect(orderProblem('retort', done, event, at(Math.floor(i / 2)))).toBeNull();
      done.push({ event, happenedAt: at(Math.floor(i / 2)) });
    });
    expect(done).toHaveLength(7);
  });

  it('lets events be left out, but a retort’s later ones not without steam on', () => {
    expect(orderProblem('retort', recorded(['steamOn', 0]), 'steamOff', at(60))).toBeNull();
    for (const event of ['ventsClosed', 'timingStarted', 'steamOff', 'cooled', 'empty'] as const) {
      expect(orderProblem('retort', recorded(['cratesIn', 0]), event, at(1))).toEqual({ kind: 'needsSteamOn' });
    }
    expect(orderProblem('cook', [], 'empty', at(1))).toBeNull();
    expect(orderProblem('cook', [], 'steamOff', at(1))).toEqual({ kind: 'needsSteamOn' });
  });

  it('refuses what comes earlier in the cycle, what is there, and what happened before', () => {
    const steamOn = recorded(['cratesIn', 0], ['steamOn', 5]);
    expect(orderProblem('retort', steamOn, 'cratesIn', at(6))).toMatchObject({ kind: 'alreadyPast' });
    expect(orderProblem('retort', steamOn, 'steamOn', at(6))).toMatchObject({ kind: 'alreadyPast' });
    expect(orderProblem('retort', steamOn, 'ventsClosed', at(4))).toMatchObject({ kind: 'beforePrevious' });
    expect(orderProblem('retort', steamOn, 'ventsClosed', at(5))).toBeNull();
  });

  it('knows only a retort’s vents', () => {
    expect(eventsOf('retort')).toEqual(FLOOR_EVENTS);
    for (const stage of ['blanch', 'cook', 'fill', null] as const) expect(eventsOf(stage)).not.toContain('ventsClosed');
  });
});
