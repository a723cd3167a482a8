import { resetRequestSchema } from '@/contracts/people';
import { openEndpoint } from '@/server/http/endpoint';
import { askReset } from '@/server/people/reset.service';

/** Sends a link to set a new password, if the address has an account: the answer is the same. */
export const POST = openEndpoint({
  body: resetRequestSchema,
  handle: ({ body, context }) => askReset(body.email, context.clientAddress),
});
