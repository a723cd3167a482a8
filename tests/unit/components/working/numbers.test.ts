import { describe, expect, it } from 'vitest';
import { fullDigits } from '@/components/working/numbers';
import { formulaPieces } from '@/components/working/symbols';

describe('fullDigits', () => {
  it('gives six significant digits with thin spaces in thousands', () => {
    expect(fullDigits(2727.4321)).toBe('2\u2009727.43');
    expect(fullDigits(1_234_567)).toBe('1\u2009234\u2009570');
    expect(fullDigits(0.0111488)).toBe('0.0111488');
    expect(fullDigits(7)).toBe('7');
    expect(fullDigits(0)).toBe('0');
  });

  it('sets a real minus and powers of ten for what is very small', () => {
    expect(fullDigits(-3.5)).toBe('\u22123.5');
    expect(fullDigits(0.000012345678)).toBe('1.23457e-5');
  });
});

describe('formulaPieces', () => {
  it('sets indices low and leaves the rest', () => {
    expect(formulaPieces('m·c_p·(T_2 − T_1)')).toEqual([
      { text: 'm·c', isLow: false },
      { text: 'p', isLow: true },
      { text: '·(T', isLow: false },
      { text: '2', isLow: true },
      { text: ' − T', isLow: false },
      { text: '1', isLow: true },
      { text: ')', isLow: false },
    ]);
  });

  it('keeps words without an index and a lone underscore whole', () => {
    expect(formulaPieces('h − h′')).toEqual([{ text: 'h − h′', isLow: false }]);
    expect(formulaPieces('a _ b')).toEqual([{ text: 'a _ b', isLow: false }]);
    expect(formulaPieces('')).toEqual([]);
  });
});
