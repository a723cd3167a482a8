import { describe, expect, it } from 'vitest';
import { boardPeakKgPerH, fittingWords, outlinePath, spellsOf, titleSlot } from '@/components/board/outline';
import { activity, mode, phase } from './fixture';

describe('spellsOf', () => {
  it('should show gaps as nothing and add overlapping phases', () => {
    expect(spellsOf([phase(5, 10, 100), phase(10, 10, 50)], 30)).toEqual([
      { from: 0, to: 5, kgPerH: 0 },
      { from: 5, to: 10, kgPerH: 100 },
      { from: 10, to: 15, kgPerH: 150 },
      { from: 15, to: 20, kgPerH: 50 },
      { from: 20, to: 30, kgPerH: 0 },
    ]);
  });
  it('should join neighbours of one rate', () => {
    expect(spellsOf([phase(0, 10, 80), phase(10, 20, 80)], 30)).toEqual([{ from: 0, to: 30, kgPerH: 80 }]);
  });
});

describe('outlinePath', () => {
  it('should rise in proportion to the board’s one scale', () => {
    const path = outlinePath(spellsOf([phase(0, 6, 1600), phase(6, 54, 400)], 60), 1600, 40);
    expect(path).toBe('M0 40V0H6V30H60V40Z');
  });
  it('should keep a simmer visible below a vent', () => {
    expect(outlinePath([{ from: 0, to: 10, kgPerH: 1 }], 1600, 40, 1.5)).toBe('M0 40V38.5H10V40Z');
  });
  it('should draw nothing where no steam is drawn', () => {
    expect(outlinePath(spellsOf([], 60), 1600, 40)).toBe('');
  });
});

describe('boardPeakKgPerH', () => {
  it('should look at every unit that an activity could run on', () => {
    const one = activity('a', { modes: [mode('r1', 60, [phase(0, 6, 900)]), mode('r2', 60, [phase(0, 6, 1600)])] });
    expect(boardPeakKgPerH([one])).toBe(1600);
    expect(boardPeakKgPerH([])).toBe(1);
  });
});

describe('titleSlot', () => {
  const spells = spellsOf([phase(10, 6, 1600), phase(16, 44, 200)], 80);
  it('should find the widest stretch where no steam reaches the words', () => {
    expect(titleSlot(spells, 800, 2)).toEqual({ leftPx: 32, widthPx: 128 });
  });
  it('should give none where the demand is high throughout', () => {
    expect(titleSlot(spellsOf([phase(0, 60, 1600)], 60), 800, 2)).toBeNull();
  });
});

describe('fittingWords', () => {
  it('should fall back from the title to the code to nothing', () => {
    expect(fittingWords('Sweetcorn 340 g', 'A107', 200)).toBe('Sweetcorn 340 g');
    expect(fittingWords('Sweetcorn 340 g', 'A107', 40)).toBe('A107');
    expect(fittingWords('Sweetcorn 340 g', 'A107', 10)).toBe('');
  });
});
