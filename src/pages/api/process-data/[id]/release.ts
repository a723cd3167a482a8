import { endpoint } from '@/server/http/endpoint';
import { releaseProcessData } from '@/server/processData/processData.service';

/** Releases process data for planning. */
export const POST = endpoint({
  permission: 'processData.release',
  handle: ({ actor, params }) => releaseProcessData(actor, params.id ?? ''),
});
