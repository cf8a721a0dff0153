/** npm run database:prepare: roles, database and migrations on a server of one's own. Step by step: infra/database-prepare/main.ts. */
import { run } from './bootstrap/run.mjs';

await run({ entry: 'infra/database-prepare/main.ts', programs: [] });
