import { useFieldArray, type Control } from 'react-hook-form';
import { RANGES } from '../../contracts/plantLibrary';
import { Button } from '../ui/Button';
import { NumberField } from '../ui/form/NumberField';
import { hourText } from './hours';

interface Props {
  readonly control: Control<Record<string, unknown>, unknown, unknown>;
  readonly name: string;
  readonly weekStartsOn: number;
  readonly unit: string;
  readonly typed: readonly { readonly fromHour: unknown; readonly value: unknown }[];
}

const nextHour = (typed: Props['typed']): number => {
  const last = Math.max(0, ...typed.map(({ fromHour }) => (typeof fromHour === 'number' ? fromHour : 0)));
  return Math.min(167, last + 1);
};

/** A value from an hour of the week on, step by step. */
export function StepsEditor({ control, name, weekStartsOn, unit, typed }: Props) {
  const { fields, append, remove } = useFieldArray({ control, name: name as never });
  const { fromHour, value } = RANGES.sharedLimits;
  return (
    <div className="min-w-0 sm:col-span-2">
      <ol>
        {fields.map((field, i) => {
          const hour = typed[i]?.fromHour;
          const isHour = typeof hour === 'number' && Number.isInteger(hour) && hour >= 0 && hour < 168;
          return (
            <li key={field.id} className="grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)_auto] items-start gap-x-3">
              <NumberField
                control={control}
                name={`${name}.${i}.fromHour`}
                label={`Step ${i + 1} from hour`}
                unit="h"
                min={fromHour.min}
                max={fromHour.max}
                {...(isHour ? { hint: hourText(hour, weekStartsOn) } : {})}
              />
              <NumberField
                control={control}
                name={`${name}.${i}.value`}
                label="Capacity"
                unit={unit}
                min={value.min}
                max={value.max}
                hint="from then on"
              />
              <Button
                look="quiet"
                size="small"
                className="mt-7"
                disabled={fields.length === 1}
                aria-label={`Take step ${i + 1} away`}
                onClick={() => remove(i)}
              >
                Take away
              </Button>
            </li>
          );
        })}
      </ol>
      <Button size="small" onClick={() => append({ fromHour: nextHour(typed), value: null })}>
        One more step
      </Button>
    </div>
  );
}
