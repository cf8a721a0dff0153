/** What the use cases of a running process share. Made once by the door (HTTP or worker), passed on, never global. */
import type { DataSource } from 'typeorm';
import type { Logger } from 'pino';
import type { Config } from './config.ts';

export interface Context {
  readonly config: Config;
  readonly database: DataSource;
  readonly log: Logger;
  readonly clock: () => Date;
}
