import { routeSchema } from '@/contracts/products';
import { endpoint } from '@/server/http/endpoint';
import { saveRoute } from '@/server/products/route.service';

/** Writes a product's route. */
export const POST = endpoint({
  permission: 'library.edit',
  body: routeSchema,
  handle: ({ actor, params, body }) => saveRoute(actor, params.id ?? '', body),
});
