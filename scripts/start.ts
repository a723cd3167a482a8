import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { buildInto, startDist } from './support/build';
import { demoPeople, firstRunCode, migrate, seedDemo } from './support/data';
import { atEnd, runCommand } from './support/finish';
import { keepAlive } from './support/keepAlive';
import { ownMail } from './support/localMail';
import { takeLock } from './support/lock';
import { freePortFrom } from './support/ports';
import { ensureDatabase, holdServer } from './support/postgres/hold';
import { Sentence, statePath } from './support/project';
import { say } from './support/say';
import { watchServer } from './support/watchServer';
import { waitUntilServing } from './support/waitUntilServing';

const DATABASE = 'steadmain';
const addressFile = statePath('address');
/** STEADMAIN_DEMO=none starts an installation of one's own. */
const withDemo = process.env['STEADMAIN_DEMO'] !== 'none';

/** One start a project folder: two would share a build and a database, and stop each other's. */
async function takeTheOnlyStart(): Promise<void> {
  const lock = await takeLock('start');
  if (!lock) {
    const address = existsSync(addressFile) ? readFileSync(addressFile, 'utf8').trim() : 'an address not known yet';
    throw new Sentence(`Steadmain already runs from this folder, at ${address}. Stop that one first, with Ctrl-C.`);
  }
  atEnd(() => lock.release());
}

async function openDatabase(): Promise<string> {
  say('Starting PostgreSQL');
  const opening = holdServer('postgres');
  atEnd(async () => {
    const server = await opening.catch(() => undefined);
    await server?.release();
  });
  const server = await opening;
  atEnd(watchServer(server));
  await ensureDatabase(server, DATABASE);
  const url = server.url(DATABASE);
  say('Bringing the tables up to date');
  await migrate(url);
  if (withDemo) {
    say('Making sure the demo plant is there');
    await seedDemo(url);
  }
  return url;
}

/** What the processes must be told of the mail server; ours only receives, on loopback. */
async function openMail(): Promise<Record<string, string>> {
  const own = await ownMail(statePath('mail'));
  if (!own) return {};
  atEnd(() => own.mail.stop());
  return own.env;
}

async function serve(databaseUrl: string): Promise<string> {
  const wanted = Number(process.env['PORT'] || 4321);
  const port = await freePortFrom(wanted);
  if (port !== wanted) say(`Port ${wanted} is taken; using ${port}`);
  const address = process.env['APP_URL'] || `http://localhost:${port}`;
  const env = { DATABASE_URL: databaseUrl, PORT: String(port), APP_URL: address, ...(await openMail()) };
  writeFileSync(addressFile, `${address}\n`);
  atEnd(async () => rmSync(addressFile, { force: true }));
  say('Starting the web process and the levelling worker');
  for (const [name, file] of [
    ['levelling', 'worker/worker.js'],
    ['web', 'web/web.js'],
  ] as const) {
    const kept = keepAlive(name, join(startDist, file), env);
    atEnd(() => kept.stop());
  }
  await waitUntilServing(`http://127.0.0.1:${port}/healthz`);
  return address;
}

/** The demo people, or the code that makes the first administrator; nothing where there are people of one's own. */
async function whoMaySignIn(databaseUrl: string, address: string): Promise<string> {
  if (withDemo) return `\n${(await demoPeople(databaseUrl)).trimEnd()}\n`;
  const code = await firstRunCode(databaseUrl);
  if (code === '') return '';
  return `\n  Nobody has an account yet. Make the first at ${address}/first-run with this code, once:\n\n    ${code}\n`;
}

await runCommand(async () => {
  if (process.env['DATABASE_URL'])
    say('DATABASE_URL is set, but npm start keeps a database of its own; leaving it alone');
  await takeTheOnlyStart();
  // Neither needs the other, and the first start has to install and build much.
  const building = buildInto(startDist);
  building.catch(() => undefined);
  const databaseUrl = await openDatabase();
  await building;
  const address = await serve(databaseUrl);
  const people = await whoMaySignIn(databaseUrl, address);
  say('Ready');
  console.log(`\n  Steadmain is at ${address}\n${people}\n  Ctrl-C stops it.\n`);
  return new Promise<number>(() => undefined);
});
