/** The first key of a site, or the one after a loss: what it is, how it makes codes, and a passphrase that was written down. */
import { useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Form } from '../../ui/form.tsx';
import { Notice } from '../../ui/notice.tsx';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';
import { formatCount } from '../../lib/format.ts';
import type { Month } from '../use-month.ts';
import { useAct } from '../use-act.ts';
import { DrawnWordsFields } from './drawn-words-fields.tsx';
import { idTypes } from './id-types.ts';
import { KeyRefusal } from './key-refusal.tsx';
import { useDrawnWords } from './use-drawn-words.ts';

export function NewKeyForm({ month, site, held }: { readonly month: Month; readonly site: string; readonly held: number }) {
  const [mode, setMode] = useState<'random' | 'hmac'>('random');
  const [idType, setIdType] = useState<string>(idTypes[0].value);
  const [zeros, setZeros] = useState<'count' | 'do-not-count'>('count');
  const [attempt, setAttempt] = useState(0);
  const making = useAct();
  const drawn = useDrawnWords(month.ask, 'new-key');
  const problems = attempt === 0 ? [] : drawn.missing;

  function make(): void {
    if (drawn.missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void making.run(() => month.makeKey({ mode, idType, stripLeadingZeros: zeros === 'do-not-count', passphrase: drawn.passphrase }));
  }

  return (
    <Form onSubmit={make} problems={problems} attempt={attempt}>
      <div className="grid max-w-2xl gap-3">
        <p>
          The key file is the one link between your record numbers and the codes in the registry. It remembers who has which code, first
          training days and how your columns are matched. It is locked with a passphrase and stays at your site. Keep two copies on your
          site’s own storage. Never send it to the registry or to anybody else.
        </p>
        {held > 0 && (
          <Notice kind="warning" title={`The registry holds ${formatCount(held, 'participant')} of ${site} already.`}>
            <p>With a new key all of them would come as new people. Make one only if the key file of your site is lost for good.</p>
          </Notice>
        )}
      </div>
      <RadioGroup
        id="key-mode"
        label="How codes are made"
        value={mode}
        onChange={(value) => setMode(value === 'hmac' ? 'hmac' : 'random')}
        options={[
          {
            value: 'random',
            label: 'Drawn at random and remembered in the key file',
            hint: 'What most sites need. The key file grows each month and has to be saved each month.',
          },
          {
            value: 'hmac',
            label: 'Computed from the record number with the site’s secret',
            hint: 'Only where the agreement of your site says so. Two coordinators can work at once.',
          },
        ]}
      />
      <Select id="key-id-type" label="Record number that your files carry" value={idType} onChange={setIdType} options={idTypes} />
      <RadioGroup
        id="key-zeros"
        label="Zeros at the beginning of a record number"
        hint="This cannot be changed later, because another choice gives other codes."
        value={zeros}
        onChange={(value) => setZeros(value === 'count' ? 'count' : 'do-not-count')}
        options={[
          { value: 'count', label: 'They count: 0042 and 42 are two people' },
          { value: 'do-not-count', label: 'They do not count: 0042 and 42 are the same person' },
        ]}
      />
      <div className="grid gap-3">
        <h3 className="font-semibold">Passphrase of the key file</h3>
        <DrawnWordsFields drawn={drawn} problems={problems} />
      </div>
      <KeyRefusal refusal={making.refusal} />
      <div>
        <Button type="submit" variant="primary" isPending={making.isPending}>
          Make the key and save its file
        </Button>
      </div>
    </Form>
  );
}
