/** OpenAPI 3.1 from the contract: zod writes the JSON Schemas. */
import { commonProblems, endpoints, problems, type Endpoint, type ProblemCode } from '@cairnstep/contract';
import { z } from 'zod';
import { authority, entries } from '../authority/table.ts';
import type { Config } from '../config.ts';
import { systemAudience, systemScope } from '../features/site-systems/access-token.ts';

type Json = { [key: string]: unknown };

const jsonSchema = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, target: 'draft-2020-12', unrepresentable: 'any' }) as Json;
  return rest;
};

function parametersOf(place: 'path' | 'query', schema: z.ZodType | undefined): Json[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = jsonSchema(schema, 'input') as { properties?: Record<string, Json>; required?: string[] };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}

const withStatus = (codes: readonly ProblemCode[]): Map<number, ProblemCode[]> => {
  const byStatus = new Map<number, ProblemCode[]>();
  for (const code of codes) byStatus.set(problems[code].status, [...(byStatus.get(problems[code].status) ?? []), code]);
  return byStatus;
};

/** What lets a caller in: any one of the list. */
function securityOf(name: keyof typeof endpoints): Json[] {
  const entry = entries[name];
  if (entry === 'anyone') return [];
  const ofSystems = entry !== 'signed-in' && authority[entry]['site-system'] !== 'no';
  return ofSystems ? [{ session: [] }, { siteSystem: [systemScope] }] : [{ session: [] }];
}

function operationOf(name: keyof typeof endpoints, endpoint: Endpoint): Json {
  const responses: Json = {};
  const content = endpoint.download
    ? { [endpoint.download.contentType]: { schema: { type: 'string', format: 'binary' } } }
    : { 'application/json': { schema: jsonSchema(endpoint.response, 'output') } };
  responses[String(endpoint.status ?? 200)] = { description: endpoint.summary, content };
  for (const [status, codes] of withStatus([...commonProblems, ...endpoint.problems])) {
    responses[String(status)] = {
      description: codes.map((code) => `${code}: ${problems[code].title}`).join('. '),
      content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
    };
  }
  const body = endpoint.upload
    ? { required: true, content: { [endpoint.upload.contentType]: { schema: { type: 'string', format: 'binary' } } } }
    : endpoint.body
      ? { required: true, content: { 'application/json': { schema: jsonSchema(endpoint.body, 'input') } } }
      : undefined;
  return {
    operationId: name,
    summary: endpoint.summary,
    description: `Asks for: ${entries[name]}.`,
    parameters: [...parametersOf('path', endpoint.params), ...parametersOf('query', endpoint.query)],
    ...(body ? { requestBody: body } : {}),
    responses,
    security: securityOf(name),
  };
}

export function openApiDocument(config: Pick<Config, 'PUBLIC_URL' | 'OIDC_ISSUER'>): Json {
  const paths: Record<string, Json> = {};
  for (const [name, endpoint] of Object.entries(endpoints) as [keyof typeof endpoints, Endpoint][]) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: operationOf(name, endpoint) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Cairnstep',
      version: '1',
      description:
        'What the application’s own pages use. Requests that change something carry the header `X-Cairnstep-Request: 1`, unless they carry an access token. Refusals are `application/problem+json`.',
    },
    servers: [{ url: config.PUBLIC_URL }],
    paths,
    components: {
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'session', description: 'Set by signing in.' },
        siteSystem: {
          type: 'openIdConnect',
          openIdConnectUrl: `${config.OIDC_ISSUER.replace(/\/$/, '')}/.well-known/openid-configuration`,
          description: `A site's own system: a JWT access token of the client credentials grant, with audience ${systemAudience(config)} and scope ${systemScope}, in the Authorization header as Bearer. The system is registered by an administrator and reaches one site.`,
        },
      },
      schemas: {
        Problem: {
          type: 'object',
          required: ['type', 'status', 'title', 'detail', 'instance'],
          properties: {
            type: { type: 'string', enum: Object.keys(problems).map((code) => `/problems/${code}`) },
            status: { type: 'integer' },
            title: { type: 'string' },
            detail: { type: 'string' },
            instance: { type: 'string' },
            errors: {
              type: 'array',
              items: {
                type: 'object',
                required: ['pointer', 'detail'],
                properties: { pointer: { type: 'string' }, detail: { type: 'string' } },
              },
            },
          },
        },
      },
    },
  };
}
