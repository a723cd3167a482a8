import { ownPinRequestSchema } from '@/contracts/people';
import { endpoint } from '@/server/http/endpoint';
import { changeOwnPin } from '@/server/people/ownAccount.service';

/** Sets another PIN for one's own badge. */
export const POST = endpoint({
  permission: 'account.own',
  body: ownPinRequestSchema,
  handle: ({ actor, body }) => changeOwnPin(actor, body),
});
