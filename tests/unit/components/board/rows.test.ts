import { describe, expect, it } from 'vitest';
import { layOutRows, LINE_PX, ROW_PX, unitAt, unitBeside } from '@/components/board/rows';
import { PLANT } from './fixture';

const rows = layOutRows(PLANT);

describe('layOutRows', () => {
  it('should put units below their line and leave out lines without units', () => {
    expect(rows.rows.map((row) => (row.kind === 'line' ? row.line.id : row.unit.id))).toEqual([
      'a',
      'r1',
      'r2',
      'b',
      'k1',
    ]);
    expect(rows.heightPx).toBe(2 * LINE_PX + 3 * ROW_PX);
    expect(rows.topOfUnit.get('k1')).toBe(2 * LINE_PX + 2 * ROW_PX);
  });
});

describe('unitAt', () => {
  it('should find the unit below the pointer, its first pixel included, its last not', () => {
    expect(unitAt(rows, LINE_PX)).toBe('r1');
    expect(unitAt(rows, LINE_PX + ROW_PX - 0.5)).toBe('r1');
    expect(unitAt(rows, LINE_PX + ROW_PX)).toBe('r2');
  });
  it('should find none over a line’s name or outside', () => {
    expect(unitAt(rows, 3)).toBeNull();
    expect(unitAt(rows, -1)).toBeNull();
    expect(unitAt(rows, rows.heightPx)).toBeNull();
  });
});

describe('unitBeside', () => {
  it('should pass over units that do not count, across lines', () => {
    expect(unitBeside(rows, 'r1', 1, (id) => id !== 'r2')).toBe('k1');
    expect(unitBeside(rows, 'k1', -1, (id) => id !== 'r2')).toBe('r1');
  });
  it('should stay at the end of the rows', () => {
    expect(unitBeside(rows, 'k1', 1, () => true)).toBe('k1');
    expect(unitBeside(rows, 'r1', -1, () => true)).toBe('r1');
  });
});
