import { drizzle, type NodePgDatabase, type NodePgQueryResultHKT } from 'drizzle-orm/node-postgres';
import type { PgDatabase } from 'drizzle-orm/pg-core';
import pg from 'pg';
import * as schema from './schema/index';

type Schema = typeof schema;

/** The database or a transaction on it: what queries take. */
export type Db = PgDatabase<NodePgQueryResultHKT, Schema>;

let open: { readonly pool: pg.Pool; readonly orm: NodePgDatabase<Schema> } | null = null;

/** Where the database is; throws where the process was not told. */
export function databaseUrl(): string {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL is not set: name the PostgreSQL database, such as postgres://user@host/name');
  return url;
}

function connect(): { readonly pool: pg.Pool; readonly orm: NodePgDatabase<Schema> } {
  const pool = new pg.Pool({
    connectionString: databaseUrl(),
    max: Number(process.env.DATABASE_CONNECTIONS ?? 10),
    connectionTimeoutMillis: 10_000,
    idleTimeoutMillis: 30_000,
  });
  const lost = (error: Error): void => console.error('database connection lost:', error.message);
  // Without listeners a stopped database would end the process: the pool listens only to connections that are idle.
  // Broken ones are dropped by themselves, and what was running on them fails where it was called.
  pool.on('error', lost);
  pool.on('connect', (client) => client.on('error', lost));
  return { pool, orm: drizzle(pool, { schema }) };
}

/** The database, connected on first use so that importing this file needs no environment. */
export const db: NodePgDatabase<Schema> = new Proxy({} as NodePgDatabase<Schema>, {
  get(_target, key) {
    open ??= connect();
    const value: unknown = Reflect.get(open.orm, key);
    return typeof value === 'function' ? (value as (...args: unknown[]) => unknown).bind(open.orm) : value;
  },
});

/** Ends all connections; the next use of `db` opens new ones. */
export async function closeDb(): Promise<void> {
  const closing = open;
  open = null;
  await closing?.pool.end();
}
