/** The form of a request. Whatever is typed is kept as it is typed; whom the request reaches stands beside it. */
import type { AccessRequest, RequestForm } from '@cairnstep/contract';
import { useState } from 'react';
import type { ReactNode } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import { ProblemError } from '../../lib/problem-error.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { Checkbox } from '../../ui/checkbox.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Form } from '../../ui/form.tsx';
import { NumberField } from '../../ui/number-field.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';
import { TextArea, TextField } from '../../ui/text-field.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { gridAddress } from './cohort-address.ts';
import { CohortInWords } from './cohort-in-words.tsx';
import { countries } from './countries.ts';
import { DeleteDraft } from './delete-draft.tsx';
import { draftProblems, fieldIdsOf, readDate, readTeam } from './draft-fields.ts';
import { KeptLine } from './kept-line.tsx';
import { Reach } from './reach.tsx';
import { duties, purposes, terms, titleOf } from './request-words.ts';
import { useSubmitRequest } from './requests.queries.ts';
import { TableChoice } from './table-choice.tsx';
import { useDraft } from './use-draft.ts';

const yesOrNo = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
];

export function RequestDraft({ request }: { readonly request: AccessRequest }) {
  const { form, change, keeping, keepNow, cohortBrought } = useDraft(request);
  const [typed, setTyped] = useState({ ethicsExpiresOn: form.ethicsExpiresOn ?? '', team: form.team.join('\n') });
  const [problems, setProblems] = useState<readonly PlacedProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const submit = useSubmitRequest(request.id);
  const wanting = draftProblems(form, typed, new Date().toISOString().slice(0, 10));

  /** What every field has: its id, its problem until it is changed, and its place in the form. */
  const field = <K extends keyof RequestForm>(id: string, key: K) => ({
    id,
    value: form[key],
    error: problems.find(({ fieldId }) => fieldId === id)?.message,
    onChange: (value: RequestForm[K]) => {
      mend(id);
      change({ [key]: value });
    },
    onBlur: keepQuietly,
  });
  const choice = <K extends keyof RequestForm>(id: string, key: K) => {
    const { value, onChange, ...rest } = field(id, key);
    return { ...rest, value: value as string | null, onChange: (next: string) => onChange(next as RequestForm[K]) };
  };
  function mend(id: string): void {
    setProblems((before) => before.filter(({ fieldId }) => fieldId !== id));
  }
  function keepQuietly(): void {
    // Whether it was kept is told by the line beside the form.
    void keepNow().catch(() => undefined);
  }
  function show(found: readonly PlacedProblem[]): void {
    setProblems(found);
    setAttempt(attempt + 1);
  }

  async function handIn(): Promise<void> {
    await keepNow();
    try {
      await submit.mutateAsync();
      announce(`Request ${request.number} was handed in.`);
    } catch (error) {
      if (!(error instanceof ProblemError && error.code === 'request-incomplete')) throw error;
      show(problemsOf(error, fieldIdsOf(form)));
    }
  }

  return (
    <Page
      title={titleOf(form)}
      kicker={`Access request ${request.number}, draft`}
      lead={
        <p>Write what you want to find out and which rows you need for it. Every word is kept as you type: you can leave and come back.</p>
      }
      note={<p>A data steward reads all of this. The summary for participants may be published when the request is approved.</p>}
    >
      <Section
        note={
          <div className="grid gap-4 lg:sticky lg:top-6">
            <h2 className="font-semibold text-ink">Whom it reaches</h2>
            <Reach request={request} />
            <p>
              To the nearest 5, counts of 1 to 10 hidden. Each answer that consent depends on changes the second number: purpose, commercial
              interest, ethics approval, organisation, country, duration, duties.
            </p>
            <KeptLine keeping={keeping} />
          </div>
        }
      >
        <Form onSubmit={keepQuietly} problems={problems} attempt={attempt}>
          <Part title="The project">
            <TextField {...field('title', 'title')} label="Title" isRequired maxLength={150} />
            <TextArea
              {...field('question', 'question')}
              label="Research question"
              hint="One or two sentences: what is compared or described, in whom."
              isRequired
              maxLength={2000}
            />
            <TextArea
              {...field('lay-summary', 'laySummary')}
              label="Summary for participants"
              hint="In words that the people whose data it is can follow."
              isRequired
              rows={6}
              maxLength={2500}
            />
            <RadioGroup
              {...choice('purpose', 'purpose')}
              label="Purpose"
              hint="Each participant’s consent is matched against it."
              isRequired
              options={purposes}
            />
            <RadioGroup
              {...choice('commercial-interest', 'commercialInterest')}
              label="Has anyone a commercial interest in the result?"
              hint="If so, two stewards decide, and some consents do not allow it."
              isRequired
              inline
              options={yesOrNo}
            />
            <TextField {...field('funding', 'funding')} label="Funding" hint="Who pays for the work. May stay empty." maxLength={500} />
          </Part>
          <Part title="Ethics approval">
            <TextField {...field('ethics-committee', 'ethicsCommittee')} label="Ethics committee" isRequired maxLength={200} />
            <TextField {...field('ethics-reference', 'ethicsReference')} label="Reference of the approval" isRequired maxLength={100} />
            <TextField
              id="ethics-expires-on"
              label="Last day of the approval"
              hint="Year, month, day, for example 2027-06-30"
              isRequired
              value={typed.ethicsExpiresOn}
              error={problems.find(({ fieldId }) => fieldId === 'ethics-expires-on')?.message}
              onChange={(text) => {
                mend('ethics-expires-on');
                setTyped((before) => ({ ...before, ethicsExpiresOn: text }));
                change({ ethicsExpiresOn: readDate(text) });
              }}
              onBlur={keepQuietly}
            />
          </Part>
          <Part title="The people">
            <RadioGroup
              {...choice('organisation-type', 'organisationType')}
              label="Your organisation works"
              isRequired
              options={[
                { value: 'not_for_profit', label: 'not for profit' },
                { value: 'for_profit', label: 'for profit' },
              ]}
            />
            <TextArea
              id="team"
              label="Others who would see rows"
              hint="E-mail addresses of registered researchers, one a line. You belong to the team without naming yourself."
              rows={3}
              value={typed.team}
              error={problems.find(({ fieldId }) => fieldId === 'team')?.message}
              onChange={(text) => {
                mend('team');
                setTyped((before) => ({ ...before, team: text }));
                change({ team: readTeam(text).team });
              }}
              onBlur={keepQuietly}
            />
          </Part>
          <Part title="The setting">
            <Select
              {...choice('country', 'country')}
              label="Country where the team and the files are"
              isRequired
              placeholder="Choose a country"
              options={countries}
            />
            <TextArea
              {...field('storage', 'storage')}
              label="Where the files are kept, and who can reach them"
              isRequired
              rows={3}
              maxLength={1000}
            />
          </Part>
          <Part title="The data">
            <div className="max-w-xl">
              <h3 className="font-semibold">Cohort</h3>
              {cohortBrought && <p role="status">Taken over from the grid.</p>}
              <CohortInWords cohort={form.cohort} />
              <p className="mt-1">
                <TextLink to={gridAddress(form.cohort, request.id)}>Choose other groups in the grid</TextLink>
              </p>
            </div>
            <TableChoice
              value={form.tables}
              problems={problems}
              onChange={(chosen, fieldId) => {
                mend(fieldId);
                change({ tables: chosen });
              }}
              onBlur={keepQuietly}
            />
            <NumberField
              {...field('months', 'months')}
              label="How long access is needed"
              unit="months"
              hint="1 to 36, from the day of the decision"
              isRequired
              minValue={1}
              maxValue={36}
              step={1}
            />
          </Part>
          <Part title="What you owe in return">
            {duties.map(({ field: key, id, label }) => (
              <RadioGroup
                key={id}
                {...choice(id, key)}
                label={label}
                hint="Some participants consent on this condition only."
                isRequired
                inline
                options={yesOrNo}
              />
            ))}
            <Checkbox {...field('terms-accepted', 'termsAccepted')} isRequired>
              I accept the terms: {terms}.
            </Checkbox>
          </Part>
          <div className="flex flex-wrap items-center gap-3 border-t border-hairline pt-6">
            {wanting.length > 0 ? (
              <Button variant="primary" onPress={() => show(wanting)}>
                Hand in to the stewards
              </Button>
            ) : (
              <ConfirmDialog
                trigger={<Button variant="primary">Hand in to the stewards</Button>}
                title={`Hand in request ${request.number}?`}
                consequence={
                  <p>
                    The stewards are told by e-mail and decide on just this wording. You cannot change it any more; you can take it back
                    until it is decided.
                  </p>
                }
                confirm="Hand it in"
                cancel="Go on writing"
                onConfirm={handIn}
              />
            )}
            <DeleteDraft request={request} keepNow={keepNow} />
          </div>
        </Form>
      </Section>
    </Page>
  );
}

function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <fieldset className="grid gap-5 border-t border-hairline pt-5 first-of-type:border-t-0 first-of-type:pt-0">
      <legend className="float-left w-full">
        <h2 className="text-section font-semibold">{title}</h2>
      </legend>
      {children}
    </fieldset>
  );
}
