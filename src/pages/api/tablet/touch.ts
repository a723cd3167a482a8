import { ok } from '@/core/result';
import { endpoint } from '@/server/http/endpoint';

/** Says that somebody's hand is on the tablet: the session by badge stays open. Reading the session has noted it. */
export const POST = endpoint({ permission: 'floor.read', handle: async () => ok(undefined) });
