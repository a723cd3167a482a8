import type { Authorized } from '../auth/permissions';
import { subscribe, untilListening } from './hub';

/** Events that a reader may leave unread before its stream is ended; it then connects again and reads anew. */
const LONGEST_QUEUE = 200;

const HEADERS = {
  'content-type': 'text/event-stream; charset=utf-8',
  'cache-control': 'no-store, no-transform',
  'x-accel-buffering': 'no',
};

/** The plant's notices as server-sent events, until the reader leaves or the session ends. */
export async function eventStream(
  actor: Authorized<'plant.follow'>,
  sessionHash: string,
  signal: AbortSignal,
): Promise<Response> {
  await untilListening();
  const encoder = new TextEncoder();
  let leave = (): void => undefined;
  const body = new ReadableStream<Uint8Array>(
    {
      start(controller) {
        let closed = false;
        const close = (): void => {
          leave();
          if (!closed) controller.close();
          closed = true;
        };
        const write = (text: string): void => {
          controller.enqueue(encoder.encode(text));
          if ((controller.desiredSize ?? 0) <= 0) close();
        };
        const unsubscribe = subscribe({
          plantId: actor.plantId,
          sessionHash,
          send: (notice) => write(`data: ${notice}\n\n`),
          beat: () => write(': still here\n\n'),
          close,
        });
        leave = () => {
          unsubscribe();
          signal.removeEventListener('abort', close);
        };
        signal.addEventListener('abort', close);
        if (signal.aborted) return close();
        write('retry: 2000\n: following\n\n');
      },
      cancel: () => leave(),
    },
    { highWaterMark: LONGEST_QUEUE },
  );
  return new Response(body, { headers: HEADERS });
}
