import { endpoint } from '@/server/http/endpoint';
import { activatePerson } from '@/server/people/people.service';

/** Lets a person work at the plant again. */
export const POST = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => activatePerson(actor, params.id ?? ''),
});
