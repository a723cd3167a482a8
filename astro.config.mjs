import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'astro/config';

export default defineConfig({
  output: 'server',
  outDir: process.env.STEADMAIN_DIST ?? 'dist',
  adapter: node({ mode: 'middleware' }),
  integrations: [react()],
  // Astro's own sessions are not used: people's sessions are rows in the database.
  session: { driver: 'memory' },
  // The framework's check does not know the address people see and skips JSON; src/middleware.ts has the whole check.
  security: { checkOrigin: false },
  devToolbar: { enabled: false },
  experimental: {
    csp: {
      directives: [
        "default-src 'self'",
        "img-src 'self' data: blob:",
        "font-src 'self'",
        "connect-src 'self'",
        "worker-src 'self' blob:",
        "object-src 'none'",
        "base-uri 'none'",
        "form-action 'self'",
        "frame-ancestors 'none'",
      ],
    },
  },
  vite: { plugins: [tailwindcss()] },
});
