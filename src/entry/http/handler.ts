import type { IncomingMessage, RequestListener, ServerResponse } from 'node:http';
import compression from 'compression';
import sirv from 'sirv';
import { answerHealth, answerProblem, refuseBody } from './answers';
import { BODY_LIMIT_BYTES, mayHaveBody, readBody } from './body';
import { keepTrusted } from './forwarded';
import { type OpenAnswers, mayCompress } from './streams';

type Next = (error?: unknown) => void;

/**
 * The pages' handler, as the Astro adapter builds it in middleware mode. It would call a third argument instead of
 * showing the application's own page for an unknown address, so it gets none.
 */
export type PagesHandler = (req: IncomingMessage, res: ServerResponse) => Promise<void> | void;

export interface HandlerOptions {
  readonly pages: PagesHandler;
  /** The folder of the client's files. */
  readonly clientDir: string;
  readonly answers: OpenAnswers;
  readonly behindProxy: boolean;
}

const HASHED = /^\/_astro\//;
const FOR_EVER = 'public, max-age=31536000, immutable';

/** The whole of the web process: health, client files, body limit, then the pages. */
export function createHandler({ pages, clientDir, answers, behindProxy }: HandlerOptions): RequestListener {
  const compress = compression({
    filter: (req, res) => mayCompress(res) && compression.filter(req, res),
  }) as unknown as (req: IncomingMessage, res: ServerResponse, next: Next) => void;
  const files = sirv(clientDir, {
    etag: true,
    setHeaders: (res, path) => res.setHeader('cache-control', HASHED.test(path) ? FOR_EVER : 'no-cache'),
  });
  return (req, res) => {
    answers.add(res);
    res.setHeader('x-content-type-options', 'nosniff');
    if (req.url === '/healthz') return answerHealth(res);
    keepTrusted(req.headers, behindProxy);
    compress(req, res, () => files(req, res, () => void renderPage(pages, req, res)));
  };
}

async function renderPage(pages: PagesHandler, req: IncomingMessage, res: ServerResponse): Promise<void> {
  try {
    if (mayHaveBody(req)) {
      const body = await readBody(req);
      if (!body) return refuseBody(req, res, BODY_LIMIT_BYTES);
      // The adapter takes a body that was read already from here.
      Object.assign(req, { body: singleChunk(body) });
    }
    await pages(req, res);
  } catch (error) {
    failed(res, error);
  }
}

async function* singleChunk(body: Buffer): AsyncGenerator<Buffer> {
  yield body;
}

function failed(res: ServerResponse, error: unknown): void {
  if (res.destroyed) return;
  console.error(error);
  if (res.headersSent) res.destroy();
  else answerProblem(res, 500, 'server-error', 'The server could not answer. Try again; if it stays, tell its keeper.');
}
