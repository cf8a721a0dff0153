/** R as a peer, where it is installed: an expression over the same numbers, timed by R itself. */
import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export interface InR {
  /** Median of five runs after one to warm up. */
  readonly milliseconds: number;
  /** `R 4.2.2`. */
  readonly version: string;
}

/**
 * @param numbers vectors that the expression may name, each finite; NaN arrives as NA
 * @param expression what is timed, such as `sd(x)`
 * @param needs packages beyond R's own, such as `nlme`
 * @returns null where R, or a package, is not installed
 */
export function timeInR(
  numbers: Readonly<Record<string, ArrayLike<number>>>,
  expression: string,
  needs: readonly string[] = [],
): InR | null {
  const hasPackages = needs.map((name) => `requireNamespace("${name}", quietly = TRUE)`).join(' && ') || 'TRUE';
  if (spawnSync('Rscript', ['-e', `quit(status = if (${hasPackages}) 0 else 1)`], { stdio: 'ignore' }).status !== 0) return null;
  const folder = mkdtempSync(join(tmpdir(), 'cairnstep-r-'));
  try {
    const reading = Object.entries(numbers).map(([name, values]) => {
      const path = join(folder, name);
      writeFileSync(path, new Uint8Array(Float64Array.from(values).buffer));
      return `${name} <- readBin("${path}", "double", ${values.length}); ${name}[is.nan(${name})] <- NA`;
    });
    const script = [
      ...needs.map((name) => `library(${name})`),
      ...reading,
      `run <- function() suppressWarnings(${expression})`,
      'invisible(run())',
      'seconds <- median(replicate(5, system.time(run())[["elapsed"]]))',
      'cat(seconds, paste0(R.version$major, ".", R.version$minor))',
    ].join('\n');
    const [seconds = '', version = ''] = execFileSync('Rscript', ['-e', script], { encoding: 'utf8' }).trim().split(' ');
    return { milliseconds: Number(seconds) * 1000, version: `R ${version}` };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
