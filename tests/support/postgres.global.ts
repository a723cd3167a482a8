import type { TestProject } from 'vitest/node';
import { holdServer } from '../../scripts/support/postgres/hold';

/** Starts the tests' PostgreSQL before the first test file, or shares the running one; the last to leave stops it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const server = await holdServer('test-postgres');
  project.provide('postgresUrl', server.url('postgres'));
  return () => server.release();
}

declare module 'vitest' {
  interface ProvidedContext {
    /** The address of the tests' PostgreSQL, its maintenance database. */
    postgresUrl: string;
  }
}
