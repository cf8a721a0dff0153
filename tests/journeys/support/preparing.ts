/** The steps of the preparing page, in a frame of the client or opened from a disk. */
import { readFile } from 'node:fs/promises';
import { expect } from '@playwright/test';
import type { FrameLocator, Page } from '@playwright/test';
import { csvOf } from './clinic-month.ts';
import type { ClinicMonth } from './clinic-month.ts';
import { keyFile, passphrase } from './site-key.ts';

/** The page itself, or the frame it is in. */
export type Sheet = Pick<FrameLocator, 'getByRole' | 'getByText' | 'getByLabel' | 'locator'>;

export interface ChosenFile {
  readonly name: string;
  readonly mimeType: string;
  readonly buffer: Buffer;
}

export const preparingIn = (page: Page): Sheet => page.frameLocator('iframe[title^="Preparing"]');

export const clinicCsv = ({ files }: ClinicMonth): ChosenFile[] =>
  files.map((file) => ({ name: `${file.table}.csv`, mimeType: 'text/csv', buffer: Buffer.from(csvOf(file)) }));

export async function choose(page: Page, sheet: Sheet, button: string, files: ChosenFile | readonly ChosenFile[]): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await sheet.getByRole('button', { name: button }).first().click();
  await (await chooser).setFiles(Array.isArray(files) ? [...(files as readonly ChosenFile[])] : [files as ChosenFile]);
}

export async function tryKey(page: Page, sheet: Sheet, file: string, words = passphrase): Promise<void> {
  await choose(page, sheet, 'Choose a file', keyFile(file));
  await sheet.getByLabel('Passphrase').fill(words);
  await sheet.getByRole('button', { name: 'Open the key' }).click();
}

export async function openKey(page: Page, sheet: Sheet, file: string): Promise<void> {
  await tryKey(page, sheet, file);
  await expect(sheet.getByText('is open: it knows')).toBeVisible();
}

export async function addFiles(page: Page, sheet: Sheet, files: readonly ChosenFile[]): Promise<void> {
  await choose(page, sheet, 'Choose files', files);
  await expect(sheet.getByRole('heading', { name: 'Preview' })).toBeVisible({ timeout: 60_000 });
}

/** The text of the key file as it is saved. */
export async function saveKey(page: Page, sheet: Sheet): Promise<string> {
  const download = page.waitForEvent('download');
  await sheet.getByRole('button', { name: 'Save the key file' }).click();
  return readFile(await (await download).path(), 'utf8');
}

export async function sendAll(sheet: Sheet): Promise<void> {
  await sheet.getByRole('button', { name: /^Send .+ rows in \d+ tables?$/ }).click();
  await expect(sheet.getByText(/were sent\.$/)).toBeVisible({ timeout: 120_000 });
}
