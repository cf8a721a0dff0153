import { LinkButton } from '../../ui/button.tsx';
import { Page } from '../../ui/page.tsx';

/** For an address that names no entry: perhaps of an older version, or mistyped. */
export function NothingHere() {
  return (
    <Page
      title="The dictionary has no such entry"
      lead={<p>The address may be mistyped, or the entry had another key in an older version. Search the dictionary for its name.</p>}
      actions={<LinkButton to="/dictionary">To the dictionary</LinkButton>}
    />
  );
}
