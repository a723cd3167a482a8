import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { contrastRatio, over, parseColour, type Colour } from '../../support/colour';

const css = readFileSync(new URL('../../../src/styles/tokens.css', import.meta.url), 'utf8');

type Theme = 'light' | 'dark';

/** Reads a token's two values from its `light-dark(...)`. */
function token(name: string, theme: Theme): Colour {
  const pattern = new RegExp(`--color-${name}: light-dark\\(((?:[^()]|\\([^()]*\\))+?), ((?:[^()]|\\([^()]*\\))+)\\);`);
  const found = pattern.exec(css);
  if (!found) throw new Error(`No token --color-${name}`);
  return parseColour((theme === 'light' ? found[1] : found[2]) as string);
}

/** Grounds that things stand on: plain ones, and tints laid over a plain one. */
function grounds(theme: Theme): Record<string, Colour> {
  const plain = Object.fromEntries(['paper', 'surface', 'sunken'].map((name) => [name, token(name, theme)]));
  const tints = ['steam-soft', 'room-soft', 'over-soft', 'focus-soft'].flatMap((tint) =>
    ['paper', 'surface'].map(
      (under) => [`${tint} on ${under}`, over(token(tint, theme), token(under, theme))] as const,
    ),
  );
  return { ...plain, ...Object.fromEntries(tints) };
}

const TEXT = ['ink', 'ink-muted', 'steam-deep'];
/** Coloured text stands on plain ground or on its own tint only. */
const TEXT_ON_OWN: readonly (readonly [string, readonly string[]])[] = [
  ['room', ['paper', 'surface', 'room-soft on surface']],
  ['room-strong', ['paper', 'surface', 'room-soft on surface']],
  ['over', ['paper', 'surface', 'sunken', 'over-soft on surface', 'over-soft on paper']],
];
const MARKS = ['steam', 'room', 'over', 'focus', 'edge'];

describe.each(['light', 'dark'] as const)('tokens, %s', (theme) => {
  const all = grounds(theme);

  it.each(TEXT)('text in %s reads on every ground at 4.5 to 1', (name) => {
    for (const [ground, colour] of Object.entries(all))
      expect(contrastRatio(token(name, theme), colour), ground).toBeGreaterThanOrEqual(4.5);
  });

  it.each(TEXT_ON_OWN)('text in %s reads where it stands at 4.5 to 1', (name, where) => {
    for (const ground of where)
      expect(contrastRatio(token(name, theme), all[ground] as Colour), ground).toBeGreaterThanOrEqual(4.5);
  });

  it.each(MARKS)('marks in %s show on every ground at 3 to 1', (name) => {
    for (const [ground, colour] of Object.entries(all))
      expect(contrastRatio(token(name, theme), colour), ground).toBeGreaterThanOrEqual(3);
  });

  it.each(['room', 'room-strong'])('the main action reads on %s at 4.5 to 1', (name) => {
    expect(contrastRatio(token('on-room', theme), token(name, theme))).toBeGreaterThanOrEqual(4.5);
  });
});

describe('contrastRatio', () => {
  it('is 21 between black and white and 1 between equals (WCAG 2.2, relative luminance)', () => {
    const black = parseColour('#000000');
    const white = parseColour('#ffffff');
    expect(contrastRatio(black, white)).toBeCloseTo(21, 10);
    expect(contrastRatio(white, white)).toBe(1);
  });

  it('lays a half clear white over black as a middle grey', () => {
    expect(over(parseColour('rgb(255 255 255 / 50%)'), parseColour('#000000')).red).toBeCloseTo(127.5, 6);
  });
});
