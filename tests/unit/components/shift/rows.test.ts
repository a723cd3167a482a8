import { describe, expect, it } from 'vitest';
import { dueText, eventName, groupRows, happenedText, rowState } from '@/components/shift/rows';
import type { ShiftRowDto } from '@/contracts/floor';
import type { FloorEventKind } from '@/core/shift/floorEvent';

const PLANNED: readonly (readonly [FloorEventKind, number])[] = [
  ['cratesIn', 395],
  ['steamOn', 400],
  ['ventsClosed', 408],
  ['timingStarted', 413],
  ['steamOff', 440],
  ['cooled', 460],
  ['empty', 470],
];

function row(id: string, happened: readonly (readonly [FloorEventKind, number])[] = [], shiftMin = 0): ShiftRowDto {
  return {
    activity: { id, stage: 'retort' } as ShiftRowDto['activity'],
    unitName: 'Retort 1',
    start: 395 + shiftMin,
    end: 470 + shiftMin,
    planned: PLANNED.map(([kind, minute]) => ({ kind, minute: minute + shiftMin })),
    steamOnBy: null,
    events: happened.map(([event, minute], i) => ({ id: `${id}${i}`, activityId: id, event, minute, by: 'S' })),
  };
}

describe('rowState', () => {
  it('asks a retort for steam on first, and for nothing of the plan’s own', () => {
    const state = rowState(row('a'));
    expect(state.next).toEqual({ kind: 'steamOn', plannedMin: 400, happenedMin: null });
    expect(state.events.map((event) => event.kind)).toEqual([
      'steamOn',
      'ventsClosed',
      'timingStarted',
      'steamOff',
      'empty',
    ]);
    expect(state.begun).toBe(false);
  });

  it('goes on after what was recorded, over what was passed over', () => {
    expect(rowState(row('a', [['steamOn', 402]])).next?.kind).toBe('ventsClosed');
    const skipped = rowState(
      row('a', [
        ['steamOn', 402],
        ['steamOff', 441],
      ]),
    );
    expect(skipped.next?.kind).toBe('empty');
    expect(skipped.events[1]?.happenedMin).toBeNull();
  });

  it('is at rest once the unit is empty', () => {
    expect(
      rowState(
        row('a', [
          ['steamOn', 402],
          ['empty', 475],
        ]),
      ).next,
    ).toBeNull();
  });
});

describe('groupRows', () => {
  it('parts what is in hand from what comes and what is done', () => {
    const rows = [
      row('done', [
        ['steamOn', 400],
        ['empty', 470],
      ]),
      row('begun', [['steamOn', 401]], 300),
      row('soon'),
      row('later', [], 300),
    ];
    const groups = groupRows(rows, 370);
    const ids = (list: readonly ShiftRowDto[]): string[] => list.map(({ activity }) => activity.id);
    expect(ids(groups.done)).toEqual(['done']);
    expect(ids(groups.inHand)).toEqual(['begun', 'soon']);
    expect(ids(groups.later)).toEqual(['later']);
  });

  it('takes a row in hand half an hour before its steam on, not a minute sooner', () => {
    expect(groupRows([row('a')], 369).inHand).toHaveLength(0);
    expect(groupRows([row('a')], 370).inHand).toHaveLength(1);
  });
});

describe('words', () => {
  it('says when something is due and how late it was', () => {
    expect(dueText(400, 391)).toBe('in 9 min');
    expect(dueText(400, 400)).toBe('now');
    expect(dueText(400, 406)).toBe('late by 6 min');
    expect(dueText(400, 275)).toBe('in 2 h 05');
    expect(happenedText(400, 403)).toBe('late by 3 min');
    expect(happenedText(400, 398)).toBe('early by 2 min');
    expect(happenedText(400, 400)).toBe('on time');
  });

  it('names events as the floor does, by the kind of stage', () => {
    expect(eventName('timingStarted', 'retort')).toBe('Process timing started');
    expect(eventName('cratesIn', 'cook')).toBe('Begun');
    expect(eventName('empty', 'cook')).toBe('Empty');
    expect([eventName('cratesIn', null), eventName('empty', null)]).toEqual(['Begun', 'Clean']);
  });
});
