import { tableName } from '../../features/submissions/table-names.ts';
import { formatCount } from '../../lib/format.ts';
import type { KeyPicture } from '../worker/protocol.ts';

/** What the key holds that its file does not, in a few words each. */
export function changeWords({ changes }: Pick<KeyPicture, 'changes'>): string[] {
  if (changes === null) return [];
  const { newPeople, changedPeople, columns, hasNewLength, hasOtherCodes, hasNewPassphrase } = changes;
  return [
    ...(newPeople > 0 ? [formatCount(newPeople, 'new person', 'new people')] : []),
    ...(changedPeople > 0 ? [`first or latest days of ${formatCount(changedPeople, 'person', 'people')}`] : []),
    ...(columns.length > 0 ? [`how columns of ${columns.map(tableName).join(', ')} are read`] : []),
    ...(hasNewLength ? ['another length of record numbers'] : []),
    ...(hasOtherCodes ? ['codes that took the place of others'] : []),
    ...(hasNewPassphrase ? ['another passphrase'] : []),
  ];
}
