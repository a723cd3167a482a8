import { editRequestSchema } from '@/contracts/week';
import { endpoint } from '@/server/http/endpoint';
import { saveEdit } from '@/server/plans/edits.service';

/** Saves an edit of the week's plan. */
export const POST = endpoint({
  permission: 'plan.edit',
  body: editRequestSchema,
  handle: ({ actor, params, body }) => saveEdit(actor, params.week ?? '', body),
});
