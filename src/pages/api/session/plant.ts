import { plantRequestSchema } from '@/contracts/account';
import { ok } from '@/core/result';
import { meDto } from '@/server/auth/actor';
import { changePlant } from '@/server/auth/session';
import { endpoint } from '@/server/http/endpoint';

/** Works at another of one's plants from now on. */
export const POST = endpoint({
  permission: 'account.own',
  body: plantRequestSchema,
  handle: async ({ actor, body, context }) => {
    const changed = await changePlant(actor, context.locals.sessionId ?? '', body.plantId);
    return changed.ok ? ok(meDto(changed.value)) : changed;
  },
});
