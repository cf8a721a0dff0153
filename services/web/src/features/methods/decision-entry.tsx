import { Button } from '../../ui/button.tsx';
import { Page } from '../../ui/page.tsx';
import type { Decision } from './decision.ts';
import { EntryKicker } from './entry-kicker.tsx';
import { EntryNeighbours } from './entry-neighbours.tsx';

export function DecisionEntry({ decision }: { readonly decision: Decision }) {
  const { slug, title, summary, note, Body } = decision;
  return (
    <Page
      title={title}
      kicker={<EntryKicker topic="registry" />}
      lead={<p>{summary}</p>}
      actions={
        <Button variant="quiet" onPress={() => window.print()}>
          Print
        </Button>
      }
      note={note !== undefined && <p>{note}</p>}
    >
      <Body />
      <EntryNeighbours slug={slug} />
    </Page>
  );
}
