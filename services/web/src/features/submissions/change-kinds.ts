import type { ChangeKind } from './submissions.queries.ts';

/** What a commit does to a row, as the screens call it. What cannot be had back comes first, where a narrow window shows it. */
export const changeKinds: readonly { readonly kind: ChangeKind; readonly word: string }[] = [
  { kind: 'removed', word: 'Removed' },
  { kind: 'changed', word: 'Changed' },
  { kind: 'added', word: 'New' },
  { kind: 'unchanged', word: 'Unchanged' },
];
