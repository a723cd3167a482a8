import { endpoint } from '@/server/http/endpoint';
import { withdrawInvitation } from '@/server/people/invitations.service';

/** Takes an invitation back. */
export const POST = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => withdrawInvitation(actor, params.id ?? ''),
});
