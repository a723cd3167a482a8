import { describe, expect, it } from 'vitest';
import { nextEvent, plannedEvents, shiftSequence } from '@/core/shift/sequence';
import { activity, flatMode, phase, placedAt, plant, unit, week } from '../../../support/builders';

const load = activity('load', {
  stage: 'retort',
  modes: [
    {
      unitId: 'retort1',
      minutes: 80,
      phases: [
        phase(0, 10, 0, 'idle'),
        phase(10, 6, 1555, 'vent'),
        phase(16, 6, 359, 'comeUp'),
        phase(22, 38, 150, 'process'),
        phase(60, 12, 0, 'cool'),
      ],
      uses: [],
      dutyId: null,
    },
  ],
  placement: { unitId: 'retort1', start: 360 },
});
const lines = plant({
  units: [unit('retort1', { kind: 'retort' }), unit('kettle1', { kind: 'kettle' }), unit('far', { lineId: 'line2' })],
});
const shift = { from: 360, to: 840 };
const on = (id: string, unitId: string, start: number) =>
  placedAt(activity(id, { modes: [flatMode(unitId, 60, 100)] }), start);

describe('the sequence of a line in a shift', () => {
  it('has what overlaps the shift on the line, in order of start, then unit', () => {
    const activities = [
      on('late', 'kettle1', 839),
      on('after', 'kettle1', 840),
      on('before', 'kettle1', 300),
      on('running', 'kettle1', 301),
      on('elsewhere', 'far', 400),
      on('same', 'kettle1', 360),
      load,
    ];
    const rows = shiftSequence(week({ plant: lines, activities }), 'line1', shift);
    expect(rows.map((row) => row.activityId)).toEqual(['running', 'same', 'load', 'late']);
  });

  it("has a retort's moments from its phases", () => {
    expect(
      plannedEvents(load, week({ plant: lines, activities: [load] })).map(({ kind, minute }) => [kind, minute]),
    ).toEqual([
      ['cratesIn', 360],
      ['steamOn', 370],
      ['ventsClosed', 376],
      ['timingStarted', 382],
      ['steamOff', 420],
      ['cooled', 432],
      ['empty', 440],
    ]);
  });

  it('has the first and the last moment of anything else', () => {
    const cook = on('cook', 'kettle1', 400);
    expect(plannedEvents(cook, week({ plant: lines, activities: [cook] })).map(({ kind }) => kind)).toEqual([
      'cratesIn',
      'empty',
    ]);
    expect(plannedEvents({ ...cook, placement: null }, week())).toEqual([]);
  });

  it('knows what comes next', () => {
    const [row] = shiftSequence(week({ plant: lines, activities: [load] }), 'line1', shift);
    expect(row && [361, 376, 441].map((minute) => nextEvent(row, minute)?.kind)).toEqual([
      'steamOn',
      'ventsClosed',
      undefined,
    ]);
  });

  it('shows the cleanings between', () => {
    const cleaning = {
      unitKind: 'kettle',
      fromFamilyId: 'A',
      toFamilyId: 'B',
      minutes: 20,
      kind: 'rinse',
      phases: [],
      uses: [],
    } as const;
    const runs = [
      { ...on('a', 'kettle1', 400), familyId: 'A' },
      { ...on('b', 'kettle1', 500), familyId: 'B' },
    ];
    const rows = shiftSequence(week({ plant: { ...lines, cleaning: [cleaning] }, activities: runs }), 'line1', shift);
    expect(rows.map(({ title, from, to }) => [title, from, to])).toEqual([
      ['Product a', 400, 460],
      ['Rinse after A', 460, 480],
      ['Product b', 500, 560],
    ]);
  });
});
