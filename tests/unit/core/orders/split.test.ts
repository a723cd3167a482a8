import { describe, expect, it } from 'vitest';
import { piecesOf, splitBatches, splitLoads } from '@/core/orders/amounts';
import { outAtOnce } from '@/core/orders/pace';
import { piecesPerMinOf, type OrderRoute } from '@/core/orders/route';
import { splitOrder } from '@/core/orders/split';

/** Worked order (invented plant): 1 200 cases of 24 x 425 g over a blancher, kettles of 840 kg and six retorts. */
const KG = 1_200 * 24 * 0.425;
const fillKg = 0.425;
const route: OrderRoute = {
  fillKg,
  stages: [
    { kind: 'run', stage: 'blanch', piecesPerMin: piecesPerMinOf(3_600, fillKg / 0.28, fillKg) },
    { kind: 'batch', stage: 'cook', sizeKg: 840, yield: 1, unitMin: [60, 60, 60, 60, 60] },
    { kind: 'run', stage: 'fill', piecesPerMin: 200 },
    {
      kind: 'load',
      stage: 'retort',
      pieces: 1_680,
      unitMin: Array.from({ length: 6 }, () => 80),
      leadMin: 8,
      longestWaitMin: 120,
    },
  ],
};

function split(part: Parameters<typeof splitOrder>[2], pieces = piecesOf(KG, fillKg)) {
  const found = splitOrder(route, pieces, part);
  if (!found.ok) throw new Error(found.error.message);
  return found.value;
}

describe('quantities of an order', () => {
  it('are 28 800 containers and 12 240 kg, in 15 kettles and 18 loads', () => {
    const { pieces, kg, batches, loads } = split('levelled');
    expect([pieces, Math.round(kg), batches.length, loads.length]).toEqual([28_800, 12_240, 15, 18]);
  });

  it('come levelled, with a part load, or with the part load carried over', () => {
    const of = (part: Parameters<typeof splitLoads>[2]) => splitLoads(28_800, 1_680, part);
    expect(of('levelled')).toEqual({ loads: Array.from({ length: 18 }, () => 1_600), carried: 0 });
    expect(of('remainder')).toEqual({ loads: [...Array.from({ length: 17 }, () => 1_680), 240], carried: 0 });
    expect(of('carried')).toEqual({ loads: Array.from({ length: 17 }, () => 1_680), carried: 240 });
  });

  it('leave no part load where the loads are full', () => {
    for (const part of ['levelled', 'remainder', 'carried'] as const) {
      expect(splitLoads(3_360, 1_680, part)).toEqual({ loads: [1_680, 1_680], carried: 0 });
    }
  });

  it('count a part of a container as one, but no rounding noise', () => {
    expect([piecesOf(714, 0.425), piecesOf(714.1, 0.425), piecesOf(0.1, 0.425)]).toEqual([1_680, 1_681, 1]);
  });

  it('fill kettles to their size and put the rest into the last', () => {
    const batches = splitBatches(12_240, 840);
    expect(batches.slice(0, 14)).toEqual(Array.from({ length: 14 }, () => 840));
    expect(batches[14]).toBeCloseTo(480, 9);
  });

  it('leave nothing to plan of less than a load that is carried over', () => {
    expect(splitOrder(route, 240, 'carried')).toMatchObject({ ok: false, error: { code: 'ORDER-SMALL' } });
  });
});

describe('loads and kettles', () => {
  it('hang together: load 7 needs 4 998 kg, so it is not full before kettle 6 is ready', () => {
    const { loads, batches } = split('remainder');
    const seventh = loads[6];
    expect(seventh?.filledKg).toBeCloseTo(4_998, 9);
    expect(seventh?.needsBatch).toBe(6);
    expect(seventh?.lastMin).toBeGreaterThan(batches[5]?.neededMin ?? Infinity);
  });

  it('leave a kettle time to be emptied before it cooks again', () => {
    const { batches } = split('levelled');
    batches.slice(5).forEach((batch, k) => {
      expect(batch.neededMin - 60).toBeGreaterThanOrEqual(batches[k]?.takenOffMin ?? Infinity);
    });
  });
});

describe('the pace', () => {
  it('is set by six retorts of 80 min at 126 containers a minute; the blancher could feed 214', () => {
    const { pace, paces } = split('levelled');
    expect(pace).toMatchObject({ stage: 'retort', units: 6, piecesEach: 1_680, minutesEach: 80 });
    expect(pace.piecesPerMin).toBeCloseTo(126, 9);
    expect(paces[0]?.piecesPerMin).toBeCloseTo(214.29, 2);
  });

  it('slows the runs down to kettles that don’t keep up with the filler', () => {
    const { runs } = split('levelled');
    // Five kettles of 60 min, and ten to be emptied at 200 a minute: 5 x 840 / 0.425 / 70 = 141.2 a minute.
    const kettlesPerMin = (5 * 840) / 0.425 / 70;
    expect(runs.map(({ stage, ownMin }) => [stage, Math.round(ownMin)])).toEqual([
      ['blanch', 134],
      ['fill', 144],
    ]);
    const lastNeeded = Math.floor((14 * 840) / 0.425 / kettlesPerMin);
    expect(runs.map(({ minutes }) => minutes)).toEqual([lastNeeded + 6, lastNeeded + 6]);
  });

  it('slows the runs down to the retorts where containers would wait too long', () => {
    const straight = { fillKg, stages: route.stages.filter(({ kind }) => kind !== 'batch') };
    const minutesOf = (pieces: number) => {
      const found = splitOrder(straight, pieces, 'levelled');
      return found.ok ? found.value.runs.map(({ minutes }) => minutes) : null;
    };
    expect(minutesOf(28_800)).toEqual([144, 144]);
    expect(minutesOf(57_600)).toEqual([Math.ceil(57_600 / 126), Math.ceil(57_600 / 126)]);
  });

  it('leaves a run at its own rate where a load or two wait for nothing', () => {
    const { runs, loads } = split('levelled', 1_680);
    expect([runs[1]?.minutes, loads[0]?.firstMin, loads[0]?.lastMin]).toEqual([9, 0, 9]);
  });

  it('keeps 40.5 crates out: 4 a load, 4.5 loads an hour, 2.25 h', () => {
    expect(outAtOnce(4, (6 * 60) / 80, 2.25)).toBeCloseTo(40.5, 12);
  });
});

describe('a route', () => {
  it('needs a filling, and its kettles before it', () => {
    const [blanch, cook, fill] = route.stages;
    const without = { fillKg, stages: [blanch, cook].flatMap((s) => s ?? []) };
    const behind = { fillKg, stages: [fill, cook].flatMap((s) => s ?? []) };
    for (const wrong of [without, behind]) {
      expect(splitOrder(wrong, 100, 'levelled')).toMatchObject({ ok: false, error: { code: 'ORDER-ROUTE' } });
    }
  });
});
