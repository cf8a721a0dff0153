/** Where a choice in the grid leads: the cohort in words, a working title, and a draft begins. */
import { emptyRequestForm } from '@cairnstep/contract';
import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import type { Cohort } from '../../lib/cohort.ts';
import { cohortIn } from '../../lib/cohort.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Form } from '../../ui/form.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { gridAddress } from './cohort-address.ts';
import { CohortInWords } from './cohort-in-words.tsx';
import { useCreateRequest } from './requests.queries.ts';

/** Where nothing was chosen in the grid: everyone, looked at by the outcome the grid opens with. */
const everyone: Cohort = { outcome: 'tmwt_ss', inDevice: false, cells: [] };

export default function NewRequestPage() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const [title, setTitle] = useState('');
  const create = useCreateRequest();
  const cohort = cohortIn(search) ?? everyone;
  const begin = () =>
    create.mutate(
      { ...emptyRequestForm(cohort), title: title.trim() },
      { onSuccess: ({ id }) => void navigate(`/requests/${id}`, { replace: true }) },
    );
  return (
    <Page
      title="Begin an access request"
      lead={<p>The request begins as a draft that only you see. You can leave it and come back.</p>}
      note={<p>While you fill it in you see how many people it reaches and how many of them consent to your use.</p>}
    >
      <Section title="The cohort you ask for">
        <div className="grid max-w-2xl gap-2">
          <CohortInWords cohort={cohort} />
          <p>
            <TextLink to={gridAddress(cohort)}>Choose other groups in the grid</TextLink>
          </p>
        </div>
      </Section>
      <Section>
        <Form onSubmit={begin}>
          <TextField
            id="title"
            label="Title"
            hint="What you want to find out, in a few words. You can change it later."
            value={title}
            onChange={setTitle}
            maxLength={150}
          />
          {create.isError && <ErrorNotice error={create.error} />}
          <div>
            <Button type="submit" variant="primary" isPending={create.isPending}>
              Begin the request
            </Button>
          </div>
        </Form>
      </Section>
    </Page>
  );
}
