/** The OpenAPI document against the published schema of OpenAPI 3.1, and against the contract it comes from. */
import { Validator } from '@seriousme/openapi-schema-validator';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import supertest from 'supertest';
import { endpoints, problems } from '../../packages/contract/src/index.ts';
import { authority, entries } from '../../services/api/src/authority/table.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

interface Operation {
  readonly operationId: string;
  readonly parameters: readonly { readonly name: string; readonly in: string }[];
  readonly responses: Readonly<Record<string, unknown>>;
  readonly security: readonly Readonly<Record<string, readonly string[]>>[];
}
let server: TestServer;
let document: {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
  components: { securitySchemes: Record<string, { type: string; openIdConnectUrl?: string }> };
};
beforeAll(async () => {
  server = await startTestServer();
  document = (await supertest(server.url).get('/api/openapi.json').expect(200)).body;
});
afterAll(() => server.close());

const operations = () =>
  Object.entries(document.paths).flatMap(([path, methods]) => Object.values(methods).map((operation) => ({ path, operation })));

describe('the OpenAPI document', () => {
  // The validator holds the schema published by the OpenAPI Initiative.
  it('is valid OpenAPI 3.1', async () => {
    const validator = new Validator();
    const result = await validator.validate(document as unknown as Parameters<typeof validator.validate>[0]);
    expect(result.errors ?? []).toEqual([]);
    expect(result.valid).toBe(true);
    expect(validator.version).toBe('3.1');
  });

  it('describes every endpoint of the contract once', () => {
    expect(
      operations()
        .map(({ operation }) => operation.operationId)
        .sort(),
    ).toEqual(Object.keys(endpoints).sort());
  });

  it('declares each parameter of a path', () => {
    for (const { path, operation } of operations()) {
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]);
      expect(
        operation.parameters
          .filter((parameter) => parameter.in === 'path')
          .map((parameter) => parameter.name)
          .sort(),
      ).toEqual(inPath.sort());
    }
  });

  it("says what lets a caller in: nothing, a session, or also the token of a site's system", () => {
    for (const { operation } of operations()) {
      const entry = entries[operation.operationId as keyof typeof endpoints];
      const ways = operation.security.map((way) => Object.keys(way)[0]);
      if (entry === 'anyone') expect(ways, operation.operationId).toEqual([]);
      else if (entry === 'signed-in' || authority[entry]['site-system'] === 'no') expect(ways, operation.operationId).toEqual(['session']);
      else expect(operation.security, operation.operationId).toEqual([{ session: [] }, { siteSystem: ['submissions'] }]);
    }
    expect(document.components.securitySchemes['siteSystem']).toMatchObject({
      type: 'openIdConnect',
      openIdConnectUrl: `${server.config.OIDC_ISSUER}/.well-known/openid-configuration`,
    });
  });

  it('names the status of every refusal an endpoint can answer with', () => {
    for (const { operation } of operations()) {
      const { problems: codes } = endpoints[operation.operationId as keyof typeof endpoints];
      for (const code of codes) expect(Object.keys(operation.responses)).toContain(String(problems[code].status));
    }
  });
});

describe('the contract', () => {
  it('gives no two parts of a request the same name, since a use case receives them as one', () => {
    const keysOf = (schema: unknown): string[] => Object.keys((schema as { shape?: object } | undefined)?.shape ?? {});
    for (const [name, endpoint] of Object.entries(endpoints)) {
      const { params, query, body } = endpoint as { params?: unknown; query?: unknown; body?: unknown };
      const names = [...keysOf(params), ...keysOf(query), ...keysOf(body)];
      expect(new Set(names).size, name).toBe(names.length);
    }
  });
});
