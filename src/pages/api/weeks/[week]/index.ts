import { endpoint } from '@/server/http/endpoint';
import { loadWeek } from '@/server/weeks/loadWeek';

/** The week with all that the board needs. */
export const GET = endpoint({
  permission: 'plan.read',
  handle: ({ actor, params }) => loadWeek(actor, params.week ?? ''),
});
