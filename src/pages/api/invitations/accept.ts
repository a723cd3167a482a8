import { acceptRequestSchema } from '@/contracts/people';
import { openEndpoint } from '@/server/http/endpoint';
import { sessionAnswer } from '@/server/http/sessionAnswer';
import { acceptInvitation } from '@/server/people/accept.service';

/** Joins a plant by an invitation's link, and signs in. */
export const POST = openEndpoint({
  body: acceptRequestSchema,
  handle: async ({ body, context }) => {
    const caller = { address: context.clientAddress, oldSessionId: context.locals.sessionId };
    return sessionAnswer(await acceptInvitation(body, caller));
  },
});
