import { endpoint } from '@/server/http/endpoint';
import { discardRun } from '@/server/levelling/runs.service';

/** Puts a proposal away. */
export const POST = endpoint({
  permission: 'plan.level',
  handle: ({ actor, params }) => discardRun(actor, params.run ?? ''),
});
