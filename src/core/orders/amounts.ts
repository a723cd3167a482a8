/** Quantities of an order: containers into loads, kg into batches. Nothing is lost and nothing passes its size. */

/** What becomes of a load that is not full: shared out over all loads, a load of its own, or left to another order. */
export type PartLoad = 'levelled' | 'remainder' | 'carried';

export const PART_LOADS: readonly PartLoad[] = ['levelled', 'remainder', 'carried'];

/** Whole containers that hold a quantity: part of a container is a container. `kg` and `fillKg` in kg. */
export const piecesOf = (kg: number, fillKg: number): number => Math.ceil(kg / fillKg - 1e-6);

export interface Loads {
  /** Containers of each load, in order. */
  readonly loads: readonly number[];
  /** Containers that are not planned: less than a load. */
  readonly carried: number;
}

/** Splits containers into loads of at most `size`; both whole and at least 1. */
export function splitLoads(pieces: number, size: number, part: PartLoad): Loads {
  const full = Math.floor(pieces / size);
  const rest = pieces - full * size;
  const fullLoads = Array.from({ length: full }, () => size);
  if (rest === 0) return { loads: fullLoads, carried: 0 };
  if (part === 'carried') return { loads: fullLoads, carried: rest };
  if (part === 'remainder') return { loads: [...fullLoads, rest], carried: 0 };
  const count = full + 1;
  const [least, larger] = [Math.floor(pieces / count), pieces % count];
  return { loads: Array.from({ length: count }, (_, i) => least + (i < larger ? 1 : 0)), carried: 0 };
}

/** Splits kg into batches that give at most `outKg` each [kg]: full ones, and the rest as the last. */
export function splitBatches(kg: number, outKg: number): number[] {
  const count = Math.max(1, Math.ceil(kg / outKg - 1e-9));
  return Array.from({ length: count }, (_, i) => (i < count - 1 ? outKg : kg - (count - 1) * outKg));
}
