import { useWatch, type Control, type UseFormSetValue } from 'react-hook-form';
import type { DutyProductDto } from '@/contracts/duties';
import { DUTY_CATALOGUE, type WorkedModel } from '@/core/duty/catalogue';
import {
  DUTY_BASES,
  DUTY_CHOICES,
  DUTY_LISTS,
  DUTY_OPTIONAL,
  DUTY_PROCESS_FIELDS,
  hintOf,
} from '@/core/duty/dutyFields';
import { DUTY_GROUPS, type DutyGroup } from '@/core/duty/dutyGroups';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput } from '../ui/form/TextInput';
import { Notice } from '../ui/Notice';
import { BasisField } from './BasisField';
import { isIdle, type DutyFormValues, type TypedInputs } from './formModel';
import { ListField } from './ListField';

interface Props {
  readonly control: Control<DutyFormValues>;
  readonly setValue: UseFormSetValue<DutyFormValues>;
  readonly model: WorkedModel;
  readonly products: readonly DutyProductDto[];
}

/** Every input of a model, in its groups. */
export function DutyFields(props: Props) {
  return DUTY_GROUPS[props.model].map((group) => <Group key={group.title} {...props} group={group} />);
}

/** Where the contents stand before the process: asked for with the load, and held against the process data too. */
const STARTS = ['initialC', 'inC'];

function Group({ group, ...props }: Props & { readonly group: DutyGroup }) {
  const inputs = useWatch({ control: props.control, name: 'duty.inputs' });
  const ofProcess = (DUTY_PROCESS_FIELDS[props.model] ?? []).filter((field) => !STARTS.includes(field));
  const isProcess = group.fields.some((field) => ofProcess.includes(field));
  return (
    <fieldset className="border-t border-rule pt-4 pb-2">
      <legend className="sr-only">{group.title}</legend>
      <h2 className="mb-3 text-md font-semibold" aria-hidden="true">
        {group.title}
      </h2>
      {isProcess ? <ProcessCaution /> : null}
      <div className="grid grid-cols-1 gap-x-4 gap-y-1.5 sm:grid-cols-2">
        {group.fields.map((field) =>
          isIdle(props.model, field, inputs) ? null : <Input key={field} {...props} field={field} inputs={inputs} />,
        )}
      </div>
    </fieldset>
  );
}

function ProcessCaution() {
  return (
    <Notice look="caution" className="mb-4">
      Temperatures and times of a thermal process come from the process authority. Here they only say how much steam the
      process takes; the plan goes by the released process data.
    </Notice>
  );
}

function Input({ control, setValue, model, products, field, inputs }: Props & { field: string; inputs: TypedInputs }) {
  const name = `duty.inputs.${field}` as const;
  const choice = DUTY_CHOICES[model]?.[field];
  if (choice) {
    const none = inputs[field] === null ? { none: 'choose…' } : {};
    return <SelectInput {...{ control, name, label: choice.name, options: choice.options, ...none }} />;
  }
  const list = DUTY_LISTS[model]?.[field];
  if (list) return <ListField {...{ control, model, field, list }} />;
  const basis = DUTY_BASES[model];
  if (basis?.field === field) {
    const title = `Specific heat of the ${field}`;
    return <BasisField {...{ control, setValue, name, title, products, atC: basis.atC(inputs) }} />;
  }
  const { ranges, defaults } = DUTY_CATALOGUE[model] as {
    readonly ranges: Readonly<Record<string, { name: string; unit: string; min: number; max: number }>>;
    readonly defaults: { readonly mark: string; readonly values: Readonly<Record<string, unknown>> };
  };
  const range = ranges[field] ?? DUTY_OPTIONAL[model]?.[field];
  if (!range) return null;
  const standard = defaults.values[field];
  return (
    <NumberField
      {...{ control, name, label: range.name, unit: range.unit, min: range.min, max: range.max }}
      {...{ hint: hintOf(model, field), standardMark: defaults.mark }}
      standard={typeof standard === 'number' ? standard : null}
    />
  );
}
