import { rmSync, writeFileSync } from 'node:fs';
import { migrate, seedDemo } from './support/data';
import { runCommand } from './support/finish';
import { ensureDatabase, holdServer, keepFile, stopUnheld } from './support/postgres/hold';
import { say } from './support/say';

const DATABASE = 'steadmain';

/** Starts the project's PostgreSQL, migrated and seeded, and leaves it running until `stop`. */
async function start(): Promise<number> {
  writeFileSync(keepFile('postgres'), '');
  const server = await holdServer('postgres');
  await ensureDatabase(server, DATABASE);
  await migrate(server.url(DATABASE));
  await seedDemo(server.url(DATABASE));
  await server.letGoWithoutStopping();
  console.log(`\nDATABASE_URL=${server.url(DATABASE)}`);
  return 0;
}

async function stop(): Promise<number> {
  rmSync(keepFile('postgres'), { force: true });
  await stopUnheld('postgres');
  say('PostgreSQL is stopped, unless another of the project’s commands uses it');
  return 0;
}

const commands: Record<string, () => Promise<number>> = { start, stop };

await runCommand(async () => {
  const command = commands[process.argv[2] ?? ''];
  if (command) return command();
  console.error(`Usage: npm run db:start or npm run db:stop`);
  return 2;
});
