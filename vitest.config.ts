import react from '@vitejs/plugin-react';
import { defaultServerConditions } from 'vite';
import { defineConfig } from 'vitest/config';

/** Packages are read from their sources, so no build is needed before a test. */
const conditions = ['@cairnstep/source'];
const resolve = { conditions: [...conditions, ...defaultServerConditions], externalConditions: conditions };
// `__vitest__` is the environment in which a project's global setup runs.
const shared = {
  resolve: { conditions },
  ssr: { resolve: { conditions, externalConditions: conditions } },
  environments: { __vitest__: { resolve } },
};

/** Tests against real servers: one file at a time per worker, longer limits because a database is cloned first. */
const integration = {
  environment: 'node' as const,
  testTimeout: 60_000,
  hookTimeout: 120_000,
  maxWorkers: 2,
  globalSetup: ['tests/support/global-setup.ts'],
};

export default defineConfig({
  test: {
    projects: [
      {
        ...shared,
        test: {
          name: 'unit',
          include: [
            'packages/*/src/**/*.test.ts',
            'services/{api,fake-oidc,mail-catcher}/src/**/*.test.ts',
            'services/web/build/*.test.ts',
            'infra/**/*.test.ts',
          ],
          testTimeout: 60_000,
        },
      },
      {
        ...shared,
        plugins: [react()],
        test: { name: 'web', include: ['services/web/src/**/*.test.{ts,tsx}'], environment: 'happy-dom', testTimeout: 30_000 },
      },
      { ...shared, test: { name: 'api', include: ['tests/api/**/*.test.ts'], ...integration } },
      { ...shared, test: { name: 'database', include: ['tests/database/**/*.test.ts'], ...integration } },
      { ...shared, test: { name: 'sign-in', include: ['tests/sign-in/**/*.test.ts'], ...integration } },
    ],
  },
});
