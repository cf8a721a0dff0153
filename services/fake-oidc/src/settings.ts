/** The stand-in's settings from the environment; a wrong one is named with what is expected. */
import { existsSync, readFileSync } from 'node:fs';
import { z } from 'zod';
import { demonstrationPeople } from './demonstration-people.ts';
import type { FakeOidcOptions } from './options.ts';

const Address = z.url({ protocol: /^https?$/, error: 'expected an http or https address' });
const Addresses = z
  .string()
  .transform((text) => text.split(/[\s,]+/).filter((address) => address !== ''))
  .pipe(z.array(Address));

const People = z.array(z.object({ subject: z.string().min(1), name: z.string().min(1), email: z.email(), label: z.string() })).min(1);
const MachineClients = z.array(z.object({ clientId: z.string().min(1), clientSecret: z.string().min(16) }));

/** A setting holding JSON, or the path of a file that does. */
const json = z.string().transform((text, context) => {
  try {
    return JSON.parse(existsSync(text) ? readFileSync(text, 'utf8') : text) as unknown;
  } catch {
    context.addIssue({ code: 'custom', message: 'expected JSON, or the path of a file with JSON' });
    return z.NEVER;
  }
});

const Settings = z.object({
  PORT: z.coerce.number().int().min(0).max(65_535),
  HOST: z.string().min(1).default('127.0.0.1'),
  ISSUER: Address.optional(),
  CLIENT_ID: z.string().min(1),
  CLIENT_SECRET: z.string().min(16, 'expected at least 16 characters'),
  REDIRECT_URIS: Addresses.refine((addresses) => addresses.length > 0, 'expected at least one address'),
  POST_LOGOUT_REDIRECT_URIS: Addresses.default([]),
  BACKCHANNEL_LOGOUT_URI: Address.optional(),
  PEOPLE: json.pipe(People).optional(),
  MACHINE_CLIENTS: json.pipe(MachineClients).default([]),
  RESOURCE: Address.optional(),
  KEYS_FILE: z.string().min(1).optional(),
});

/** @throws Error naming every missing or wrong setting */
export function readSettings(environment: Readonly<Record<string, string | undefined>>): FakeOidcOptions {
  const parsed = Settings.safeParse(environment);
  if (!parsed.success) {
    throw new Error(
      `These settings are missing or wrong:\n${parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`).join('\n')}`,
    );
  }
  const settings = parsed.data;
  return {
    port: settings.PORT,
    host: settings.HOST,
    clientId: settings.CLIENT_ID,
    clientSecret: settings.CLIENT_SECRET,
    redirectUris: settings.REDIRECT_URIS,
    postLogoutRedirectUris: settings.POST_LOGOUT_REDIRECT_URIS,
    people: settings.PEOPLE ?? demonstrationPeople,
    machineClients: settings.MACHINE_CLIENTS,
    ...(settings.ISSUER === undefined ? {} : { issuer: settings.ISSUER }),
    ...(settings.BACKCHANNEL_LOGOUT_URI === undefined ? {} : { backchannelLogoutUri: settings.BACKCHANNEL_LOGOUT_URI }),
    ...(settings.RESOURCE === undefined ? {} : { resource: settings.RESOURCE }),
    ...(settings.KEYS_FILE === undefined ? {} : { keysFile: settings.KEYS_FILE }),
  };
}
