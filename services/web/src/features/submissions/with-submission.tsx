import type { Submission } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { Fragment } from 'react';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { Answer } from '../../ui/answer.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { submissionQuery } from './submissions.queries.ts';

export interface WithSubmissionProps {
  /** The page's title until the submission is there. */
  readonly title: string;
  /** `isCutOff`: the registry does not answer just now; what is shown may be old. */
  readonly children: (submission: Submission, isCutOff: boolean) => ReactNode;
}

/** The submission that the address names; another one is another page. */
export function WithSubmission({ title, children }: WithSubmissionProps) {
  const { submissionId = '' } = useParams();
  const query = useQuery(submissionQuery(submissionId));
  if (query.data !== undefined) return <Fragment key={submissionId}>{children(query.data, query.isRefetchError)}</Fragment>;
  return (
    <Page title={title}>
      <Section>
        <Answer query={query} waiting="Reading the submission.">
          {() => null}
        </Answer>
      </Section>
    </Page>
  );
}
