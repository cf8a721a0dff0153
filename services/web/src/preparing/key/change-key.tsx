/** What can be done with an open key besides preparing a month. Each is folded until it is wanted. */
import { useState } from 'react';
import type { ReactNode } from 'react';
import type { Month } from '../use-month.ts';
import { ChangePassphrase } from './change-passphrase.tsx';
import { JoinNumbers } from './join-numbers.tsx';
import { MergeKeys } from './merge-keys.tsx';
import { OpenKeyForm } from './open-key-form.tsx';
import { RotateKey } from './rotate-key.tsx';

export function ChangeKey({ month, site }: { readonly month: Month; readonly site: string }) {
  return (
    <div className="grid gap-3">
      <Folded title="Open another key file">
        <p>The key that is open now is closed. What it holds beyond its file is lost, unless you save it first.</p>
        <OpenKeyForm id="open-other-key" label={`Key file of ${site}`} act="Open this key instead" onOpen={month.openKey} />
      </Folded>
      <Folded title="Two copies of the key">
        <MergeKeys month={month} />
      </Folded>
      <Folded title="One person with two record numbers">
        <JoinNumbers month={month} />
      </Folded>
      <Folded title="A new secret for the key">
        <RotateKey month={month} />
      </Folded>
      <Folded title="A new passphrase">
        <ChangePassphrase month={month} />
      </Folded>
    </div>
  );
}

function Folded({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  const [wasOpened, setOpened] = useState(false);
  return (
    <details onToggle={() => setOpened(true)}>
      <summary className="link">{title}</summary>
      {wasOpened && <div className="mt-3 grid max-w-2xl gap-4 border-l-2 border-hairline pl-4">{children}</div>}
    </details>
  );
}
