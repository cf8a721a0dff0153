/** A zip whose bytes depend on the files alone: fixed time stamps, given order. */
import { buffer } from 'node:stream/consumers';
import yazl from 'yazl';

const fixedTime = new Date(Date.UTC(2000, 0, 1));

export async function zipFiles(files: readonly { readonly name: string; readonly text: string }[]): Promise<Buffer> {
  const zip = new yazl.ZipFile();
  for (const { name, text } of files)
    zip.addBuffer(Buffer.from(text, 'utf8'), name, { mtime: fixedTime, mode: 0o100644, forceDosTimestamp: true });
  zip.end();
  return buffer(zip.outputStream);
}
