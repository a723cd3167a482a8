import { commentRequestSchema } from '@/contracts/week';
import { endpoint } from '@/server/http/endpoint';
import { agree } from '@/server/issues/issues.service';

/** A utilities lead agrees to steam over the limit in the plan's present revision. */
export const POST = endpoint({
  permission: 'steam.agree',
  body: commentRequestSchema,
  status: 201,
  handle: ({ actor, params, body }) => agree(actor, params.week ?? '', body),
});
