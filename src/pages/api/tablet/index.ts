import { enrolRequestSchema } from '@/contracts/people';
import { readCookie, TABLET_COOKIE } from '@/server/http/cookies';
import { endpoint } from '@/server/http/endpoint';
import { json } from '@/server/http/problem';
import { tabletCookie } from '@/server/http/tabletCookie';
import { enrolTablet } from '@/server/people/tablets.service';

/** Makes this device one of the plant's tablets; the administrator is signed out of it. */
export const POST = endpoint({
  permission: 'tablets.manage',
  body: enrolRequestSchema,
  handle: async ({ actor, body, context }) => {
    const oldToken = readCookie(context.request.headers.get('cookie'), TABLET_COOKIE);
    const enrolled = await enrolTablet(actor, body, { sessionId: context.locals.sessionId, oldToken });
    if (!enrolled.ok) return enrolled;
    return json({ next: '/tablet' }, 201, { 'set-cookie': tabletCookie(enrolled.value.token) });
  },
});
