import type { ChangeKind } from './submissions.queries.ts';

/** What a commit does to a row, as the screens call it. */
export const changeKinds: readonly { readonly kind: ChangeKind; readonly word: string }[] = [
  { kind: 'added', word: 'New' },
  { kind: 'changed', word: 'Changed' },
  { kind: 'unchanged', word: 'Unchanged' },
  { kind: 'removed', word: 'Removed' },
];
