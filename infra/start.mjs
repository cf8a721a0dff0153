/** npm start: everything on this machine, with demonstration data. What it does step by step: infra/start/main.ts. */
import { run } from './bootstrap/run.mjs';

// With a server of one's own, none is installed.
await run({ entry: 'infra/start/main.ts', programs: process.env.DATABASE_URL ? [] : ['postgresql'] });
