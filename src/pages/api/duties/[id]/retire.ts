import { retireSchema } from '@/contracts/duties';
import { retireDuty } from '@/server/duties/duties.service';
import { endpoint } from '@/server/http/endpoint';

/** Takes a duty out of use. */
export const POST = endpoint({
  permission: 'library.edit',
  body: retireSchema,
  handle: ({ actor, params, body }) => retireDuty(actor, params.id ?? '', body.revision),
});
