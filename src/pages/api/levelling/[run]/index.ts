import { endpoint } from '@/server/http/endpoint';
import { readRun } from '@/server/levelling/runs.service';

/** A levelling run as it is. */
export const GET = endpoint({
  permission: 'plan.read',
  handle: ({ actor, params }) => readRun(actor, params.run ?? ''),
});
