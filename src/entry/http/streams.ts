import type { ServerResponse } from 'node:http';

const isEventStream = (res: ServerResponse): boolean =>
  String(res.getHeader('content-type') ?? '').startsWith('text/event-stream');

/** Whether to compress an answer: never an event stream, whose events would wait in the compressor. */
export const mayCompress = (res: ServerResponse): boolean => !isEventStream(res);

/** Knows the answers under way, so that those that never end by themselves can be ended when the process stops. */
export class OpenAnswers {
  readonly #open = new Set<ServerResponse>();

  add(res: ServerResponse): void {
    this.#open.add(res);
    res.once('close', () => this.#open.delete(res));
  }

  /** Ends every event stream; the browser connects again, to whoever serves then. */
  endStreams(): void {
    for (const res of this.#open) if (isEventStream(res)) res.destroy();
  }
}
