import { noticesRequestSchema } from '@/contracts/people';
import { endpoint } from '@/server/http/endpoint';
import { setNotices } from '@/server/people/ownAccount.service';

/** Says what one wants to be told of by e-mail. */
export const POST = endpoint({
  permission: 'account.own',
  body: noticesRequestSchema,
  handle: ({ actor, body }) => setNotices(actor, body),
});
