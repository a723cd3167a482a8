import { describe, expect, it } from 'vitest';
import { BOILER_HOUSE_RANGES, boilerExport, fromAndAtFactor } from '@/core/duty/boilerExport';
import type { Duty } from '@/core/duty/duty';
import type { InputRanges } from '@/core/duty/inputs';
import { jacketedKettle, kettleHeatUp } from '@/core/duty/jacketedKettle';
import { JACKETED_KETTLE_RANGES } from '@/core/duty/jacketedKettleInput';
import { workOut } from '@/core/duty/model';
import { specificHeat } from '@/core/duty/specificHeat';
import { STEAM_BLANCHER_RANGES, steamBlancher } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import { STILL_RETORT_RANGES } from '@/core/duty/stillRetortInput';
import { WATER_HEATING_RANGES, waterHeating, type WaterHeatingInput } from '@/core/duty/waterHeating';
import { toAbsolute } from '@/core/quantity/pressure';
import { barAbsolute, barGauge } from '@/core/quantity/units';
import type { Problem, Result } from '@/core/result';
import { steamState } from '@/core/steam/steamState';
import { blancherA, kettleB, retortC, supply } from '../../../verification/dutyWorkedBatches';
import { failureOf, valueOf } from '../../../verification/steamSupport';

const wash: WaterHeatingInput = { kind: 'wash', waterKg: 1000, fromC: 15, toC: 82, minutes: 10 };
const house = {
  ratingFromAndAtKgPerH: 4000,
  boilerPressureBarG: 10,
  feedTankPressureBarG: 0.2,
  blowdownFraction: 0.05,
  condensateReturnFraction: 0.6,
  condensateC: 90,
  makeUpC: 15,
};

/** Puts every ranged field below, above and off the number line, one at a time. */
function refusals<Input extends object>(
  input: Input,
  ranges: InputRanges<Input>,
  work: (input: Input) => Result<unknown>,
) {
  return Object.entries<{ min: number; max: number }>(ranges).flatMap(([field, { min, max }]) =>
    [min - 1, max + 1, Number.NaN].map((value) => ({
      field,
      value,
      problem: failureOf(work({ ...input, [field]: value })),
    })),
  );
}

describe('input out of range', () => {
  const all = [
    ...refusals(blancherA, STEAM_BLANCHER_RANGES, (input) => steamBlancher(input, supply)),
    ...refusals(kettleB, JACKETED_KETTLE_RANGES, (input) => jacketedKettle(input, supply)),
    ...refusals(retortC, STILL_RETORT_RANGES, (input) => stillRetort(input, supply)),
    ...refusals(wash, WATER_HEATING_RANGES, (input) => waterHeating(input, supply)),
    ...refusals(house, BOILER_HOUSE_RANGES, (input) => boilerExport(input, supply)),
  ];

  it('is refused for every numeric field of every model', () => {
    const numeric = (input: object) => Object.values(input).filter((value) => typeof value === 'number').length;
    const fields = [blancherA, kettleB, retortC, wash, house].reduce((sum, input) => sum + numeric(input), 0);
    expect(all).toHaveLength(3 * fields);
  });

  it.each(all)('$field = $value', ({ field, problem }) => {
    expect(problem.code).toBe('DUTY-RANGE');
    expect(problem.field).toBe(field);
    expect(problem.message).toMatch(/ is (-?[\d.e+-]+|not a number).*; it must be \S+ to \S+/);
  });
});

describe('input in the wrong order', () => {
  const kettle = (change: Partial<typeof kettleB>) => jacketedKettle({ ...kettleB, ...change }, supply);
  const blancher = (change: Partial<typeof blancherA>) => steamBlancher({ ...blancherA, ...change }, supply);
  const retort = (change: Partial<typeof retortC>) => stillRetort({ ...retortC, ...change }, supply);

  it.each<[string, Result<Duty>, string, string]>([
    ['product not heated', blancher({ productOutC: 15 }), 'DUTY-ORDER', 'productOutC'],
    ['chamber colder than product', blancher({ chamberC: 89 }), 'DUTY-ORDER', 'chamberC'],
    ['batch not heated', kettle({ endC: 20 }), 'DUTY-ORDER', 'endC'],
    ['all of it boiled off', kettle({ boilOffKg: 900 }), 'DUTY-ORDER', 'boilOffKg'],
    ['jacket too cold', kettle({ jacketPressureBarG: 0 }), 'DUTY-JACKET', 'jacketPressureBarG'],
    ['shell hotter than vent', retort({ shellC: 110 }), 'DUTY-ORDER', 'ventEndC'],
    ['process colder than vent', retort({ processC: 105 }), 'DUTY-ORDER', 'processC'],
    ['contents that cool', retort({ contentsAfterVentC: 59 }), 'DUTY-ORDER', 'contentsAfterVentC'],
    [
      'contents hotter than the steam',
      retort({ holds: [{ minutes: 12, contentsEndC: 122 }] }),
      'DUTY-ORDER',
      'processC',
    ],
    ['no process time', retort({ holds: [] }), 'DUTY-RANGE', 'holds'],
    ['a piece without length', retort({ holds: [{ minutes: 0, contentsEndC: 119 }] }), 'DUTY-RANGE', 'holds.0.minutes'],
    ['more cans than fit', retort({ containers: 20_000 }), 'DUTY-VOID', 'containers'],
    ['water not heated', waterHeating({ ...wash, toC: 15 }, supply), 'DUTY-ORDER', 'toC'],
  ])('%s', (_what, result, code, field) => {
    expect(failureOf(result)).toMatchObject({ code, field });
  });

  it('refuses contents above vent temperature when vents close, naming both', () => {
    const result = retort({
      contentsAfterVentC: 108,
      contentsAfterComeUpC: 110,
      holds: [{ minutes: 9, contentsEndC: 119 }],
    });
    expect(failureOf(result)).toMatchObject({ code: 'DUTY-ORDER', field: 'ventEndC' });
    expect(failureOf(result).message).toContain('108 °C');
  });

  it('refuses a jacket above the header', () => {
    const header = valueOf(steamState({ pressure: barGauge(2), quality: { kind: 'wet', dryness: 1 } }));
    expect(failureOf(jacketedKettle(kettleB, { ...supply, header })).code).toBe('STEAM-THROTTLE');
    expect(failureOf(kettleHeatUp(kettleB, { ...supply, header })).code).toBe('STEAM-THROTTLE');
  });

  it('refuses a feed tank at boiler pressure', () => {
    const answer = boilerExport({ ...house, boilerPressureBarG: 0.2 }, supply);
    expect(failureOf(answer)).toMatchObject({ code: 'DUTY-ORDER', field: 'feedTankPressureBarG' });
  });

  it('refuses feed that would boil in the boiler', () => {
    expect(failureOf(fromAndAtFactor(toAbsolute(barGauge(1)), 150)).code).toBe('STEAM-RANGE');
  });
});

describe('specific heat', () => {
  const composition = { water: 0.8, protein: 0.05, fat: 0.02, carbohydrate: 0.1, fibre: 0.02, ash: 0.01 };
  const problems: readonly [string, Problem | undefined][] = [
    ['water', problemOf(specificHeat({ kind: 'waterOnly', water: 1.1 }, 20))],
    ['composition', problemOf(specificHeat({ kind: 'composition', composition: { ...composition, fibre: 0.07 } }, 20))],
    ['fat', problemOf(specificHeat({ kind: 'composition', composition: { ...composition, fat: -0.1 } }, 20))],
    ['kJPerKgK', problemOf(specificHeat({ kind: 'given', kJPerKgK: 42, source: 'supplier' }, 20))],
    ['source', problemOf(specificHeat({ kind: 'given', kJPerKgK: 3.6, source: ' ' }, 20))],
    ['specificHeatAtC', problemOf(specificHeat({ kind: 'composition', composition }, -5))],
  ];
  function problemOf(result: Result<unknown>): Problem | undefined {
    return result.ok ? undefined : result.error;
  }

  it.each(problems)('refuses a bad %s', (field, problem) => {
    expect(problem?.field).toBe(field);
  });

  it('falls back on water alone, and says so', () => {
    const rough = valueOf(specificHeat({ kind: 'waterOnly', water: 0.8 }, 60));
    expect(rough.value).toBeCloseTo(0.837 + 3.349 * 0.8, 12);
    expect(rough.source).toContain('Siebel');
  });

  it('takes a given figure with its source', () => {
    const given = valueOf(specificHeat({ kind: 'given', kJPerKgK: 3.6, source: 'supplier sheet' }, 60));
    expect(given).toMatchObject({ value: 3.6, source: 'supplier sheet' });
  });
});

describe('phases', () => {
  const kinds = (duty: Duty) => [...new Set(duty.phases.map(({ kind }) => kind))];

  it('leave out what has no length', () => {
    expect(kinds(valueOf(steamBlancher({ ...blancherA, warmUpMin: 0, idleMin: 0 }, supply)))).toEqual(['run']);
    expect(kinds(valueOf(steamBlancher({ ...blancherA, runMin: 0, idleMin: 0 }, supply)))).toEqual(['warmUp']);
    expect(kinds(valueOf(steamBlancher({ ...blancherA, runMin: 0, warmUpMin: 0 }, supply)))).toEqual(['idle']);
    expect(kinds(valueOf(jacketedKettle({ ...kettleB, boilOffKg: 0, holdMin: 0 }, supply)))).toEqual(['heatUp']);
  });

  it('cool a retort without steam', () => {
    const duty = valueOf(stillRetort({ ...retortC, coolMin: 20 }, supply));
    expect(duty.phases.at(-1)).toEqual({ kind: 'cool', minutes: 20, steamKgPerH: 0 });
    expect(duty.steamKg).toBe(valueOf(stillRetort(retortC, supply)).steamKg);
  });

  it('take less steam into a warm retort', () => {
    const warm = valueOf(stillRetort({ ...retortC, shellC: 80 }, supply));
    expect(warm.steamKg).toBeLessThan(valueOf(stillRetort(retortC, supply)).steamKg);
  });

  it('end on whole minutes through a long heat-up', () => {
    const heatUp = valueOf(jacketedKettle(kettleB, supply)).phases.filter(({ kind }) => kind === 'heatUp');
    expect(heatUp.slice(0, 3).map(({ minutes }) => minutes)).toEqual([1, 2, 2]);
    expect(heatUp.length).toBeLessThan(25);
  });

  it('keep the peak of a small, fast kettle in a piece shorter than a minute', () => {
    const small = { ...kettleB, batchKg: 20, kettleSteelKg: 20, jacketAreaM2: 0.5, boilOffKg: 0 };
    const first = valueOf(jacketedKettle(small, supply)).phases[0];
    const { peakKgPerH } = valueOf(kettleHeatUp(small, supply));
    expect(first?.minutes).toBeLessThan(1);
    expect((first?.steamKgPerH ?? 0) / peakKgPerH).toBeGreaterThan(0.98);
  });
});

describe('working', () => {
  const pages = [steamBlancher(blancherA, supply), jacketedKettle(kettleB, supply), stillRetort(retortC, supply)];

  it.each(pages.map((page) => valueOf(page).working))('of $title is complete', ({ steps, totals, cautions }) => {
    expect(steps.length).toBeGreaterThan(8);
    for (const step of steps) {
      expect([step.section, step.symbol, step.name, step.formula, step.source]).not.toContain('');
      expect(Number.isFinite(step.value)).toBe(true);
      expect(step.inputs.length).toBeGreaterThan(0);
    }
    expect(totals.map(({ name }) => name)).toEqual(expect.arrayContaining(['Steam', 'Duration']));
    expect(cautions.length).toBeGreaterThan(0);
  });

  it('is plain data', () => {
    for (const page of pages) expect(JSON.parse(JSON.stringify(valueOf(page)))).toEqual(valueOf(page));
  });
});

describe('one door to the models', () => {
  it('works each model out as the model itself does', () => {
    expect(workOut({ model: 'steamBlancher', inputs: blancherA }, supply)).toEqual(steamBlancher(blancherA, supply));
    expect(workOut({ model: 'jacketedKettle', inputs: kettleB }, supply)).toEqual(jacketedKettle(kettleB, supply));
    expect(workOut({ model: 'stillRetort', inputs: retortC }, supply)).toEqual(stillRetort(retortC, supply));
    expect(workOut({ model: 'waterHeating', inputs: wash }, supply)).toEqual(waterHeating(wash, supply));
  });

  it('takes a typed profile as it is', () => {
    const phases = [{ kind: 'vent', minutes: 8, steamKgPerH: 2000 } as const];
    const duty = valueOf(workOut({ model: 'typed', inputs: { phases, source: 'header meter, March' } }, supply));
    expect(duty.steamKg).toBeCloseTo(2000 * (8 / 60), 9);
    expect(duty.working.title).toContain('header meter, March');
  });

  it.each([
    { kind: 'vent', minutes: 8, steamKgPerH: -1 } as const,
    { kind: 'vent', minutes: 0, steamKgPerH: 2000 } as const,
    { kind: 'vent', minutes: Number.NaN, steamKgPerH: 2000 } as const,
    { kind: 'vent', minutes: 8, steamKgPerH: 200_001 } as const,
  ])('refuses a typed phase of $minutes min at $steamKgPerH kg/h', (phase) => {
    const phases = [{ kind: 'comeUp', minutes: 6, steamKgPerH: 400 } as const, phase];
    const answer = workOut({ model: 'typed', inputs: { phases, source: 'meter' } }, supply);
    expect(failureOf(answer).code).toBe('DUTY-RANGE');
    expect(failureOf(answer).field).toMatch(/^phases\.1/);
  });
});

describe('boiler export', () => {
  it('needs no steam in the feed tank when all comes back hot enough', () => {
    const out = valueOf(
      boilerExport({ ...house, feedTankPressureBarG: 0, condensateReturnFraction: 1, condensateC: 100 }, supply),
    );
    expect(out.feedTankSteamKgPerH).toBe(0);
    expect(out.netKgPerH).toBe(out.grossKgPerH);
  });

  it('falls with cold feed on a Monday: 0.8306 of the rating at 15 degC and 10 bar g', () => {
    expect(valueOf(fromAndAtFactor(toAbsolute(barGauge(10)), 15))).toBeCloseTo(0.8306, 4);
  });

  it('changes with the air pressure', () => {
    const high = { ...supply, ambient: barAbsolute(0.845) };
    expect(valueOf(boilerExport(house, high)).netKgPerH).not.toBe(valueOf(boilerExport(house, supply)).netKgPerH);
  });
});
