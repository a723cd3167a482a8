import { endpoint } from '@/server/http/endpoint';
import { signOutPerson } from '@/server/people/people.service';

/** Ends every session of a person. */
export const POST = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => signOutPerson(actor, params.id ?? ''),
});
