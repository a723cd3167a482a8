import { removeCleaning } from '@/server/cleanings/cleanings.service';
import { endpoint } from '@/server/http/endpoint';

/** Removes a planned clean that is not placed and on no issue. */
export const DELETE = endpoint({
  permission: 'plan.edit',
  handle: ({ actor, params }) => removeCleaning(actor, params.week ?? '', params.activity ?? ''),
});
