/** The site key: opened, made, or open and told of. */
import { useState } from 'react';
import { formatCount, formatNumber } from '../../lib/format.ts';
import { Button } from '../../ui/button.tsx';
import { Facts } from '../../ui/facts.tsx';
import { Loading } from '../../ui/loading.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Section } from '../../ui/page.tsx';
import { tableName } from '../../features/submissions/table-names.ts';
import type { Month } from '../use-month.ts';
import type { KeyPicture } from '../worker/protocol.ts';
import { ChangeKey } from './change-key.tsx';
import { nameOfIdType } from './id-types.ts';
import { NewKeyForm } from './new-key-form.tsx';
import { OpenKeyForm } from './open-key-form.tsx';

export interface KeySectionProps {
  readonly month: Month;
  readonly site: string;
  /** Participants that the registry holds of the site. */
  readonly held: number;
  /** All that the key holds in sight, because the page is about nothing else. */
  readonly isWhole: boolean;
}

export function KeySection({ month, site, held, isWhole }: KeySectionProps) {
  const { picture } = month.state;
  return (
    <Section
      title="Site key"
      id="key"
      note={
        <>
          <p>
            The key is opened in the memory of this page and nowhere else. Once the page is left or loaded again, it has to be opened again.
          </p>
          <p>Nothing of it is ever sent: neither the file, nor its passphrase, nor a record number.</p>
        </>
      }
    >
      {picture === null ? (
        <Loading>Getting ready.</Loading>
      ) : picture.key === null ? (
        <ClosedKey month={month} site={site} held={held} />
      ) : (
        <OpenedKey month={month} site={site} keyPicture={picture.key} isWhole={isWhole} />
      )}
    </Section>
  );
}

function ClosedKey({ month, site, held }: Pick<KeySectionProps, 'month' | 'site' | 'held'>) {
  const [isMaking, setMaking] = useState(false);
  if (isMaking)
    return (
      <div className="grid gap-6">
        <div>
          <Button onPress={() => setMaking(false)}>Open a key file instead</Button>
        </div>
        <NewKeyForm month={month} site={site} held={held} />
      </div>
    );
  return (
    <div className="grid gap-8">
      <OpenKeyForm id="open-key" label={`Key file of ${site}`} hint={newestKey} act="Open the key" onOpen={month.openKey} />
      <div className="grid max-w-2xl justify-items-start gap-3">
        <p>No key file yet? A site makes one before its first month.</p>
        <Button onPress={() => setMaking(true)}>Make a key</Button>
        <LostKey />
      </div>
    </div>
  );
}

/** Names as they are given when a key file is saved: `S01-site-key-r3-2026-12-01-a1b2.json`. */
const newestKey =
  'The newest one: the highest number behind “r” in its name, the latest day. Two files with the same number and different endings are copies that went on separately: open one of them, then make one key of both.';

function LostKey() {
  return (
    <details className="max-w-2xl">
      <summary className="link">The key file or its passphrase is lost</summary>
      <div className="mt-2 grid gap-2">
        <p>
          Look first for the second copy on your site’s storage, and for the paper with the six words. The registry has no copy and cannot
          open one.
        </p>
        <p>
          If both are gone, the link between your record numbers and the codes is gone with them. What the registry holds stays as it is,
          but nobody can add to it: make a new key, and everybody comes as a new participant from then on.
        </p>
        <p>Tell the data steward which month the new codes begin with, so that nobody is counted twice.</p>
      </div>
    </details>
  );
}

function OpenedKey({
  month,
  site,
  keyPicture,
  isWhole,
}: Pick<KeySectionProps, 'month' | 'site' | 'isWhole'> & { readonly keyPicture: KeyPicture }) {
  const { people, revision, lacking, changes } = keyPicture;
  const unsaved = changes?.newPeople ?? 0;
  const facts = <KeyFacts keyPicture={keyPicture} />;
  return (
    <div className="grid gap-6">
      <p>
        The key of {site} is open: it knows {formatCount(people, 'person', 'people')}
        {unsaved > 0 && `, ${formatNumber(unsaved)} of them not yet in its file,`} and was saved {formatCount(revision, 'time')}.
      </p>
      {lacking !== null && (
        <Notice
          kind="warning"
          title={`The key lacks ${lacking.missing} of the ${lacking.of} participants that the registry holds of ${site}.`}
        >
          <p>
            It is probably an older copy, and these people would get a second code. Open the newest file, or make one key out of both copies
            below, under “Two copies of the key”.
          </p>
        </Notice>
      )}
      {isWhole ? (
        <>
          {facts}
          <ChangeKey month={month} site={site} />
        </>
      ) : (
        <details>
          <summary className="link">What the key holds, and ways to change it</summary>
          <div className="mt-3 grid gap-6 border-l-2 border-hairline pl-4">
            {facts}
            <ChangeKey month={month} site={site} />
          </div>
        </details>
      )}
      <SavedNote month={month} />
    </div>
  );
}

function KeyFacts({ keyPicture }: { readonly keyPicture: KeyPicture }) {
  const { keyId, mode, idType, stripLeadingZeros, people, peopleWithFirstDay, secrets, tables, revision } = keyPicture;
  return (
    <Facts
      facts={[
        { term: 'People', value: formatCount(people, 'person', 'people') },
        { term: 'First training days', value: `${peopleWithFirstDay} of ${people}` },
        { term: 'Codes', value: mode === 'random' ? 'drawn at random and remembered' : 'computed with the site’s secret' },
        { term: 'Record number', value: nameOfIdType(idType) },
        { term: 'Zeros at the beginning', value: stripLeadingZeros ? 'do not count' : 'count' },
        { term: 'Name of the secret', value: keyId },
        { term: 'Earlier secrets', value: secrets > 1 ? `${secrets - 1}, kept until everybody has been carried over` : 'none' },
        { term: 'Saved', value: formatCount(revision, 'time') },
        { term: 'Columns remembered', value: tables.length === 0 ? 'none yet' : tables.map(tableName).join(', ') },
      ]}
    />
  );
}

function SavedNote({ month }: { readonly month: Month }) {
  const { savedAs } = month.state;
  if (savedAs === null) return null;
  return (
    <Notice kind="success" title={`The key file was saved as ${savedAs}.`}>
      <p>Your browser has put it where it puts downloads. Move it to your site’s own storage, and keep a second copy there.</p>
    </Notice>
  );
}
