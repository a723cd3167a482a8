import { spreadRequestSchema } from '@/contracts/spread';
import { endpoint } from '@/server/http/endpoint';
import { setSpread } from '@/server/spread/spread.service';

/** Sets how early or late starts on a unit are. */
export const POST = endpoint({
  permission: 'library.edit',
  body: spreadRequestSchema,
  handle: ({ actor, body, params }) => setSpread(actor, params.unit ?? '', body),
});
