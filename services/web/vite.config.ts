/** How the client is built: one entry, lazy pages, and a ceiling on what a first visit has to fetch. */
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defaultClientConditions, defineConfig } from 'vite';
import { englishOnly } from './build/english-only.ts';
import { initialScriptBudget } from './build/initial-script-budget.ts';

/** Bytes of gzipped JavaScript before the first page can show: the entry and everything it imports statically. */
const INITIAL_SCRIPT_BYTES = 150_000;

export default defineConfig({
  resolve: { conditions: ['@cairnstep/source', ...defaultClientConditions] },
  plugins: [react(), tailwindcss(), englishOnly(), initialScriptBudget(INITIAL_SCRIPT_BYTES)],
  server: { proxy: { '/api': process.env.API_URL ?? 'http://127.0.0.1:3000' } },
  build: {
    outDir: 'dist',
    emptyOutDir: true,
    // Small assets as data: addresses would need a wider content security policy.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
  },
});
