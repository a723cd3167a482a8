import { badgeSignInRequestSchema } from '@/contracts/people';
import { signInByBadge } from '@/server/auth/badgeSignIn';
import { readCookie, TABLET_COOKIE } from '@/server/http/cookies';
import { openEndpoint } from '@/server/http/endpoint';
import { sessionAnswer } from '@/server/http/sessionAnswer';
import { sheetOfTablet } from '@/server/people/tablets.service';

/** Signs in at an enrolled tablet by badge number and PIN. */
export const POST = openEndpoint({
  body: badgeSignInRequestSchema,
  handle: async ({ body, context }) => {
    const tabletToken = readCookie(context.request.headers.get('cookie'), TABLET_COOKIE);
    const opened = await signInByBadge({ ...body, tabletToken, oldSessionId: context.locals.sessionId });
    return sessionAnswer(opened, opened.ok ? await sheetOfTablet(opened.value) : '/tablet');
  },
});
