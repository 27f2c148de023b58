/* How Astro builds Setwright: one Node server whose entry is src/server.ts, islands in React, no inline style sheets and no inline scripts of ours. */
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'astro/config';
import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwind from '@astrojs/tailwind';
import { POLICY } from './src/http/policy.mjs';

/** Files of engine, domain and workflows. */
const PURE = /[\\/](?:src[\\/](?:engine|domain)|workflows)[\\/]/;

/** The Node adapter with our own entry: the adapter's starts listening before the database is migrated and never stops cleanly. */
function nodeWithOurServer() {
  const adapter = node({ mode: 'standalone', experimentalDisableStreaming: true });
  const done = adapter.hooks['astro:config:done'];
  const serverEntrypoint = fileURLToPath(new URL('./src/server.ts', import.meta.url));
  adapter.hooks['astro:config:done'] = (context) =>
    done({
      ...context,
      setAdapter: (made) => context.setAdapter({ ...made, serverEntrypoint, exports: [] }),
    });
  return adapter;
}

export default defineConfig({
  output: 'server',
  adapter: nodeWithOurServer(),
  integrations: [react(), tailwind({ applyBaseStyles: false })],
  devToolbar: { enabled: false },
  // The middleware has an origin check of its own, which covers JSON bodies too.
  security: { checkOrigin: false },
  // Sign-in sessions are ours, in SQLite; Astro's file store would only leave files behind.
  session: { driver: 'null' },
  build: { inlineStylesheets: 'never', assets: '_astro' },
  // Astro writes the hashes of its island bootstrap into the policy, so nothing needs 'unsafe-inline'.
  experimental: { csp: { directives: POLICY } },
  vite: {
    build: {
      assetsInlineLimit: 0,
      // The pure layers do nothing when they are loaded: what an island does not use of them stays out of its script.
      rollupOptions: { treeshake: { moduleSideEffects: (id) => !PURE.test(id) } },
    },
    ssr: { external: ['better-sqlite3', 'knex', '@node-rs/argon2', '@react-pdf/renderer'] },
  },
});
