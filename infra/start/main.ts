/** npm start: builds what has changed, then runs the whole product on this machine until it is told to end. */
import { join } from 'node:path';
import { announcement } from './announce.ts';
import { buildIfChanged } from './build.ts';
import { addressOf, publicUrlOf } from './environment.ts';
import { prepare } from './prepare.ts';
import { removeRun, writeRun } from './run-note.ts';
import { runProduct } from './run-product.ts';
import { runSession, untilToldToEnd } from './session.ts';

await runSession(async (session) => {
  const { folder, place } = await prepare(session);
  const { report, onStarted, signal } = session;
  await buildIfChanged(['servers', 'client'], { logFile: join(folder.logs, 'build.log'), onWork: (what) => report(`${what} …`), signal });
  report('Starting …');
  await runProduct({ place, folder, fromSources: false, report, onStarted, signal });
  const run = {
    address: publicUrlOf(place),
    mailAddress: addressOf(place.ports.mailPages),
    providerAddress: addressOf(place.ports.provider),
  };
  writeRun(folder.path, run);
  onStarted(async () => removeRun(folder.path));
  report(announcement(run, folder.path));
  await untilToldToEnd(session);
  report('Ending …');
  return 0;
}, 0);
