import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));

export default defineConfig({
  root,
  resolve: { alias: { '@': `${root}src` } },
  test: {
    include: ['tests/{unit,property,verification}/**/*.test.ts'],
    environment: 'node',
    testTimeout: 30_000,
  },
});
