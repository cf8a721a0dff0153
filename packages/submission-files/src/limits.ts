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
