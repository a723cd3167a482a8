import { readCapacity } from '@/server/capacity/capacity.service';
import { endpoint } from '@/server/http/endpoint';

/** The boiler house over a week. */
export const GET = endpoint({
  permission: 'capacity.read',
  handle: ({ actor, params }) => readCapacity(actor, params.week ?? ''),
});
