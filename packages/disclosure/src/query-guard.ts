/**
 * Minimum size and minimum difference of the sets of people a project is given statistics about.
 *
 * Two safe answers can make an unsafe one: the mean of 24 people and the mean of 23 of them give the last one's value. So each answered
 * set of people is kept, and a new question is compared with all of the project's, whoever asked and in whichever data cut. An export
 * is an answered set as well. Sets are compared by their people, not by the wording of the filter.
 */
import { isCloseToCombination } from './close-combinations.ts';
import type { PeopleSet } from './people-set.ts';
import { countDifference } from './people-set.ts';
import { requireSmallestShown, SMALLEST_SHOWN } from './smallest-shown.ts';

export interface AnsweredSet {
  readonly project: string;
  /** The frozen data cut or release the answer came from. */
  readonly cut: string;
  readonly people: PeopleSet;
}

export interface Question {
  readonly project: string;
  readonly cut: string;
  readonly people: PeopleSet;
  /** Everybody in the data cut: their figures are public, so they count as answered. */
  readonly everyone: PeopleSet;
}

/** For the audit log only. Whoever asked is told `refusalText` and nothing else, or the reason itself would answer. */
export type RefusalReason = 'too-few-people' | 'too-close-to-everyone' | 'too-close-to-an-answer' | 'too-close-to-several-answers';

export type Judgement =
  | { readonly verdict: 'answer' }
  /** Give the stored answer again: the same people, the same cut. */
  | { readonly verdict: 'answer-as-before'; readonly answered: AnsweredSet }
  | { readonly verdict: 'refuse'; readonly reason: RefusalReason };

/** The one text for every refusal. */
export const refusalText = 'Too few people, or too close to an earlier question.';

/**
 * @param answered sets answered so far; those of other projects are passed over
 * @param smallestShown policy, at least 11
 * @throws RangeError for a lower `smallestShown`
 */
export function judgeQuestion(question: Question, answered: readonly AnsweredSet[], smallestShown: number = SMALLEST_SHOWN): Judgement {
  const limit = requireSmallestShown(smallestShown) - 1;
  const isTooClose = (difference: number) => difference >= 1 && difference <= limit;
  const ofProject = answered.filter(({ project }) => project === question.project);
  const differences = ofProject.map(({ people }) => countDifference(people, question.people));

  const before = ofProject.find(({ cut }, at) => cut === question.cut && differences[at] === 0);
  if (before !== undefined) return { verdict: 'answer-as-before', answered: before };
  if (question.people.size <= limit) return { verdict: 'refuse', reason: 'too-few-people' };
  if (isTooClose(countDifference(question.people, question.everyone))) return { verdict: 'refuse', reason: 'too-close-to-everyone' };
  if (differences.some(isTooClose)) return { verdict: 'refuse', reason: 'too-close-to-an-answer' };
  const known = ofProject.map(({ people }) => people);
  if (isCloseToCombination(question.people, known, question.everyone, limit)) {
    return { verdict: 'refuse', reason: 'too-close-to-several-answers' };
  }
  return { verdict: 'answer' };
}
