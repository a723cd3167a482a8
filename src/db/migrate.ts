import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate as applyMigrations } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';
import { databaseUrl } from './client';

/** Any number that no other use of the database picks: "STEADMAI" on a telephone's keys. */
const MIGRATION_LOCK = 78_323_624;

/**
 * Brings the database up to the newest migration. Several processes may call it at once: an advisory lock lets one work
 * and the others find it done. `folder` is relative to the working directory unless absolute.
 */
export async function migrate(url: string = databaseUrl(), folder = 'drizzle'): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  client.on('error', (error) => console.error('database connection lost while migrating:', error.message));
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    await applyMigrations(drizzle(client), { migrationsFolder: folder });
  } finally {
    await client.end();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await migrate();
  console.log('The database is at its newest migration.');
}
