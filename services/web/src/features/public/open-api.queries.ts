/** The published description of the interface, read for its list of addresses. */
import { endpoint } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { call } from '../../lib/call.ts';

export interface Operation {
  readonly path: string;
  readonly method: string;
  readonly summary: string;
  readonly callers: 'anyone' | 'people' | 'people and systems';
}

/** Only what the page shows; the document holds far more. */
const OpenApiDocument = z.object({
  paths: z.record(z.string(), z.record(z.string(), z.unknown())),
});
const OperationObject = z.object({ summary: z.string().default(''), security: z.array(z.record(z.string(), z.unknown())).default([]) });

const getOpenApi = endpoint({
  method: 'GET',
  path: '/api/openapi.json',
  summary: 'The description of the interface',
  response: OpenApiDocument,
  problems: [],
});

const methods = ['get', 'post', 'put', 'delete'];

export const openApiQuery = () =>
  queryOptions({
    queryKey: ['open-api'],
    queryFn: async ({ signal }) => ({ operations: operationsOf(await call(getOpenApi, {}, { signal })) }),
    staleTime: Infinity,
  });

function operationsOf({ paths }: z.output<typeof OpenApiDocument>): Operation[] {
  return Object.entries(paths).flatMap(([path, item]) =>
    methods.flatMap((method) => {
      const parsed = OperationObject.safeParse(item[method]);
      if (!parsed.success) return [];
      const { summary, security } = parsed.data;
      return [{ path, method: method.toUpperCase(), summary, callers: callersOf(security) }];
    }),
  );
}

function callersOf(security: readonly Readonly<Record<string, unknown>>[]): Operation['callers'] {
  if (security.length === 0) return 'anyone';
  return security.some((way) => 'siteSystem' in way) ? 'people and systems' : 'people';
}
