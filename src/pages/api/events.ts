import { hashSessionId } from '@/server/auth/hashedSessions';
import { eventStream } from '@/server/events/stream';
import { endpoint } from '@/server/http/endpoint';

/** Follows the session's plant: notices of what changed. */
export const GET = endpoint({
  permission: 'plant.follow',
  handle: ({ actor, context }) =>
    eventStream(actor, hashSessionId(context.locals.sessionId ?? ''), context.request.signal),
});
