import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));

export default defineConfig({
  root,
  resolve: { alias: { '@': `${root}src` } },
  test: {
    include: ['tests/e2e/**/*.test.ts'],
    globalSetup: ['tests/support/postgres.global.ts', 'tests/support/build.global.ts'],
    environment: 'node',
    pool: 'forks',
    // One application and one browser at a time: two of each on two cores would only wait for each other.
    fileParallelism: false,
    testTimeout: 180_000,
    hookTimeout: 180_000,
  },
});
