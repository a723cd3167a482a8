import { setPasswordRequestSchema } from '@/contracts/people';
import { openEndpoint } from '@/server/http/endpoint';
import { sessionAnswer } from '@/server/http/sessionAnswer';
import { setPasswordByLink } from '@/server/people/reset.service';

/** Sets a new password by a link, and signs in. */
export const POST = openEndpoint({
  body: setPasswordRequestSchema,
  handle: async ({ body, context }) => {
    const caller = { address: context.clientAddress, oldSessionId: context.locals.sessionId };
    return sessionAnswer(await setPasswordByLink(body, caller));
  },
});
