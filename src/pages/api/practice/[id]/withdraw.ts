import { endpoint } from '@/server/http/endpoint';
import { withdrawPractice } from '@/server/practice/practice.service';

export const POST = endpoint({
  permission: 'practice.release',
  handle: ({ actor, params }) => withdrawPractice(actor, params.id ?? ''),
});
