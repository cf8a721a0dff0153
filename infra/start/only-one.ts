/** One start per data folder: two databases on the same files would destroy them. */
import { createHash } from 'node:crypto';
import { createServer } from 'node:net';
import { StartError } from './start-error.ts';
import { readRun } from './run-note.ts';

/**
 * Claims the folder for this process and answers with how to give it back. The claim is a listener in Linux's abstract
 * socket names, so it ends with the process however that dies, and two starts at once cannot both get it.
 *
 * @throws StartError when another start holds it
 */
export function claimDataFolder(path: string): Promise<() => Promise<void>> {
  const name = `\0cairnstep-${createHash('sha256').update(path).digest('hex')}`;
  const claim = createServer((connection) => connection.destroy());
  return new Promise((resolve, reject) => {
    claim.once('error', () => {
      const address = readRun(path)?.address;
      const where = address === undefined ? 'It is just starting or stopping.' : `It answers at ${address}.`;
      reject(new StartError(`Cairnstep already runs on ${path}. ${where} For a second one, set CAIRNSTEP_DATA_DIR to another folder.`));
    });
    claim.listen(name, () => resolve(() => new Promise((done) => claim.close(() => done()))));
  });
}
