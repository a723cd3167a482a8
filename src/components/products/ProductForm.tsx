import { useWatch } from 'react-hook-form';
import { PRODUCT_RANGES, type FamilyDto, type ProductDto, type ProductRequest } from '@/contracts/products';
import { api } from '../query/api';
import { BasisField } from '../duties/BasisField';
import { FormActions } from '../ui/form/FormActions';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import { heatAt, productSchema, productStart, SHOWN_AT_C } from './productForm';

interface Props {
  readonly saved: ProductDto | null;
  readonly families: readonly FamilyDto[];
  readonly mayEdit: boolean;
  readonly whoMay: string;
}

const RANGES = PRODUCT_RANGES;
const bounds = ({ name, unit, min, max }: (typeof RANGES)[keyof typeof RANGES]) => ({ label: name, unit, min, max });

/** Name, family, composition, container: with the specific heat that follows as they are typed. */
export function ProductForm({ saved, families, mayEdit, whoMay }: Props) {
  const form = useZodForm(productSchema, productStart(saved, families[0]?.id ?? ''));
  const { control, setValue } = form;
  const send = (values: ProductRequest): Promise<{ readonly id: string }> =>
    saved
      ? api(`/api/products/${saved.id}`, { method: 'POST', body: { ...values, read: saved.read } })
      : api('/api/products', { method: 'POST', body: values });
  const save = useSave(form, send, ({ id }) => window.location.assign(`/products/${id}`));
  return (
    <div className="grid grid-cols-1 gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,1fr)_20rem]">
      <form onSubmit={save.submit} noValidate className="min-w-0">
        <fieldset disabled={!mayEdit} className="contents">
          <div className="grid grid-cols-1 gap-x-4 gap-y-1.5 sm:grid-cols-2">
            <TextInput control={control} name="name" label="Name" maxLength={120} />
            <SelectInput
              {...{ control, name: 'familyId', label: 'Family', hint: 'What is cleaned between two families follows.' }}
              options={families.map(({ id, name }) => ({ value: id, label: name }))}
            />
            <BasisField {...{ control, setValue, name: 'basis', title: 'Specific heat', atC: 60 }} />
            <NumberField control={control} name="fillKg" {...bounds(RANGES.fillKg)} />
            <NumberField control={control} name="containerKg" {...bounds(RANGES.containerKg)} />
            <NumberField control={control} name="casePieces" {...bounds(RANGES.casePieces)} />
            <NumberField
              {...{ control, name: 'initialC', ...bounds(RANGES.initialC) }}
              hint="Contents at steam on, as it usually is. The process data holds the least."
            />
          </div>
        </fieldset>
        {mayEdit ? (
          <FormActions state={save.state} save={saved ? 'Save the product' : 'Save, then enter its route'}>
            {null}
          </FormActions>
        ) : (
          <Notice>{whoMay}</Notice>
        )}
      </form>
      <Follows control={control} />
    </div>
  );
}

/** What follows of the figures as typed. */
function Follows({ control }: { readonly control: ReturnType<typeof useZodForm<typeof productSchema>>['control'] }) {
  const units = useUnits();
  const { basis, fillKg, containerKg, casePieces } = useWatch({ control });
  const fill = Number(fillKg ?? Number.NaN);
  const container = Number(containerKg ?? Number.NaN);
  const pieces = Number(casePieces ?? Number.NaN);
  const heats = SHOWN_AT_C.map((tC) => ({ tC, heat: heatAt(basis, tC) }));
  return (
    <aside aria-label="What follows" className="space-y-4 lg:sticky lg:top-20 lg:self-start">
      <h3 className="text-md font-semibold">What follows</h3>
      <table className="handbook">
        <thead>
          <tr>
            <th scope="col">at</th>
            <th scope="col">specific heat, {units.symbol('specificHeat')}</th>
          </tr>
        </thead>
        <tbody>
          {heats.map(({ tC, heat }) => (
            <tr key={tC}>
              <td>{units.text('temperature', tC)}</td>
              <td className="number">{heat ? units.number('specificHeat', heat.value) : '–'}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <dl className="grid grid-cols-2 gap-x-6 gap-y-2 text-sm">
        <dt className="text-ink-muted">A full container</dt>
        <dd className="text-right">
          {Number.isFinite(fill + container) ? units.text('mass', fill + container, 3) : '–'}
        </dd>
        <dt className="text-ink-muted">A case, contents</dt>
        <dd className="text-right">{Number.isFinite(fill * pieces) ? units.text('mass', fill * pieces, 2) : '–'}</dd>
      </dl>
      <p className="text-xs text-ink-muted">
        {heats[0]?.heat ? `${heats[0].heat.source}. ` : ''}A duty takes a composition over at its own temperature of
        use; one that is changed here is taken over again in its duties.
      </p>
    </aside>
  );
}
