/** What each refusal means, in the order a reader asks: why, what was kept, what to do. */
import type { ProblemCode } from '@cairnstep/contract';

export interface Explanation {
  readonly meaning: string;
  readonly kept: string;
  readonly next: string;
}

const nothingChanged = 'Nothing was changed.';

export const explanations: Readonly<Record<ProblemCode, Explanation>> = {
  'not-signed-in': {
    meaning: 'The address is for people who work with the registry, and no one is signed in. A session also ends after a time without use.',
    kept: 'Nothing was changed. Drafts that were saved before are still there.',
    next: 'Sign in; you come back to the address you were at.',
  },
  'no-grant': {
    meaning: 'You are signed in, but no role in the registry has been given to you, or the last one has ended.',
    kept: nothingChanged,
    next: 'Ask an administrator of the registry for a role. It counts from your next request; you need not sign in again.',
  },
  'not-permitted': {
    meaning: 'Your role in the registry does not include this act, or not for this site.',
    kept: nothingChanged,
    next: 'If your work needs it, ask an administrator of the registry.',
  },
  'request-not-from-here': {
    meaning: 'A change must be sent by the registry’s own pages, or by a program that says so with a header. This one was not.',
    kept: nothingChanged,
    next: 'Open the registry from its own address and try there. Programs send the header X-Cairnstep-Request: 1.',
  },
  'not-found': {
    meaning: 'The address names nothing that you may see. It may be mistyped, or the thing belongs to another site.',
    kept: nothingChanged,
    next: 'Begin again from the list it should be in.',
  },
  'invalid-input': {
    meaning: 'One or more fields hold something that cannot be used. Each is named, with what is expected.',
    kept: 'Nothing was changed. What you typed stays in the form.',
    next: 'Mend the fields named and send again.',
  },
  'too-large': {
    meaning: 'The file or request is larger than the registry accepts in one piece.',
    kept: 'Nothing was changed. Files added before are still there.',
    next: 'Send one month and one table at a time. If a single month is too large, ask an administrator.',
  },
  'too-many-requests': {
    meaning: 'More requests came from your account or address in a short time than the registry answers.',
    kept: 'Nothing was changed by the requests that were refused.',
    next: 'Wait a minute and try again.',
  },
  busy: {
    meaning: 'The registry is starting, being restarted, or has more to do than it can answer right now.',
    kept: nothingChanged,
    next: 'Try again in a minute.',
  },
  'internal-error': {
    meaning: 'Something failed in the registry that should not have. The answer carries a request number under which the details are kept.',
    kept: 'The act was taken back as a whole; nothing was half saved.',
    next: 'Try once more. If it fails again, tell an administrator the request number.',
  },
  'provider-unavailable': {
    meaning: 'Your organisation’s sign-in service did not answer, so the registry could not learn who you are.',
    kept: 'Nothing was changed. Drafts are kept.',
    next: 'Try again in a few minutes. If it lasts, ask those who run your organisation’s accounts.',
  },
  'sign-in-failed': {
    meaning: 'The answer of the sign-in service did not fit the question asked: it came too late, was used before, or was cut short.',
    kept: nothingChanged,
    next: 'Start signing in again, in one window.',
  },
  'invitation-unusable': {
    meaning: 'The invitation was used already, has expired, or was taken back.',
    kept: 'Roles given to you before are untouched.',
    next: 'Ask whoever invited you for a new invitation.',
  },
  'token-refused': {
    meaning:
      'A program sent an access token that does not hold: it has expired, was given by another provider or for another address, or its client is not registered for a site, or was disabled.',
    kept: nothingChanged,
    next: 'Get a fresh token from the identity provider. If that is refused too, ask an administrator whether the client id is registered and enabled.',
  },
  'token-without-scope': {
    meaning: 'The access token is sound, but the identity provider did not put the scope into it that submitting asks for.',
    kept: nothingChanged,
    next: 'Ask for the token with scope=submissions. If the provider does not grant it, ask whoever runs the provider.',
  },
  'two-identities': {
    meaning:
      'The request carried the session of a signed-in person and the access token of a system. Whose act it would be, nobody could say.',
    kept: nothingChanged,
    next: 'Send the token alone: a program keeps no cookies of the registry.',
  },
  'system-registered': {
    meaning: 'A client id of the identity provider belongs to one system of one site, and this one is registered.',
    kept: nothingChanged,
    next: 'Enable the system that is registered, or let the provider give out another client id.',
  },
  'grant-to-oneself': {
    meaning: 'Nobody can give, end or disable their own roles.',
    kept: nothingChanged,
    next: 'Ask another administrator to do it.',
  },
  'already-held': {
    meaning: 'The person has the same role, for the same site, on at least one of the days named.',
    kept: nothingChanged,
    next: 'Nothing needs to be done for the days it counts. For another last day, end the role and give it again.',
  },
  'submission-stale': {
    meaning:
      'The registry’s rows of this month changed after the preview was made, so a commit would do something other than what you saw.',
    kept: 'Your files are kept. Nothing was committed.',
    next: 'Check the submission again, look at the new preview, then commit.',
  },
  'submission-has-errors': {
    meaning: 'At least one finding is an error. A month is taken in as a whole or not at all.',
    kept: 'Your files and their findings are kept. Nothing was committed.',
    next: 'Mend the rows named in your files, add the files again and check once more.',
  },
  'submission-has-open-warnings': {
    meaning: 'A warning asks whether something unusual is true. At least one has no reason beside it yet.',
    kept: 'Your files, findings and reasons are kept. Nothing was committed.',
    next: 'Mend the rows, or say in a few words why they stand, then commit.',
  },
  'submission-closed': {
    meaning: 'This submission was committed, replaced by a later one, or given up. It takes no more changes.',
    kept: 'It stays as it was, with its receipt if it was committed.',
    next: 'Open the month again to submit a correction.',
  },
  'submission-busy': {
    meaning: 'The files are being read and checked right now.',
    kept: 'Your files are kept.',
    next: 'Wait until the check has finished; the page shows how far it is.',
  },
  'submission-empty': {
    meaning: 'There is nothing to check: no file has been added.',
    kept: nothingChanged,
    next: 'Add at least one file of the month.',
  },
  'month-not-open': {
    meaning: 'The month lies in the future, or outside the time your site’s agreement covers.',
    kept: nothingChanged,
    next: 'Choose another month. If the agreement’s dates are wrong, ask an administrator.',
  },
  'month-not-empty': {
    meaning: 'A month can be closed as “nothing to report” only while nothing was submitted for it and no submission of it is under way.',
    kept: nothingChanged,
    next: 'Give up the submission that is under way, or correct the one that was accepted.',
  },
  'identifies-somebody': {
    meaning: 'What was typed or sent looks like something that identifies a person: a name, a date, a number or an address.',
    kept: 'Nothing of it was kept.',
    next: 'Type study days, plain numbers and codes. Names, dates and numbers of people stay at the clinic.',
  },
  'codes-collide': {
    meaning:
      'Two participant codes were to become one, but both hold a row of the same day and number, and the two rows do not say the same. Which is right, only the clinic knows.',
    kept: 'Nothing was changed, for none of the codes of the batch.',
    next: 'Correct the months of one of the two codes, so that the rows agree or only one holds them. Then send the codes again.',
  },
  'file-unreadable': {
    meaning: 'The file is not a CSV file in UTF-8 with the columns of the template, or it is damaged.',
    kept: 'The file was not added. Files added before are still there.',
    next: 'Save it again as CSV (UTF-8) from the template and add it once more.',
  },
  'request-incomplete': {
    meaning: 'Some answers that a decision needs are missing from the request.',
    kept: 'The draft is kept as typed.',
    next: 'Fill in what is named and submit again.',
  },
  'request-not-in-state': {
    meaning: 'The request was submitted, decided or withdrawn since you opened it, and no longer allows this.',
    kept: 'The request stays as it now is.',
    next: 'Load the page again to see where it stands.',
  },
  'conflict-of-interest': {
    meaning: 'A steward does not decide a request of a team they belong to, nor one they have an interest in.',
    kept: 'No decision was recorded.',
    next: 'Leave the request to another steward.',
  },
  'already-voted': {
    meaning: 'Each steward decides once on a version of a request, and your decision on this one is recorded.',
    kept: 'Your first decision stands.',
    next: 'If the request changes, its new version can be decided anew.',
  },
  'access-ended': {
    meaning: 'The approval had an end date, and it has passed, or the access was ended early.',
    kept: 'The request and its decision stay on record.',
    next: 'Write a new request if the work goes on. Copies you hold must be destroyed as the agreement says.',
  },
  'export-not-ready': {
    meaning: 'The export is still being built, or building it failed.',
    kept: 'The approval stands.',
    next: 'Wait until the page says it is ready. If it failed, build it again.',
  },
  'export-stale': {
    meaning: 'A participant in this export has withdrawn, or the approval changed, since it was built.',
    kept: 'The approval stands.',
    next: 'Build the export again. Destroy the copy you hold and confirm that you did.',
  },
  'release-unchanged': {
    meaning: 'A release made now would be the same as the last one.',
    kept: 'No release was made.',
    next: 'Make a release after the next month has been committed.',
  },
};
