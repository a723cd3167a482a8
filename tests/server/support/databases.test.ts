import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type TestDatabase, createTestDatabase } from '../../support/database';

let one: TestDatabase;
let other: TestDatabase;

beforeAll(async () => {
  [one, other] = await Promise.all([createTestDatabase(), createTestDatabase()]);
});
afterAll(async () => {
  await one.close();
  await other.close();
});

async function rows(url: string, sql: string): Promise<unknown[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query(sql)).rows;
  } finally {
    await client.end();
  }
}

describe('databases for tests', () => {
  it('are apart from each other', async () => {
    await rows(one.url, 'create table left_behind (id int)');
    const find = "select 1 from pg_tables where tablename = 'left_behind'";
    expect(await rows(one.url, find)).toHaveLength(1);
    expect(await rows(other.url, find)).toHaveLength(0);
  });

  it('have the migrations applied', async () => {
    const migrations = await rows(other.url, 'select 1 from drizzle.__drizzle_migrations');
    expect(migrations.length).toBeGreaterThan(0);
  });
});
