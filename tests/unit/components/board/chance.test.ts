import { describe, expect, it } from 'vitest';
import { chancePath, errorText, greatestChance, percentText, standardError } from '@/components/board/chance';

describe('the greatest chance', () => {
  it('is the first of the greatest, and none where nothing is ever over', () => {
    expect(greatestChance([0, 0.2, 0.5, 0.5, 0.1])).toEqual({ chance: 0.5, minute: 2 });
    expect(greatestChance([0, 0, 0])).toBeNull();
    expect(greatestChance([])).toBeNull();
    expect(greatestChance([1])).toEqual({ chance: 1, minute: 0 });
  });

  it('is looked for from a minute on: what is past is no chance any more', () => {
    expect(greatestChance([0.9, 0.2, 0.4], 1)).toEqual({ chance: 0.4, minute: 2 });
    expect(greatestChance([0.9, 0, 0], 1)).toBeNull();
    expect(greatestChance([0.9], 5)).toBeNull();
  });
});

describe('the row of chances', () => {
  const scale = { pxPerMin: 2, heightPx: 20 };

  it('draws each run of one chance as a block from the bottom', () => {
    expect(chancePath([0, 0.5, 0.5, 1, 0], 0, scale)).toBe('M2 20V10H6V20ZM6 20V0H8V20Z');
  });

  it('draws nothing where the chance is not greater', () => {
    expect(chancePath([0, 0.05, 0.05], 0.05, scale)).toBe('');
    // 1 - 0.95 is not 0.05 to the bit: 20 of 400 weeks are what the confidence leaves out, 21 are more.
    expect(chancePath([20 / 400], 1 - 0.95, scale)).toBe('');
    expect(chancePath([21 / 400], 1 - 0.95, scale)).not.toBe('');
  });

  it('keeps what is too likely in sight, and a small chance at a hair', () => {
    expect(chancePath([0.06], 0.05, scale)).toBe('M0 20V14H2V20Z');
    expect(chancePath([0.01], 0, scale)).toBe('M0 20V19H2V20Z');
  });
});

describe('a chance in words', () => {
  it.each([
    [0, '0\u00a0%'],
    [1 / 400, '< 0.5\u00a0%'],
    [0.005, '1\u00a0%'],
    [0.343, '34\u00a0%'],
    [399 / 400, '> 99.5\u00a0%'],
    [1, '100\u00a0%'],
  ])('%d reads %s', (chance, text) => {
    expect(percentText(chance)).toBe(text);
  });

  it('carries the standard error of a share of samples', () => {
    expect(standardError(0.5, 400)).toBeCloseTo(0.025, 12);
    expect(standardError(0, 400)).toBe(0);
    expect(errorText(0.5, 400)).toBe('± 3\u00a0%');
    expect(errorText(0.05, 400)).toBe('± 1.1\u00a0%');
    expect(errorText(0, 400)).toBe('in none of 400');
    expect(errorText(1, 400)).toBe('in all 400');
  });
});
