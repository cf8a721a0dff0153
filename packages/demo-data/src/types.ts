/** What the demonstration registry hands out. Everything in it is invented. */
import type { TableKey } from '@cairnstep/dictionary';

/** A made-up clinic of the made-up consortium. */
export interface DemoSite {
  /** `S01` to `S12`. */
  readonly code: string;
  readonly name: string;
  /** First month the site submits, such as `2024-11`. */
  readonly firstMonth: string;
}

/** A stored value: code or participant code as text, number in the stored unit; null for an empty cell. */
export type DemoCell = string | number | null;

/** The cells of one row in the dictionary's order of columns. */
export type DemoRow = readonly DemoCell[];

/** What one site submits for one month. A table without rows is left out. */
export interface DemoMonth {
  readonly site: string;
  /** Such as `2026-10`. */
  readonly month: string;
  readonly tables: Partial<Readonly<Record<TableKey, readonly DemoRow[]>>>;
}

/** CSV files as UTF-8, by table. */
export type DemoFiles = Partial<Readonly<Record<TableKey, Uint8Array>>>;

/** A mistake put into a file on purpose, and the finding it must lead to. */
export interface PlantedMistake {
  /** What the clinic did wrong, in a few words. */
  readonly what: string;
  readonly table: TableKey;
  /** Line of the file as an editor counts it, 1 for the header; null where the finding is about the whole file. */
  readonly line: number | null;
  /** Column of the finding: a key of the dictionary, or the header as written when it has no such column; null when about a whole row. */
  readonly column: string | null;
  /** Id of the rule that must find it. */
  readonly rule: string;
  /** Further rules that the same mistake can break, depending on what else the row holds. */
  readonly also: readonly string[];
}

/** An invented person as only the clinic knows them. */
export interface ClinicPerson {
  readonly recordNumber: string;
  readonly code: string;
  /** First training day, `2026-03-26`. */
  readonly indexDate: string;
  readonly age: number;
}

/** What a clinic has of a month before anything is taken out of it. */
export interface ClinicMonth {
  /** CSV files with record numbers, names, dates and remarks beside what the registry asks for. */
  readonly files: DemoFiles;
  /** People whom the registry knows from earlier months. */
  readonly people: readonly ClinicPerson[];
}

export interface DemoOptions {
  /** Whole number from 0 to 4,294,967,295. The same seed and last month give the same bytes. */
  readonly seed: number;
  /** Last submitted month, such as `2026-10`; the registry holds the 24 months that end with it. */
  readonly lastMonth: string;
}

export interface DemoRegistry {
  readonly sites: readonly DemoSite[];
  /** Every submitted month of every site: in calendar order, the sites of a month in the order of their codes. */
  months(): Generator<DemoMonth, void>;
  /** The month after the last submitted one. */
  readonly next: {
    /** Files of site S01 without a mistake. */
    readonly clean: DemoFiles;
    /** The same month as the clinic itself has it. */
    readonly fromTheClinic: ClinicMonth;
    /** Files of site S02 with the planted mistakes. */
    readonly mistakes: DemoFiles;
    readonly planted: readonly PlantedMistake[];
  };
}
