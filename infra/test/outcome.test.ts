import { describe, expect, it } from 'vitest';
import { closingLine, judged, sum } from './outcome.ts';
import { playwrightOutcome, vitestOutcome } from './reports.ts';

describe('judged', () => {
  it('takes a report’s word when the exit code agrees', () => {
    expect(judged({ passed: 3, failed: 0, skipped: 1 }, 0)).toEqual({ passed: 3, failed: 0, skipped: 1 });
    expect(judged({ passed: 3, failed: 2, skipped: 0 }, 1)).toEqual({ passed: 3, failed: 2, skipped: 0 });
  });

  it.each([
    ['left no report', undefined, 0, 1],
    ['found nothing to run', { passed: 0, failed: 0, skipped: 0 }, 0, 1],
    ['skipped everything', { passed: 0, failed: 0, skipped: 4 }, 0, 1],
    ['broke off after its tests had passed', { passed: 5, failed: 0, skipped: 0 }, 1, 1],
    ['was killed', { passed: 5, failed: 0, skipped: 0 }, null, 1],
  ])('counts a failure for a run that %s', (_case, counted, code, failed) => {
    expect(judged(counted, code).failed).toBe(failed);
  });
});

describe('closingLine', () => {
  it('names three totals and nothing else', () => {
    const total = sum([
      { passed: 10, failed: 0, skipped: 1 },
      { passed: 2, failed: 3, skipped: 0 },
    ]);
    expect(closingLine(total)).toBe('12 passed, 3 failed, 1 skipped');
  });
});

describe('reports', () => {
  it('count a vitest file that could not be run as one failure', () => {
    const report = {
      numPassedTests: 1,
      numFailedTests: 1,
      numPendingTests: 1,
      numTodoTests: 1,
      testResults: [
        { status: 'passed', assertionResults: [{ status: 'passed' }] },
        { status: 'failed', assertionResults: [{ status: 'failed' }, { status: 'passed' }] },
        { status: 'failed', assertionResults: [] },
        { status: 'failed', assertionResults: [{ status: 'skipped' }] },
      ],
    };
    expect(vitestOutcome(report)).toEqual({ passed: 1, failed: 3, skipped: 2 });
  });

  it('count a journey that passed only on a second try, and a set-up that threw, as failures', () => {
    expect(playwrightOutcome({ errors: [], stats: { expected: 4, unexpected: 1, flaky: 1, skipped: 2 } })).toEqual({
      passed: 4,
      failed: 2,
      skipped: 2,
    });
    expect(playwrightOutcome({ errors: [{ message: 'no' }], stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 0 } }).failed).toBe(1);
  });

  it('are refused when they are not what they should be', () => {
    expect(() => vitestOutcome({ numPassedTests: 1 })).toThrow();
    expect(() => playwrightOutcome([])).toThrow();
  });
});
