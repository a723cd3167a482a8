import { firingRequestSchema } from '@/contracts/capacity';
import { setFiring } from '@/server/capacity/capacity.service';
import { endpoint } from '@/server/http/endpoint';

/** Lights, shuts or derates a boiler for a span. */
export const POST = endpoint({
  permission: 'capacity.set',
  body: firingRequestSchema,
  handle: ({ actor, body, params }) => setFiring(actor, params.week ?? '', body),
});
