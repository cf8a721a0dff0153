/** The months of the sites: a steward sees what is missing; a coordinator closes a month in which nothing happened. */
import type { Page } from '@playwright/test';
import { exampleMonth } from './support/example-month.ts';
import { look } from './looks.ts';
import { expect, test } from './support/journey.ts';
import { signIn } from './support/sign-in.ts';

// Every page is looked at in four ways, which takes its time on a busy machine.
test.describe.configure({ timeout: 900_000 });

const site = { code: 'S04', option: /\(S04\)$/ };
const newcomer = 'Felix Brandt';

/** The cell of a site under a month's header. */
async function stateOf(page: Page, month: string): Promise<string> {
  const headers = await page.getByRole('columnheader').allTextContents();
  const short = `${month.slice(0, 3)} ${month.split(' ')[1] ?? ''}`;
  const row = page.getByRole('row').filter({ hasText: `(${site.code})` });
  return (
    (await row
      .getByRole('cell')
      .nth(headers.indexOf(short) - 1)
      .textContent()) ?? ''
  );
}

test('a month with nothing to report is closed, and the calendar says so', async ({ page, browser, baseURL, listen }) => {
  const { name: month } = exampleMonth('clean');
  await signIn(page, 'Ruth Adeyemi');
  await page.getByRole('link', { name: newcomer }).click();
  await page
    .locator('label')
    .filter({ hasText: /^site coordinator/ })
    .click();
  await page.getByRole('button', { name: /Choose/ }).click();
  await page.getByRole('option', { name: site.option }).click();
  await page.getByRole('button', { name: 'Give the role from today' }).click();
  const end = page.getByRole('button', { name: /^End the role site coordinator/ });
  await expect(end).toBeVisible();

  const elsewhere = await browser.newContext({
    ...(baseURL !== undefined && { baseURL }),
    locale: 'en-GB',
    timezoneId: 'Etc/UTC',
    reducedMotion: 'reduce',
  });
  listen(elsewhere);
  const theirs = await elsewhere.newPage();
  await signIn(theirs, newcomer);
  const next = theirs.locator('#next');
  await next.getByRole('button', { name: `Nothing to report for ${month}` }).click();
  await expect(theirs.getByRole('alertdialog', { name: `Nothing to report for ${month}?` })).toBeVisible();
  await look(theirs, 'months-1-nothing-to-report');
  await theirs.getByRole('button', { name: `Close ${month}` }).click();
  await expect(next.getByText('Nothing is due')).toBeVisible();
  await expect(theirs.getByRole('row', { name: new RegExp(`^${month} nothing to report said by ${newcomer}`) })).toBeVisible();
  await look(theirs, 'months-2-closed');
  await elsewhere.close();

  await end.click();
  await page.getByRole('alertdialog').getByRole('button', { name: /^End/ }).click();
  await expect(end).toBeHidden();

  await page.context().clearCookies();
  await signIn(page, 'Tomas Hale');
  await page.goto('/calendar');
  await expect(page.getByRole('table', { name: /^Sites and their last twelve months/ })).toBeVisible();
  expect(await stateOf(page, month)).toContain(`nothing to reportsaid by ${newcomer}`);
  await look(page, 'months-3-calendar');
});
