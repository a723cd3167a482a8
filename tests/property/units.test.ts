/** What always holds of figures on screens, whatever the quantity and the value. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figureText, figureValue, spanSaid } from '@/components/ui/form/figure';
import { unitsOf } from '@/components/units';
import { DISPLAY_QUANTITIES, fromDisplay, toDisplay, UNIT_SYSTEMS } from '@/core/quantity/display';

const quantity = fc.constantFrom(...DISPLAY_QUANTITIES);
const system = fc.constantFrom(...UNIT_SYSTEMS);
const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
/** A size that rounding errors of a value with an offset are measured against. */
const sizeOf = (x: number) => Math.max(1, Math.abs(x));

describe('conversion', () => {
  it('goes both ways within 1e-12', () => {
    const seen = new Set<string>();
    fc.assert(
      fc.property(quantity, system, value, (q, s, x) => {
        seen.add(`${q} ${s}`);
        expect(Math.abs(fromDisplay(q, toDisplay(q, x, s), s) - x)).toBeLessThan(1e-12 * sizeOf(x));
        const back = toDisplay(q, fromDisplay(q, x, s), s);
        expect(Math.abs(back - x) / sizeOf(x)).toBeLessThan(1e-12);
      }),
      { numRuns: 4000 },
    );
    expect(seen.size).toBe(DISPLAY_QUANTITIES.length * UNIT_SYSTEMS.length);
  });

  it('keeps order: more inside is more on the screen', () => {
    fc.assert(
      fc.property(quantity, system, value, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (q, s, x, by) => {
        expect(toDisplay(q, x + by, s)).toBeGreaterThan(toDisplay(q, x, s));
      }),
      { numRuns: 1000 },
    );
  });
});

describe('a form’s figures', () => {
  it('are read back to what is shown, to six digits', () => {
    let read = 0;
    fc.assert(
      fc.property(quantity, system, value, (q, s, x) => {
        const units = unitsOf(s);
        const text = figureText(units, { quantity: q }, x);
        // A figure too large or too small for plain digits is not typed by anybody.
        fc.pre(!text.includes('e'));
        const back = figureValue(units, { quantity: q }, text);
        expect(figureText(units, { quantity: q }, back)).toBe(text);
        read++;
      }),
      { numRuns: 2000 },
    );
    expect(read).toBe(2000);
  });

  it('say ranges whose ends are inside when typed', () => {
    const size = fc.double({ min: 1e-2, max: 1e5, noNaN: true });
    let typed = 0;
    fc.assert(
      fc.property(quantity, system, size, size, (q, s, a, b) => {
        const [min, max] = [Math.min(a, b), Math.max(a, b) * 1.001];
        const units = unitsOf(s);
        const ends = /^(\S+) to (\S+)/.exec(spanSaid(units, { quantity: q }, min, max));
        fc.pre(ends !== null && !ends[0].includes('e'));
        const [least, most] = [ends?.[1], ends?.[2]].map((end) => figureValue(units, { quantity: q }, end ?? ''));
        expect(least).toBeGreaterThanOrEqual(min * (1 - 1e-12));
        expect(most).toBeLessThanOrEqual(max * (1 + 1e-12));
        typed++;
      }),
      { numRuns: 2000 },
    );
    expect(typed).toBe(2000);
  });
});
