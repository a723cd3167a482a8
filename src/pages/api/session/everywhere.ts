import { lucia } from '@/server/auth/lucia';
import { endpoint } from '@/server/http/endpoint';
import { signOutEverywhere } from '@/server/people/ownAccount.service';

/** Ends every session of one's own, on whatever device. */
export const DELETE = endpoint({
  permission: 'account.own',
  handle: async ({ actor }) => {
    const ended = await signOutEverywhere(actor);
    if (!ended.ok) return ended;
    const cookie = lucia.createBlankSessionCookie().serialize();
    return new Response(null, { status: 204, headers: { 'set-cookie': cookie, 'cache-control': 'no-store' } });
  },
});
