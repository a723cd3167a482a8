import { badgeRequestSchema } from '@/contracts/people';
import { endpoint } from '@/server/http/endpoint';
import { giveBadge, takeBadge } from '@/server/people/badges.service';

/** Gives a badge number and a PIN for the tablets on the floor. */
export const POST = endpoint({
  permission: 'people.manage',
  body: badgeRequestSchema,
  handle: ({ actor, params, body }) => giveBadge(actor, params.id ?? '', body),
});

/** Takes the badge away. */
export const DELETE = endpoint({
  permission: 'people.manage',
  handle: ({ actor, params }) => takeBadge(actor, params.id ?? ''),
});
