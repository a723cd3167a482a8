import { changeProductSchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { changeProduct } from '@/server/products/products.service';

/** Changes a product. */
export const POST = endpoint({
  permission: 'library.edit',
  body: changeProductSchema,
  handle: ({ actor, params, body }) => changeProduct(actor, params.id ?? '', body),
});
