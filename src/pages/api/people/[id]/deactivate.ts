import { endpoint } from '@/server/http/endpoint';
import { deactivatePerson } from '@/server/people/people.service';

/** Lets a person work at the plant no longer; sessions end at once. */
export const POST = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => deactivatePerson(actor, params.id ?? ''),
});
