/** npm test: every kind of check, or those named. What it does step by step: infra/test/main.ts. */
import { run } from './bootstrap/run.mjs';

const kinds = process.argv.slice(2);
const hasBrowser = kinds.length === 0 || kinds.includes('journeys');
await run({ entry: 'infra/test/main.ts', programs: hasBrowser ? ['postgresql', 'curl', 'chromium'] : ['postgresql', 'curl'] });
