import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';
import { migrate, seedDemo } from '../../scripts/support/data';
import { takeLock } from '../../scripts/support/lock';
import { hashOf } from '../../scripts/support/sources';

/** A database of one test file's own. */
export interface TestDatabase {
  readonly url: string;
  close(): Promise<void>;
}

/** A fresh database with every migration applied and no rows of ours. */
export const createTestDatabase = (): Promise<TestDatabase> =>
  copyOf(`migrated_${hashOf(['drizzle', 'src/db']).slice(0, 16)}`, (url) => migrate(url));

/** A fresh database with the demo plant, seeded as if it were `now` (an ISO instant). */
export function createDemoDatabase(now: string): Promise<TestDatabase> {
  const name = `demo_${hashOf(['drizzle', 'src', 'scripts/seed.ts']).slice(0, 16)}_${now.replace(/\W/g, '')}`;
  return copyOf(name.toLowerCase(), async (url) => {
    await migrate(url);
    await seedDemo(url, now);
  });
}

const addressOf = (database: string): string => {
  const url = new URL(inject('postgresUrl'));
  url.pathname = `/${database}`;
  return url.href;
};

async function onServer<T>(work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: addressOf('postgres') });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/** Copies a template, which is filled by whoever needs it first. A copy costs a fraction of migrating and seeding. */
async function copyOf(template: string, fill: (url: string) => Promise<unknown>): Promise<TestDatabase> {
  await makeTemplate(template, fill);
  const name = `test_${randomBytes(8).toString('hex')}`;
  await onServer((client) => client.query(`create database "${name}" template "${template}"`));
  return {
    url: addressOf(name),
    close: () => onServer(async (client) => void (await client.query(`drop database "${name}" with (force)`))),
  };
}

async function makeTemplate(template: string, fill: (url: string) => Promise<unknown>): Promise<void> {
  const lock = await takeLock('test-template', { wait: true });
  try {
    await onServer(async (client) => {
      const found = await client.query('select 1 from pg_database where datname = $1', [template]);
      if (found.rowCount) return;
      // Filled under another name first: a template that was cut short is never copied.
      await client.query(`drop database if exists "${template}_new" with (force)`);
      await client.query(`create database "${template}_new" template template0`);
      await fill(addressOf(`${template}_new`));
      await client.query(`alter database "${template}_new" rename to "${template}"`);
    });
  } finally {
    await lock?.release();
  }
}
