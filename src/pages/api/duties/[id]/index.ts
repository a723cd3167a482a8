import { changeDutySchema } from '@/contracts/duties';
import { changeDuty } from '@/server/duties/duties.service';
import { endpoint } from '@/server/http/endpoint';

/** Changes a duty. */
export const POST = endpoint({
  permission: 'library.edit',
  body: changeDutySchema,
  handle: ({ actor, params, body }) => changeDuty(actor, params.id ?? '', body),
});
