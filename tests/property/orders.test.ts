import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PART_LOADS } from '@/core/orders/amounts';
import type { OrderRoute } from '@/core/orders/route';
import { splitOrder } from '@/core/orders/split';

/** Invented routes of every size: kettles, a filler and retorts, with or without each but the filler. */
const arbitraryRoute: fc.Arbitrary<OrderRoute> = fc
  .record({
    fillKg: fc.double({ min: 0.05, max: 20, noNaN: true }),
    sizeKg: fc.option(fc.integer({ min: 100, max: 5_000 })),
    yieldShare: fc.double({ min: 0.5, max: 2, noNaN: true }),
    cookMin: fc.array(fc.integer({ min: 1, max: 400 }), { minLength: 1, maxLength: 6 }),
    fillPerMin: fc.double({ min: 0.5, max: 900, noNaN: true }),
    loadPieces: fc.option(fc.integer({ min: 60, max: 5_000 })),
    retortMin: fc.array(fc.integer({ min: 20, max: 300 }), { minLength: 1, maxLength: 8 }),
  })
  .map(({ fillKg, sizeKg, yieldShare, cookMin, fillPerMin, loadPieces, retortMin }) => ({
    fillKg,
    stages: [
      ...(sizeKg === null
        ? []
        : [{ kind: 'batch' as const, stage: 'cook' as const, sizeKg, yield: yieldShare, unitMin: cookMin }]),
      { kind: 'run' as const, stage: 'fill' as const, piecesPerMin: fillPerMin },
      ...(loadPieces === null
        ? []
        : [
            {
              ...{ kind: 'load' as const, stage: 'retort' as const, pieces: loadPieces },
              ...{ unitMin: retortMin, leadMin: 8, longestWaitMin: 120 },
            },
          ]),
    ],
  }));

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
const sizeOf = ({ stages }: OrderRoute, kind: 'batch' | 'load'): number => {
  const stage = stages.find((one) => one.kind === kind);
  if (stage?.kind === 'batch') return stage.sizeKg * stage.yield;
  return stage?.kind === 'load' ? stage.pieces : Infinity;
};

const split = (route: OrderRoute, pieces: number, part: (typeof PART_LOADS)[number]) => {
  const found = splitOrder(route, pieces, part);
  return found.ok ? found.value : null;
};
const order = [arbitraryRoute, fc.integer({ min: 1, max: 3_000 }), fc.constantFrom(...PART_LOADS)] as const;
const RUNS = 300;

describe('any order split over any route', () => {
  it('keeps its quantity: what is planned and what is carried over are what was ordered', () => {
    let counted = 0;
    fc.assert(
      fc.property(...order, (route, pieces, part) => {
        const found = split(route, pieces, part);
        if (!found) {
          const isSmall = part === 'carried' && pieces < sizeOf(route, 'load');
          const batchPieces = sizeOf(route, 'batch') / route.fillKg;
          expect(isSmall || pieces / Math.min(batchPieces, sizeOf(route, 'load')) > 400).toBe(true);
          return;
        }
        counted += 1;
        expect(found.pieces + found.carriedPieces).toBe(pieces);
        if (found.loads.length > 0) expect(sum(found.loads.map((load) => load.pieces))).toBe(found.pieces);
        if (found.batches.length > 0) {
          expect(sum(found.batches.map(({ outKg }) => outKg)) / found.kg).toBeCloseTo(1, 9);
        }
      }),
      { numRuns: RUNS },
    );
    expect(counted).toBeGreaterThan(RUNS / 2);
  });

  it('passes no load’s and no batch’s size, and leaves none empty', () => {
    let counted = 0;
    fc.assert(
      fc.property(...order, (route, pieces, part) => {
        const found = split(route, pieces, part);
        for (const load of found?.loads ?? []) {
          counted += 1;
          expect(load.pieces).toBeGreaterThan(0);
          expect(load.pieces).toBeLessThanOrEqual(sizeOf(route, 'load'));
        }
        for (const { outKg } of found?.batches ?? []) {
          expect(outKg).toBeGreaterThan(0);
          expect(outKg).toBeLessThanOrEqual(sizeOf(route, 'batch') * (1 + 1e-9));
        }
      }),
      { numRuns: RUNS },
    );
    expect(counted).toBeGreaterThan(RUNS);
  });

  it('fills loads one after another within the fill run, out of kettles that are needed by then', () => {
    let counted = 0;
    fc.assert(
      fc.property(...order, (route, pieces, part) => {
        const found = split(route, pieces, part);
        const fillMin = found?.runs.find(({ stage }) => stage === 'fill')?.minutes ?? 0;
        found?.loads.forEach((load, i) => {
          counted += 1;
          expect(load.lastMin).toBeGreaterThan(load.firstMin);
          expect(load.lastMin).toBeLessThanOrEqual(fillMin);
          expect(load.firstMin).toBeGreaterThanOrEqual(found.loads[i - 1]?.firstMin ?? 0);
          const kettle = found.batches[load.needsBatch - 1];
          if (kettle) expect(kettle.neededMin).toBeLessThan(load.lastMin);
        });
      }),
      { numRuns: RUNS },
    );
    expect(counted).toBeGreaterThan(RUNS);
  });
});
