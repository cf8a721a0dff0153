/** Binds a client id of the identity provider to a site. */
import { addSiteSystem } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import { sitesQuery } from '../../lib/sites.ts';
import { announce } from '../../ui/announcer.tsx';
import { Answer } from '../../ui/answer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Form } from '../../ui/form.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Select } from '../../ui/select.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { useAddSystem } from './site-systems.queries.ts';

interface Draft {
  readonly siteId: string | null;
  readonly subject: string;
  readonly label: string;
}
const empty: Draft = { siteId: null, subject: '', label: '' };

const ids = { siteId: 'system-site', subject: 'system-client', label: 'system-label' } as const;
const refusable = { '/body/siteId': ids.siteId, '/body/subject': ids.subject, '/body/label': ids.label };

function problemsIn({ siteId, subject, label }: Draft): PlacedProblem[] {
  const shape = addSiteSystem.body?.shape;
  const fieldProblem = (fieldId: string, message: string | undefined): PlacedProblem[] =>
    message === undefined ? [] : [{ fieldId, message }];
  return [
    ...fieldProblem(ids.siteId, siteId === null ? 'Choose the site that the system belongs to' : undefined),
    ...fieldProblem(ids.subject, shape?.subject.safeParse(subject).error?.issues[0]?.message),
    ...fieldProblem(ids.label, shape?.label.safeParse(label).error?.issues[0]?.message),
  ];
}

export function AddSystemForm() {
  const add = useAddSystem();
  const sites = useQuery(sitesQuery());
  const [draft, setDraft] = useState(empty);
  const [attempt, setAttempt] = useState(0);
  const found = attempt === 0 ? [] : problemsIn(draft);
  const problems = found.length > 0 ? found : problemsOf(add.error, refusable);
  const errorOf = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;

  function send(): void {
    setAttempt(attempt + 1);
    const { siteId, subject, label } = draft;
    if (siteId === null || problemsIn(draft).length > 0) return;
    add.mutate(
      { siteId, subject, label },
      {
        onSuccess: (added) => {
          announce(`${added.label} can submit for ${added.site.name}.`);
          setDraft(empty);
          setAttempt(0);
        },
      },
    );
  }

  return (
    <div className="grid gap-6">
      {add.data !== undefined && <Notice kind="success" title={`${add.data.label} can submit for ${add.data.site.name}.`} />}
      <Form onSubmit={send} attempt={attempt} problems={problems}>
        <Answer query={sites} waiting="Looking up the sites.">
          {(known) => (
            <Select
              id={ids.siteId}
              label="Site"
              isRequired
              value={draft.siteId}
              options={known.sites.map(({ id, code, name }) => ({ value: id, label: `${name} (${code})` }))}
              onChange={(siteId) => setDraft({ ...draft, siteId })}
              error={errorOf(ids.siteId)}
            />
          )}
        </Answer>
        <TextField
          id={ids.subject}
          label="Client id"
          hint="As the identity provider calls the system; capitals count."
          autoComplete="off"
          spellCheck="false"
          isRequired
          value={draft.subject}
          onChange={(subject) => setDraft({ ...draft, subject })}
          error={errorOf(ids.subject)}
        />
        <TextField
          id={ids.label}
          label="Name"
          hint="What submissions, receipts and the audit log call it, such as “Training records of the clinic”."
          isRequired
          value={draft.label}
          onChange={(label) => setDraft({ ...draft, label })}
          error={errorOf(ids.label)}
        />
        {add.isError && problems.length === 0 && <ErrorNotice error={add.error} />}
        <div>
          <Button type="submit" variant="primary" isPending={add.isPending}>
            Register the system
          </Button>
        </div>
      </Form>
    </div>
  );
}
