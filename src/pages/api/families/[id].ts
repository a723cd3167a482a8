import { familySchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { renameFamily, retireFamily } from '@/server/products/families.service';

/** Gives a family another name. */
export const POST = endpoint({
  permission: 'library.edit',
  body: familySchema,
  handle: ({ actor, params, body }) => renameFamily(actor, params.id ?? '', body),
});

/** Takes a family without products out of use. */
export const DELETE = endpoint({
  permission: 'library.edit',
  handle: ({ actor, params }) => retireFamily(actor, params.id ?? ''),
});
