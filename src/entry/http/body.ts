import type { IncomingMessage } from 'node:http';

/** The most that a request may carry, in bytes as received. */
export const BODY_LIMIT_BYTES = 1024 * 1024;

/** Whether the request announces or may stream a body. */
export function mayHaveBody(req: IncomingMessage): boolean {
  return req.headers['transfer-encoding'] !== undefined || Number(req.headers['content-length'] ?? 0) > 0;
}

/**
 * Reads a request's body whole, counting what arrives: a chunked body announces no length.
 * @returns undefined as soon as it is known to pass the limit; what follows of it is then left unread.
 */
export async function readBody(req: IncomingMessage, limit = BODY_LIMIT_BYTES): Promise<Buffer | undefined> {
  if (Number(req.headers['content-length'] ?? 0) > limit) return undefined;
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of req.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size > limit) return undefined;
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}
