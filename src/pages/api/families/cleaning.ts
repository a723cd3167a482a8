import { cleaningRequestSchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { setCleaning } from '@/server/products/families.service';

/** What is cleaned on a kind of unit between two families. */
export const POST = endpoint({
  permission: 'library.edit',
  body: cleaningRequestSchema,
  handle: ({ actor, body }) => setCleaning(actor, body),
});
