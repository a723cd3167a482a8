import { describe, expect, it } from 'vitest';
import { relaxationText } from '@/components/board/Relaxations';
import { makeClock } from '@/components/time';
import { unitsOf } from '@/components/units';
import type { Relaxation } from '@/core/levelling/proposal';
import { PLANT } from './fixture';

const clock = makeClock({ firstInstant: '2026-11-30T00:00:00Z', timeZone: 'Europe/London' });
const words = { clock, names: { activity: (id: string) => `Load ${id}` }, week: { plant: PLANT } };
const said = (relaxation: Relaxation, system: 'si' | 'usCustomary' = 'si') =>
  relaxationText(relaxation, words, unitsOf(system)).replace(/[\u00a0\u2009\u202f]/g, ' ');

describe('what would do it, in words', () => {
  it('says how much more steam where and when, in the units shown', () => {
    const more: Relaxation = { kind: 'moreSteam', headerId: 'main', from: 400, to: 406, kgPerH: 203 };
    expect(said(more)).toBe('205 kg/h more on the header, Mon 06:40 to 06:46');
    expect(said(more, 'usCustomary')).toContain('450 lb/h more');
    expect(said({ ...more, from: 1430, to: 1450 })).toContain('Mon 23:50 to Tue 00:10');
  });

  it('says what each trial leaves', () => {
    expect(said({ kind: 'unfix', activityId: 'A7', leavesKg: 0 })).toBe('Load A7 not fixed: nothing stays over');
    expect(said({ kind: 'furtherMoves', minutes: 1440, leavesKg: 42 })).toBe(
      'Starts moved by up to 24 h: 42 kg stay over',
    );
    expect(said({ kind: 'otherUnits', leavesKg: 0 })).toBe('Batches moved to other units too: nothing stays over');
  });
});
