/** The end of a command that has started everything: says where it is, and stays until it is told to end. */
import { announcement } from './announce.ts';
import { addressOf, publicUrlOf } from './environment.ts';
import type { Place } from './environment.ts';
import { removeRun, writeRun } from './run-note.ts';
import { untilToldToEnd } from './session.ts';
import type { Session } from './session.ts';

/** Resolves with the exit code. */
export async function announceAndStay(session: Session, place: Place): Promise<number> {
  const { report, onStarted } = session;
  const run = {
    address: publicUrlOf(place),
    mailAddress: addressOf(place.ports.mailPages),
    providerAddress: addressOf(place.ports.provider),
  };
  writeRun(place.dataFolder, run);
  onStarted(async () => removeRun(place.dataFolder));
  report(announcement(run, place.dataFolder));
  await untilToldToEnd(session);
  report('Ending …');
  return 0;
}
