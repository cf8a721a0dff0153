/** How large a file may be before reading stops. */
export interface ReadLimits {
  readonly bytes: number;
  readonly columns: number;
  /** Characters of one cell. */
  readonly cellLength: number;
  /** Rows below the header, blank ones not counted. */
  readonly rows: number;
}

/** Twenty times a large site's month, and small enough that a hostile file is refused within seconds. */
export const defaultLimits: ReadLimits = { bytes: 50_000_000, columns: 500, cellLength: 10_000, rows: 1_000_000 };

/** How much may come out of a workbook, which is a zip archive. `rows` counts for each sheet. */
export interface WorkbookLimits extends ReadLimits {
  /** Files in the archive. */
  readonly entries: number;
  /** Bytes of all files in the archive, unpacked. */
  readonly unpackedBytes: number;
  /** Bytes unpacked for each byte packed, of a file above a megabyte. */
  readonly unpackRatio: number;
  readonly sheets: number;
  /** Texts that sheets refer to by number, and their characters together. */
  readonly sharedTexts: number;
  readonly sharedTextLength: number;
}

/**
 * A workbook of 50,000 bouts unpacks to 51 MB, ten times its size; one of empty formatted rows to nine times. Deflate can
 * reach 1,032.
 */
export const defaultWorkbookLimits: WorkbookLimits = {
  ...defaultLimits,
  entries: 1_000,
  unpackedBytes: 300_000_000,
  unpackRatio: 200,
  sheets: 100,
  sharedTexts: 1_000_000,
  sharedTextLength: 20_000_000,
};
