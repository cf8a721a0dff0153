/** The first key of a site, or the one after a loss: what it is, how it makes codes, and a passphrase that was written down. */
import { useCallback, useEffect, useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Checkbox } from '../../ui/checkbox.tsx';
import { Form } from '../../ui/form.tsx';
import { Notice } from '../../ui/notice.tsx';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { formatCount } from '../../lib/format.ts';
import type { Month } from '../use-month.ts';
import { useAct } from '../use-act.ts';
import { KeyRefusal } from './key-refusal.tsx';

const idTypes = [
  { value: 'mrn', label: 'Hospital record number' },
  { value: 'department-number', label: 'Number of the therapy department' },
  { value: 'registry-number', label: 'Number given for the registry alone' },
];

/** Two words are asked back: enough to see that the paper holds them, in their order. */
const asked = [2, 5] as const;

export function NewKeyForm({ month, site, held }: { readonly month: Month; readonly site: string; readonly held: number }) {
  const [mode, setMode] = useState<'random' | 'hmac'>('random');
  const [idType, setIdType] = useState('mrn');
  const [zeros, setZeros] = useState<'count' | 'do-not-count'>('count');
  const [words, setWords] = useState<readonly string[]>([]);
  const [isWritten, setWritten] = useState(false);
  const [typed, setTyped] = useState<readonly [string, string]>(['', '']);
  const [attempt, setAttempt] = useState(0);
  const making = useAct();
  const { ask } = month;

  const drawWords = useCallback(() => void ask('suggest-passphrase', null).then((drawn) => setWords(drawn.split(' '))), [ask]);
  useEffect(drawWords, [drawWords]);
  function drawOthers(): void {
    drawWords();
    setWritten(false);
    setTyped(['', '']);
  }

  const wrong = asked.flatMap((number, at) =>
    typed[at]?.trim().toLowerCase() === words[number - 1]
      ? []
      : [{ fieldId: `word-${number}`, message: `Type word ${number} as you wrote it down.` }],
  );
  const missing = [
    ...(isWritten ? [] : [{ fieldId: 'words-written', message: 'Write the six words down, and say that you have.' }]),
    ...wrong,
  ];
  const problems = attempt === 0 ? [] : missing;
  const errorAt = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;

  function make(): void {
    if (missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void making.run(() => month.makeKey({ mode, idType, stripLeadingZeros: zeros === 'do-not-count', passphrase: words.join(' ') }));
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
      <div className="grid max-w-2xl gap-3">
        <h3 className="font-semibold">Passphrase of the key file</h3>
        <p>Six words, drawn for you. Write them on paper and keep the paper at your site, apart from the file. Nobody can recover them.</p>
        <ol className="grid list-inside list-decimal grid-cols-2 gap-x-6 gap-y-1 rounded-sm border border-edge bg-paper p-4 font-mono sm:grid-cols-3">
          {words.map((word, at) => (
            <li key={at}>{word}</li>
          ))}
        </ol>
        <div>
          <Button onPress={drawOthers}>Other words</Button>
        </div>
        <Checkbox id="words-written" value={isWritten} onChange={setWritten} error={errorAt('words-written')} isRequired>
          I have written these six words down
        </Checkbox>
        {asked.map((number, at) => (
          <TextField
            key={number}
            id={`word-${number}`}
            label={`Word ${number}, from your paper`}
            autoComplete="off"
            spellCheck="false"
            value={typed[at] ?? ''}
            onChange={(word) => setTyped(at === 0 ? [word, typed[1]] : [typed[0], word])}
            error={errorAt(`word-${number}`)}
            isRequired
          />
        ))}
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
