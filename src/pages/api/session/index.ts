import { signInRequestSchema } from '@/contracts/account';
import { meDto } from '@/server/auth/actor';
import { lucia } from '@/server/auth/lucia';
import { endSession } from '@/server/auth/session';
import { signIn } from '@/server/auth/signIn';
import { openEndpoint } from '@/server/http/endpoint';
import { json } from '@/server/http/problem';

/** Signs in. */
export const POST = openEndpoint({
  body: signInRequestSchema,
  handle: async ({ body, context }) => {
    const oldSessionId = context.locals.sessionId;
    const result = await signIn({ ...body, address: context.clientAddress, oldSessionId });
    if (!result.ok) return result;
    const cookie = lucia.createSessionCookie(result.value.session.id).serialize();
    return json(meDto(result.value.actor), 200, { 'set-cookie': cookie });
  },
});

/** Signs out; without a session there is nothing to do. */
export const DELETE = openEndpoint({
  handle: async ({ context }) => {
    if (context.locals.sessionId) await endSession(context.locals.sessionId);
    const cookie = lucia.createBlankSessionCookie().serialize();
    return new Response(null, { status: 204, headers: { 'set-cookie': cookie, 'cache-control': 'no-store' } });
  },
});
