import type { IncomingMessage, ServerResponse } from 'node:http';

/** How long a refused request's remaining bytes are let in and dropped, so that the client gets to read the refusal. */
const DRAIN_MS = 2_000;

/** Answers with a problem in the shape of every other problem of the application. */
export function answerProblem(res: ServerResponse, status: number, code: string, message: string): void {
  res.writeHead(status, { 'content-type': 'application/problem+json', 'cache-control': 'no-store' });
  res.end(JSON.stringify({ status, code, message }));
}

/** Refuses a request because of the size of its body, then closes the connection. */
export function refuseBody(req: IncomingMessage, res: ServerResponse, limitBytes: number): void {
  res.setHeader('connection', 'close');
  const limit = `${Math.round(limitBytes / 1024)} KiB`;
  answerProblem(res, 413, 'body-too-large', `The request carries more than ${limit}. Send less at once.`);
  req.resume();
  const cut = setTimeout(() => req.destroy(), DRAIN_MS);
  req.once('close', () => clearTimeout(cut));
}

/** Answers the question whether this process serves. It asks neither the database nor the pages. */
export function answerHealth(res: ServerResponse): void {
  res.writeHead(200, { 'content-type': 'application/json', 'cache-control': 'no-store' });
  res.end('{"status":"ok"}');
}
