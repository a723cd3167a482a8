import { familySchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { createFamily } from '@/server/products/families.service';

/** A new family. */
export const POST = endpoint({
  permission: 'library.edit',
  body: familySchema,
  status: 201,
  handle: ({ actor, body }) => createFamily(actor, body),
});
