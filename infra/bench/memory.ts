/** Memory of a process as Linux counts it (proc(5): /proc/<pid>/status and clear_refs). */
import { readFileSync, writeFileSync } from 'node:fs';

/** A field of /proc/<pid>/status, which counts in KiB, in MB. */
function field(pid: number, name: 'VmRSS' | 'VmHWM'): number {
  const kib = new RegExp(`^${name}:\\s+(\\d+) kB$`, 'm').exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1];
  if (kib === undefined) throw new Error(`Process ${pid} has no ${name}.`);
  return (Number(kib) * 1024) / 1e6;
}

/** Begins to watch the resident memory of a process; the answer says by how many MB its peak has since been above what it was. */
export function watchMemory(pid: number): () => number {
  // 5 resets the peak.
  writeFileSync(`/proc/${pid}/clear_refs`, '5');
  const before = field(pid, 'VmRSS');
  return () => field(pid, 'VmHWM') - before;
}
