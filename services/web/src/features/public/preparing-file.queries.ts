/** What the preparing page, as one file, hashes to; written by its build and served beside it, not by the API. */
import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { UnexpectedAnswerError, UnreachableError } from '../../lib/problem-error.ts';

const PreparingFile = z.object({
  bytes: z.number().int(),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
});

export const preparingFileQuery = () =>
  queryOptions({
    queryKey: ['preparing-file'],
    queryFn: async ({ signal }) => {
      const response = await fetch('/prepare.json', { signal }).catch((cause: unknown) => {
        throw signal.aborted ? cause : new UnreachableError();
      });
      // A client that was built without the file answers with its start page.
      const parsed = PreparingFile.safeParse(await response.json().catch(() => undefined));
      if (!parsed.success) throw new UnexpectedAnswerError(response.status);
      return parsed.data;
    },
    staleTime: 10 * 60_000,
  });
