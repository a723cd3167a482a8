import { planOrderSchema } from '@/contracts/orders';
import { endpoint } from '@/server/http/endpoint';
import { planOrder, takeOrderBack } from '@/server/orders/planOrder.service';

/** Splits an order and adds its runs, batches and loads to a week, not yet placed. */
export const POST = endpoint({
  permission: 'plan.edit',
  body: planOrderSchema,
  status: 201,
  handle: ({ actor, params, body }) => planOrder(actor, params.id ?? '', body),
});

/** Takes an order back out of its week while nothing of it is placed. */
export const DELETE = endpoint({
  permission: 'plan.edit',
  handle: ({ actor, params }) => takeOrderBack(actor, params.id ?? ''),
});
