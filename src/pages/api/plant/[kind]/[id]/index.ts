import { editThingSchema } from '@/contracts/plantLibrary';
import { endpoint } from '@/server/http/endpoint';
import { editThing } from '@/server/plant/library.service';

export const POST = endpoint({
  permission: 'plant.edit',
  body: editThingSchema,
  handle: ({ actor, params, body }) => editThing(actor, params.kind, params.id ?? '', body.values, body.was),
});
