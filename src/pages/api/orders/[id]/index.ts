import { changeOrderSchema } from '@/contracts/orders';
import { endpoint } from '@/server/http/endpoint';
import { changeOrder, deleteOrder } from '@/server/orders/orders.service';

/** Changes an order. */
export const POST = endpoint({
  permission: 'plan.edit',
  body: changeOrderSchema,
  handle: ({ actor, params, body }) => changeOrder(actor, params.id ?? '', body),
});

/** Deletes an order of which nothing is planned. */
export const DELETE = endpoint({
  permission: 'plan.edit',
  handle: ({ actor, params }) => deleteOrder(actor, params.id ?? ''),
});
