/**
 * Shows that the tests of the classification notice a wrong rule. Each mutation changes one rule in a copy of the sources;
 * the constructed cases and property tests run on the copy, and at least one must fail.
 * Run: npx tsx packages/scoring/reference/mutate.ts
 */
import { spawnSync } from 'node:child_process';
import { cpSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

interface Mutation {
  readonly rule: string;
  readonly file: string;
  readonly from: string;
  readonly to: string;
}

const mutations: readonly Mutation[] = [
  {
    rule: 'A dermatome is normal only when both modalities are 2',
    file: 'read-side.ts',
    from: 'if (both & 0b100) canBeNormal |= bit;',
    to: 'if (either & 0b100) canBeNormal |= bit;',
  },
  {
    rule: 'A key muscle below 3 gives the segment above it',
    file: 'side-outcomes.ts',
    from: "addEnd(outcomes, 'below-three', sensory, muscle - 1, strong, bit)",
    to: "addEnd(outcomes, 'below-three', sensory, muscle, strong, bit)",
  },
  {
    rule: 'A normal exam without contraction is S3',
    file: 'side-outcomes.ts',
    from: 'contraction ? place.INT : place.S3',
    to: 'place.INT',
  },
  {
    rule: 'The level of injury is the most rostral of the four',
    file: 'possible-results.ts',
    from: 'Math.min(mostCaudal(rightLevels), mostCaudal(leftLevels))',
    to: 'Math.max(mostCaudal(rightLevels), mostCaudal(leftLevels))',
  },
  {
    rule: 'Movement of key muscles counts from four levels below the motor level',
    file: 'level-bits.ts',
    from: 'return (-8 << level) << 1;',
    to: 'return (-4 << level) << 1;',
  },
  {
    rule: 'A non-key muscle counts from four levels below the motor level',
    file: 'strength.ts',
    from: 'return found.nonKey - outcome.motor > 3;',
    to: 'return found.nonKey - outcome.motor > 2;',
  },
  {
    rule: 'Exactly half of the key muscles at grade 3 is D',
    file: 'grades.ts',
    from: 'if (2 * (right.most + left.most) >= total) grades |= gradeD;',
    to: 'if (2 * (right.most + left.most) > total) grades |= gradeD;',
  },
  {
    rule: 'A muscle the level takes for granted counts as granted where C and D are told apart',
    file: 'strength.ts',
    from: 'const sure = countBits(outcome.strong & below);',
    to: 'const sure = 0;',
  },
  {
    rule: 'A non-key muscle extends the motor zone only when the grade is C',
    file: 'zones.ts',
    from: 'if (2 * (here.fewest + opposite.fewest) < total) zones |= 1 << found.nonKey;',
    to: 'zones |= 1 << found.nonKey;',
  },
  {
    rule: 'A tagged score that counts as altered is at least the examined score',
    file: 'cell-reading.ts',
    from: '(asAltered & -(1 << score)) | examined | tagged',
    to: 'asAltered | examined | tagged',
  },
];

const packageFolder = dirname(dirname(fileURLToPath(import.meta.url)));
const modules = join(dirname(dirname(packageFolder)), 'node_modules');

/** Runs the tests of the classification on a copy of the package; `undefined` when they could not run at all. */
function failedTests(mutation: Mutation | undefined): number | undefined {
  const copy = mkdtempSync(join(tmpdir(), 'scoring-mutant-'));
  try {
    for (const entry of ['src', 'reference', 'package.json']) cpSync(join(packageFolder, entry), join(copy, entry), { recursive: true });
    symlinkSync(modules, join(copy, 'node_modules'));
    if (mutation !== undefined) {
      const file = join(copy, 'src', mutation.file);
      const parts = readFileSync(file, 'utf8').split(mutation.from);
      if (parts.length !== 2)
        throw new Error(`"${mutation.from}" must stand once in ${mutation.file}, but stands ${parts.length - 1} times.`);
      writeFileSync(file, parts.join(mutation.to));
    }
    const report = join(copy, 'report.json');
    const vitest = join(modules, 'vitest', 'vitest.mjs');
    const options = [
      'run',
      'src/classify.test.ts',
      '--root',
      copy,
      '--bail',
      '1',
      '--testTimeout',
      '60000',
      '--reporter',
      'json',
      '--outputFile',
      report,
    ];
    spawnSync(process.execPath, [vitest, ...options], { cwd: copy, stdio: 'ignore' });
    const { numTotalTests, numFailedTests } = JSON.parse(readFileSync(report, 'utf8')) as { numTotalTests: number; numFailedTests: number };
    return numTotalTests === 0 ? undefined : numFailedTests;
  } finally {
    rmSync(copy, { recursive: true, force: true });
  }
}

if (failedTests(undefined) !== 0) throw new Error('The tests must pass on the unchanged sources first.');
const missed = mutations.filter((mutation) => {
  const failed = failedTests(mutation);
  if (failed === undefined) throw new Error(`The tests could not run with the mutation of "${mutation.rule}".`);
  console.log(`${failed > 0 ? 'caught' : 'MISSED'}  ${mutation.rule}`);
  return failed === 0;
});
console.log(`${mutations.length - missed.length} of ${mutations.length} mutations caught.`);
if (missed.length > 0) process.exitCode = 1;
