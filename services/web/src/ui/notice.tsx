/** A message within the page, marked by a line and a word, never by colour alone. */
import type { ReactNode } from 'react';

export type NoticeKind = 'information' | 'success' | 'warning' | 'error';

const looks: Record<NoticeKind, { readonly line: string; readonly word: string; readonly name: string }> = {
  information: { line: 'border-lake', word: 'text-lake', name: 'Note' },
  success: { line: 'border-lichen', word: 'text-lichen', name: 'Done' },
  warning: { line: 'border-amber', word: 'text-amber', name: 'Take care' },
  error: { line: 'border-oxide', word: 'text-oxide', name: 'Problem' },
};

export interface NoticeProps {
  readonly kind?: NoticeKind;
  /** What happened, in a few words. */
  readonly title?: string;
  readonly children?: ReactNode;
  /** Interrupts a screen reader: only for what appears after an act of the reader. */
  readonly urgent?: boolean;
}

export function Notice({ kind = 'information', title, children, urgent = false }: NoticeProps) {
  const look = looks[kind];
  return (
    <div {...(urgent && { role: 'alert' })} className={`max-w-2xl border-l-4 py-1 pl-4 ${look.line}`}>
      <p className="font-semibold">
        <span className={look.word}>{look.name}.</span>
        {title !== undefined && ` ${title}`}
      </p>
      {children !== undefined && <div className="mt-1">{children}</div>}
    </div>
  );
}
