import { endpoint } from '@/server/http/endpoint';
import { cancelRun } from '@/server/levelling/runs.service';

/** Stops a levelling run. */
export const POST = endpoint({
  permission: 'plan.level',
  handle: ({ actor, params }) => cancelRun(actor, params.run ?? ''),
});
