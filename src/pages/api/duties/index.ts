import { newDutySchema } from '@/contracts/duties';
import { createDuty, listDuties } from '@/server/duties/duties.service';
import { endpoint } from '@/server/http/endpoint';

/** The plant's duties with what uses them. */
export const GET = endpoint({
  permission: 'library.read',
  handle: ({ actor }) => listDuties(actor),
});

/** A new duty. */
export const POST = endpoint({
  permission: 'library.edit',
  body: newDutySchema,
  status: 201,
  handle: ({ actor, body }) => createDuty(actor, body),
});
