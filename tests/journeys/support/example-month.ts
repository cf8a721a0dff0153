/** The month's files that the product hands out to try a submission with. */
import { readdirSync } from 'node:fs';
import { basename, join } from 'node:path';
import { exampleFilesVariable } from '../product-variables.ts';

export interface ExampleMonth {
  /** `2026-11` */
  readonly month: string;
  /** `November 2026` */
  readonly name: string;
  /** One CSV file for each table. */
  readonly files: readonly string[];
}

/** Of site S01 without a mistake, or of site S02 with the mistakes that clinics make. */
export function exampleMonth(kind: 'clean' | 'with-mistakes'): ExampleMonth {
  const root = process.env[exampleFilesVariable] ?? '';
  const folder = readdirSync(root).find((name) => name.endsWith(`-${kind}`));
  const month = folder?.match(/\d{4}-\d{2}/)?.[0];
  if (folder === undefined || month === undefined) throw new Error(`The product wrote no example month ${kind}.`);
  const name = new Intl.DateTimeFormat('en-GB', { month: 'long', year: 'numeric', timeZone: 'UTC' }).format(
    new Date(`${month}-01T00:00:00Z`),
  );
  return { month, name, files: readdirSync(join(root, folder)).map((file) => join(root, folder, basename(file))) };
}
