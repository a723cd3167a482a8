import { createThingSchema } from '@/contracts/plantLibrary';
import { endpoint } from '@/server/http/endpoint';
import { createThing } from '@/server/plant/library.service';

export const POST = endpoint({
  permission: 'plant.edit',
  body: createThingSchema,
  status: 201,
  handle: ({ actor, params, body }) => createThing(actor, params.kind, body.values),
});
