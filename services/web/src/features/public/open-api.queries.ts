/** The published description of the interface, read for its list of addresses. */
import { endpoint } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { call } from '../../lib/call.ts';

export interface Operation {
  readonly path: string;
  readonly method: string;
  readonly summary: string;
}

/** Only what the page shows; the document holds far more. */
const OpenApiDocument = z.object({
  paths: z.record(z.string(), z.record(z.string(), z.unknown())),
});
const OperationObject = z.object({ summary: z.string().default('') });

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
      return parsed.success ? [{ path, method: method.toUpperCase(), summary: parsed.data.summary }] : [];
    }),
  );
}
