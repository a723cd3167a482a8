import { useState } from 'react';
import type { OrdersDto } from '../../contracts/orders';
import type { UnitSystem } from '../../core/quantity/display';
import { QueryProvider } from '../query/client';
import { Notice } from '../ui/Notice';
import { UnitsProvider } from '../ui/units';
import { OrderForm } from './OrderForm';
import { OrderTable } from './OrderTable';
import { SplitDialog } from './SplitDialog';
import { useOrders } from './useOrders';

interface Props {
  readonly initial: OrdersDto;
  readonly mayEdit: boolean;
  readonly system: UnitSystem;
}

function Page({ initial, mayEdit }: Props) {
  const orders = useOrders(initial);
  const [editing, setEditing] = useState<string | null>(null);
  const [splitting, setSplitting] = useState<string | null>(null);
  const [said, setSaid] = useState('');
  const all = orders.data.orders;
  const order = all.find(({ id }) => id === editing) ?? null;
  const split = all.find(({ id }) => id === splitting);
  const open = (id: string): void => {
    setSaid('');
    setEditing(id);
  };
  const saved = (number: string): void => {
    setEditing(null);
    setSaid(number === '' ? 'Deleted.' : `${number} is saved.`);
  };
  const form =
    editing === null ? null : (
      <OrderForm key={editing} {...{ orders, order }} onClose={() => setEditing(null)} onSaved={saved} />
    );
  return (
    <>
      <div className="mb-2 min-h-7" aria-live="polite">
        {said === '' ? null : <Notice look="good">{said}</Notice>}
      </div>
      <OrderTable
        {...{ orders: all, mayEdit, editing, form }}
        onEdit={open}
        onNew={() => open('')}
        onSplit={setSplitting}
      />
      {all.length === 0 ? (
        <p className="mt-6 text-md">No order has been entered yet. A new order names a product, how much, and when.</p>
      ) : null}
      {split ? (
        <SplitDialog
          key={split.id}
          {...{ orders, order: split }}
          onClose={() => setSplitting(null)}
          onPlanned={(message) => {
            setSplitting(null);
            setSaid(message);
          }}
        />
      ) : null}
    </>
  );
}

/** The plant's orders as an island. */
export function OrdersPage(props: Props) {
  return (
    <QueryProvider>
      <UnitsProvider system={props.system}>
        <Page {...props} />
      </UnitsProvider>
    </QueryProvider>
  );
}
