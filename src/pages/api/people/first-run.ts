import { firstRunRequestSchema } from '@/contracts/people';
import { openEndpoint } from '@/server/http/endpoint';
import { sessionAnswer } from '@/server/http/sessionAnswer';
import { firstRun } from '@/server/people/firstRun.service';

/** Makes the first plant and its administrator, by the code that the start command prints. */
export const POST = openEndpoint({
  body: firstRunRequestSchema,
  handle: async ({ body, context }) => {
    const caller = { address: context.clientAddress, oldSessionId: context.locals.sessionId };
    return sessionAnswer(await firstRun(body, caller));
  },
});
