/** Binds a commit to what was previewed: the files with what was mended in them, the counts and the state of the site they were compared with. */
import { createHash } from 'node:crypto';
import type { TableChange } from '@cairnstep/contract';
import type { z } from 'zod';
import { canonicalJson } from '../../audit/canonical-json.ts';

export interface Previewed {
  readonly submission: string;
  readonly revision: number;
  readonly files: readonly { readonly key: string; readonly sha256: string; readonly mendsDigest: string | null }[];
  readonly tables: readonly z.output<typeof TableChange>[];
}

export function previewDigest({ submission, revision, files, tables }: Previewed): string {
  const sorted = files
    .map(({ key, sha256, mendsDigest }) => ({ table: key, sha256, ...(mendsDigest === null ? {} : { mends: mendsDigest }) }))
    .sort((a, b) => (a.table < b.table ? -1 : 1));
  return createHash('sha256')
    .update(canonicalJson({ submission, revision, files: sorted, tables: [...tables] }))
    .digest('hex');
}
