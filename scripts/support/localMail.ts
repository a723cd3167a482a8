import { randomUUID } from 'node:crypto';
import { mkdirSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { SMTPServer } from 'smtp-server';

const LARGEST_BYTES = 1_000_000;
const KEPT = 300;

/** A mail server on loopback that keeps what it is given and passes nothing on. */
export interface LocalMail {
  /** smtp://127.0.0.1:port */
  readonly url: string;
  stop(): Promise<void>;
}

/** Written under another name first: who lists the folder never reads half a message. */
function keep(folder: string, message: Buffer): void {
  const name = `${String(Date.now()).padStart(15, '0')}-${randomUUID()}`;
  writeFileSync(join(folder, `${name}.part`), message, { mode: 0o600 });
  renameSync(join(folder, `${name}.part`), join(folder, `${name}.eml`));
  const old = readdirSync(folder).sort().slice(0, -KEPT);
  for (const file of old) rmSync(join(folder, file), { force: true });
}

/** Starts it on a port of the kernel's choosing; each message becomes a file in the folder, the newest 300 stay. */
export async function startLocalMail(folder: string): Promise<LocalMail> {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    closeTimeout: 500,
    size: LARGEST_BYTES,
    onData(stream, _session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => {
        if (!stream.sizeExceeded) chunks.push(chunk);
      });
      stream.on('end', () => {
        if (stream.sizeExceeded)
          return done(Object.assign(new Error('The message is too large'), { responseCode: 552 }));
        keep(folder, Buffer.concat(chunks));
        done(null);
      });
    },
  });
  server.on('error', (error: Error) => console.error('local mail:', error.message));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    stop: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}

/**
 * A mail server of one's own where the environment names none. Gives what the application's processes must be told:
 * where to send, and where an administrator may read what was sent.
 */
export async function ownMail(folder: string): Promise<{ env: Record<string, string>; mail: LocalMail } | null> {
  if (process.env['SMTP_URL'] || process.env['SMTP_HOST']) return null;
  const mail = await startLocalMail(folder);
  return { mail, env: { SMTP_URL: mail.url, LOCAL_MAIL_FOLDER: folder } };
}
