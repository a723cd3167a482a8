import { endpoint } from '@/server/http/endpoint';
import { resendInvitation } from '@/server/people/invitations.service';

/** Sends an invitation again, with a new link. */
export const POST = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => resendInvitation(actor, params.id ?? ''),
});
