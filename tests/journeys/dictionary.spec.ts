/** Somebody prepares a template and needs to know what a column means. */
import { readFile } from 'node:fs/promises';
import { expect, test } from '@playwright/test';
import { codebookRows } from '../../packages/dictionary/src/index.ts';
import { look } from './looks.ts';

test('search the dictionary, read what a column means, and take the codebook along', async ({ page }) => {
  await page.goto('/');
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Dictionary' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Dictionary' })).toBeVisible();
  await page.getByRole('button', { name: 'Everything Show' }).click();
  await page.getByRole('option', { name: 'Bouts' }).click();
  await expect(page).toHaveURL(/\?show=bouts$/);
  await expect(page.getByRole('region', { name: 'Sessions' })).toHaveCount(0);
  await look(page, 'dictionary');

  await page.getByRole('searchbox', { name: 'Search' }).fill('treadmill speed');
  await expect(page.getByRole('status').filter({ hasText: 'variable' })).toHaveText(/^1 variable and/);
  await page.getByRole('link', { name: 'Treadmill speed' }).click();

  await expect(page).toHaveURL(/\/dictionary\/bouts\/treadmill_speed_mps$/);
  await expect(page.getByText('value in km/h × 5 ÷ 18 = value in m/s')).toBeVisible();
  await expect(page.getByRole('region', { name: 'Rules' }).getByText('T02')).toBeVisible();
  await look(page, 'dictionary-variable');

  await page.goBack();
  await expect(page.getByRole('searchbox', { name: 'Search' })).toHaveValue('treadmill speed');

  const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Codebook as CSV' }).click()]);
  expect(download.suggestedFilename()).toBe('cairnstep-codebook.csv');
  const csv = await readFile(await download.path(), 'utf8');
  expect(csv.split('\r\n').filter(Boolean)).toHaveLength(codebookRows().length + 1);
  expect(csv).toContain('bouts,treadmill_speed_mps,Treadmill speed,');
});

test('find a cell of the exam by its segment, and a measure with its published thresholds', async ({ page }) => {
  await page.goto('/dictionary?show=exams');
  await page.getByRole('button', { name: /Show all 132 cells of the exam/ }).click();
  await page.getByRole('link', { name: 'pp_l_s4_5' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Pin prick, left, S4-5' })).toBeVisible();
  await expect(page.getByRole('row', { name: 'NT not testable', exact: true })).toBeVisible();

  await page.goto('/dictionary/measures/tmwt_ss');
  await expect(page.getByRole('region', { name: 'Published sizes of change' })).toContainText('0.13 m/s');
  await look(page, 'dictionary-measure');
});
