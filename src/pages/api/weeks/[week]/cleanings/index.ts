import { cleaningPlanSchema } from '@/contracts/cleanings';
import { addCleaning } from '@/server/cleanings/cleanings.service';
import { endpoint } from '@/server/http/endpoint';

/** Adds a clean of a unit to the week, not yet placed. */
export const POST = endpoint({
  permission: 'plan.edit',
  body: cleaningPlanSchema,
  status: 201,
  handle: ({ actor, params, body }) => addCleaning(actor, params.week ?? '', body),
});
