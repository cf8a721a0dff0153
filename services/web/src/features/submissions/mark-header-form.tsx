/** Lets a steward mark one header of a site's files as safe. */
import { markSafeHeader } from '@cairnstep/contract';
import type { Site } from '@cairnstep/contract';
import { useState } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Form } from '../../ui/form.tsx';
import { Notice } from '../../ui/notice.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { useMarkHeader } from './safe-headers.queries.ts';

const fieldId = 'safe-header';

export function MarkHeaderForm({ site }: { readonly site: Site }) {
  const mark = useMarkHeader(site.id);
  const [header, setHeader] = useState('');
  const [attempt, setAttempt] = useState(0);
  const missing = attempt === 0 ? undefined : problemOf(header);
  const problems = missing === undefined ? problemsOf(mark.error, { '/body/header': fieldId }) : [{ fieldId, message: missing }];

  function send(): void {
    setAttempt(attempt + 1);
    if (problemOf(header) !== undefined) return;
    mark.mutate(header, {
      onSuccess: () => {
        announce(`The header ${header.trim()} is marked as safe.`);
        setHeader('');
        setAttempt(0);
      },
    });
  }

  return (
    <div className="grid gap-4">
      <h3 className="font-semibold">Mark a header</h3>
      <p className="max-w-2xl">
        Ask the clinic for the header and what the column holds: a finding does not show a header that may itself name a person.
      </p>
      {mark.isSuccess && <Notice kind="success" title={`“${mark.variables.trim()}” passes in files of ${site.name}.`} />}
      <Form onSubmit={send} attempt={attempt} problems={problems}>
        <TextField
          id={fieldId}
          label="Header"
          hint="As it stands in the file; capitals count."
          autoComplete="off"
          spellCheck="false"
          isRequired
          value={header}
          onChange={setHeader}
          error={problems.find((problem) => problem.fieldId === fieldId)?.message}
        />
        {mark.isError && problems.length === 0 && <ErrorNotice error={mark.error} />}
        <div>
          <Button type="submit" variant="primary" isPending={mark.isPending}>
            Mark as safe
          </Button>
        </div>
      </Form>
    </div>
  );
}

const problemOf = (header: string): string | undefined => markSafeHeader.body?.shape.header.safeParse(header).error?.issues[0]?.message;
