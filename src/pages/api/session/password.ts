import { changePasswordRequestSchema } from '@/contracts/people';
import { endpoint } from '@/server/http/endpoint';
import { changePassword } from '@/server/people/ownAccount.service';

/** Sets another password of one's own. */
export const POST = endpoint({
  permission: 'account.own',
  body: changePasswordRequestSchema,
  handle: ({ actor, body, context }) => changePassword(actor, context.locals.sessionId ?? '', body),
});
