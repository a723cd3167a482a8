import { readShiftSheet, shiftSheetQuerySchema } from '@/server/floor/shiftSheet.service';
import { endpoint } from '@/server/http/endpoint';

/** One line's shift from the issue on the floor. */
export const GET = endpoint({
  permission: 'floor.read',
  query: shiftSheetQuerySchema,
  handle: ({ actor, params, query }) => readShiftSheet(actor, params.week ?? '', query),
});
