import { createServer } from 'node:http';
import { fileURLToPath } from 'node:url';
import { type PagesHandler, createHandler } from './http/handler';
import { stopGracefullyOnSignal } from './http/stop';
import { OpenAnswers } from './http/streams';

const port = Number(process.env['PORT'] || 4321);
const host = process.env['HOST'] || '127.0.0.1';
// Built apart from this file, to the folder beside it; both come together only here.
const pagesUrl = new URL('../server/entry.mjs', import.meta.url);
const { handler } = (await import(/* @vite-ignore */ pagesUrl.href)) as { handler: PagesHandler };

const answers = new OpenAnswers();
const server = createServer(
  createHandler({
    pages: handler,
    clientDir: fileURLToPath(new URL('../client', import.meta.url)),
    answers,
    behindProxy: process.env['BEHIND_PROXY'] === 'yes',
  }),
);
stopGracefullyOnSignal(server, answers);
server.on('error', (error) => {
  console.error(`Can't listen on ${host}:${port}: ${error.message}`);
  process.exit(1);
});
server.listen(port, host, () => console.log(`Listening on ${host}:${port}`));
