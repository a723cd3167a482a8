import { endpoint } from '@/server/http/endpoint';
import { listPeople } from '@/server/people/people.service';

/** The plant's people, invitations and tablets. */
export const GET = endpoint({ permission: 'people.manage', handle: ({ actor }) => listPeople(actor) });
