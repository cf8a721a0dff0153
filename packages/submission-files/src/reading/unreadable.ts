import { UnreadableFile } from './unreadable-file.ts';

/** Why a file is not read. No field repeats anything of its content. */
export interface Unreadable {
  readonly ok: false;
  readonly rule: string;
  readonly found: string;
  readonly mend: string;
  /** Line of the file or row of the sheet; null when the whole is meant. */
  readonly line: number | null;
}

/** What an error of the readers says; an error of another kind goes on. */
export function unreadable(error: unknown): Unreadable {
  if (!(error instanceof UnreadableFile)) throw error;
  return { ok: false, rule: error.rule, found: error.found, mend: error.mend, line: error.line };
}
