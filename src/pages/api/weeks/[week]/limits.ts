import { limitRequestSchema } from '@/contracts/capacity';
import { setLimit } from '@/server/capacity/capacity.service';
import { endpoint } from '@/server/http/endpoint';

/** Sets a header's steam limit for a span, or takes it back. */
export const POST = endpoint({
  permission: 'capacity.set',
  body: limitRequestSchema,
  handle: ({ actor, body, params }) => setLimit(actor, params.week ?? '', body),
});
