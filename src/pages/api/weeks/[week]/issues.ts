import { commentRequestSchema } from '@/contracts/week';
import { endpoint } from '@/server/http/endpoint';
import { issuePlan } from '@/server/issues/issues.service';

/** Puts the plan on the floor. */
export const POST = endpoint({
  permission: 'plan.issue',
  body: commentRequestSchema,
  status: 201,
  handle: ({ actor, params, body }) => issuePlan(actor, params.week ?? '', body),
});
