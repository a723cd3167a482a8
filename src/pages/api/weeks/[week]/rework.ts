import { reworkRequestSchema } from '@/contracts/rework';
import { endpoint } from '@/server/http/endpoint';
import { listOutOfDate, rework } from '@/server/products/rework.service';

/** Runs whose duty or route has changed since they were planned. */
export const GET = endpoint({
  permission: 'plan.read',
  handle: ({ actor, params }) => listOutOfDate(actor, params.week ?? ''),
});

/** Works runs out anew from the library. */
export const POST = endpoint({
  permission: 'plan.edit',
  body: reworkRequestSchema,
  handle: ({ actor, params, body }) => rework(actor, params.week ?? '', body),
});
