/** `npm run audit:verify`: recomputes the chain; exit code 1 when it does not hold. */
import { registry } from '../authority/actor.ts';
import { asActor } from '../database/as-actor.ts';
import { makeDataSource } from '../database/data-source.ts';
import { readVerdict } from './read-verdict.ts';

const url = process.env['DATABASE_APP_URL'];
if (!url) {
  process.stderr.write('DATABASE_APP_URL is missing: it says which registry to verify.\n');
  process.exit(2);
}
const database = await makeDataSource({ url, poolSize: 1 }).initialize();
try {
  const verdict = await asActor(database, registry, readVerdict);
  if (verdict.holds) process.stdout.write(`The audit log holds: ${verdict.entries} entries, head ${verdict.head ?? 'none'}.\n`);
  else process.stdout.write(`The audit log is broken at entry ${verdict.firstBrokenSeq}: it or its predecessor was changed, removed or moved.\n`);
  process.exitCode = verdict.holds ? 0 : 1;
} finally {
  await database.destroy();
}
