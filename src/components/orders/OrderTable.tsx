import { useTable } from '@tanstack/react-table';
import { Fragment, useMemo, type KeyboardEvent, type ReactNode } from 'react';
import type { OrderDto } from '../../contracts/orders';
import { Button } from '../ui/Button';
import { useHydrated } from '../ui/useHydrated';
import { useUnits } from '../ui/units';
import { COLUMN_NAMES, ORDER_FEATURES, orderColumns } from './orderColumns';
import { OrderTools } from './OrderTools';

interface Props {
  readonly orders: readonly OrderDto[];
  readonly mayEdit: boolean;
  readonly editing: string | null;
  readonly form: ReactNode;
  readonly onEdit: (id: string) => void;
  readonly onNew: () => void;
  readonly onSplit: (id: string) => void;
}

const CELL = 'px-2.5 py-2.5 align-top max-md:block max-md:px-0 max-md:py-0.5';

/** Moves the focus between rows with the arrows. */
function step(event: KeyboardEvent<HTMLTableRowElement>, by: 1 | -1): void {
  event.preventDefault();
  const rows = [...(event.currentTarget.parentElement?.querySelectorAll<HTMLElement>('tr[data-order]') ?? [])];
  rows[rows.indexOf(event.currentTarget) + by]?.focus();
}

/** Order lines: sorted, filtered, searched, with the columns that somebody wants to see. */
export function OrderTable({ orders, mayEdit, editing, form, onEdit, onNew, onSplit }: Props) {
  const units = useUnits();
  const columns = useMemo(() => orderColumns(units), [units]);
  const data = useMemo(() => [...orders], [orders]);
  const table = useTable({
    features: ORDER_FEATURES,
    columns,
    data,
    getRowId: (order) => order.id,
    globalFilterFn: 'includesString',
    initialState: { sorting: [{ id: 'due', desc: false }] },
  });
  const rows = table.getRowModel().rows;
  const onKey = (event: KeyboardEvent<HTMLTableRowElement>, id: string): void => {
    if (event.key === 'ArrowDown') step(event, 1);
    if (event.key === 'ArrowUp') step(event, -1);
    if (event.target !== event.currentTarget || !mayEdit) return;
    if (event.key === 'Enter') onEdit(id);
    if (event.key === 's') onSplit(id);
  };
  const width = table.getVisibleLeafColumns().length + 1;
  return (
    <>
      <OrderTools table={table} shown={rows.length} all={orders.length} onNew={mayEdit ? onNew : null} />
      {editing === '' ? <div className="mb-4 border-y border-rule">{form}</div> : null}
      <div className="overflow-x-auto">
        <table className="w-full border-t border-rule text-sm max-md:block max-md:text-base" aria-label="Orders">
          <thead className="max-md:sr-only">
            <tr className="border-b border-rule">
              {table.getVisibleLeafColumns().map((column) => {
                const sorted = column.getIsSorted();
                return (
                  <th
                    key={column.id}
                    scope="col"
                    aria-sort={sorted === 'asc' ? 'ascending' : sorted === 'desc' ? 'descending' : 'none'}
                    className="label px-0.5 py-1 text-left font-medium"
                  >
                    <button
                      type="button"
                      className="cursor-pointer rounded-sm px-2 py-1 whitespace-nowrap hover:text-ink"
                      onClick={() => column.toggleSorting(sorted === 'asc')}
                    >
                      {COLUMN_NAMES[column.id]}
                      <span aria-hidden="true" className="ml-1 inline-block w-3">
                        {sorted === 'asc' ? '↑' : sorted === 'desc' ? '↓' : ''}
                      </span>
                    </button>
                  </th>
                );
              })}
              <th scope="col">
                <span className="sr-only">Actions</span>
              </th>
            </tr>
          </thead>
          <tbody className="max-md:block">
            {rows.map((row, index) => (
              <Fragment key={row.id}>
                <tr
                  data-order={row.id}
                  tabIndex={index === 0 ? 0 : -1}
                  onKeyDown={(event) => onKey(event, row.id)}
                  className="border-b border-rule -outline-offset-2 hover:bg-sunken max-md:block max-md:py-3"
                >
                  {row.getVisibleCells().map((cell) => (
                    <td
                      key={cell.id}
                      className={`${CELL} ${cell.column.id === 'number' ? 'font-semibold' : ''} ${cell.column.id === 'productName' ? 'min-w-48 max-md:min-w-0' : 'whitespace-nowrap'}`}
                    >
                      <span className="mr-2 text-sm text-ink-muted md:hidden">{COLUMN_NAMES[cell.column.id]}</span>
                      <table.FlexRender cell={cell} />
                    </td>
                  ))}
                  <td className="py-1.5 pl-2 text-right align-top whitespace-nowrap max-md:block max-md:text-left">
                    <RowActions order={row.original} {...{ mayEdit, onEdit, onSplit }} />
                  </td>
                </tr>
                {editing === row.id ? (
                  <tr className="border-b border-rule max-md:block">
                    <td colSpan={width} className="max-md:block">
                      {form}
                    </td>
                  </tr>
                ) : null}
              </Fragment>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}

interface ActionsProps {
  readonly order: OrderDto;
  readonly mayEdit: boolean;
  readonly onEdit: (id: string) => void;
  readonly onSplit: (id: string) => void;
}

function RowActions({ order, mayEdit, onEdit, onSplit }: ActionsProps) {
  const { id, number, state } = order;
  const isReady = useHydrated();
  return (
    <>
      {state.weekStart === null ? null : (
        <a className="link mr-3 text-sm" href={`/week/${state.weekStart}`}>
          week
        </a>
      )}
      {mayEdit ? (
        <>
          <Button
            look="quiet"
            size="small"
            disabled={!isReady}
            onClick={() => onEdit(id)}
            aria-label={`Change ${number}`}
          >
            Change
          </Button>
          <Button size="small" disabled={!isReady} onClick={() => onSplit(id)} aria-label={`Split ${number}`}>
            {state.kind === 'notPlanned' ? 'Split…' : 'Planned…'}
          </Button>
        </>
      ) : null}
    </>
  );
}
