import { editPersonRequestSchema } from '@/contracts/people';
import { endpoint } from '@/server/http/endpoint';
import { editPerson } from '@/server/people/people.service';

/** Changes a person's roles and lines. */
export const POST = endpoint({
  permission: 'people.manage',
  body: editPersonRequestSchema,
  handle: ({ actor, params, body }) => editPerson(actor, params.id ?? '', body),
});
