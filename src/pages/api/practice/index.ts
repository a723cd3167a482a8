import { enterPracticeSchema } from '@/contracts/practice';
import { endpoint } from '@/server/http/endpoint';
import { enterPractice, listPractice } from '@/server/practice/practice.service';

export const GET = endpoint({ permission: 'practice.read', handle: ({ actor }) => listPractice(actor) });

export const POST = endpoint({
  permission: 'practice.enter',
  body: enterPracticeSchema,
  status: 201,
  handle: ({ actor, body }) => enterPractice(actor, body),
});
