import { parentPort } from 'node:worker_threads';
import { levelWeek } from './levelWeek';
import { openMailbox } from './mailbox';
import type { StartMessage, ThreadMessage } from './messages';

/** Thread entry: one start message in, progress out, one done message out. A fault ends the thread with its error. */
parentPort?.once('message', ({ week, options, cancel, mailbox }: StartMessage) => {
  const send = (message: ThreadMessage): void => parentPort?.postMessage(message);
  const result = levelWeek(week, options, {
    cancelled: () => Atomics.load(cancel, 0) === 1,
    onProgress: (progress) => send({ kind: 'progress', progress }),
    ...(mailbox ? { exchange: openMailbox(mailbox) } : {}),
  });
  send({ kind: 'done', result });
});
