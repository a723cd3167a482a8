import { ownSettingsRequestSchema } from '@/contracts/settings';
import { endpoint } from '@/server/http/endpoint';
import { saveOwnSettings } from '@/server/settings/settings.service';

/** Keeps the person's own choices. */
export const POST = endpoint({
  permission: 'settings.own',
  body: ownSettingsRequestSchema,
  handle: ({ actor, body }) => saveOwnSettings(actor, body),
});
