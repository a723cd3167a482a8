import { endpoint } from '@/server/http/endpoint';
import { readLibrary } from '@/server/plant/library.service';

export const GET = endpoint({ permission: 'plant.read', handle: ({ actor }) => readLibrary(actor) });
