import type { ReactTable } from '@tanstack/react-table';
import type { OrderDto } from '../../contracts/orders';
import { Button } from '../ui/Button';
import { Field, SelectField } from '../ui/Field';
import { useHydrated } from '../ui/useHydrated';
import { COLUMN_NAMES, type ORDER_FEATURES } from './orderColumns';

interface Props {
  readonly table: ReactTable<typeof ORDER_FEATURES, OrderDto>;
  readonly shown: number;
  readonly all: number;
  /** null: the person may not. */
  readonly onNew: (() => void) | null;
}

const STATES = { notPlanned: 'not planned', planned: 'planned', onFloor: 'on the floor' };

/** Search, filters and columns of the orders. */
export function OrderTools({ table, shown, all, onNew }: Props) {
  const state = table.getColumn('state');
  const product = table.getColumn('productName');
  const names = [...new Set(table.getCoreRowModel().rows.map(({ original }) => original.productName))].sort();
  const isReady = useHydrated();
  return (
    <div className="mb-2 flex flex-wrap items-start gap-x-4 gap-y-1">
      <Field
        className="w-full sm:w-56"
        label="Search"
        type="search"
        disabled={!isReady}
        value={String(table.state.globalFilter ?? '')}
        hint={shown === all ? `${all} orders` : `${shown} of ${all} orders`}
        onChange={(event) => table.setGlobalFilter(event.target.value)}
      />
      <SelectField
        className="min-w-36 max-sm:flex-1"
        label="State"
        disabled={!isReady}
        value={String(state?.getFilterValue() ?? '')}
        onChange={(event) => state?.setFilterValue(event.target.value || undefined)}
      >
        <option value="">all</option>
        {Object.entries(STATES).map(([value, label]) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </SelectField>
      <SelectField
        className="max-w-64 min-w-36 max-sm:flex-1"
        label="Product"
        disabled={!isReady}
        value={String(product?.getFilterValue() ?? '')}
        onChange={(event) => product?.setFilterValue(event.target.value || undefined)}
      >
        <option value="">all</option>
        {names.map((name) => (
          <option key={name}>{name}</option>
        ))}
      </SelectField>
      <details className="relative mt-5.5">
        <summary className="inline-flex min-h-10 cursor-pointer items-center rounded-md border border-edge bg-surface px-3.5 font-medium">
          Columns
        </summary>
        <ul className="absolute z-20 mt-1 w-52 rounded-md border border-rule bg-surface p-3 shadow-float">
          {table
            .getAllLeafColumns()
            .filter((column) => column.getCanHide())
            .map((column) => (
              <li key={column.id}>
                <label className="flex min-h-9 items-center gap-2.5">
                  <input
                    type="checkbox"
                    className="size-4.5 accent-room"
                    checked={column.getIsVisible()}
                    onChange={(event) => column.toggleVisibility(event.target.checked)}
                  />
                  {COLUMN_NAMES[column.id]}
                </label>
              </li>
            ))}
        </ul>
      </details>
      {onNew ? (
        <Button look="main" className="mt-5.5 min-h-10 sm:ml-auto" disabled={!isReady} onClick={onNew}>
          New order
        </Button>
      ) : null}
    </div>
  );
}
