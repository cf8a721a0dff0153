/** Reading the test programs' own reports. */
import { existsSync, readFileSync } from 'node:fs';
import { z } from 'zod';
import type { Outcome } from './outcome.ts';

const VitestReport = z.object({
  numPassedTests: z.int(),
  numFailedTests: z.int(),
  numPendingTests: z.int(),
  numTodoTests: z.int(),
  testResults: z.array(z.object({ status: z.string(), assertionResults: z.array(z.object({ status: z.string() })) })),
});

const PlaywrightReport = z.object({
  errors: z.array(z.unknown()),
  stats: z.object({ expected: z.int(), unexpected: z.int(), flaky: z.int(), skipped: z.int() }),
});

/** vitest's JSON report. A file that could not be run (an import that fails, a hook that throws) counts as one failure. */
export function vitestOutcome(report: unknown): Outcome {
  const { numPassedTests, numFailedTests, numPendingTests, numTodoTests, testResults } = VitestReport.parse(report);
  const brokenFiles = testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  );
  return { passed: numPassedTests, failed: numFailedTests + brokenFiles.length, skipped: numPendingTests + numTodoTests };
}

/** Playwright's JSON report. A test that passed only on a second try has failed; so has a set-up that threw. */
export function playwrightOutcome(report: unknown): Outcome {
  const { errors, stats } = PlaywrightReport.parse(report);
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length, skipped: stats.skipped };
}

/** The outcome in a report file, or undefined when the run left none that can be read. */
export function outcomeIn(file: string, read: (report: unknown) => Outcome): Outcome | undefined {
  if (!existsSync(file)) return undefined;
  try {
    return read(JSON.parse(readFileSync(file, 'utf8')));
  } catch {
    return undefined;
  }
}
