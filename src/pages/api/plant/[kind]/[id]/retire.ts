import { endpoint } from '@/server/http/endpoint';
import { retireThing } from '@/server/plant/library.service';

export const POST = endpoint({
  permission: 'plant.edit',
  handle: ({ actor, params }) => retireThing(actor, params.kind, params.id ?? ''),
});
