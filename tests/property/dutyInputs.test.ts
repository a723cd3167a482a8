/** The schemas of duties' inputs accept exactly what core's ranges accept, and what they accept core works with. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dutyModelSchema, inputsSchema, parseDuty } from '@/contracts/dutyInputs';
import { DUTY_CATALOGUE, type WorkedModel } from '@/core/duty/catalogue';
import { DUTY_BASES, DUTY_CHOICES, DUTY_LISTS, DUTY_WHOLE } from '@/core/duty/dutyFields';
import { checkInputs, DUTY_RANGE, type InputRanges } from '@/core/duty/inputs';
import { workOut, type DutyModel } from '@/core/duty/model';
import type { Range } from '@/core/quantity/range';
import { supply } from '../verification/dutyWorkedBatches';

const MODELS = Object.keys(DUTY_CATALOGUE) as WorkedModel[];
const rangesOf = (model: WorkedModel): Readonly<Record<string, Range>> => DUTY_CATALOGUE[model].ranges;
const middle = ({ min, max }: Range): number => (min + max) / 2;
const middles = (ranges: Readonly<Record<string, Range>>) =>
  Object.fromEntries(Object.entries(ranges).map(([field, range]) => [field, middle(range)]));

/** A model's defaults; the middle of the range where there is none. */
function sound(model: WorkedModel): Record<string, unknown> {
  const lists = Object.entries(DUTY_LISTS[model] ?? {}).map(([field, { ranges }]) => [field, [middles(ranges)]]);
  const choices = Object.entries(DUTY_CHOICES[model] ?? {}).map(([field, { options }]) => [field, options[0]?.value]);
  const basis = DUTY_BASES[model];
  return {
    ...middles(rangesOf(model)),
    ...Object.fromEntries([...lists, ...choices]),
    ...(basis ? { [basis.field]: { kind: 'given', kJPerKgK: 3.9, source: 'property test' } } : {}),
    ...DUTY_CATALOGUE[model].defaults.values,
  };
}

/** Inside, at an end, outside, or no number at all. */
const figure = ({ min, max }: Range): fc.Arbitrary<number> =>
  fc.oneof(
    fc.double({ min, max, noNaN: true }),
    fc.constantFrom(min, max, 0, 0.005, 0.01, -1, Number.NaN, Number.POSITIVE_INFINITY),
    fc.double({ min: max, max: max * 2 + 1, noNaN: true }),
    fc.double({ min: min - Math.abs(min) - 1, max: min, noNaN: true }),
  );

/** One or two of a model's figures, typed over. */
const typed = (model: WorkedModel): fc.Arbitrary<Record<string, unknown>> =>
  fc
    .subarray(Object.keys(rangesOf(model)), { minLength: 1, maxLength: 2 })
    .chain((fields) =>
      fc.record(Object.fromEntries(fields.map((field) => [field, figure(rangesOf(model)[field] as Range)]))),
    );

describe.each(MODELS)('inputs of %s', (model) => {
  it('fit the schema where core’s ranges hold, and nowhere else', () => {
    let refused = 0;
    let accepted = 0;
    fc.assert(
      fc.property(typed(model), (change) => {
        const inputs: Record<string, unknown> = { ...sound(model), ...change };
        const bad = checkInputs(inputs, rangesOf(model) as InputRanges<typeof inputs>);
        const parsed = inputsSchema(model).safeParse(inputs);
        const isHalf = DUTY_WHOLE[model]?.some((field) => !Number.isInteger(inputs[field])) ?? false;
        expect(parsed.success, JSON.stringify(change)).toBe(bad === undefined && !isHalf);
        if (bad) expect(parsed.error?.issues.map(({ path }) => path.join('.'))).toContain(bad.field);
        if (bad) refused += 1;
        else accepted += 1;
      }),
      { numRuns: 150 },
    );
    expect(Math.min(refused, accepted)).toBeGreaterThanOrEqual(15);
  });

  it('that fit are never out of a range to core', () => {
    let seen = 0;
    fc.assert(
      fc.property(typed(model), (change) => {
        const parsed = parseDuty(model, { ...sound(model), ...change });
        fc.pre(parsed.ok);
        const worked = parsed.ok ? workOut(parsed.value, supply) : parsed;
        const isTemperatureOfUse = !worked.ok && worked.error.field === 'specificHeatAtC';
        if (!worked.ok && !isTemperatureOfUse) expect(worked.error.code).not.toBe(DUTY_RANGE);
        seen += 1;
      }),
      { numRuns: 60 },
    );
    expect(seen).toBeGreaterThanOrEqual(60);
  });
});

describe('a typed profile', () => {
  it('fits the schema where core works it out', () => {
    const phase = fc.record({
      kind: fc.constantFrom('vent' as const, 'run' as const),
      minutes: figure({ name: '', unit: 'min', min: 0.01, max: 10_080 }),
      steamKgPerH: figure({ name: '', unit: 'kg/h', min: 0, max: 200_000 }),
    });
    let fitting = 0;
    fc.assert(
      fc.property(fc.array(phase, { minLength: 1, maxLength: 2 }), (phases) => {
        const duty: DutyModel = { model: 'typed', inputs: { phases, source: 'meter' } };
        const isSound = workOut(duty, supply).ok;
        expect(dutyModelSchema.safeParse(duty).success).toBe(isSound);
        if (isSound) fitting += 1;
      }),
      { numRuns: 200 },
    );
    expect(fitting).toBeGreaterThanOrEqual(15);
  });
});
