import { useFieldArray, type Control } from 'react-hook-form';
import { ROUTE_RANGES, type RouteChoicesDto } from '@/contracts/products';
import { Button } from '../ui/Button';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput } from '../ui/form/TextInput';

interface Props {
  readonly control: Control<Record<string, unknown>>;
  readonly name: string;
  readonly limits: RouteChoicesDto['limits'];
}

/** Uses of shared limits: crates, operators, water. */
export function UsesEditor({ control, name, limits }: Props) {
  const uses = useFieldArray({ control, name: name as never });
  if (limits.length === 0 && uses.fields.length === 0) return null;
  const figure = (index: number, field: 'offsetMin' | 'minutes' | 'amount') => {
    const { name: label, unit, min, max } = ROUTE_RANGES[field === 'minutes' ? 'useMinutes' : field];
    return { control, name: `${name}.${index}.${field}`, label, unit, min, max };
  };
  const empty = { limitId: limits[0]?.id ?? '', offsetMin: 0, minutes: null, amount: null };
  return (
    <div className="mt-4">
      {uses.fields.map((field, index) => (
        <div
          key={field.id}
          className="grid grid-cols-2 items-start gap-x-3 sm:grid-cols-[minmax(0,1.4fr)_repeat(3,minmax(0,1fr))_auto]"
        >
          <SelectInput
            {...{ control, name: `${name}.${index}.limitId`, label: 'Uses' }}
            options={limits.map(({ id, name: limit, unit }) => ({ value: id, label: `${limit}, ${unit}` }))}
          />
          <NumberField {...figure(index, 'amount')} />
          <NumberField {...figure(index, 'offsetMin')} />
          <NumberField {...figure(index, 'minutes')} />
          <Button
            look="quiet"
            size="small"
            className="mt-7 justify-self-start"
            onClick={() => uses.remove(index)}
            aria-label={`Take use ${index + 1} out`}
          >
            Remove
          </Button>
        </div>
      ))}
      <Button look="quiet" size="small" onClick={() => uses.append(empty)}>
        Add a use of a shared limit
      </Button>
    </div>
  );
}
