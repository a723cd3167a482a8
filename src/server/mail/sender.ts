import { setTimeout as sleep } from 'node:timers/promises';
import { deliver, type Delivery, type Outgoing } from './deliver';
import { claimMail, markRefused, markSent, putBack, type MailRow } from './mails.repo';
import { mailServer, type MailServer } from './mailServer';

const POLL_MS = 1_000;
const AFTER_FAULT_MS = 10_000;
const STOP_MS = 6_000;
/** Waits before the second try and on; the last holds for all that follow. [s] */
const WAITS = [10, 30, 120, 300, 900, 1_800, 3_600] as const;
/** Names kept for examples and tests (RFC 2606): nobody is there. */
const NOBODYS = /\.(example|invalid|test|localhost)$|@(example\.(com|net|org)|localhost)$/i;

export type Deliver = (server: MailServer, mail: Outgoing) => Promise<Delivery>;

const waitAfter = (tries: number): number => WAITS[Math.min(tries, WAITS.length) - 1] ?? WAITS[0];

async function tryOnce(server: MailServer, row: MailRow, send: Deliver): Promise<void> {
  if (!server.isLoopback && NOBODYS.test(row.to)) return markRefused(row, 'The address leads nowhere.');
  const { to, subject, messageId, createdAt: date } = row;
  const result = await send(server, { to, subject, messageId, date, text: row.text ?? '', html: row.html ?? '' });
  if (result.kind === 'sent') return markSent(row);
  console.error(`mail ${row.id} (try ${row.tries}): ${result.error}`);
  return result.kind === 'refused' ? markRefused(row, result.error) : putBack(row, result.error, waitAfter(row.tries));
}

/** Tries every message that is due, one after the other, until none is left or `stop`; gives how many were tried. */
export async function sendDue(server: MailServer, send: Deliver = deliver, stop?: AbortSignal): Promise<number> {
  for (let tried = 0; ; tried++) {
    const row = stop?.aborted ? null : await claimMail();
    if (!row) return tried;
    await tryOnce(server, row, send);
  }
}

/** What runs until it is stopped. */
export interface MailSender {
  /** Takes no further message and waits for the one under way. */
  stop(): Promise<void>;
}

const NONE: MailSender = { stop: async () => undefined };

/** What is named can't be a mail server: said, and the rest of the process goes on. */
function namedServer(): MailServer | null {
  try {
    const server = mailServer();
    if (!server) console.log('No mail server is named (SMTP_URL): messages wait in the queue.');
    return server;
  } catch (error) {
    console.error('Messages wait in the queue:', error instanceof Error ? error.message : error);
    return null;
  }
}

/**
 * Sends what is in the queue, here and in any number of other processes. The queue is the messages' own table, not a
 * second list of jobs: a message can't be in one and missing in the other, and what people are shown of it is what the
 * worker goes by.
 */
export function startMailSender(server: MailServer | null = namedServer()): MailSender {
  if (!server) return NONE;
  const stopping = new AbortController();
  const { signal } = stopping;
  const pause = (ms: number) => sleep(ms, undefined, { signal }).catch(() => undefined);
  const loop = async (): Promise<void> => {
    while (!signal.aborted) {
      try {
        await sendDue(server, deliver, signal);
        await pause(POLL_MS);
      } catch (error) {
        console.error('mail queue:', error);
        await pause(AFTER_FAULT_MS);
      }
    }
  };
  const done = loop();
  return {
    stop: async () => {
      stopping.abort();
      // What takes longer is left to its lease: another process sends it again.
      await Promise.race([done, sleep(STOP_MS)]);
    },
  };
}
