import { describe, expect, it } from 'vitest';
import { DUTY_CATALOGUE } from '@/core/duty/catalogue';
import { CLEANING_IN_PLACE_RANGES, cleaningInPlace } from '@/core/duty/cleaningInPlace';
import { CONTINUOUS_COOKER_RANGES, continuousCooker } from '@/core/duty/continuousCooker';
import type { Duty } from '@/core/duty/duty';
import { EVAPORATOR_RANGES, evaporator } from '@/core/duty/evaporator';
import { EXHAUST_BOX_RANGES, exhaustBox } from '@/core/duty/exhaustBox';
import { HOT_WATER_RANGES, hotWater } from '@/core/duty/hotWater';
import { INJECTION_COOKER_RANGES, injectionCooker } from '@/core/duty/injectionCooker';
import { PLANT_SPECIFIC } from '@/core/duty/inputs';
import { workOut, type DutyModel } from '@/core/duty/model';
import { overpressureRetort } from '@/core/duty/overpressureRetort';
import { OVERPRESSURE_RETORT_RANGES } from '@/core/duty/overpressureRetortInput';
import { PLATE_PASTEURISER_RANGES, platePasteuriser } from '@/core/duty/platePasteuriser';
import { SHELL_COOLING_RANGES, shellAtSteamOn } from '@/core/duty/shellTemperature';
import { steamBlancher } from '@/core/duty/steamBlancher';
import { TUNNEL_PASTEURISER_RANGES, tunnelPasteuriser } from '@/core/duty/tunnelPasteuriser';
import { WATER_BLANCHER_RANGES, waterBlancher } from '@/core/duty/waterBlancher';
import { barAbsolute, barGauge } from '@/core/quantity/units';
import type { Range } from '@/core/quantity/range';
import type { Result } from '@/core/result';
import { steamState } from '@/core/steam/steamState';
import * as example from '../../../verification/dutyExamples';
import { blancherA, supply } from '../../../verification/dutyWorkedBatches';
import { failureOf, valueOf } from '../../../verification/steamSupport';

/** Input, its ranges, and how it is worked out. */
type Subject = readonly [
  name: string,
  input: object,
  ranges: Readonly<Record<string, Range>>,
  work: (change: object) => Result<unknown>,
];

function subject<Input extends object>(
  name: string,
  input: Input,
  ranges: Readonly<Record<string, Range>>,
  work: (input: Input) => Result<unknown>,
): Subject {
  return [name, input, ranges, (change) => work({ ...input, ...change })];
}

const SUBJECTS: readonly Subject[] = [
  subject('water blancher', example.waterBlancherD, WATER_BLANCHER_RANGES, (i) => waterBlancher(i, supply)),
  subject('injection', example.injectionE, INJECTION_COOKER_RANGES, (i) => injectionCooker(i, supply)),
  subject('spray retort', example.sprayRetortF, OVERPRESSURE_RETORT_RANGES, (i) => overpressureRetort(i, supply)),
  subject('cooker', example.hydrostaticG, CONTINUOUS_COOKER_RANGES, (i) => continuousCooker(i, supply)),
  subject('exhaust box', example.exhaustBoxH, EXHAUST_BOX_RANGES, (i) => exhaustBox(i, supply)),
  subject('plate pasteuriser', example.plateI, PLATE_PASTEURISER_RANGES, (i) => platePasteuriser(i, supply)),
  subject('tunnel pasteuriser', example.tunnelJ, TUNNEL_PASTEURISER_RANGES, (i) => tunnelPasteuriser(i, supply)),
  subject('evaporator', example.evaporatorK, EVAPORATOR_RANGES, (i) => evaporator(i, supply)),
  subject('hot water', example.washDownL, HOT_WATER_RANGES, (i) => hotWater(i, supply)),
  subject('cleaning in place', example.cipM, CLEANING_IN_PLACE_RANGES, (i) => cleaningInPlace(i, supply)),
  subject('shell', example.shellN, SHELL_COOLING_RANGES, shellAtSteamOn),
];

describe.each(SUBJECTS)('%s', (_name, input, ranges, work) => {
  const numeric = Object.entries(input).flatMap(([field, value]) => (typeof value === 'number' ? [field] : []));

  it('takes its example', () => {
    expect(work({}).ok).toBe(true);
  });

  it('has a range for every number', () => {
    expect(Object.keys(ranges).sort()).toEqual(numeric.sort());
  });

  it.each(numeric)('refuses %s below, above and off its range', (field) => {
    const { min, max } = ranges[field] ?? { min: Number.NaN, max: Number.NaN };
    for (const value of [min - 1, max + 1, Number.NaN]) {
      const refused = failureOf(work({ [field]: value }));
      expect(refused).toMatchObject({ code: 'DUTY-RANGE', field });
      expect(refused.message).toMatch(/ is (-?[\d.e+-]+|not a number).*; it must be \S+ to \S+/);
    }
  });
});

const DUTIES: readonly DutyModel[] = [
  { model: 'waterBlancher', inputs: example.waterBlancherD },
  { model: 'injectionCooker', inputs: example.injectionE },
  { model: 'overpressureRetort', inputs: example.sprayRetortF },
  { model: 'continuousCooker', inputs: example.hydrostaticG },
  { model: 'exhaustBox', inputs: example.exhaustBoxH },
  { model: 'platePasteuriser', inputs: example.plateI },
  { model: 'tunnelPasteuriser', inputs: example.tunnelJ },
  { model: 'evaporator', inputs: example.evaporatorK },
  { model: 'hotWater', inputs: example.washDownL },
  { model: 'cleaningInPlace', inputs: example.cipM },
];

describe('through the one door', () => {
  it.each(DUTIES)('$model opens to a complete working', (duty) => {
    const { working, phases, steamKg } = valueOf(workOut(duty, supply));
    expect(working.steps.length).toBeGreaterThan(5);
    for (const step of working.steps) {
      expect([step.section, step.symbol, step.name, step.formula, step.source]).not.toContain('');
      expect(Number.isFinite(step.value)).toBe(true);
      expect(step.inputs.length > 0 || step.formula === 'as given').toBe(true);
    }
    expect(working.cautions.length).toBeGreaterThan(0);
    expect(phases.length).toBeGreaterThan(1);
    expect(steamKg).toBeGreaterThan(0);
    expect(JSON.parse(JSON.stringify(working))).toEqual(working);
  });

  it('knows which is never moved', () => {
    const never = DUTIES.filter((duty) => valueOf(workOut(duty, supply)).neverMoved === true);
    expect(never.map(({ model }) => model)).toEqual(['continuousCooker']);
    expect(DUTY_CATALOGUE.continuousCooker.neverMoved).toBe(true);
  });
});

describe('catalogue for forms', () => {
  const entries = Object.values(DUTY_CATALOGUE);

  it.each(entries)(
    '$model starts from figures inside their ranges, marked as the plant’s own',
    ({ defaults, ranges }) => {
      expect(defaults.mark).toBe(PLANT_SPECIFIC);
      let numbers = 0;
      for (const [field, value] of Object.entries<unknown>(defaults.values)) {
        if (typeof value !== 'number' || field === 'ventSteps') continue;
        numbers += 1;
        expect(value, field).toBeGreaterThanOrEqual(ranges[field]?.min ?? Number.NaN);
        expect(value, field).toBeLessThanOrEqual(ranges[field]?.max ?? Number.NaN);
      }
      expect(numbers).toBeGreaterThan(2);
    },
  );

  it('asks for the escape of a blancher', () => {
    expect(DUTY_CATALOGUE.steamBlancher.defaults.values).not.toHaveProperty('escapeFraction');
    expect(DUTY_CATALOGUE.waterBlancher.defaults.values).not.toHaveProperty('escapeFraction');
  });
});

describe('input in the wrong order', () => {
  const of = (name: string, change: object): Result<unknown> =>
    SUBJECTS.find(([known]) => known === name)?.[3](change) ?? { ok: true, value: null };

  it.each<[string, string, object, string, string]>([
    ['bath colder than product', 'water blancher', { bathC: 89 }, 'DUTY-ORDER', 'bathC'],
    ['product not heated', 'water blancher', { productOutC: 14 }, 'DUTY-ORDER', 'productOutC'],
    ['fresh water hotter than bath', 'water blancher', { makeUpC: 94 }, 'DUTY-ORDER', 'bathC'],
    ['tank warmer than bath when cold', 'water blancher', { coldC: 95 }, 'DUTY-ORDER', 'bathC'],
    ['batch not heated', 'injection', { endC: 20 }, 'DUTY-ORDER', 'endC'],
    ['no step of come-up', 'spray retort', { comeUp: [] }, 'DUTY-RANGE', 'comeUp'],
    ['no process time', 'spray retort', { holds: [] }, 'DUTY-RANGE', 'holds'],
    [
      'a step without length',
      'spray retort',
      { comeUp: [{ minutes: 0, mediumEndC: 121, contentsEndC: 60 }] },
      'DUTY-RANGE',
      'comeUp.0.minutes',
    ],
    [
      'contents hotter than the water',
      'spray retort',
      { comeUp: [...example.sprayRetortF.comeUp.slice(1), { minutes: 1, mediumEndC: 121.1, contentsEndC: 121.2 }] },
      'DUTY-ORDER',
      'holds.0.contentsEndC',
    ],
    [
      'kept water hotter than the first step',
      'spray retort',
      { reusedWaterC: 95 },
      'DUTY-ORDER',
      'comeUp.0.mediumEndC',
    ],
    ['contents hotter than the steam', 'cooker', { outC: 122 }, 'DUTY-ORDER', 'processC'],
    ['legs that cool', 'cooker', { legWaterInC: 90 }, 'DUTY-ORDER', 'legWaterOutC'],
    ['contents hotter than the box', 'exhaust box', { outC: 96 }, 'DUTY-ORDER', 'chamberC'],
    ['product hotter than it is pasteurised', 'plate pasteuriser', { inC: 73 }, 'DUTY-ORDER', 'pasteuriseC'],
    ['exchanger too cold', 'plate pasteuriser', { pasteuriseC: 140 }, 'DUTY-EXCHANGER', 'exchangerPressureBarG'],
    ['contents hotter than the spray', 'tunnel pasteuriser', { outC: 86 }, 'DUTY-ORDER', 'sprayC'],
    ['concentrate thinner than feed', 'evaporator', { solidsOut: 0.05 }, 'DUTY-ORDER', 'solidsOut'],
    ['half an effect', 'evaporator', { effects: 2.5 }, 'DUTY-RANGE', 'effects'],
    ['calandria too cold', 'evaporator', { boilingC: 120 }, 'DUTY-EXCHANGER', 'exchangerPressureBarG'],
    ['water not heated', 'hot water', { hotC: 14 }, 'DUTY-ORDER', 'hotC'],
    ['warming longer than the wash', 'cleaning in place', { warmingMin: 21 }, 'DUTY-ORDER', 'warmingMin'],
    ['tank hotter than its set point', 'cleaning in place', { tankC: 81 }, 'DUTY-ORDER', 'setC'],
    ['shell colder than the room', 'shell', { endC: 24 }, 'DUTY-ORDER', 'endC'],
  ])('%s', (_what, name, change, code, field) => {
    expect(failureOf(of(name, change))).toMatchObject({ code, field });
  });

  it('refuses an open tank that would boil at the plant’s altitude, naming both temperatures', () => {
    const high = { ...supply, ambient: barAbsolute(0.75) };
    const refused = failureOf(waterBlancher({ ...example.waterBlancherD, bathC: 95 }, high));
    expect(refused).toMatchObject({ code: 'DUTY-BOILING', field: 'bathC' });
    expect(refused.message).toMatch(/95 °C.*boils at 91\./);
  });

  it('refuses an exchanger above the header', () => {
    const low = valueOf(steamState({ pressure: barGauge(2), quality: { kind: 'wet', dryness: 1 } }));
    const refused = failureOf(hotWater(example.washDownL, { ...supply, header: low }));
    expect(refused.code).toBe('STEAM-THROTTLE');
  });
});

describe('a length too short to be meant', () => {
  it.each([1e-9, 0.009])('of %d min is refused; 0 leaves the phase out', (rinseMin) => {
    const refused = failureOf(cleaningInPlace({ ...example.cipM, rinseMin }, supply));
    expect(refused).toMatchObject({ code: 'DUTY-RANGE', field: 'rinseMin' });
    expect(refused.message).toMatch(/must be 0 or 0\.01 to 240 min/);
  });
});

describe('warnings', () => {
  const warningsOf = (result: Result<Duty>) => valueOf(result).working.warnings;

  it('doubt a blancher on less than 0.30 kg of steam per kg', () => {
    const [doubt] = warningsOf(steamBlancher(blancherA, supply));
    expect(doubt).toMatch(/^0\.171 kg of steam per kg of product is less than the 0\.30/);
    expect(warningsOf(steamBlancher({ ...blancherA, escapeFraction: 0.58 }, supply))).toEqual([]);
    expect(warningsOf(steamBlancher({ ...blancherA, escapeFraction: 0.57 }, supply))).toHaveLength(1);
    expect(warningsOf(waterBlancher(example.waterBlancherD, supply))).toHaveLength(1);
    expect(warningsOf(waterBlancher({ ...example.waterBlancherD, makeUpKgPerH: 6000 }, supply))).toEqual([]);
  });

  it('say when the steam adds more water than the recipe leaves room for', () => {
    expect(warningsOf(injectionCooker(example.injectionE, supply))).toEqual([]);
    const [tooMuch] = warningsOf(injectionCooker({ ...example.injectionE, recipeRoomKg: 100 }, supply));
    expect(tooMuch).toMatch(/adds 126\.\d kg of water, the recipe leaves room for 100 kg/);
  });
});

describe('phases', () => {
  const kinds = (result: Result<Duty>) => valueOf(result).phases.map(({ kind }) => kind);

  it('leave out what has no length', () => {
    expect(kinds(waterBlancher({ ...example.waterBlancherD, warmUpMin: 0, idleMin: 0 }, supply))).toEqual(['run']);
    expect(kinds(continuousCooker({ ...example.hydrostaticG, heatUpMin: 0, idleMin: 0 }, supply))).toEqual(['run']);
    expect(kinds(hotWater({ ...example.washDownL, storeKg: 0 }, supply))).toEqual(['wash']);
    expect(kinds(cleaningInPlace({ ...example.cipM, part: 'tank' }, supply))).toEqual(['heatUp']);
    expect(kinds(cleaningInPlace({ ...example.cipM, part: 'circuit' }, supply))).toEqual(['wash', 'wash', 'rinse']);
  });

  it('of a cooker rise while it heats up, by its losses alone', () => {
    const { phases } = valueOf(continuousCooker(example.hydrostaticG, supply));
    const heatUp = phases.filter(({ kind }) => kind === 'heatUp').map(({ steamKgPerH }) => steamKgPerH);
    expect(heatUp).toHaveLength(6);
    expect([...heatUp].sort((a, b) => a - b)).toEqual(heatUp);
    expect(Math.max(...heatUp) / Math.min(...heatUp)).toBeLessThan(1.1);
  });

  it('of a store turn a peak into a base load', () => {
    const greatest = (storeKg: number) =>
      Math.max(...valueOf(hotWater({ ...example.washDownL, storeKg }, supply)).phases.map((p) => p.steamKgPerH));
    expect(greatest(5000)).toBeLessThan(greatest(0) / 3);
  });
});
