/** What a duty's form holds while it is typed, and the schema that checks it. Pure. */
import { z } from 'zod';
import { inputsSchema, typedProfileSchema, words } from '@/contracts/dutyInputs';
import { DUTY_CATALOGUE, type WorkedModel } from '@/core/duty/catalogue';
import {
  DUTY_BASES,
  DUTY_CHOICES,
  DUTY_LISTS,
  DUTY_OPTIONAL,
  DUTY_ONLY_WITH,
  faultField,
} from '@/core/duty/dutyFields';
import type { DutyModel } from '@/core/duty/model';
import { workOutOn, type Headers } from './demand';

/** Inputs as typed: figures may be missing (null) or unreadable (NaN). */
export type TypedInputs = Record<string, unknown>;

export interface DutyFormValues {
  readonly name: string;
  readonly tryOnHeaderId: string;
  readonly duty: { readonly model: DutyModel['model']; readonly inputs: TypedInputs };
}

/** Models in the order that the form offers them, with their names. */
export const MODEL_OPTIONS: readonly { readonly value: DutyModel['model']; readonly label: string }[] = [
  ...Object.values(DUTY_CATALOGUE).map(({ model, title }) => ({ value: model, label: title })),
  { value: 'typed', label: 'Typed or measured draw' },
];

/** A model as people call it. */
export const modelTitle = (model: DutyModel['model']): string =>
  MODEL_OPTIONS.find(({ value }) => value === model)?.label ?? model;

const emptyRow = (fields: readonly string[]): TypedInputs => Object.fromEntries(fields.map((field) => [field, null]));

/** A list's new row. */
export const newRow = (model: WorkedModel, list: string): TypedInputs =>
  emptyRow(Object.keys(DUTY_LISTS[model]?.[list]?.ranges ?? {}));

/** What a basis of its kind starts from. */
export function blankBasis(kind: string): TypedInputs {
  if (kind === 'waterOnly') return { kind, water: null };
  if (kind === 'given') return { kind, kJPerKgK: null, source: '' };
  const composition = emptyRow(['water', 'protein', 'fat', 'carbohydrate', 'fibre', 'ash']);
  return { kind: 'composition', composition };
}

/** What a new duty of a model starts from: plant-specific defaults; what has none is left to be entered. */
export function blankInputs(model: DutyModel['model']): TypedInputs {
  if (model === 'typed') return { phases: [{ kind: 'run', minutes: null, steamKgPerH: null }], source: '' };
  const { ranges, defaults } = DUTY_CATALOGUE[model];
  const basis = DUTY_BASES[model];
  const lists = Object.keys(DUTY_LISTS[model] ?? {});
  return {
    ...emptyRow([
      ...Object.keys(ranges),
      ...Object.keys(DUTY_CHOICES[model] ?? {}),
      ...Object.keys(DUTY_OPTIONAL[model] ?? {}),
    ]),
    ...Object.fromEntries(lists.map((list) => [list, [newRow(model, list)]])),
    ...(basis ? { [basis.field]: blankBasis('composition') } : {}),
    ...defaults.values,
  };
}

/** Inputs as they are stored, with nothing undefined: an empty optional figure is null. */
export const inputsOf = ({ model, inputs }: DutyModel): TypedInputs =>
  model === 'typed' ? { ...inputs } : { ...emptyRow(Object.keys(DUTY_OPTIONAL[model] ?? {})), ...inputs };

/** True where a choice makes a field idle: it keeps its figure and is not asked for. */
export function isIdle(model: WorkedModel, field: string, inputs: TypedInputs): boolean {
  const only = DUTY_ONLY_WITH[field];
  return only !== undefined && DUTY_CHOICES[model]?.[only.field] !== undefined && inputs[only.field] !== only.is;
}

const schemaOf = (model: DutyModel['model']): z.ZodType =>
  model === 'typed' ? typedProfileSchema : inputsSchema(model);

/** The duty as typed, where every figure is there and in its range; null where one is not. */
export function typedDuty(model: DutyModel['model'], inputs: unknown): DutyModel | null {
  const parsed = schemaOf(model).safeParse(inputs);
  return parsed.success ? ({ model, inputs: parsed.data } as DutyModel) : null;
}

/** Number of figures that are still missing or out of range. */
export const faultsLeft = (model: DutyModel['model'], inputs: unknown): number =>
  schemaOf(model).safeParse(inputs).error?.issues.length ?? 0;

/**
 * The form's schema: every figure in its range; then whether the whole can be worked out on the header it is tried on,
 * with core's sentence at the field that stands in the way.
 */
export function dutyFormSchema(model: DutyModel['model'], headers: Headers): z.ZodType<DutyFormValues, DutyFormValues> {
  const schema = z
    .object({
      name: words('Give the duty a name that people know it by.', 120),
      tryOnHeaderId: z.string(),
      duty: z.object({ model: z.literal(model), inputs: schemaOf(model) }),
    })
    .superRefine((values, context) => {
      const duty = { model, inputs: values.duty.inputs } as DutyModel;
      const worked = workOutOn(headers, values.tryOnHeaderId, duty);
      if (worked.ok) return;
      const field = faultField(duty, worked.error);
      const isInput = field !== undefined && field !== 'tryOnHeaderId';
      const path = isInput ? ['duty', 'inputs', ...field.split('.')] : ['tryOnHeaderId'];
      context.addIssue({ code: 'custom', message: worked.error.message, path });
    });
  return schema as unknown as z.ZodType<DutyFormValues, DutyFormValues>;
}
