/** What in a reason would tell who somebody is, found with the detectors of the registry before it is sent. Loaded when the first reason is kept. */
import { detectIdentifiers, identifierWords } from '@cairnstep/deidentification';

/** Kinds of things in words, such as "the name of a person"; never the thing itself. */
export function identifyingIn(reason: string): readonly string[] {
  const found = detectIdentifiers({ headers: ['reason'], rows: [[reason]] }, { roles: new Map([['reason', 'text']]) });
  return [...new Set(found.filter(({ strength }) => strength === 'block').map(({ class: kind }) => identifierWords[kind]))];
}
