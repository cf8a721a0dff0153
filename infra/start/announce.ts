/** What a person needs to know once everything runs. */
import { existsSync } from 'node:fs';
import { demonstrationPeople } from '@cairnstep/fake-oidc/demonstration-people';
import { exampleFilesOf } from './environment.ts';
import type { Run } from './run-note.ts';

const table = (rows: readonly (readonly string[])[]): string[] => {
  const widths = (rows[0] ?? []).map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
  return rows.map((row) => `  ${row.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join('  ')}`.trimEnd());
};

export function announcement(run: Run, dataFolder: string): string {
  const people = demonstrationPeople.map(({ role, name, label }) => [role ?? 'no role', name, label]);
  return [
    '',
    `Cairnstep is ready at ${run.address}`,
    '',
    'Everything in it is invented. Sign in with one click, without a password, as:',
    ...table(people),
    '',
    `Mails it sends are shown at ${run.mailAddress}`,
    ...(existsSync(exampleFilesOf(dataFolder)) ? [`Files to try a submission with are in ${exampleFilesOf(dataFolder)}`] : []),
    `Data and logs are in ${dataFolder}`,
    'Ctrl-C ends it; the data stays.',
    '',
  ].join('\n');
}
