/** How the preparing page is built: one file, the same bytes in the frame of the client and on a clinic's disk. */
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defaultClientConditions, defineConfig } from 'vite';
import { englishOnly } from './build/english-only.ts';
import { oneFile } from './build/one-file.ts';

export default defineConfig({
  resolve: { conditions: ['@cairnstep/source', ...defaultClientConditions] },
  plugins: [react(), tailwindcss(), englishOnly(), oneFile({ page: 'prepare.html', limit: 400_000 })],
  worker: { format: 'es' },
  publicDir: false,
  build: { outDir: 'dist', emptyOutDir: false },
});
