/** npm run first-administrator: lets the first administrator into a new registry. Step by step: infra/first-administrator/main.ts. */
import { run } from './bootstrap/run.mjs';

await run({ entry: 'infra/first-administrator/main.ts', programs: [] });
