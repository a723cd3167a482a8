import { useState } from 'react';
import { familySchema, type FamilyDto, type FamilyRequest } from '@/contracts/products';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';

const reload = (): void => window.location.reload();

/** The plant's product families: named, renamed, and taken out of use when no product belongs to them. */
export function Families({
  families,
  mayEdit,
}: {
  readonly families: readonly FamilyDto[];
  readonly mayEdit: boolean;
}) {
  const [open, setOpen] = useState<string | null>(null);
  return (
    <section aria-labelledby="families">
      <h2 id="families" className="mb-2 text-lg">
        Families
      </h2>
      <ul className="max-w-2xl divide-y divide-rule border-y border-rule">
        {families.map((family) => (
          <li key={family.id} className="py-2">
            {open === family.id ? (
              <FamilyForm family={family} onClose={() => setOpen(null)} />
            ) : (
              <div className="flex flex-wrap items-center gap-x-4">
                <span className="min-w-0 flex-1 font-medium">{family.name}</span>
                <span className="text-sm text-ink-muted">
                  {family.products === 1 ? '1 product' : `${family.products} products`}
                </span>
                {mayEdit ? (
                  <Button look="quiet" size="small" onClick={() => setOpen(family.id)}>
                    Change
                  </Button>
                ) : null}
              </div>
            )}
          </li>
        ))}
      </ul>
      {!mayEdit ? null : open === '' ? (
        <div className="mt-4 max-w-2xl">
          <FamilyForm family={null} onClose={() => setOpen(null)} />
        </div>
      ) : (
        <Button className="mt-4" onClick={() => setOpen('')}>
          New family
        </Button>
      )}
    </section>
  );
}

function FamilyForm({ family, onClose }: { readonly family: FamilyDto | null; readonly onClose: () => void }) {
  const form = useZodForm(familySchema, { name: family?.name ?? '' });
  const [refusal, setRefusal] = useState('');
  const path = family ? `/api/families/${family.id}` : '/api/families';
  const save = useSave(form, (values: FamilyRequest) => api(path, { method: 'POST', body: values }), reload);
  const retire = (): void =>
    void api(path, { method: 'DELETE' }).then(reload, (error: unknown) => setRefusal(messageOf(error)));
  return (
    <form onSubmit={save.submit} noValidate>
      <TextInput control={form.control} name="name" label="Name of the family" maxLength={80} />
      {refusal === '' ? null : (
        <p role="alert" className="text-sm text-over">
          {refusal}
        </p>
      )}
      <FormActions state={save.state} save="Save the family" onCancel={onClose}>
        {family && family.products === 0 ? (
          <Button look="over" className="mr-auto" onClick={retire}>
            Take out of use
          </Button>
        ) : null}
      </FormActions>
    </form>
  );
}
