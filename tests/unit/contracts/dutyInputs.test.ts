import { describe, expect, it } from 'vitest';
import { dutyModelSchema, inputsSchema } from '@/contracts/dutyInputs';
import { DUTY_CATALOGUE, type WorkedModel } from '@/core/duty/catalogue';
import { DUTY_BASES, DUTY_CHOICES, DUTY_LISTS, DUTY_OPTIONAL } from '@/core/duty/dutyFields';
import { DUTY_GROUPS } from '@/core/duty/dutyGroups';
import { blancherA, kettleB, retortC } from '../../verification/dutyWorkedBatches';

const MODELS = Object.keys(DUTY_CATALOGUE) as WorkedModel[];
const faultsOf = (duty: unknown) =>
  (dutyModelSchema.safeParse(duty).error?.issues ?? []).map(({ path, message }) => [path.join('.'), message]);

describe('fields of a duty model', () => {
  it.each(MODELS)('stand in the groups of the form once each: %s', (model) => {
    const named = DUTY_GROUPS[model].flatMap(({ fields }) => fields);
    const basis = DUTY_BASES[model];
    const known = [
      ...Object.keys(DUTY_CATALOGUE[model].ranges),
      ...Object.keys(DUTY_CHOICES[model] ?? {}),
      ...Object.keys(DUTY_LISTS[model] ?? {}),
      ...Object.keys(DUTY_OPTIONAL[model] ?? {}),
      ...(basis ? [basis.field] : []),
    ];
    expect([...named].sort()).toEqual([...known].sort());
  });

  it.each(MODELS)('start from figures that fit: %s', (model) => {
    const { error } = inputsSchema(model).safeParse({ ...DUTY_CATALOGUE[model].defaults.values });
    const given = new Set(Object.keys(DUTY_CATALOGUE[model].defaults.values));
    expect(error?.issues.filter(({ path }) => given.has(String(path[0]))) ?? []).toEqual([]);
  });
});

describe('a duty', () => {
  it.each([
    ['steamBlancher', blancherA],
    ['jacketedKettle', kettleB],
    ['stillRetort', retortC],
    ['typed', { phases: [{ kind: 'vent', minutes: 8, steamKgPerH: 2000 }], source: 'meter, 12 Nov' }],
  ])('fits its model: %s', (model, inputs) => {
    expect(dutyModelSchema.parse({ model, inputs })).toEqual({ model, inputs });
  });

  it('is told every fault at its field, in sentences with value and range', () => {
    const inputs = { ...blancherA, steelKg: -850, runMin: 0.001, escapeFraction: undefined, warmUpMin: 'soon' };
    expect(faultsOf({ model: 'steamBlancher', inputs }).sort()).toEqual([
      ['inputs.escapeFraction', 'Share escaping at the ends is not entered; it must be 0 to 0.95.'],
      ['inputs.runMin', 'Run is 0.001 min; it must be 0 or 0.01 to 10080 min.'],
      ['inputs.steelKg', 'Steel is -850 kg; it must be 0 to 20000 kg.'],
      ['inputs.warmUpMin', 'Warm-up is not a number; it must be 0 to 240 min.'],
    ]);
  });

  it.each([
    ['a fraction over 1', { water: 1.4 }, 'inputs.product.composition.water', 'Water fraction is 1.4'],
    ['fibre counted twice', { carbohydrate: 0.1014, fibre: 0.06 }, 'inputs.product.composition.water', 'Sum of the'],
  ])('is refused for %s', (_, change, path, sentence) => {
    const { product } = blancherA;
    if (product.kind !== 'composition') throw new Error('batch A has a composition');
    const composition = { ...product.composition, ...change };
    const inputs = { ...blancherA, product: { kind: 'composition', composition } };
    expect(faultsOf({ model: 'steamBlancher', inputs })).toEqual([[path, expect.stringContaining(sentence)]]);
  });

  it('without a row, a choice or a source is asked for it', () => {
    expect(faultsOf({ model: 'stillRetort', inputs: { ...retortC, holds: [], ventSteps: 2.5 } })).toEqual([
      ['inputs.holds', 'Process time in pieces: enter at least one row.'],
      ['inputs.ventSteps', 'Whole steps of the vent: enter a whole number.'],
    ]);
    expect(
      faultsOf({ model: 'waterHeating', inputs: { kind: 'soak', waterKg: 5, fromC: 1, toC: 9, minutes: 1 } }),
    ).toEqual([['inputs.kind', 'For: choose one.']]);
    expect(faultsOf({ model: 'typed', inputs: { phases: [], source: ' ' } }).map(([path]) => path)).toEqual([
      'inputs.phases',
      'inputs.source',
    ]);
    expect(faultsOf({ model: 'kiln', inputs: {} })).toEqual([['model', 'Choose what kind of duty this is.']]);
  });
});
