import { readdirSync } from 'node:fs';
import pg from 'pg';
import { expect, it } from 'vitest';
import { migrate } from '@/db/migrate';
import { createTestDatabase } from '../support/database';

it('several processes may migrate an empty database at once', async () => {
  const database = await createTestDatabase();
  const client = new pg.Client({ connectionString: database.url });
  await client.connect();
  try {
    await client.query('drop schema public cascade; drop schema drizzle cascade; create schema public');
    await Promise.all([migrate(database.url), migrate(database.url), migrate(database.url)]);
    const applied = await client.query('select 1 from drizzle.__drizzle_migrations');
    expect(applied.rowCount).toBe(readdirSync('drizzle').filter((file) => file.endsWith('.sql')).length);
  } finally {
    await client.end();
    await database.close();
  }
});
