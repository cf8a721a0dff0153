/** Somebody who read a figure of the registry wants to know how it was computed, and why it should be believed. */
import { readFile } from 'node:fs/promises';
import { expect, test } from '@playwright/test';
import { evidenceTable } from '../../packages/statistics/src/index.ts';
import { look } from './looks.ts';

test('find a method without signing in, read its formula, and see how near it comes to figures computed elsewhere', async ({ page }) => {
  await page.goto('/');
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Methods' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Methods' })).toBeVisible();

  await page.getByRole('button', { name: /Question/ }).click();
  await page.getByRole('option', { name: 'Do two groups differ?' }).click();
  await page.getByRole('searchbox', { name: 'Search' }).fill('welch');
  await expect(page.getByRole('status').filter({ hasText: 'page' })).toHaveText(/^1 page of/);
  await page.getByRole('region', { name: 'Do two groups differ?' }).getByRole('link', { name: 'Two groups: Welch t test' }).click();

  await expect(page).toHaveURL(/\/methods\/welch$/);
  await expect(page.getByRole('region', { name: 'Formula' })).toContainText('a = s12 / n1');
  await expect(page.getByRole('region', { name: 'In use' })).toContainText('Needs two values in each group');
  const evidence = page.getByRole('region', { name: 'Evidence' });
  await expect(evidence.getByRole('row', { name: /^R 4\.2\.2, t\.test/ })).toContainText('7 × 10−15');
  await look(page, 'methods-welch');

  await page.goBack();
  await expect(page.getByRole('searchbox', { name: 'Search' })).toHaveValue('welch');
});

test('take the evidence for all methods along', async ({ page }) => {
  await page.goto('/methods');
  await look(page, 'methods');
  const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Download CSV' }).click()]);
  expect(download.suggestedFilename()).toBe('cairnstep-evidence.csv');
  const csv = await readFile(await download.path(), 'utf8');
  expect(csv.split('\r\n').filter(Boolean)).toHaveLength(evidenceTable.length + 1);
});

test('read what the registry decides itself, on screen and on paper', async ({ page }) => {
  await page.goto('/methods?question=registry');
  await page.getByRole('link', { name: 'What is hidden, and why' }).click();
  await expect(page.getByText(/Counts of 1 to 10 are hidden/)).toBeVisible();
  await look(page, 'methods-what-is-hidden');

  await page.getByRole('link', { name: 'After: How exports protect people' }).click();
  await page.getByRole('link', { name: 'how consent is matched', exact: true }).click();
  await expect(page.getByRole('row', { name: /^research on population origins or ancestry/ })).toContainText('not allowed');
  await expect(page.getByText(/GA4GH Data Use Ontology/)).toContainText('CC BY 4.0');
  await look(page, 'methods-consent-matching');

  await page.emulateMedia({ media: 'print' });
  await expect(page.getByRole('navigation', { name: 'Pages' })).toBeHidden();
  await expect(page.getByRole('cell', { name: 'not in general aggregates' })).toBeVisible();
});
