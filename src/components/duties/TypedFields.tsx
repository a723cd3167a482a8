import { useFieldArray, type Control } from 'react-hook-form';
import { PHASE_KINDS } from '@/contracts/dutyInputs';
import { TYPED_RANGES } from '@/core/duty/model';
import { Button } from '../ui/Button';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { PHASE_NAMES } from '../working/numbers';
import type { DutyFormValues } from './formModel';
import { useFault } from './ListField';

const NAME = 'duty.inputs.phases';
const KINDS = PHASE_KINDS.map((value) => ({ value, label: PHASE_NAMES[value] ?? value }));
const EMPTY = { kind: 'run', minutes: null, steamKgPerH: null };

/** A draw as the meter says it: phases in order, and where they are from. */
export function TypedFields({ control }: { readonly control: Control<DutyFormValues> }) {
  const rows = useFieldArray({ control, name: NAME as never });
  const fault = useFault(control, NAME);
  const { minutes, steamKgPerH } = TYPED_RANGES;
  return (
    <fieldset>
      <legend className="mb-3 text-md font-semibold">Phases, in order</legend>
      <ol>
        {rows.fields.map((row, index) => (
          <li
            key={row.id}
            className="grid grid-cols-2 items-start gap-x-3 sm:grid-cols-[minmax(0,1.2fr)_repeat(2,minmax(0,1fr))_auto]"
          >
            <SelectInput control={control} name={`${NAME}.${index}.kind` as never} label="Phase" options={KINDS} />
            <NumberField
              {...{ control, name: `${NAME}.${index}.minutes` as never, label: 'Length', unit: minutes.unit }}
              {...{ min: minutes.min, max: minutes.max }}
            />
            <NumberField
              {...{ control, name: `${NAME}.${index}.steamKgPerH` as never, label: 'Draw', unit: steamKgPerH.unit }}
              {...{ min: steamKgPerH.min, max: steamKgPerH.max }}
            />
            <Button
              look="quiet"
              size="small"
              className="mt-7 justify-self-start"
              disabled={rows.fields.length <= 1}
              onClick={() => rows.remove(index)}
              aria-label={`Take phase ${index + 1} out`}
            >
              Remove
            </Button>
          </li>
        ))}
      </ol>
      <div className="mb-5 flex items-center gap-3">
        <Button size="small" onClick={() => rows.append(EMPTY)}>
          Add a phase
        </Button>
        {fault ? <p className="text-xs text-over">{fault}</p> : null}
      </div>
      <TextInput
        control={control}
        name="duty.inputs.source"
        label="Where the figures are from"
        hint="Which meter, which day, who read it."
        maxLength={200}
      />
    </fieldset>
  );
}
