import { useWatch, type Control, type FieldPath, type FieldValues, type UseFormSetValue } from 'react-hook-form';
import type { DutyProductDto } from '@/contracts/duties';
import { specificHeatBasisSchema } from '@/contracts/dutyInputs';
import {
  COMPONENTS,
  FRACTIONS,
  FRACTIONS_SUM,
  GIVEN_SPECIFIC_HEAT,
  specificHeat,
  type FoodComposition,
} from '@/core/duty/specificHeat';
import { SelectField } from '../ui/Field';
import { NumberField } from '../ui/form/NumberField';
import { TextInput } from '../ui/form/TextInput';
import { useUnits } from '../ui/units';
import { Formula } from '../working/WorkingSteps';
import { fullDigits } from '../working/numbers';
import { blankBasis } from './formModel';

const KINDS = [
  { value: 'composition', label: 'Composition, shares of the mass' },
  { value: 'waterOnly', label: 'Water content only: rough' },
  { value: 'given', label: 'A figure from elsewhere' },
];
const NAMES: Readonly<Record<keyof FoodComposition, string>> = {
  water: 'Water',
  protein: 'Protein',
  fat: 'Fat',
  carbohydrate: 'Carbohydrate',
  fibre: 'Fibre',
  ash: 'Ash',
};
const HINTS: Partial<Record<keyof FoodComposition, string>> = { carbohydrate: 'Net of fibre.', fibre: 'Counted once.' };

interface Props<Values extends FieldValues, Output> {
  readonly control: Control<Values, unknown, Output>;
  readonly setValue: UseFormSetValue<Values>;
  /** Where the basis stands in the form's values. */
  readonly name: FieldPath<Values>;
  readonly title: string;
  /** Temperature of use [degC]; not a number while it is not known. */
  readonly atC: number;
  /** Products whose basis can be taken over. */
  readonly products?: readonly DutyProductDto[];
}

/** Where a specific heat comes from, with the figure at the temperature of use and its formula as it is typed. */
export function BasisField<Values extends FieldValues, Output>(props: Props<Values, Output>) {
  const { control, setValue, name, title, atC, products = [] } = props;
  const basis = useWatch({ control, name }) as { readonly kind: string } & Record<string, unknown>;
  const put = (value: unknown): void => setValue(name, value as never, { shouldDirty: true, shouldValidate: true });
  const at = (field: string) => `${name}.${field}` as FieldPath<Values>;
  return (
    <fieldset className="col-span-full rounded-md border border-rule px-4 pt-3 pb-1">
      <legend className="label px-1">{title}</legend>
      <div className="grid grid-cols-1 gap-x-4 gap-y-1.5 sm:grid-cols-2">
        <SelectField label="From" value={basis.kind} onChange={(event) => put(blankBasis(event.target.value))}>
          {KINDS.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </SelectField>
        {products.length > 0 ? <TakeOver products={products} onTake={put} /> : null}
      </div>
      {basis.kind === 'composition' ? (
        <div className="grid grid-cols-2 gap-x-4 gap-y-1 sm:grid-cols-3">
          {COMPONENTS.map((part) => (
            <NumberField
              key={part}
              {...{ control, name: at(`composition.${part}`), label: NAMES[part], min: FRACTIONS[part].min }}
              max={FRACTIONS[part].max}
              hint={HINTS[part] ?? ' '}
            />
          ))}
        </div>
      ) : null}
      {basis.kind === 'waterOnly' ? (
        <NumberField
          control={control}
          name={at('water')}
          label="Water"
          hint="Share of the mass, 0 to 1"
          min={0}
          max={1}
        />
      ) : null}
      {basis.kind === 'given' ? (
        <div className="grid grid-cols-1 gap-x-4 gap-y-1.5 sm:grid-cols-2">
          <NumberField
            {...{ control, name: at('kJPerKgK'), label: GIVEN_SPECIFIC_HEAT.name, unit: GIVEN_SPECIFIC_HEAT.unit }}
            min={GIVEN_SPECIFIC_HEAT.min}
            max={GIVEN_SPECIFIC_HEAT.max}
          />
          <TextInput control={control} name={at('source')} label="Where it comes from" maxLength={200} />
        </div>
      ) : null}
      <SpecificHeatLine basis={basis} atC={atC} />
    </fieldset>
  );
}

function TakeOver({ products, onTake }: { products: readonly DutyProductDto[]; onTake: (basis: unknown) => void }) {
  const take = (id: string): void => {
    const found = products.find((product) => product.id === id);
    if (found) onTake(found.basis);
  };
  return (
    <SelectField label="Take over from a product" value="" onChange={(event) => take(event.target.value)}>
      <option value="">choose…</option>
      {products.map(({ id, name }) => (
        <option key={id} value={id}>
          {name}
        </option>
      ))}
    </SelectField>
  );
}

const sumOf = (basis: Record<string, unknown>): number | null => {
  const parts = basis.composition as Partial<Record<keyof FoodComposition, number | null>> | undefined;
  if (!parts) return null;
  return COMPONENTS.reduce((sum, name) => sum + (Number.isFinite(parts[name]) ? Number(parts[name]) : 0), 0);
};

/** Sum of the fractions and the specific heat that follows; says what is missing where it does not. */
function SpecificHeatLine({ basis, atC }: { readonly basis: Record<string, unknown>; readonly atC: number }) {
  const units = useUnits();
  const sum = sumOf(basis);
  const isOff = sum !== null && (sum < FRACTIONS_SUM.min || sum > FRACTIONS_SUM.max);
  const parsed = specificHeatBasisSchema.safeParse(basis);
  const heat = parsed.success && Number.isFinite(atC) ? specificHeat(parsed.data, atC) : null;
  return (
    <p className="mb-3 flex flex-wrap gap-x-6 gap-y-1 text-sm" aria-live="polite">
      {sum === null ? null : (
        <span className={isOff ? 'text-over' : 'text-ink-muted'}>
          Sum {fullDigits(sum)}
          {isOff ? `: must be ${FRACTIONS_SUM.min} to ${FRACTIONS_SUM.max}` : ''}
        </span>
      )}
      {heat?.ok ? (
        <span>
          <Formula text="c_p" /> = <Formula text={heat.value.formula} /> ={' '}
          <strong className="font-semibold text-steam-deep">{units.number('specificHeat', heat.value.value)}</strong>{' '}
          {units.symbol('specificHeat')} at {units.text('temperature', atC)}{' '}
          <span className="text-ink-muted">({heat.value.source})</span>
        </span>
      ) : (
        <span className="text-ink-muted">The specific heat follows once all is entered.</span>
      )}
    </p>
  );
}
