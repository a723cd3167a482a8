import { describe, expect, it } from 'vitest';
import { arrivalsOf, boilerFacts, headerState, releaseKg } from '@/components/plant/facts';
import { blankOf } from '@/components/plant/fields';
import { barsOf, hourText, summed } from '@/components/plant/hours';
import { LISTINGS } from '@/components/plant/listing';
import { unitsOf } from '@/components/units';
import { THING_KINDS, THING_SCHEMAS } from '@/contracts/plantLibrary';
import { boiler, header, library } from '../../support/plantLibrary';

const plant = library();

describe('hours of the week', () => {
  it('are said by the plant’s own week', () => {
    expect([hourText(0, 1), hourText(28, 1), hourText(28, 7), hourText(168, 1)]).toEqual([
      'Mon 00:00',
      'Tue 04:00',
      'Mon 04:00',
      'the end of the week',
    ]);
  });

  it('sum base loads and draw steps in order, whatever is half typed', () => {
    const steps = summed([
      { fromHour: 4, toHour: 136, value: 240 },
      { fromHour: 100, toHour: 168, value: 60 },
    ]);
    expect(steps).toEqual([
      { fromHour: 0, value: 0 },
      { fromHour: 4, value: 240 },
      { fromHour: 100, value: 300 },
      { fromHour: 136, value: 60 },
    ]);
    const typed = [
      { fromHour: 22, value: 1 },
      { fromHour: null, value: 3 },
      { fromHour: 0, value: 2 },
    ];
    expect(barsOf(typed)).toEqual([
      { from: 0, to: 22, value: 2 },
      { from: 22, to: 168, value: 1 },
    ]);
  });
});

describe('what follows from what is typed', () => {
  it('is a boiler’s chain from rating to net export', () => {
    const found = boilerFacts(boiler(), plant);
    // Worked boiler (invented plant), computed with an independent IAPWS-IF97 implementation: 3546.94 kg/h.
    expect(found).toMatchObject({
      ok: true,
      value: { netKgPerH: expect.closeTo(3_546.94, 2), headerName: 'Main header' },
    });
    if (!found.ok) return;
    expect(found.value.riseKgPerHPerMin).toBeCloseTo(354.694, 3);
    expect(found.value.turnedDownKgPerH).toBeCloseTo(3_546.94 / 4, 2);
    // 8 t of water at 10 bar g, 8.876 kg per bar and tonne, computed with an independent IAPWS-IF97 implementation.
    expect(found.value.storedKgPerBar).toBeCloseTo(8 * 8.876, 1);
    expect(boilerFacts({ ...boiler(), ratingFromAndAtKgPerH: null }, plant).ok).toBe(false);
    expect(boilerFacts({ ...boiler(), headerId: null }, plant).ok).toBe(false);
  });

  it('is a header’s state, and what the valves that feed it would give', () => {
    const state = headerState(header(), plant);
    expect(state).toMatchObject({ ok: true, value: { kind: 'wet' } });
    expect(headerState(header({ superheatK: 5 }), plant).ok).toBe(false);
    const low = { ...header({ name: 'Low', pressureBarG: 3, dryness: 0.995 }), feedKind: 'letdown' as const };
    const [by] = arrivalsOf({ ...low, feedFromHeaderId: 'main', greatestKgPerH: 1_000 }, null, plant);
    if (!by?.byValve.ok || !state.ok) throw new Error('no arrival');
    expect(by.byValve.value.h).toBeCloseTo(state.value.h, 9);
    expect([by.name, by.isWrong]).toEqual(['Main header', false]);
    const hot = { ...low, dryness: null, superheatK: 60, feedFromHeaderId: 'main', greatestKgPerH: 1_000 };
    expect(arrivalsOf(hot, null, plant)[0]).toMatchObject({
      isWrong: true,
      says: [expect.stringContaining('at most')],
    });
    expect(arrivalsOf(header(), 'main', plant).map(({ name }) => name)).toEqual(['Boiler 1']);
    expect(arrivalsOf(header(), null, plant)).toEqual([]);
  });

  it('is the steam that an accumulator gives up, none where its pressures are the wrong way round', () => {
    const kg = releaseKg({ highBarG: 7, lowBarG: 3, waterTonnes: 20 }, plant);
    expect(kg.ok && kg.value > 500 && kg.value < 2_000).toBe(true);
    expect(releaseKg({ highBarG: 3, lowBarG: 7, waterTonnes: 20 }, plant).ok).toBe(false);
    expect(releaseKg({ highBarG: 7, lowBarG: 3, waterTonnes: null }, plant).ok).toBe(false);
  });
});

describe('the forms', () => {
  it.each(THING_KINDS)('of %s have every field of their schema', (kind) => {
    expect(Object.keys(blankOf(kind)).sort()).toEqual(Object.keys(THING_SCHEMAS[kind].shape).sort());
  });

  it('list key figures in the units of the person', () => {
    const [main] = plant.things.headers;
    if (!main) throw new Error('no header');
    expect(LISTINGS.headers.cells(main, plant, unitsOf('si'))).toEqual(
      ['7.0\u00a0bar\u00a0g', 'x 0.98', 'boilers'].map(expectText),
    );
    expect(LISTINGS.headers.cells(main, plant, unitsOf('usCustomary'))[0]).toContain('psig');
  });
});

const expectText = (text: string) => expect.stringMatching(text.replaceAll('\u00a0', '\\s').replaceAll('.', '\\.'));
