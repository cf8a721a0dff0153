import { useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Checkbox } from '../../ui/checkbox.tsx';
import { FileDrop } from '../../ui/file-drop.tsx';
import { Form } from '../../ui/form.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { useAct } from '../use-act.ts';
import { KeyRefusal } from './key-refusal.tsx';

export interface OpenKeyFormProps {
  /** Unique on the page. */
  readonly id: string;
  readonly label: string;
  readonly hint?: string;
  readonly act: string;
  /** @throws WorkRefused */
  readonly onOpen: (file: File, passphrase: string) => Promise<void>;
}

/** A key file and its passphrase. */
export function OpenKeyForm({ id, label, hint, act, onOpen }: OpenKeyFormProps) {
  const [file, setFile] = useState<File | null>(null);
  const [passphrase, setPassphrase] = useState('');
  const [isShown, setShown] = useState(false);
  const [attempt, setAttempt] = useState(0);
  const opening = useAct();
  const missing = [
    ...(file === null ? [{ fieldId: `${id}-file`, message: 'Choose the key file.' }] : []),
    ...(passphrase.trim() === '' ? [{ fieldId: `${id}-passphrase`, message: 'Type the passphrase.' }] : []),
  ];
  const problems = attempt === 0 ? [] : missing;

  function open(): void {
    if (file === null || missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void opening.run(async () => {
      await onOpen(file, passphrase);
      setFile(null);
      setPassphrase('');
      setShown(false);
    });
  }

  return (
    <Form onSubmit={open} problems={problems} attempt={attempt}>
      <div id={`${id}-file`} className="grid max-w-2xl gap-2">
        <FileDrop label={label} {...(hint !== undefined && { hint })} accept={['.json']} onFiles={([chosen]) => setFile(chosen ?? null)} />
        <p role="status">{file === null ? '' : `Chosen: ${file.name}`}</p>
      </div>
      <TextField
        id={`${id}-passphrase`}
        label="Passphrase"
        hint="The six words of this key file, with a blank between them."
        type={isShown ? 'text' : 'password'}
        autoComplete="off"
        spellCheck="false"
        value={passphrase}
        onChange={setPassphrase}
        error={problems.find(({ fieldId }) => fieldId === `${id}-passphrase`)?.message}
        isRequired
      />
      <Checkbox id={`${id}-shown`} value={isShown} onChange={setShown}>
        Show what I type
      </Checkbox>
      <KeyRefusal refusal={opening.refusal} />
      <div>
        <Button type="submit" variant="primary" isPending={opening.isPending}>
          {act}
        </Button>
      </div>
    </Form>
  );
}
