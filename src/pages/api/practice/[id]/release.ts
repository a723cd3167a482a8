import { endpoint } from '@/server/http/endpoint';
import { releasePractice } from '@/server/practice/practice.service';

export const POST = endpoint({
  permission: 'practice.release',
  handle: ({ actor, params }) => releasePractice(actor, params.id ?? ''),
});
