/** A site coordinator's month: from the clinic's files to an accepted submission, or to a list of what to mend. */
import { readFile } from 'node:fs/promises';
import type { Page } from '@playwright/test';
import { demoRegistry, demoSeed } from '../../packages/demo-data/src/index.ts';
import { tableOf } from '../../packages/dictionary/src/index.ts';
import { look } from './looks.ts';
import { exampleMonth } from './support/example-month.ts';
import type { ExampleMonth } from './support/example-month.ts';
import { expect, test } from './support/journey.ts';
import { mailTo } from './support/mails.ts';
import { signIn } from './support/sign-in.ts';

async function sendFiles(page: Page, { files }: ExampleMonth): Promise<void> {
  const window = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose files' }).click();
  await (await window).setFiles([...files]);
  await page.getByRole('button', { name: `Send ${files.length} files` }).click();
}

const allArrived = (page: Page) => expect(page.getByRole('list', { name: 'Files not sent yet' })).toBeHidden();

/** A file as the clinic has it, chosen as if it were prepared, does not leave the browser. */
async function chooseRawFile(page: Page): Promise<void> {
  const changes: string[] = [];
  page.on('request', (request) => {
    if (request.method() !== 'GET') changes.push(request.url());
  });
  const window = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose files' }).click();
  const buffer = Buffer.from('participant,surname\r\n00417723,Rosenquist\r\n');
  await (await window).setFiles([{ name: 'participants.csv', mimeType: 'text/csv', buffer }]);
  const list = page.getByRole('list', { name: 'Files not sent yet' });
  await expect(list.getByText(/^Nothing of this file has left your browser\./)).toBeVisible();
  await expect(list.getByText(/^Participants, line 2, column participant/)).toBeVisible();
  await expect(list.getByRole('link', { name: 'Prepare the clinic’s files' })).toBeVisible();
  await expect(page.getByRole('button', { name: /^Send / })).toBeHidden();
  expect(changes).toEqual([]);
  await page.getByRole('button', { name: 'Leave out participants.csv' }).click();
}

// Every page is looked at in four ways, which takes its time on a busy machine.
test.describe.configure({ timeout: 900_000 });

const nextStep = (page: Page) => page.locator('#next');

test('turns the clinic’s files into an accepted month, and the same files again change nothing', async ({ page }) => {
  const example = exampleMonth('clean');
  const { name: month } = example;

  await signIn(page, 'Mira Okafor');
  await expect(page.getByRole('heading', { level: 1, name: 'This month' })).toBeVisible();
  await expect(nextStep(page).getByText(`${month} is due on`)).toBeVisible();
  await look(page, 'coordinator-1-this-month');

  await nextStep(page)
    .getByRole('button', { name: `Submit ${month}` })
    .click();
  await expect(page.getByRole('heading', { level: 1, name: `Submit ${month}` })).toBeVisible();
  await look(page, 'coordinator-2-no-files');
  await chooseRawFile(page);
  const window = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose files' }).click();
  await (await window).setFiles([...example.files]);
  await expect(page.getByRole('list', { name: 'Files not sent yet' }).getByRole('listitem')).toHaveCount(example.files.length);
  await look(page, 'coordinator-3-files-chosen');
  await page.getByRole('button', { name: `Send ${example.files.length} files` }).click();
  await expect(page.getByRole('list', { name: 'Files not sent yet' })).toBeHidden();

  await page.getByRole('button', { name: `Check ${month}` }).click();
  // Leaving does not end the check, and coming back finds it.
  await page.getByRole('link', { name: 'all months' }).click();
  await nextStep(page)
    .getByRole('link', { name: `Go on with ${month}` })
    .click();
  await expect(page.getByRole('heading', { name: 'Review' })).toBeVisible();
  await expect(page.locator('#check').getByText('Nothing was found. Look at what would change, then commit.')).toBeVisible();
  await look(page, 'coordinator-4-review');
  await page.getByRole('link', { name: / new rows of sessions$/ }).click();
  await expect(page.getByRole('heading', { name: 'New rows of sessions' })).toBeVisible();
  await expect(page.locator('#rows').getByRole('row').nth(1)).toContainText('Main device class');
  await look(page, 'coordinator-5-new-rows');

  await page.getByRole('button', { name: `Commit ${month}` }).click();
  const question = page.getByRole('alertdialog', { name: `Commit ${month} of Alder Ridge Rehabilitation (S01)?` });
  await expect(question).toContainText(/\d new\./);
  await look(page, 'coordinator-6-commit');
  await question.getByRole('button', { name: `Commit ${month}` }).click();

  await expect(page.getByRole('heading', { level: 1, name: `Receipt of ${month}` })).toBeVisible();
  await look(page, 'coordinator-7-receipt');
  const download = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Download as JSON' }).click();
  const receipt = JSON.parse(await readFile(await (await download).path(), 'utf8')) as { readonly digest: string; readonly month: string };
  expect(receipt.month).toBe(example.month);
  await expect(page.getByText(receipt.digest)).toBeVisible();
  const mail = await mailTo('mira.okafor@', new RegExp(`${month} of Alder Ridge Rehabilitation \\(S01\\) is in the registry`));
  expect(mail.text).toContain(receipt.digest);
  expect(mail.text).toContain(page.url());

  await page.getByRole('link', { name: 'Months of the site' }).click();
  await expect(nextStep(page).getByText('Nothing is due')).toBeVisible();
  await page.getByRole('button', { name: `Correct ${month}` }).click();
  await expect(page.getByRole('heading', { level: 1, name: `Correct ${month}` })).toBeVisible();
  await sendFiles(page, example);
  await allArrived(page);
  await page.getByRole('button', { name: `Check ${month}` }).click();
  await expect(page.getByText('The registry already holds just these rows. A commit would change nothing.')).toBeVisible();
  await page.getByRole('button', { name: 'Give up this submission' }).click();
  await page.getByRole('button', { name: 'Give it up' }).click();
  await expect(nextStep(page).getByText('Nothing is due')).toBeVisible();

  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Submissions' }).click();
  await expect(page.getByRole('row', { name: new RegExp(`^${month} given up`) })).toBeVisible();
  await expect(page.getByRole('row', { name: new RegExp(`^${month} accepted`) })).toBeVisible();
  await look(page, 'coordinator-8-submissions');
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Audit' }).click();
  await expect(page.getByRole('row', { name: /Mira Okafor site coordinator submission given up/ }).first()).toBeVisible();
  await look(page, 'coordinator-9-own-acts');
});

test('reads by file, line and column what to mend, and nothing enters the registry', async ({ page }) => {
  const example = exampleMonth('with-mistakes');
  const { name: month } = example;
  const [year, number] = example.month.split('-').map(Number) as [number, number];
  const lastMonth = new Date(Date.UTC(year, number - 2, 1)).toISOString().slice(0, 7);
  const { planted } = demoRegistry({ seed: demoSeed, lastMonth }).next;

  await signIn(page, 'Paulo Serrano');
  await nextStep(page)
    .getByRole('button', { name: `Submit ${month}` })
    .click();
  await sendFiles(page, example);
  const question = page.getByRole('alertdialog', { name: 'Send these files?' });
  await expect(question).toContainText('column remarks');
  await question.getByRole('button', { name: /^Send / }).click();
  await allArrived(page);
  await page.getByRole('button', { name: `Check ${month}` }).click();
  await expect(page.getByRole('heading', { name: 'Findings', exact: true })).toBeVisible();
  await expect(page.getByText(/^\d+ errors and \d+ warnings found\./)).toBeVisible();
  await look(page, 'coordinator-findings');

  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: 'Download the findings as CSV' }).click();
  const found = (await readFile(await (await download).path(), 'utf8')).split('\r\n');
  for (const { what, table, line, column, rule } of planted) {
    const place = `${tableOf(table).name},${line ?? ''},${column ?? ''},`;
    expect(
      found.some((row) => row.includes(`,${rule},${place}`)),
      `${what}: ${place} ${rule}`,
    ).toBe(true);
  }

  const mistake = planted.find(({ rule }) => rule === 'F21');
  if (mistake === undefined) throw new Error('The files hold no value beyond a hard limit.');
  await page.getByRole('link', { name: 'of rule F21' }).click();
  await expect(
    page.getByRole('row', { name: new RegExp(`^${tableOf(mistake.table).name} ${mistake.line} ${mistake.column} `) }),
  ).toBeVisible();
  await expect(page).toHaveURL(/rule=F21/);
  await look(page, 'coordinator-places');
  await page.reload();
  await expect(
    page.getByRole('row', { name: new RegExp(`^${tableOf(mistake.table).name} ${mistake.line} ${mistake.column} `) }),
  ).toBeVisible();

  const table = tableOf(mistake.table);
  const variable = table.variables.find(({ key }) => key === mistake.column);
  const limits = variable?.plausible ?? variable?.hard;
  if (limits === undefined) throw new Error('Nobody knows a plausible value for the mistaken cell.');
  await page.getByRole('button', { name: `Mend ${mistake.column} in line ${mistake.line} of ${table.name.toLowerCase()}` }).click();
  await page.getByRole('textbox', { name: `New value of ${mistake.column}, line ${mistake.line}` }).fill(String(limits.min));
  await look(page, 'coordinator-mending');
  await page.getByRole('button', { name: 'Apply 1 change and check again' }).click();
  await expect(page.getByText('1 cell mended on screen')).toBeVisible();
  await expect(page.getByText(/^\d+ errors and \d+ warnings found\./)).toBeVisible();
  await expect(page.getByRole('link', { name: 'of rule F21' })).toBeHidden();

  await expect(page.getByText('The errors above keep the month out. Nothing has entered the registry.')).toBeVisible();
  await expect(page.getByRole('button', { name: `Commit ${month}` })).toBeHidden();
  await page.getByRole('link', { name: 'all months' }).click();
  await expect(page.getByRole('row', { name: new RegExp(`^${month} begun .* not yet`) })).toBeVisible();
});
