/**
 * One sheet of paper. Sections are divided by hairlines; on wide screens a margin to the right carries short notes beside
 * what they explain (meaning, method, n, source), on narrow ones the note folds under it.
 */
import { useId } from 'react';
import type { ReactNode } from 'react';

export interface PageProps {
  readonly title: string;
  /** Above the title: what kind of thing this is, or the way back. */
  readonly kicker?: ReactNode;
  readonly lead?: ReactNode;
  /** Beside the lead, in the margin. */
  readonly note?: ReactNode;
  /** The acts of the page as a whole. */
  readonly actions?: ReactNode;
  readonly children?: ReactNode;
}

export function Page({ title, kicker, lead, note, actions, children }: PageProps) {
  return (
    <>
      <title>{`${title} · Cairnstep`}</title>
      <Row note={note}>
        {kicker !== undefined && <p className="text-small text-quiet">{kicker}</p>}
        <h1 className="text-title font-semibold">{title}</h1>
        {lead !== undefined && <div className="mt-3 max-w-2xl text-lead">{lead}</div>}
        {actions !== undefined && <div className="not-printed mt-5 flex flex-wrap gap-3">{actions}</div>}
      </Row>
      {children}
    </>
  );
}

export interface SectionProps {
  readonly title?: string;
  /** For links to this section. */
  readonly id?: string;
  readonly note?: ReactNode;
  /** For what needs the whole width of the sheet; the note then stands under it. */
  readonly wide?: boolean;
  readonly children: ReactNode;
}

export function Section({ title, id, note, wide = false, children }: SectionProps) {
  const titleId = useId();
  return (
    <section id={id} aria-labelledby={title === undefined ? undefined : titleId} className="border-t border-hairline">
      <Row note={note} wide={wide}>
        {title !== undefined && (
          <h2 id={titleId} className="mb-3 text-section font-semibold">
            {title}
          </h2>
        )}
        {children}
      </Row>
    </section>
  );
}

function Row({ note, wide = false, children }: Pick<SectionProps, 'note' | 'wide' | 'children'>) {
  const besides = wide ? 'relative bg-sheet' : 'lg:grid lg:grid-cols-[minmax(0,1fr)_240px]';
  return (
    <div className={besides}>
      <div className="min-w-0 px-4 py-6 md:px-8 lg:py-8">{children}</div>
      {note !== undefined && note !== null && (
        <div className={`px-4 pb-6 md:px-8 ${wide ? 'lg:pb-8' : 'lg:px-5 lg:py-8'}`}>
          <MarginNote>{note}</MarginNote>
        </div>
      )}
    </div>
  );
}

/** A note that stands elsewhere than in a section's margin. */
export function MarginNote({ children }: { readonly children: ReactNode }) {
  return (
    <div
      role="note"
      className="prose-links grid max-w-2xl gap-2 border-l-2 border-hairline pl-3 text-small text-quiet lg:border-l-0 lg:pl-0"
    >
      {children}
    </div>
  );
}
