/** Participant codes that a site has replaced: after its key was changed, or when two codes turned out to be one person's. */
import { pseudonymPattern } from '@cairnstep/dictionary';
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Id } from './vocabulary.ts';

const ParticipantCode = z.string().regex(pseudonymPattern, 'This is not a participant code');

/** Codes of one batch. A site sees a few hundred people a year; its whole registry fits. */
export const mostReplacedCodes = 20_000;

export const CodePairs = z
  .array(z.strictObject({ from: ParticipantCode, to: ParticipantCode }))
  .min(1, 'Send at least one pair of codes')
  .max(mostReplacedCodes, `Send at most ${mostReplacedCodes} pairs at a time`);

export const replaceCodes = endpoint({
  method: 'POST',
  path: '/api/sites/:siteId/replaced-codes',
  summary: "Put new participant codes in the place of old ones, all or none, in the site's rows and their history",
  params: z.strictObject({ siteId: Id }),
  body: z.strictObject({ codes: CodePairs }),
  largestBody: 2_000_000,
  response: z.strictObject({
    /** Codes that the registry held and now holds under the new code. */
    replaced: z.number().int(),
    /** Codes it held no row of: nothing to do, but files with them are refused from now on. */
    unknown: z.number().int(),
    /** People of whom two or more codes are now one. */
    joined: z.number().int(),
    /** Rows that carry a new code. */
    rows: z.number().int(),
    /** Earlier values of rows that are now found under the new code. */
    earlierValues: z.number().int(),
  }),
  problems: ['not-found', 'codes-collide', 'too-large'],
});
