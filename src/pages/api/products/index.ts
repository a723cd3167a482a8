import { newProductSchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { createProduct, listProducts } from '@/server/products/products.service';

/** Products with their routes, families and cleaning. */
export const GET = endpoint({
  permission: 'library.read',
  handle: ({ actor }) => listProducts(actor),
});

/** A new product. */
export const POST = endpoint({
  permission: 'library.edit',
  body: newProductSchema,
  status: 201,
  handle: ({ actor, body }) => createProduct(actor, body),
});
