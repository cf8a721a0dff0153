/** A researcher reads the grid, asks for the rows of a cohort and takes the export home; a steward weighs and decides. */
import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import type { Page } from '@playwright/test';
import { strFromU8, unzipSync } from 'fflate';
import { look } from './looks.ts';
import { expect, test } from './support/journey.ts';
import { mailTo } from './support/mails.ts';
import { signIn } from './support/sign-in.ts';

// Every page is looked at in four ways.
test.describe.configure({ timeout: 600_000 });

const researcher = { name: 'Anneke Visser', email: 'anneke.visser@' };
const stewards = [
  { name: 'Tomas Hale', email: 'tomas.hale@' },
  { name: 'Ines Calder', email: 'ines.calder@' },
] as const;

const kept = (page: Page) => page.getByText(/^Kept at \d\d:\d\d\.$/);
/** As people do: on the words of the answer, its own input being out of sight. */
const choose = (page: Page, question: RegExp, answer: string) =>
  page
    .getByRole('radiogroup', { name: question })
    .locator('label', { has: page.getByRole('radio', { name: new RegExp(`^${answer}`) }) })
    .click();

/** All that a request has to say beyond its title and cohort. */
async function fillIn(page: Page, question: string): Promise<void> {
  await page.getByRole('textbox', { name: /^Research question/ }).fill(question);
  await page
    .getByRole('textbox', { name: /^Summary for participants/ })
    .fill('We want to describe how fast people walk before and after a course of training, so that clinics can tell others like them.');
  await choose(page, /^Purpose/, 'Research on spinal cord injury');
  await choose(page, /commercial interest/, 'No');
  await page.getByRole('textbox', { name: /^Ethics committee/ }).fill('Committee of the Institute for Gait Research');
  await page.getByRole('textbox', { name: /^Reference of the approval/ }).fill('IGR-118');
  await page.getByRole('textbox', { name: /^Last day of the approval/ }).fill('2099-12-31');
  await choose(page, /^Your organisation works/, 'not for profit');
  await page.getByRole('button', { name: /Country where the team/ }).click();
  await page.getByRole('option', { name: 'Netherlands', exact: true }).click();
  await page
    .getByRole('textbox', { name: /^Where the files are kept/ })
    .fill('Encrypted share of the institute, reached by the named team only.');
  for (const [table, reason] of [
    ['Participants', 'Level and grade define the groups.'],
    ['Outcomes', 'The walking speeds are the outcome.'],
  ] as const) {
    await page.locator('label', { has: page.getByRole('checkbox', { name: new RegExp(`^${table}`) }) }).click();
    await page.getByRole('textbox', { name: new RegExp(`^Why ${table.toLowerCase()} are needed`) }).fill(reason);
  }
  await page.getByRole('textbox', { name: /^How long access/ }).fill('12');
  for (const duty of [/publish the results/, /work together/, /give derived data back/]) await choose(page, duty, 'Yes');
  await page.getByText('I accept the terms').click();
}

async function handIn(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Hand in to the stewards' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Hand it in' }).click();
}

/** The number that people speak of a request by. */
async function numberOf(page: Page): Promise<string> {
  const number = (await page.getByText(/^Access request AR-/).textContent())?.match(/AR-\d{4}-\d{4}/)?.[0];
  if (number === undefined) throw new Error('The request shows no number.');
  return number;
}

async function decide(page: Page, vote: 'Approve' | 'Decline', reason: string): Promise<void> {
  await choose(page, /^Your decision/, vote);
  await page.getByRole('textbox', { name: /^Reason/ }).fill(reason);
  await page.getByText('I have no interest in this request').click();
  await page.getByRole('button', { name: 'Decide' }).click();
}

/** Lines of a file without quotes in it, as cells. */
const cellsOf = (csv: string): string[][] =>
  csv
    .split(/\r?\n/)
    .filter((line) => line !== '')
    .map((line) => line.split(','));

test('asks for a cohort chosen in the grid, is approved, and takes the rows home', async ({ page, browser, baseURL, listen }) => {
  await signIn(page, researcher.name);
  await expect(page.getByRole('heading', { level: 1, name: 'Explore' })).toBeVisible();
  const grid = page.getByRole('grid');
  await expect(grid.getByRole('gridcell', { name: /95% interval/ }).first()).toBeVisible();
  await expect(grid.getByText('not shown').first()).toBeAttached();
  await look(page, 'researcher-1-grid');

  await page.getByRole('textbox', { name: 'Levels' }).fill('C5-T3');
  await page.getByRole('button', { name: 'Choose levels' }).click();
  await expect(page.getByText('C5–C8: every grade')).toBeVisible();
  await page.getByRole('button', { name: 'Clear' }).click();
  // By the keyboard: into the grid, to a cell, and on to its neighbours.
  await grid.getByRole('rowheader', { name: 'C5–C8' }).focus();
  for (const key of ['ArrowRight', 'ArrowRight', 'ArrowRight', ' ', 'Shift+ArrowRight', 'Shift+ArrowDown', 'Shift+ArrowLeft']) {
    await page.keyboard.press(key);
  }
  await expect(page).toHaveURL(/cells=c5_c8\.C\.D-t1_t9\.C\.D/);
  await expect(
    page.getByRole('status').filter({ hasText: /^\d+ of \d+ people with both values, and those in 1 group that is not shown$/ }),
  ).toBeVisible();
  await look(page, 'researcher-2-cohort');
  await page.reload();
  await expect(page.getByText('C5–C8: AIS C and D')).toBeVisible();
  await page.getByRole('button', { name: 'Show as table' }).click();
  await expect(page.getByRole('table').getByRole('row', { name: /C5–C8 D \d+/ })).toBeVisible();
  await look(page, 'researcher-3-table');

  await page.getByRole('link', { name: 'Request these rows' }).click();
  await expect(page.getByText('T1–T9: AIS C and D')).toBeVisible();
  await look(page, 'researcher-4-begin');
  await page.getByRole('textbox', { name: 'Title' }).fill('Walking speed after supported training');
  await page.getByRole('button', { name: 'Begin the request' }).click();
  await expect(page.getByRole('heading', { name: 'Whom it reaches' })).toBeVisible();
  const number = await numberOf(page);

  await expect(page.getByText(/How many of them consent is worked out once these are answered: purpose, /)).toBeVisible();
  await page.getByRole('button', { name: 'Hand in to the stewards' }).click();
  await expect(page.getByRole('alert', { name: /things need mending/ })).toBeFocused();
  await expect(page.getByRole('alertdialog')).toHaveCount(0);
  await look(page, 'researcher-5-missing');
  await fillIn(page, 'How does self-selected walking speed change over one course of training, by grade?');
  await expect(kept(page)).toBeVisible();
  await page.reload();
  await expect(page.getByRole('textbox', { name: /^Reference of the approval/ })).toHaveValue('IGR-118');
  await expect(page.getByText('of them consent to this use')).toBeVisible();
  await look(page, 'researcher-6-draft');
  await handIn(page);
  await expect(page.getByText('Waiting for a decision.')).toBeVisible();
  await look(page, 'researcher-7-handed-in');
  for (const { email } of stewards) {
    const mail = await mailTo(email, new RegExp(`${number} waits for a decision`));
    expect(mail.text).toContain(page.url().replace('/requests/', '/desk/'));
  }

  const office = await browser.newContext({
    ...(baseURL !== undefined && { baseURL }),
    locale: 'en-GB',
    timezoneId: 'Etc/UTC',
    reducedMotion: 'reduce',
  });
  listen(office);
  const desk = await office.newPage();
  await signIn(desk, stewards[0].name);
  await expect(desk.getByRole('heading', { level: 1, name: 'Desk' })).toBeVisible();
  await look(desk, 'steward-1-desk');
  await desk.getByRole('table', { name: 'Requests you can decide' }).getByRole('link', { name: number }).click();
  await expect(desk.getByRole('table', { name: 'Why consent does not reach the others' })).toBeVisible();
  await look(desk, 'steward-2-review');
  await desk.getByRole('button', { name: 'Decide' }).click();
  await expect(desk.getByRole('alert', { name: '3 things need mending' })).toBeFocused();
  await decide(desk, 'Approve', 'A clear question, approved by an ethics committee, and the tables fit it.');
  const question = desk.getByRole('alertdialog', { name: `Approve request ${number}?` });
  await expect(question).toContainText(/rows of up to \d+ consenting people for 12 months/);
  await look(desk, 'steward-3-approve');
  await question.getByRole('button', { name: 'Approve it' }).click();
  await expect(desk.getByText(/Approved on \d+ \w+ \d{4}\./)).toBeVisible();
  await look(desk, 'steward-4-approved');

  const letter = await mailTo(researcher.email, new RegExp(`${number} approved`));
  expect(letter.text).toContain('A clear question, approved by an ethics committee');
  await page.reload();
  await expect(page.getByText(/Access ends on/)).toBeVisible();
  await look(page, 'researcher-8-approved');
  await page.getByRole('button', { name: 'Build the export' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Exports' })).toBeVisible();
  const newest = page.getByRole('main').getByRole('listitem').first();
  const link = newest.getByRole('link', { name: /^Download EX-/ });
  await expect(link).toBeVisible({ timeout: 60_000 });
  await look(page, 'researcher-9-export');
  await mailTo(researcher.email, /export EX-\d{4}-\d{4} is ready/);

  const download = page.waitForEvent('download');
  await link.click();
  const zip = await readFile(await (await download).path());
  await expect(newest.getByText(createHash('sha256').update(zip).digest('hex'))).toBeVisible();
  const files = Object.fromEntries(Object.entries(unzipSync(zip)).map(([name, bytes]) => [name, strFromU8(bytes)]));
  expect(Object.keys(files).sort()).toEqual(['README.md', 'codebook.csv', 'manifest-sha256.txt', 'outcomes.csv', 'participants.csv']);
  for (const line of (files['manifest-sha256.txt'] ?? '').trim().split('\n')) {
    const [sum = '', name = ''] = line.split(/\s+/);
    expect(
      createHash('sha256')
        .update(files[name] ?? '')
        .digest('hex'),
      name,
    ).toBe(sum);
  }
  const described = new Set(cellsOf(files['codebook.csv'] ?? '').map(([table, column]) => `${table} ${column}`));
  for (const table of ['participants', 'outcomes']) {
    for (const column of cellsOf(files[`${table}.csv`] ?? '')[0] ?? []) expect(described).toContain(`${table} ${column}`);
  }
  const people = new Set(
    cellsOf(files['participants.csv'] ?? '')
      .slice(1)
      .map(([code]) => code),
  );
  await expect(newest.getByText(`${people.size} people`, { exact: true })).toBeVisible();
  expect(
    cellsOf(files['outcomes.csv'] ?? '')
      .slice(1)
      .every(([code]) => people.has(code)),
  ).toBe(true);
  expect(files['README.md']).toContain(number);
  await office.close();
});

test('is declined with a reason that it can learn from', async ({ page, browser, baseURL, listen }) => {
  await signIn(page, researcher.name);
  await page.goto('/requests/new');
  await page.getByRole('textbox', { name: 'Title' }).fill('Everything about everyone');
  await page.getByRole('button', { name: 'Begin the request' }).click();
  await expect(page.getByRole('heading', { name: 'Whom it reaches' })).toBeVisible();
  const number = await numberOf(page);
  await fillIn(page, 'What can be found in the registry when one looks at all of it?');
  await handIn(page);
  await expect(page.getByText('Waiting for a decision.')).toBeVisible();

  const office = await browser.newContext({
    ...(baseURL !== undefined && { baseURL }),
    locale: 'en-GB',
    timezoneId: 'Etc/UTC',
    reducedMotion: 'reduce',
  });
  listen(office);
  const desk = await office.newPage();
  await signIn(desk, stewards[1].name);
  await desk.getByRole('table', { name: 'Requests you can decide' }).getByRole('link', { name: number }).click();
  await expect(desk.getByText('Everyone of the release.')).toBeVisible();
  await decide(desk, 'Decline', 'The question is not one that can be answered: name the groups and what is compared.');
  const question = desk.getByRole('alertdialog', { name: `Decline request ${number}?` });
  await look(desk, 'steward-5-decline');
  await question.getByRole('button', { name: 'Decline it' }).click();
  await expect(desk.getByText(/Declined on/)).toBeVisible();
  await desk.getByRole('link', { name: 'Desk' }).first().click();
  await expect(
    desk.getByRole('table', { name: 'All other requests' }).getByRole('row', { name: new RegExp(`^${number} .* declined$`) }),
  ).toBeVisible();
  await office.close();

  const letter = await mailTo(researcher.email, new RegExp(`${number} declined`));
  expect(letter.text).toContain('name the groups and what is compared');
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Access requests' }).click();
  await expect(page.getByRole('row', { name: new RegExp(`^${number} Everything about everyone declined`) })).toBeVisible();
  await look(page, 'researcher-10-requests');
  await page.getByRole('link', { name: number }).click();
  await expect(page.getByText('name the groups and what is compared')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Build the export' })).toBeHidden();
  await look(page, 'researcher-11-declined');
});

test('a steward makes the next release only when something has changed', async ({ page }) => {
  await signIn(page, stewards[0].name);
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Releases' }).click();
  await expect(page.getByRole('link', { name: 'Release 1' })).toBeVisible();
  await look(page, 'steward-6-releases');
});
