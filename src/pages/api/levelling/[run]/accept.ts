import { acceptRequestSchema } from '@/contracts/levelling';
import { endpoint } from '@/server/http/endpoint';
import { acceptRun } from '@/server/levelling/accept.service';

/** Takes a proposal, whole or in part. */
export const POST = endpoint({
  permission: 'plan.level',
  body: acceptRequestSchema,
  handle: ({ actor, params, body }) => acceptRun(actor, params.run ?? '', body),
});
