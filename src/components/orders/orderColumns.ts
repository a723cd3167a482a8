import {
  columnFilteringFeature,
  columnVisibilityFeature,
  createColumnHelper,
  createFilteredRowModel,
  createSortedRowModel,
  filterFn_equalsString,
  filterFn_includesString,
  globalFilteringFeature,
  rowSortingFeature,
  sortFn_alphanumeric,
  sortFn_basic,
  tableFeatures,
} from '@tanstack/react-table';
import type { OrderDto } from '../../contracts/orders';
import type { Units } from '../units';
import { quantityText, stateText, wallText } from './words';

export const ORDER_FEATURES = tableFeatures({
  columnFilteringFeature,
  globalFilteringFeature,
  rowSortingFeature,
  columnVisibilityFeature,
  filteredRowModel: createFilteredRowModel(),
  sortedRowModel: createSortedRowModel(),
  filterFns: { includesString: filterFn_includesString, equalsString: filterFn_equalsString },
  sortFns: { alphanumeric: sortFn_alphanumeric, basic: sortFn_basic },
});

const helper = createColumnHelper<typeof ORDER_FEATURES, OrderDto>();

/** Names of the columns, in order; the number is always shown. */
export const COLUMN_NAMES: Readonly<Record<string, string>> = {
  number: 'Order',
  productName: 'Product',
  quantity: 'Quantity',
  earliest: 'Earliest start',
  latestStart: 'Latest start',
  due: 'Due',
  priority: 'Priority',
  state: 'State',
};

/** Columns of the table; search and filters read what they show. */
export const orderColumns = (units: Units) =>
  helper.columns([
    helper.accessor('number', { sortFn: 'alphanumeric', enableHiding: false }),
    helper.accessor('productName', { sortFn: 'alphanumeric', filterFn: 'equalsString' }),
    helper.accessor((order) => order.quantityKg, {
      id: 'quantity',
      sortFn: 'basic',
      enableGlobalFilter: false,
      cell: ({ row }) => quantityText(row.original, units),
    }),
    helper.accessor((order) => order.earliest ?? '', {
      id: 'earliest',
      sortFn: 'basic',
      cell: ({ row }) => wallText(row.original.earliest),
    }),
    helper.accessor((order) => order.latestStart ?? '', {
      id: 'latestStart',
      sortFn: 'basic',
      cell: ({ row }) => wallText(row.original.latestStart),
    }),
    helper.accessor('due', { sortFn: 'basic', cell: ({ row }) => wallText(row.original.due) }),
    helper.accessor('priority', { sortFn: 'basic', enableGlobalFilter: false }),
    helper.accessor((order) => order.state.kind, {
      id: 'state',
      sortFn: 'basic',
      filterFn: 'equalsString',
      cell: ({ row }) => stateText(row.original.state),
    }),
  ]);
