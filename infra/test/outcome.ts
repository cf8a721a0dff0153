/** How a kind of check ended, in numbers. */
export interface Outcome {
  readonly passed: number;
  readonly failed: number;
  readonly skipped: number;
}

export const failedOnce: Outcome = { passed: 0, failed: 1, skipped: 0 };
export const passedOnce: Outcome = { passed: 1, failed: 0, skipped: 0 };

export function sum(outcomes: readonly Outcome[]): Outcome {
  return outcomes.reduce((a, b) => ({ passed: a.passed + b.passed, failed: a.failed + b.failed, skipped: a.skipped + b.skipped }), {
    passed: 0,
    failed: 0,
    skipped: 0,
  });
}

/**
 * What a run of a test program comes to. A run that broke off counts a failure even when its report names none, and so
 * does one that found nothing to run.
 *
 * @param counted from its report; undefined when it left none
 * @param exitCode null when it was killed
 */
export function judged(counted: Outcome | undefined, exitCode: number | null): Outcome {
  if (counted === undefined) return failedOnce;
  const isBroken = exitCode !== 0 && counted.failed === 0;
  const isEmpty = counted.passed + counted.failed === 0;
  return isBroken || isEmpty ? { ...counted, failed: counted.failed + 1 } : counted;
}

/** The run's last line. */
export function closingLine({ passed, failed, skipped }: Outcome): string {
  return `${passed} passed, ${failed} failed, ${skipped} skipped`;
}
