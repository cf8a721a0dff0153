/** What can be done with an open key besides preparing a month: merging, joining, rotating. Each is folded until it is wanted. */
import { useState } from 'react';
import type { ReactNode } from 'react';
import { formatCount } from '../../lib/format.ts';
import { Button } from '../../ui/button.tsx';
import { Form } from '../../ui/form.tsx';
import { Notice } from '../../ui/notice.tsx';
import { TextArea, TextField } from '../../ui/text-field.tsx';
import { useAct } from '../use-act.ts';
import type { Month } from '../use-month.ts';
import { DrawnWordsFields } from './drawn-words-fields.tsx';
import { KeyRefusal } from './key-refusal.tsx';
import { OpenKeyForm } from './open-key-form.tsx';
import { useDrawnWords } from './use-drawn-words.ts';

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

const replacedWords = (count: number): string =>
  count === 0
    ? 'No code had to be replaced.'
    : `${formatCount(count, 'code')} ${count === 1 ? 'was' : 'were'} replaced. The registry has to be told: see the end of this page.`;

function MergeKeys({ month }: { readonly month: Month }) {
  const [merged, setMerged] = useState<{ readonly replaced: number; readonly firstDaysMoved: readonly string[] } | null>(null);

  async function merge(file: File, passphrase: string): Promise<void> {
    const { picture, ...result } = await month.ask('merge-key', { file, passphrase });
    setMerged(result);
    await month.keyChanged(picture);
  }

  return (
    <>
      <p>
        When two coordinators went on with copies of the same key, make one out of them: open the other copy here as well. Where both gave a
        person a code, one of the two is kept. From then on, both coordinators use the file saved below. Better still: one of you saves, the
        other opens what was saved.
      </p>
      <OpenKeyForm id="merge-key" label="The other copy of the key file" act="Make one key of both" onOpen={merge} />
      {merged !== null && (
        <Notice kind="success" title="The two copies are one now. Save the key file." urgent>
          <p>{replacedWords(merged.replaced)}</p>
          {merged.firstDaysMoved.length > 0 && (
            <p>
              The first training day of {formatCount(merged.firstDaysMoved.length, 'person', 'people')} differed between the copies; the
              earlier one counts. Send all rows of these people again:{' '}
              <span className="font-mono wrap-anywhere">{merged.firstDaysMoved.join(', ')}</span>
            </p>
          )}
        </Notice>
      )}
    </>
  );
}

function JoinNumbers({ month }: { readonly month: Month }) {
  const [kept, setKept] = useState('');
  const [joined, setJoined] = useState('');
  const [done, setDone] = useState<{ readonly replaced: number; readonly firstDayMoved: string | null } | null>(null);
  const [attempt, setAttempt] = useState(0);
  const joining = useAct();
  const missing = [
    ...(kept.trim() === '' ? [{ fieldId: 'join-kept', message: 'Give the record number that stays.' }] : []),
    ...(joined.trim() === '' ? [{ fieldId: 'join-joined', message: 'Give the other record number.' }] : []),
  ];
  const problems = attempt === 0 ? [] : missing;

  function join(): void {
    setDone(null);
    if (missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void joining.run(async () => {
      const { picture, ...result } = await month.ask('join-numbers', { kept, joined });
      setDone(result);
      setKept('');
      setJoined('');
      await month.keyChanged(picture);
    });
  }

  return (
    <Form onSubmit={join} problems={problems} attempt={attempt}>
      <p>When your clinic’s system has the same person twice, both record numbers can lead to one code.</p>
      <TextField
        id="join-kept"
        label="Record number whose code stays"
        autoComplete="off"
        value={kept}
        onChange={setKept}
        error={problems.find(({ fieldId }) => fieldId === 'join-kept')?.message}
        isRequired
      />
      <TextField
        id="join-joined"
        label="The other record number of this person"
        autoComplete="off"
        value={joined}
        onChange={setJoined}
        error={problems.find(({ fieldId }) => fieldId === 'join-joined')?.message}
        isRequired
      />
      <KeyRefusal refusal={joining.refusal} />
      {done !== null && (
        <Notice kind="success" title="Both record numbers lead to one code now. Save the key file." urgent>
          <p>{replacedWords(done.replaced)}</p>
          {done.firstDayMoved !== null && (
            <p>
              The two had different first training days; the earlier one counts. Send all rows of this person again:{' '}
              <span className="font-mono wrap-anywhere">{done.firstDayMoved}</span>
            </p>
          )}
        </Notice>
      )}
      <div>
        <Button type="submit" isPending={joining.isPending}>
          Join the two
        </Button>
      </div>
    </Form>
  );
}

function RotateKey({ month }: { readonly month: Month }) {
  const [numbers, setNumbers] = useState('');
  const [isAsking, setAsking] = useState(false);
  const [carriedOver, setCarriedOver] = useState<number | null>(null);
  const rotating = useAct();

  const rotate = () =>
    void rotating.run(async () => {
      const recordNumbers = numbers.split(/[\r\n;]+/).filter((each) => each.trim() !== '');
      const done = await month.ask('rotate-key', { recordNumbers });
      setCarriedOver(done.carriedOver);
      setAsking(false);
      setNumbers('');
      await month.keyChanged(done.picture);
    });

  return (
    <>
      <p>
        Draw a new secret when somebody may have seen the key file together with its passphrase, or when somebody who knew it has left. The
        codes made with the old secret are replaced in the registry by new ones; nothing else of the registry changes. Take a new passphrase
        as well, under the next heading.
      </p>
      <p>
        The people whose record numbers you list are carried over now. Everybody else is carried over when their record number is met in a
        later month; until then the key file keeps the old secret.
      </p>
      <TextArea
        id="rotate-numbers"
        label="Record numbers to carry over now"
        hint="One a line. Leave it empty to carry everybody over when they are met."
        value={numbers}
        onChange={setNumbers}
      />
      <KeyRefusal refusal={rotating.refusal} />
      {carriedOver !== null && (
        <Notice kind="success" title="The key has a new secret. Save the key file." urgent>
          <p>{replacedWords(carriedOver)} Older copies of the file must not be used any more.</p>
        </Notice>
      )}
      {isAsking ? (
        <div role="group" aria-labelledby="rotate-question" className="grid gap-3">
          <p id="rotate-question" className="font-semibold">
            Draw a new secret? Codes that are replaced stay replaced, and copies of the key file saved before become useless.
          </p>
          <div className="flex flex-wrap gap-3">
            <Button variant="danger" isPending={rotating.isPending} onPress={rotate} autoFocus>
              Draw a new secret
            </Button>
            <Button onPress={() => setAsking(false)}>Leave it as it is</Button>
          </div>
        </div>
      ) : (
        <div>
          <Button onPress={() => setAsking(true)}>Draw a new secret</Button>
        </div>
      )}
    </>
  );
}

function ChangePassphrase({ month }: { readonly month: Month }) {
  const [attempt, setAttempt] = useState(0);
  const [isChanged, setChanged] = useState(false);
  const changing = useAct();
  const drawn = useDrawnWords(month.ask, 'new-passphrase');
  const problems = attempt === 0 ? [] : drawn.missing;

  function change(): void {
    if (drawn.missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void changing.run(async () => {
      const picture = await month.ask('change-passphrase', { passphrase: drawn.passphrase });
      setChanged(true);
      await month.keyChanged(picture);
    });
  }

  return (
    <Form onSubmit={change} problems={problems} attempt={attempt}>
      <p>
        The file that you save next is locked with the new words. Copies saved before stay locked with the old ones: delete them, once the
        new file is where it belongs.
      </p>
      {isChanged ? (
        <Notice kind="success" title="The key has a new passphrase. Save the key file." urgent />
      ) : (
        <>
          <DrawnWordsFields drawn={drawn} problems={problems} />
          <KeyRefusal refusal={changing.refusal} />
          <div>
            <Button type="submit" isPending={changing.isPending}>
              Use these words
            </Button>
          </div>
        </>
      )}
    </Form>
  );
}
