import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const root = fileURLToPath(new URL('..', import.meta.url));

/** Programs that Node runs by themselves, by the file they become below the build's folder. */
const programs: Record<string, string> = {
  'web/web': 'src/entry/web.ts',
  'worker/worker': 'src/server/jobs/worker.ts',
  'worker/thread': 'src/server/jobs/thread.ts',
};

export default defineConfig({
  root,
  resolve: { alias: { '@': `${root}src` } },
  publicDir: false,
  logLevel: 'warn',
  build: {
    ssr: true,
    outDir: process.env['STEADMAIN_DIST'] ?? 'dist',
    // The pages' build, which comes first, lies there already.
    emptyOutDir: false,
    target: 'node20',
    sourcemap: true,
    rollupOptions: {
      input: Object.fromEntries(Object.entries(programs).filter(([, source]) => existsSync(`${root}${source}`))),
      output: { entryFileNames: '[name].js', chunkFileNames: 'shared/[name]-[hash].js' },
    },
  },
});
