/** What each process is told: environment variables, the one way in which settings reach them. */
import { join } from 'node:path';
import { demonstrationSystems } from '@cairnstep/fake-oidc/demonstration-people';
import type { DatabaseAddresses } from '../database/roles.ts';
import { loopback } from '../network/ports.ts';
import { projectRoot } from '../project-root.ts';
import type { Ports } from './ports.ts';
import type { Secrets } from './secrets.ts';
import type { StartSettings } from './settings.ts';

export interface Place {
  readonly settings: StartSettings;
  readonly dataFolder: string;
  readonly ports: Ports;
  readonly secrets: Secrets;
  /** The API's own port; the product's, unless something stands in front of it. */
  readonly apiPort: number;
}

const clientId = 'cairnstep';

/** This process's environment, less the administrator's way into the database. */
function inherited(): NodeJS.ProcessEnv {
  const { DATABASE_URL: _administrators, ...rest } = process.env;
  return rest;
}

export const addressOf = (port: number): string => `http://${loopback}:${port}`;

/** Where browsers reach the product. */
export const publicUrlOf = ({ settings, ports }: Place): string => settings.publicUrl ?? addressOf(ports.product);

/** API and worker. */
export function apiEnvironment(place: Place, database: Pick<DatabaseAddresses, 'appUrl'>): NodeJS.ProcessEnv {
  const { settings, ports, secrets, apiPort } = place;
  return {
    ...inherited(),
    NODE_ENV: 'production',
    PORT: String(apiPort),
    HOST: loopback,
    PUBLIC_URL: publicUrlOf(place),
    TRUST_PROXY: String(settings.trustProxy),
    DATABASE_APP_URL: database.appUrl,
    SESSION_SECRET: secrets.sessionSecret,
    OIDC_ISSUER: addressOf(ports.provider),
    OIDC_CLIENT_ID: clientId,
    OIDC_CLIENT_SECRET: secrets.oidcClientSecret,
    OIDC_ALLOW_HTTP: 'yes',
    SMTP_URL: `smtp://${loopback}:${ports.smtp}`,
    MAIL_FROM: 'Cairnstep <registry@cairnstep.example>',
    WEB_DIST: join(projectRoot, 'services/web/dist'),
    LOG_LEVEL: settings.logLevel,
    DEMONSTRATION: 'yes',
  };
}

/** Where the seed puts files to try an upload with. */
export const exampleFilesOf = (dataFolder: string): string => join(dataFolder, 'example-files');

/** Migration, seed and audit check: the API's settings, and the administrator's way into the database. */
export function adminEnvironment(place: Place, database: DatabaseAddresses): NodeJS.ProcessEnv {
  return { ...apiEnvironment(place, database), DATABASE_URL: database.databaseUrl, EXAMPLE_FILES: exampleFilesOf(place.dataFolder) };
}

export function providerEnvironment(place: Place): NodeJS.ProcessEnv {
  const { dataFolder, ports, secrets, apiPort } = place;
  const publicUrl = publicUrlOf(place);
  return {
    ...inherited(),
    PORT: String(ports.provider),
    HOST: loopback,
    CLIENT_ID: clientId,
    CLIENT_SECRET: secrets.oidcClientSecret,
    REDIRECT_URIS: `${publicUrl}/api/sign-in/callback`,
    POST_LOGOUT_REDIRECT_URIS: `${publicUrl}/`,
    BACKCHANNEL_LOGOUT_URI: `${addressOf(apiPort)}/api/sign-in/back-channel-logout`,
    RESOURCE: `${publicUrl}/api`,
    MACHINE_CLIENTS: JSON.stringify(
      demonstrationSystems.map(({ clientId: id }) => ({ clientId: id, clientSecret: secrets.siteSystemSecret })),
    ),
    KEYS_FILE: join(dataFolder, 'provider-keys.json'),
  };
}

export function mailEnvironment({ dataFolder, ports }: Place): NodeJS.ProcessEnv {
  return {
    ...inherited(),
    PORT: String(ports.mailPages),
    SMTP_PORT: String(ports.smtp),
    HOST: loopback,
    FOLDER: join(dataFolder, 'mails'),
  };
}
