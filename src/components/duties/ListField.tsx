import { useFieldArray, useFormState, get, type Control } from 'react-hook-form';
import type { WorkedModel } from '@/core/duty/catalogue';
import { hintOf, type DutyList } from '@/core/duty/dutyFields';
import { Button } from '../ui/Button';
import { NumberField } from '../ui/form/NumberField';
import { newRow, type DutyFormValues } from './formModel';

interface Props {
  readonly control: Control<DutyFormValues>;
  readonly model: WorkedModel;
  readonly field: string;
  readonly list: DutyList;
}

/** Rows of figures: pieces of a process time, steps of a come-up. */
export function ListField({ control, model, field, list }: Props) {
  const name = `duty.inputs.${field}` as const;
  const rows = useFieldArray({ control, name: name as never });
  const fault = useFault(control, name);
  const columns = Object.entries(list.ranges);
  return (
    <fieldset className="col-span-full rounded-md border border-rule px-4 pt-3 pb-4">
      <legend className="label px-1">{list.name}</legend>
      <ol>
        {rows.fields.map((row, index) => (
          <li key={row.id} className="grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)_auto] items-start gap-x-3">
            {columns.map(([column, range]) => (
              <NumberField
                key={column}
                {...{ control, name: `${name}.${index}.${column}` as never, label: range.name, unit: range.unit }}
                {...{ min: range.min, max: range.max, hint: index === 0 ? hintOf(model, column) : undefined }}
              />
            ))}
            <Button
              look="quiet"
              size="small"
              className="mt-7"
              disabled={rows.fields.length <= list.count.min}
              onClick={() => rows.remove(index)}
              aria-label={`Take row ${index + 1} out`}
            >
              Remove
            </Button>
          </li>
        ))}
      </ol>
      <div className="flex items-center gap-3">
        <Button size="small" onClick={() => rows.append(newRow(model, field))}>
          Add a row
        </Button>
        {fault ? <p className="text-xs text-over">{fault}</p> : null}
      </div>
    </fieldset>
  );
}

interface Fault {
  readonly message?: string;
  readonly root?: { readonly message?: string };
}

/** What is wrong with a list as a whole. */
export function useFault(control: Control<DutyFormValues>, name: string): string | undefined {
  const { errors } = useFormState({ control });
  const found = get<object, Fault | undefined>(errors, name);
  return found?.root?.message ?? found?.message;
}
