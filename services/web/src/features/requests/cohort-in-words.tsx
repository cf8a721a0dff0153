import type { RequestForm } from '@cairnstep/contract';
import { cohortPhrases } from '../../lib/cohort.ts';
import { outcomeInWords } from './request-words.ts';

export function CohortInWords({ cohort }: { readonly cohort: RequestForm['cohort'] }) {
  return (
    <>
      {cohort.cells.length === 0 ? (
        <p>Everyone of the release.</p>
      ) : (
        <ul className="list-disc pl-5">
          {cohortPhrases(cohort.cells).map((phrase) => (
            <li key={phrase}>{phrase}</li>
          ))}
        </ul>
      )}
      <p className="text-small text-quiet">
        Chosen while looking at: {outcomeInWords(cohort)}. The cohort is not limited to people who have this outcome.
      </p>
    </>
  );
}
