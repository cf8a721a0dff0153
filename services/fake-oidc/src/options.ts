/** What the stand-in is told at start. */

export interface Person {
  readonly subject: string;
  readonly name: string;
  readonly email: string;
  readonly label: string;
}

export interface MachineClient {
  readonly clientId: string;
  readonly clientSecret: string;
}

export interface FakeOidcOptions {
  /** 0 takes any free port. */
  readonly port: number;
  readonly host?: string;
  /** The address the provider answers to in its tokens; default `http://<host>:<port>`. */
  readonly issuer?: string;
  /** The registry's confidential client. */
  readonly clientId: string;
  readonly clientSecret: string;
  readonly redirectUris: readonly string[];
  readonly postLogoutRedirectUris: readonly string[];
  /** Where the registry hears that a person signed out here; without it nobody is told. */
  readonly backchannelLogoutUri?: string;
  readonly people: readonly Person[];
  /** Sites' systems, which get access tokens for `resource` by client credentials. */
  readonly machineClients?: readonly MachineClient[];
  /** The registry's API address: the audience of machine clients' access tokens. */
  readonly resource?: string;
  /** Signing and cookie keys are kept in this file, so that tokens outlast a restart; without it they are made anew. */
  readonly keysFile?: string;
}

export interface FakeOidc {
  readonly issuer: string;
  close(): Promise<void>;
}
