import { retireProductSchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { retireProduct } from '@/server/products/products.service';

/** Takes a product out of use. */
export const POST = endpoint({
  permission: 'library.edit',
  body: retireProductSchema,
  handle: ({ actor, params, body }) => retireProduct(actor, params.id ?? '', body.read),
});
