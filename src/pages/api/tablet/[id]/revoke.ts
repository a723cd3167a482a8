import { endpoint } from '@/server/http/endpoint';
import { revokeTablet } from '@/server/people/tablets.service';

/** Lets a tablet sign nobody in any more. */
export const POST = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => revokeTablet(actor, params.id ?? ''),
});
