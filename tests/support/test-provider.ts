/** An identity provider that does what a test tells it, honest unless told otherwise. */
import { createHash } from 'node:crypto';
import { createServer, type IncomingMessage } from 'node:http';
import { exportJWK, generateKeyPair, SignJWT, type CryptoKey, type JWTPayload } from 'jose';
import { listenLocally } from './server.ts';

export interface TokenRequest {
  readonly authorization: string | undefined;
  readonly form: URLSearchParams;
}

export interface Behaviour {
  /** Changes the metadata document. */
  metadata?: (document: Record<string, unknown>) => Record<string, unknown>;
  /** Changes the claims of the ID token, or what is signed and how. */
  claims?: (claims: JWTPayload) => JWTPayload;
  idToken?: (claims: JWTPayload) => Promise<string>;
}

export interface TestProvider {
  readonly issuer: string;
  readonly clientId: string;
  readonly keys: { readonly publicJwk: Record<string, unknown>; readonly privateKey: CryptoKey };
  readonly tokenRequests: TokenRequest[];
  behaviour: Behaviour;
  /** What the next code stands for: set by a test from the authorization request it followed. */
  expect(authorization: URL, subject?: string, extra?: JWTPayload): string;
  sign(claims: JWTPayload, header?: Record<string, unknown>): Promise<string>;
  close(): Promise<void>;
}

async function formOf(request: IncomingMessage): Promise<URLSearchParams> {
  let text = '';
  for await (const chunk of request) text += String(chunk);
  return new URLSearchParams(text);
}

export async function startTestProvider(): Promise<TestProvider> {
  const { publicKey, privateKey } = await generateKeyPair('RS256', { extractable: true });
  const publicJwk = { ...(await exportJWK(publicKey)), kid: 'key-1', alg: 'RS256', use: 'sig' };
  const codes = new Map<string, { challenge: string | null; claims: JWTPayload }>();
  const tokenRequests: TokenRequest[] = [];
  const clientId = 'cairnstep';

  const server = createServer((request, response) => {
    void (async () => {
      const json = (status: number, body: unknown): void => {
        response.writeHead(status, { 'Content-Type': 'application/json' }).end(JSON.stringify(body));
      };
      const path = new URL(request.url ?? '/', 'http://here').pathname;
      if (path === '/.well-known/openid-configuration') {
        const document = {
          issuer: provider.issuer,
          authorization_endpoint: `${provider.issuer}/authorize`,
          token_endpoint: `${provider.issuer}/token`,
          jwks_uri: `${provider.issuer}/keys`,
          end_session_endpoint: `${provider.issuer}/end`,
          response_types_supported: ['code'],
          subject_types_supported: ['public'],
          id_token_signing_alg_values_supported: ['RS256'],
          code_challenge_methods_supported: ['S256'],
          authorization_response_iss_parameter_supported: true,
        };
        return json(200, provider.behaviour.metadata?.(document) ?? document);
      }
      if (path === '/keys') return json(200, { keys: [publicJwk] });
      if (path === '/token') {
        const form = await formOf(request);
        tokenRequests.push({ authorization: request.headers.authorization, form });
        const known = codes.get(form.get('code') ?? '');
        codes.delete(form.get('code') ?? '');
        const verifier = form.get('code_verifier');
        const challenge = verifier === null ? null : createHash('sha256').update(verifier).digest('base64url');
        if (!known || challenge === null || challenge !== known.challenge) return json(400, { error: 'invalid_grant' });
        const claims = provider.behaviour.claims?.(known.claims) ?? known.claims;
        const idToken = await (provider.behaviour.idToken?.(claims) ?? provider.sign(claims));
        return json(200, { access_token: 'an-access-token', token_type: 'Bearer', expires_in: 60, id_token: idToken });
      }
      json(404, {});
    })();
  });

  const provider: TestProvider = {
    issuer: await listenLocally(server),
    clientId,
    keys: { publicJwk, privateKey },
    tokenRequests,
    behaviour: {},
    expect(authorization, subject = 'person-1', extra = {}) {
      const code = createHash('sha256')
        .update(authorization.href + String(codes.size) + String(Math.random()))
        .digest('hex');
      const now = Math.floor(Date.now() / 1000);
      codes.set(code, {
        challenge: authorization.searchParams.get('code_challenge'),
        claims: {
          iss: provider.issuer,
          sub: subject,
          aud: clientId,
          iat: now,
          exp: now + 300,
          auth_time: now,
          nonce: authorization.searchParams.get('nonce') ?? '',
          sid: 'provider-session-1',
          name: 'A Person',
          email: 'person@test.example',
          ...extra,
        },
      });
      return code;
    },
    sign: (claims, header = {}) =>
      new SignJWT(claims).setProtectedHeader({ alg: 'RS256', kid: 'key-1', typ: 'JWT', ...header }).sign(privateKey),
    close: () =>
      new Promise((resolve) => {
        server.closeAllConnections();
        server.close(() => resolve());
      }),
  };
  return provider;
}
