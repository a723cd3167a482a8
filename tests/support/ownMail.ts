import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startLocalMail } from '../../scripts/support/localMail';

/** The start command's own mail server, with its messages in a folder of its own; `env` is for the application. */
export async function openMailbox(): Promise<{ env: Record<string, string>; close: () => Promise<void> }> {
  const folder = mkdtempSync(join(tmpdir(), 'steadmain-mail-'));
  const mail = await startLocalMail(folder);
  return {
    env: { SMTP_URL: mail.url, LOCAL_MAIL_FOLDER: folder },
    close: async () => {
      await mail.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
