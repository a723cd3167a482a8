import { inviteRequestSchema } from '@/contracts/people';
import { endpoint } from '@/server/http/endpoint';
import { invite } from '@/server/people/invitations.service';

/** Invites somebody by e-mail. */
export const POST = endpoint({
  permission: 'people.manage',
  body: inviteRequestSchema,
  status: 201,
  handle: ({ actor, body }) => invite(actor, body),
});
