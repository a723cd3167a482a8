import { orderThingsSchema } from '@/contracts/plantLibrary';
import { endpoint } from '@/server/http/endpoint';
import { orderThings } from '@/server/plant/library.service';

export const POST = endpoint({
  permission: 'plant.edit',
  body: orderThingsSchema,
  handle: ({ actor, params, body }) => orderThings(actor, params.kind, body.ids),
});
