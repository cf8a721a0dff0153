/**
 * npm test [kind …]: runs the named kinds of check, all by default, against a throw-away database that it starts and
 * deletes. Closes with a line of totals and exits with 0 only when nothing failed.
 */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startThrowAwayCluster } from '../database/cluster.ts';
import { runSession } from '../start/session.ts';
import { StartError } from '../start/start-error.ts';
import { kinds } from './kinds.ts';
import type { Kind } from './kinds.ts';
import { closingLine, failedOnce, sum } from './outcome.ts';
import type { Outcome } from './outcome.ts';

/** A run that hangs must still say what it found. */
const wholeRunWithinMs = 55 * 60_000;

function chosenKinds(names: readonly string[]): readonly Kind[] {
  const unknown = names.filter((name) => !kinds.some((kind) => kind.name === name));
  if (unknown.length > 0)
    throw new StartError(`No such kind of test: ${unknown.join(', ')}. There are: ${kinds.map(({ name }) => name).join(', ')}.`);
  return names.length === 0 ? kinds : kinds.filter(({ name }) => names.includes(name));
}

await runSession(async ({ signal: toldToEnd, report, onStarted }) => {
  const chosen = chosenKinds(process.argv.slice(2));
  const timeIsUp = AbortSignal.timeout(wholeRunWithinMs);
  const signal = AbortSignal.any([toldToEnd, timeIsUp]);

  const reports = mkdtempSync(join(tmpdir(), 'cairnstep-reports-'));
  onStarted(async () => rmSync(reports, { recursive: true, force: true }));
  let databaseAdminUrl: string | undefined;
  if (chosen.some(({ usesDatabase }) => usesDatabase)) {
    const cluster = await startThrowAwayCluster();
    onStarted(() => cluster.stop());
    databaseAdminUrl = cluster.adminUrl;
  }

  const lines: string[] = [];
  const outcomes: Outcome[] = [];
  for (const kind of chosen) {
    toldToEnd.throwIfAborted();
    const begun = Date.now();
    report(`\n== ${kind.name} ==`);
    const outcome = signal.aborted ? failedOnce : await kind.run({ databaseAdminUrl, reports, signal });
    outcomes.push(outcome);
    lines.push(`${kind.name.padEnd(10)} ${closingLine(outcome)} (${Math.round((Date.now() - begun) / 1000)} s)`);
  }
  toldToEnd.throwIfAborted();
  if (timeIsUp.aborted) report(`\nThe run was broken off after ${wholeRunWithinMs / 60_000} minutes.`);
  const total = sum(outcomes);
  report(`\n${lines.join('\n')}\n\n${closingLine(total)}`);
  return total.failed === 0 ? 0 : 1;
}, 130);
