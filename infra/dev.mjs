/** npm run dev: the product with reload on both sides. What it does step by step: infra/dev/main.ts. */
import { run } from './bootstrap/run.mjs';

await run({ entry: 'infra/dev/main.ts', programs: process.env.DATABASE_URL ? [] : ['postgresql'] });
