import { useState } from 'react';
import type { ProductDto, ProductsDto } from '@/contracts/products';
import type { UnitSystem } from '@/core/quantity/display';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { UnitsProvider } from '../ui/units';
import { ProductForm } from './ProductForm';
import { RouteEditor } from './RouteEditor';

interface Props extends Pick<ProductsDto, 'families' | 'choices'> {
  readonly saved: ProductDto | null;
  readonly mayEdit: boolean;
  readonly whoMay: string;
  readonly system: UnitSystem;
}

/** A product and its route as an island. */
export function ProductEditor({ saved, families, choices, mayEdit, whoMay, system }: Props) {
  return (
    <UnitsProvider system={system}>
      <ProductForm {...{ saved, families, mayEdit, whoMay }} />
      {saved ? (
        <section className="mt-12" aria-labelledby="route">
          <h2 id="route" className="mb-4 text-lg">
            Route
          </h2>
          <RouteEditor product={saved} choices={choices} mayEdit={mayEdit} />
          {mayEdit && saved.plannedRuns === 0 ? <Retire saved={saved} /> : null}
        </section>
      ) : null}
    </UnitsProvider>
  );
}

function Retire({ saved }: { readonly saved: ProductDto }) {
  const [refusal, setRefusal] = useState('');
  const retire = async (): Promise<void> => {
    try {
      await api(`/api/products/${saved.id}/retire`, { method: 'POST', body: { read: saved.read } });
      window.location.assign('/products');
    } catch (error) {
      setRefusal(messageOf(error));
    }
  };
  return (
    <div className="mt-10 flex flex-wrap items-center gap-4 border-t border-rule pt-5">
      <Button look="over" onClick={() => void retire()}>
        Take the product out of use
      </Button>
      {refusal === '' ? null : (
        <p role="alert" className="text-sm text-over">
          {refusal}
        </p>
      )}
    </div>
  );
}
