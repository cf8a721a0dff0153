/** The kinds of check, in the order in which they run: the quick ones first. */
import { join } from 'node:path';
import { projectRoot } from '../project-root.ts';
import { failedOnce, judged, passedOnce } from './outcome.ts';
import type { Outcome } from './outcome.ts';
import { outcomeIn, playwrightOutcome, vitestOutcome } from './reports.ts';
import { runChild } from '../start/run-child.ts';

export interface KindContext {
  /** Administrator's address of the throw-away cluster. */
  readonly databaseAdminUrl: string | undefined;
  /** Where reports are written. */
  readonly reports: string;
  readonly signal: AbortSignal;
}

export interface Kind {
  readonly name: string;
  /** Whether it needs the throw-away cluster. */
  readonly usesDatabase: boolean;
  run(context: KindContext): Promise<Outcome>;
}

const installed = (path: string): string => join(projectRoot, 'node_modules', path);

/** A script of package.json that passes or fails as one. */
const script = (name: string): Kind => ({
  name,
  usesDatabase: false,
  run: async ({ signal }) => ((await runChild('npm', ['run', '--silent', name], process.env, signal)) === 0 ? passedOnce : failedOnce),
});

const vitest = (name: string, usesDatabase: boolean): Kind => ({
  name,
  usesDatabase,
  async run({ databaseAdminUrl, reports, signal }) {
    const file = join(reports, `${name}.json`);
    const args = [
      installed('vitest/vitest.mjs'),
      'run',
      '--project',
      name,
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${file}`,
    ];
    const environment = databaseAdminUrl === undefined ? process.env : { ...process.env, TEST_DATABASE_ADMIN_URL: databaseAdminUrl };
    const code = await runChild(process.execPath, args, environment, signal);
    return judged(outcomeIn(file, vitestOutcome), code);
  },
});

const journeys: Kind = {
  name: 'journeys',
  // The product under test starts a cluster of its own, as it does for everybody.
  usesDatabase: false,
  async run({ reports, signal }) {
    const file = join(reports, 'journeys.json');
    const args = [installed('@playwright/test/cli.js'), 'test', '-c', 'tests/journeys/playwright.config.ts', '--reporter=list,json'];
    const environment = {
      ...process.env,
      PLAYWRIGHT_JSON_OUTPUT_NAME: file,
      // Journeys may import the project's packages, which are read from their sources here as in every other test.
      NODE_OPTIONS: `${process.env['NODE_OPTIONS'] ?? ''} --conditions=@cairnstep/source`.trim(),
    };
    const code = await runChild(process.execPath, args, environment, signal);
    return judged(outcomeIn(file, playwrightOutcome), code);
  },
};

export const kinds: readonly Kind[] = [
  script('types'),
  script('lint'),
  vitest('unit', false),
  vitest('web', false),
  vitest('database', true),
  vitest('sign-in', true),
  vitest('api', true),
  journeys,
];
