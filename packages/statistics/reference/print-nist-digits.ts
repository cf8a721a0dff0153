/**
 * Prints how many digits linear regression reaches on the certified sets of NIST, beside how many are asked for.
 * Run: npx tsx --conditions=@cairnstep/source reference/print-nist-digits.ts
 */

import { fittedNistSets, nistDigits } from './nist-linear-regression.checks.ts';

for (const set of fittedNistSets) {
  const { coefficients, standardErrors } = nistDigits(set);
  console.log(
    `${set.name.padEnd(9)} coefficients ${coefficients.toFixed(1).padStart(4)} (asked ${set.neededDigits}), standard errors ${standardErrors.toFixed(1)}`,
  );
}
