import { endpoint } from '@/server/http/endpoint';
import { listSpreads } from '@/server/spread/spread.service';

/** How early or late starts are, by unit, with what the floor has recorded. */
export const GET = endpoint({ permission: 'plant.read', handle: ({ actor }) => listSpreads(actor) });
