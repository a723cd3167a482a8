import { floorEventRequestSchema } from '@/contracts/floor';
import { recordEvent } from '@/server/floor/recordEvent.service';
import { endpoint } from '@/server/http/endpoint';

/** Records what happened on the floor. */
export const POST = endpoint({
  permission: 'floor.record',
  body: floorEventRequestSchema,
  status: 201,
  handle: ({ actor, params, body }) => recordEvent(actor, params.week ?? '', body),
});
