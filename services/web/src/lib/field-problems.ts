/** From a refusal's JSON pointers to the fields of a form. */
import { ProblemError } from './problem-error.ts';

export interface PlacedProblem {
  /** The `id` of the field; absent when no field on the page can mend it. */
  readonly fieldId?: string;
  readonly message: string;
}

/** Where something is wrong, as the registry and the contract tell it. */
export interface LocatedProblem {
  readonly pointer: string;
  readonly detail: string;
}

/**
 * `fieldIds`: the id of the field for each pointer the form can mend, for example `{ '/form/title': 'title' }`; a pointer deeper
 * than a key belongs to it. Anything else that was refused is told without a field.
 */
export function placed(problems: readonly LocatedProblem[], fieldIds: Readonly<Record<string, string>>): PlacedProblem[] {
  return problems.map(({ pointer, detail }) => {
    const key = Object.keys(fieldIds).find((known) => pointer === known || pointer.startsWith(`${known}/`));
    const fieldId = key === undefined ? undefined : fieldIds[key];
    return { ...(fieldId !== undefined && { fieldId }), message: detail };
  });
}

/** Of a refusal; none of any other error. */
export const problemsOf = (error: unknown, fieldIds: Readonly<Record<string, string>>): PlacedProblem[] =>
  error instanceof ProblemError ? placed(error.errors, fieldIds) : [];
