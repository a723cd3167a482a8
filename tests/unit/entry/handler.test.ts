import { type IncomingMessage, type Server, createServer, request } from 'node:http';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { text } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { BODY_LIMIT_BYTES } from '@/entry/http/body';
import { type PagesHandler, createHandler } from '@/entry/http/handler';
import { OpenAnswers } from '@/entry/http/streams';

let server: Server;
let clientDir: string;
let reachedPages = 0;
const answers = new OpenAnswers();

/** Stands for the built pages: tells what arrived, streams events, or breaks. */
const pages: PagesHandler = async (req, res) => {
  reachedPages += 1;
  if (req.url === '/broken') throw new Error('a page that breaks');
  if (req.url === '/events') {
    res.writeHead(200, { 'content-type': 'text/event-stream' });
    res.write('data: first\n\n');
    return;
  }
  const { body } = req as IncomingMessage & { body?: AsyncIterable<Buffer> };
  let received = 0;
  for await (const chunk of body ?? []) received += chunk.length;
  res.setHeader('content-type', 'text/html');
  res.end(`${received} ${req.headers['x-forwarded-for'] ?? 'direct'} ${'x'.repeat(5000)}`);
};

beforeAll(async () => {
  clientDir = mkdtempSync(join(tmpdir(), 'steadmain-client-'));
  mkdirSync(join(clientDir, '_astro'));
  writeFileSync(join(clientDir, '_astro', 'a.1234.js'), 'export {};');
  writeFileSync(join(clientDir, 'icon.svg'), '<svg/>');
  server = createServer(createHandler({ pages, clientDir, answers, behindProxy: false }));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});

afterAll(() => {
  server.closeAllConnections();
  server.close();
  rmSync(clientDir, { recursive: true });
});

interface Call {
  readonly method?: string;
  readonly headers?: Record<string, string>;
  readonly chunks?: readonly Buffer[];
}

function call(path: string, { method = 'GET', headers = {}, chunks = [] }: Call = {}): Promise<IncomingMessage> {
  const { port } = server.address() as AddressInfo;
  return new Promise((resolve, reject) => {
    const req = request({ port, host: '127.0.0.1', path, method, headers, agent: false }, resolve);
    req.on('error', reject);
    for (const chunk of chunks) req.write(chunk);
    req.end();
  });
}

const problemOf = async (res: IncomingMessage) => JSON.parse(await text(res)) as { status: number; code: string };

describe('the web process', () => {
  it('says that it serves', async () => {
    const res = await call('/healthz');
    expect(res.statusCode).toBe(200);
    expect(JSON.parse(await text(res))).toEqual({ status: 'ok' });
  });

  it('hands a chunked body of exactly the limit to the pages', async () => {
    const half = Buffer.alloc(BODY_LIMIT_BYTES / 2);
    const res = await call('/', { method: 'POST', chunks: [half, half] });
    expect(res.statusCode).toBe(200);
    expect(await text(res)).toMatch(new RegExp(`^${BODY_LIMIT_BYTES} `));
  });

  it('refuses a chunked body one byte over the limit, before any page', async () => {
    const before = reachedPages;
    const res = await call('/', { method: 'POST', chunks: [Buffer.alloc(BODY_LIMIT_BYTES), Buffer.alloc(1)] });
    expect(res.statusCode).toBe(413);
    expect(await problemOf(res)).toMatchObject({ status: 413, code: 'body-too-large' });
    expect(reachedPages).toBe(before);
  });

  it('refuses an announced length over the limit without waiting for it', async () => {
    const headers = { 'content-length': String(BODY_LIMIT_BYTES + 1) };
    const { port } = server.address() as AddressInfo;
    const res = await new Promise<IncomingMessage>((resolve, reject) => {
      const req = request({ port, host: '127.0.0.1', path: '/', method: 'PUT', headers, agent: false }, (answer) => {
        resolve(answer);
        req.destroy();
      });
      req.on('error', reject);
      req.flushHeaders();
    });
    expect(res.statusCode).toBe(413);
    expect(res.headers.connection).toBe('close');
  });

  it('compresses pages but never an event stream', async () => {
    const page = await call('/', { headers: { 'accept-encoding': 'gzip' } });
    expect(page.headers['content-encoding']).toBe('gzip');
    page.resume();
    const stream = await call('/events', { headers: { 'accept-encoding': 'gzip' } });
    expect(stream.headers['content-encoding']).toBeUndefined();
    const first = await new Promise<Buffer>((resolve) => stream.once('data', resolve));
    expect(first.toString()).toBe('data: first\n\n');
    stream.destroy();
  });

  it('ends event streams when asked to, so that the process can stop', async () => {
    const stream = await call('/events');
    stream.on('error', () => undefined);
    const closed = new Promise((resolve) => stream.once('close', () => resolve('closed')));
    stream.resume();
    answers.endStreams();
    expect(await closed).toBe('closed');
  });

  it('lets hashed files be kept for ever and others be asked for again', async () => {
    const hashed = await call('/_astro/a.1234.js');
    expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const plain = await call('/icon.svg');
    expect(plain.headers['cache-control']).toBe('no-cache');
    expect(plain.headers['x-content-type-options']).toBe('nosniff');
    hashed.resume();
    plain.resume();
  });

  it('does not believe an address that the client sends itself', async () => {
    const res = await call('/', { headers: { 'x-forwarded-for': '203.0.113.9' } });
    expect(await text(res)).toMatch(/^0 direct /);
  });

  it('answers a problem, not a stack, when a page breaks', async () => {
    const silenced = console.error;
    console.error = () => undefined;
    const res = await call('/broken').finally(() => (console.error = silenced));
    expect(res.statusCode).toBe(500);
    expect(await problemOf(res)).toMatchObject({ code: 'server-error' });
  });
});
