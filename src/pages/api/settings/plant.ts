import { plantSettingsRequestSchema } from '@/contracts/settings';
import { endpoint } from '@/server/http/endpoint';
import { savePlantSettings } from '@/server/settings/settings.service';

/** Sets what holds for the whole plant. */
export const POST = endpoint({
  permission: 'settings.plant',
  body: plantSettingsRequestSchema,
  handle: ({ actor, body }) => savePlantSettings(actor, body),
});
