/** npm run bench [name …]: our times beside a named peer's. What it does step by step: infra/bench/main.ts. */
import { run } from './bootstrap/run.mjs';

await run({ entry: 'infra/bench/main.ts', programs: ['postgresql'] });
