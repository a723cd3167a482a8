import { endpoint } from '@/server/http/endpoint';
import { listProcessData } from '@/server/processData/processData.service';

/** The plant's thermal-process data. */
export const GET = endpoint({
  permission: 'processData.read',
  handle: ({ actor }) => listProcessData(actor),
});
