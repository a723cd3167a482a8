import { NOTICE_CHANNEL, SESSION_CHANNEL, type PlantNoticeMessage } from './notify';
import { startListener, type Listener } from './listener';
import { liveSessions } from './liveSessions';

/** One open event stream. */
export interface Subscriber {
  readonly plantId: string;
  readonly sessionHash: string;
  /** Hands on a notice, as JSON. */
  readonly send: (notice: string) => void;
  /** A sign of life. */
  readonly beat: () => void;
  readonly close: () => void;
}

const HEARTBEAT_MS = 20_000;
const LONGEST_WAIT_FOR_LISTENER_MS = 3_000;

const subscribers = new Set<Subscriber>();
let listener: Listener | null = null;
let listening: Promise<void> | null = null;
let heartbeat: NodeJS.Timeout | undefined;

function closeWhere(matches: (subscriber: Subscriber) => boolean): void {
  for (const subscriber of [...subscribers]) if (matches(subscriber)) subscriber.close();
}

function onMessage(channel: string, payload: string): void {
  if (channel === SESSION_CHANNEL) return closeWhere(({ sessionHash }) => sessionHash === payload);
  const { plantId, notice } = JSON.parse(payload) as PlantNoticeMessage;
  const text = JSON.stringify(notice);
  for (const subscriber of subscribers) if (subscriber.plantId === plantId) subscriber.send(text);
}

async function beat(): Promise<void> {
  for (const subscriber of subscribers) subscriber.beat();
  if (subscribers.size === 0) return;
  const live = await liveSessions([...subscribers]);
  closeWhere((subscriber) => !live.has(subscriber));
}

function open(): Promise<void> {
  heartbeat = setInterval(() => {
    beat().catch((error: unknown) => console.error('event streams could not be checked:', error));
  }, HEARTBEAT_MS);
  heartbeat.unref();
  return new Promise((resolve) => {
    let before = false;
    listener = startListener({
      channels: [NOTICE_CHANNEL, SESSION_CHANNEL],
      onMessage,
      onListening: () => {
        // Notices were missed: browsers connect again and read everything anew.
        if (before) closeWhere(() => true);
        before = true;
        resolve();
      },
    });
  });
}

/** Waits until notices are heard, but not for ever: without a database the stream opens and ends when it is back. */
export async function untilListening(): Promise<void> {
  listening ??= open();
  let timer: NodeJS.Timeout | undefined;
  const enough = new Promise<void>((resolve) => (timer = setTimeout(resolve, LONGEST_WAIT_FOR_LISTENER_MS)));
  await Promise.race([listening, enough]);
  clearTimeout(timer);
}

/** Adds a stream; gives what takes it away again. One connection to the database serves all streams of the process. */
export function subscribe(subscriber: Subscriber): () => void {
  subscribers.add(subscriber);
  return () => subscribers.delete(subscriber);
}

/** Ends all streams and the connection. */
export async function stopEvents(): Promise<void> {
  closeWhere(() => true);
  clearInterval(heartbeat);
  const stopping = listener;
  listener = null;
  listening = null;
  await stopping?.stop();
}
