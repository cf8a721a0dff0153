/** Ids of the file rules that stop reading. */
export type StoppingRule = 'F01' | 'F02' | 'F03' | 'F04' | 'F05' | 'F40' | 'F41';

/**
 * Thrown inside the readers where a file cannot be read any further; the public functions turn it into a finding.
 * Carries no part of the file's content.
 */
export class UnreadableFile extends Error {
  constructor(
    readonly rule: StoppingRule,
    readonly found: string,
    readonly mend: string,
    /** Line of the file or row of the sheet, or null when the whole is meant. */
    readonly line: number | null,
  ) {
    super(found);
  }
}
