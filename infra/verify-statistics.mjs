/** npm run verify:statistics: every method against outside figures. What it does: packages/statistics/reference/verify.ts. */
import { run } from './bootstrap/run.mjs';

await run({ entry: 'packages/statistics/reference/verify.ts', programs: [] });
