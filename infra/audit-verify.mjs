/** npm run audit:verify: recomputes the audit log's chain. What it does step by step: infra/audit-verify/main.ts. */
import { run } from './bootstrap/run.mjs';

await run({ entry: 'infra/audit-verify/main.ts', programs: process.env.DATABASE_URL ? [] : ['postgresql'] });
