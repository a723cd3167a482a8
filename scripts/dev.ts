import { migrate, seedDemo } from './support/data';
import { atEnd, runCommand } from './support/finish';
import { ensureDatabase, holdServer } from './support/postgres/hold';
import { cleanEnv, runTool } from './support/run';

const DATABASE = 'steadmain';

// The pages with Astro's development server. The levelling worker is not part of it: `npm start` runs both as built.
await runCommand(async () => {
  const server = await holdServer('postgres');
  atEnd(() => server.release());
  await ensureDatabase(server, DATABASE);
  const databaseUrl = server.url(DATABASE);
  await migrate(databaseUrl);
  await seedDemo(databaseUrl);
  const env = cleanEnv({ DATABASE_URL: databaseUrl, APP_URL: 'http://localhost:4321' });
  return (await runTool('astro', ['dev', '--port', '4321'], { env })).code;
});
