import { orderSchema } from '@/contracts/orders';
import { endpoint } from '@/server/http/endpoint';
import { createOrder, listOrders } from '@/server/orders/orders.service';

/** Orders, how far each has got, and the products that orders can name. */
export const GET = endpoint({
  permission: 'plan.read',
  handle: ({ actor }) => listOrders(actor),
});

/** A new order. */
export const POST = endpoint({
  permission: 'plan.edit',
  body: orderSchema,
  status: 201,
  handle: ({ actor, body }) => createOrder(actor, body),
});
