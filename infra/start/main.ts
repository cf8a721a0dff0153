/** npm start: builds what has changed, then runs the whole product on this machine until it is told to end. */
import { join } from 'node:path';
import { announceAndStay } from './announce-and-stay.ts';
import { buildIfChanged } from './build.ts';
import { prepare } from './prepare.ts';
import { runProduct } from './run-product.ts';
import { runSession } from './session.ts';

await runSession(async (session) => {
  const { folder, place } = await prepare(session);
  const { report, onStarted, signal } = session;
  await buildIfChanged(['servers', 'client'], { logFile: join(folder.logs, 'build.log'), onWork: (what) => report(`${what} …`), signal });
  report('Starting …');
  await runProduct({ place, folder, fromSources: false, report, onStarted, signal });
  return announceAndStay(session, place);
}, 0);
