import { levellingRequestSchema } from '@/contracts/levelling';
import { endpoint } from '@/server/http/endpoint';
import { startLevelling } from '@/server/levelling/start.service';

/** Asks for a levelling of the week's plan. */
export const POST = endpoint({
  permission: 'plan.level',
  body: levellingRequestSchema,
  status: 202,
  handle: ({ actor, params, body }) => startLevelling(actor, params.week ?? '', body),
});
