/** Uniform numbers in [0, 1). */
export type Random = () => number;

/** A small seeded generator (32-bit Weyl sequence with a multiplicative hash); the same seed gives the same numbers. */
export function seededRandom(seed: number): Random {
  let state = (seed * 2654435761) | 0;
  return () => {
    state = (state + 0x9e3779b9) | 0;
    let hash = Math.imul(state ^ (state >>> 16), 0x85ebca6b);
    hash = Math.imul(hash ^ (hash >>> 13), 0xc2b2ae35);
    return ((hash ^ (hash >>> 16)) >>> 0) / 4294967296;
  };
}

/** A whole number in [0, below). */
export const wholeBelow = (random: Random, below: number): number => Math.floor(random() * below);

/** Shuffles in place. */
export function shuffle(random: Random, values: number[]): void {
  for (let i = values.length - 1; i > 0; i--) {
    const j = wholeBelow(random, i + 1);
    [values[i], values[j]] = [values[j] as number, values[i] as number];
  }
}
