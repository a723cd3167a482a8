/** Schemas of every duty model's inputs, made from core's catalogue: the same ranges, the same sentences. */
import { z } from 'zod';
import { DUTY_CATALOGUE, type InputsOf, type WorkedModel } from '../core/duty/catalogue';
import {
  DUTY_BASES,
  DUTY_CHOICES,
  DUTY_LISTS,
  DUTY_OPTIONAL,
  DUTY_WHOLE,
  type DutyList,
} from '../core/duty/dutyFields';
import { checkNumber } from '../core/duty/inputs';
import { TYPED_RANGES, type DutyModel } from '../core/duty/model';
import { COMPONENTS, FRACTIONS, FRACTIONS_SUM, GIVEN_SPECIFIC_HEAT, sumOfFractions } from '../core/duty/specificHeat';
import { fail, ok, problem, type Result } from '../core/result';
import type { PhaseKind } from '../core/plant/activity';
import { checkRange, shortNumber, type Range } from '../core/quantity/range';

const spanOf = ({ min, max, unit }: Range): string =>
  `${shortNumber(min)} to ${shortNumber(max)}${unit === '' ? '' : ` ${unit}`}`;

/** A number in a range; a missing one is asked for by name. */
export function numberIn(range: Range) {
  const what = (input: unknown) => (input === undefined || input === null ? 'not entered' : 'not a number');
  const error = ({ input }: { readonly input?: unknown }) =>
    `${range.name} is ${what(input)}; it must be ${spanOf(range)}.`;
  return z.number({ error }).check((context) => {
    const bad = checkNumber(range, context.value, '');
    if (bad) context.issues.push({ code: 'custom', message: bad.message, input: context.value });
  });
}

const wholeIn = (range: Range) =>
  numberIn(range).refine(Number.isInteger, { error: `${range.name}: enter a whole number.` });

/** A figure that may be left empty. */
const optional = <T>(schema: z.ZodType<T, T>) => schema.nullish().transform((value) => value ?? undefined);

const numbersIn = (ranges: Readonly<Record<string, Range>>) =>
  Object.fromEntries(Object.entries(ranges).map(([field, range]) => [field, numberIn(range)]));

/** Words that somebody has to enter. */
export const words = (sentence: string, most = 200) =>
  z
    .string({ error: sentence })
    .trim()
    .min(1, { error: sentence })
    .max(most, { error: `At most ${most} characters.` });

export const compositionSchema = z
  .object({
    water: numberIn(FRACTIONS.water),
    protein: numberIn(FRACTIONS.protein),
    fat: numberIn(FRACTIONS.fat),
    carbohydrate: numberIn(FRACTIONS.carbohydrate),
    fibre: numberIn(FRACTIONS.fibre),
    ash: numberIn(FRACTIONS.ash),
  })
  .superRefine((composition, context) => {
    const bad = checkRange('DUTY-RANGE', FRACTIONS_SUM, sumOfFractions(composition));
    if (!bad) return;
    const message = `${bad.message} Most often fibre is counted twice: carbohydrate is net of fibre.`;
    context.addIssue({ code: 'custom', message, path: [COMPONENTS[0] ?? 'water'] });
  });

/** Where a specific heat comes from. */
export const specificHeatBasisSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('composition'), composition: compositionSchema }),
  z.object({ kind: z.literal('waterOnly'), water: numberIn(FRACTIONS.water) }),
  z.object({
    kind: z.literal('given'),
    kJPerKgK: numberIn(GIVEN_SPECIFIC_HEAT),
    source: words('Say where the specific heat comes from.'),
  }),
]);

const listSchema = ({ name, count, ranges }: DutyList) =>
  z
    .array(z.object(numbersIn(ranges)), { error: `${name}: enter at least one row.` })
    .min(count.min, { error: `${name}: enter at least ${count.min === 1 ? 'one row' : `${count.min} rows`}.` })
    .max(count.max, { error: `${name}: at most ${count.max} rows.` });

function shapeOf(model: WorkedModel): z.ZodRawShape {
  const ranges: Readonly<Record<string, Range>> = DUTY_CATALOGUE[model].ranges;
  const shape: Record<string, z.ZodType> = numbersIn(ranges);
  for (const field of DUTY_WHOLE[model] ?? []) if (ranges[field]) shape[field] = wholeIn(ranges[field]);
  for (const [field, { name, options }] of Object.entries(DUTY_CHOICES[model] ?? {})) {
    shape[field] = z.enum(options.map(({ value }) => value) as [string, ...string[]], {
      error: `${name}: choose one.`,
    });
  }
  for (const [field, list] of Object.entries(DUTY_LISTS[model] ?? {})) shape[field] = listSchema(list);
  for (const [field, range] of Object.entries(DUTY_OPTIONAL[model] ?? {})) shape[field] = optional(wholeIn(range));
  const basis = DUTY_BASES[model];
  if (basis) shape[basis.field] = specificHeatBasisSchema;
  return shape;
}

const made = new Map<WorkedModel, z.ZodType>();

/** The inputs of a model that is worked out; every fault at once, each at its field. Unknown fields are dropped. */
export function inputsSchema<Model extends WorkedModel>(model: Model): z.ZodType<InputsOf<Model>> {
  const known = made.get(model) ?? z.object(shapeOf(model));
  made.set(model, known);
  // The shape is that of the catalogue, which core types by the model; a property test holds both to each other.
  return known as z.ZodType<InputsOf<Model>>;
}

export const PHASE_KINDS = [
  'warmUp',
  'run',
  'idle',
  'heatUp',
  'boilOff',
  'hold',
  'vent',
  'comeUp',
  'process',
  'cool',
  'rinse',
  'wash',
] as const satisfies readonly PhaseKind[];

/** A typed or measured profile: phases, and where they are from. */
export const typedProfileSchema = z.object({
  phases: z
    .array(
      z.object({
        kind: z.enum(PHASE_KINDS, { error: 'Phase: choose one.' }),
        minutes: numberIn(TYPED_RANGES.minutes),
        steamKgPerH: numberIn(TYPED_RANGES.steamKgPerH),
      }),
      { error: 'Enter at least one phase.' },
    )
    .min(1, { error: 'Enter at least one phase.' })
    .max(60, { error: 'At most 60 phases.' }),
  source: words('Say where the figures are from: which meter, which day.'),
});

const workedSchema = <Model extends WorkedModel>(model: Model) =>
  z.object({ model: z.literal(model), inputs: inputsSchema(model) });

/** A duty: its model, and inputs that fit it. */
export const dutyModelSchema = z.discriminatedUnion(
  'model',
  [
    workedSchema('steamBlancher'),
    workedSchema('waterBlancher'),
    workedSchema('jacketedKettle'),
    workedSchema('injectionCooker'),
    workedSchema('stillRetort'),
    workedSchema('overpressureRetort'),
    workedSchema('continuousCooker'),
    workedSchema('exhaustBox'),
    workedSchema('platePasteuriser'),
    workedSchema('tunnelPasteuriser'),
    workedSchema('evaporator'),
    workedSchema('hotWater'),
    workedSchema('waterHeating'),
    workedSchema('cleaningInPlace'),
    z.object({ model: z.literal('typed'), inputs: typedProfileSchema }),
  ],
  { error: 'Choose what kind of duty this is.' },
);

/**
 * A duty as it is stored, held to its model: what no longer fits is refused with the sentence of the first field.
 * @returns DUTY-STORED naming the field.
 */
export function parseDuty(model: string, inputs: unknown): Result<DutyModel> {
  const parsed = dutyModelSchema.safeParse({ model, inputs });
  if (parsed.success) return ok(parsed.data);
  const [first] = parsed.error.issues;
  return fail(problem('DUTY-STORED', first?.message ?? 'The stored duty fits no model.', first?.path.join('.')));
}
