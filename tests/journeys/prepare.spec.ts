/** A month from the clinic's own files: prepared in the browser, sent, checked, committed; and nothing of what identifies leaves. */
import { createHash } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Browser, Page } from '@playwright/test';
import { saveKeyFile } from '../../packages/deidentification/src/index.ts';
import { look } from './looks.ts';
import { clinicMonth } from './support/clinic-month.ts';
import type { ClinicMonth } from './support/clinic-month.ts';
import { author, clinicWorkbook } from './support/clinic-workbook.ts';
import { askAs, letCoordinate } from './support/grant.ts';
import { expect } from './support/journey.ts';
import { leaksIn } from './support/leaks.ts';
import { addFiles, choose, clinicCsv, openKey, preparingIn, saveKey, sendAll, tryKey } from './support/preparing.ts';
import type { ChosenFile } from './support/preparing.ts';
import { passphrase, siteKey } from './support/site-key.ts';
import { signIn } from './support/sign-in.ts';
import { test } from './support/watched-browser.ts';

// Every page is looked at in four ways, which takes its time on a busy machine. Each journey goes on from the one before it.
test.describe.configure({ timeout: 900_000, mode: 'serial' });

const coordinator = 'Jonas Lindqvist';
const site = 'S03';

/** What the journeys have made so far. */
interface SoFar {
  readonly month: ClinicMonth;
  /** The site's key file as the first journey saved it. */
  readonly key: string;
}
let soFar: SoFar | undefined;
const before = (): SoFar => {
  if (soFar === undefined) throw new Error('The month was not prepared.');
  return soFar;
};

/** The codes that the registry holds of the site. */
async function heldCodes(page: Page): Promise<readonly string[]> {
  const { sites } = await askAs<{ readonly sites: readonly { readonly id: string; readonly code: string }[] }>(page, 'GET', '/api/sites');
  const id = sites.find(({ code }) => code === site)?.id;
  return (await askAs<{ readonly codes: readonly string[] }>(page, 'GET', `/api/sites/${id}/participant-codes`)).codes;
}

/** Submits or corrects the month of the site, as far as its page. */
async function openMonth(page: Page): Promise<void> {
  await page.goto(`/month?site=${site}`);
  const submit = page.locator('#next').getByRole('button', { name: /^Submit / });
  const goOn = page.locator('#next').getByRole('link', { name: /^Go on with / });
  const correct = page.getByRole('button', { name: /^Correct / }).first();
  await submit.or(goOn).or(correct).first().click();
  await expect(page.getByRole('heading', { level: 1, name: /^(Submit|Correct) / })).toBeVisible();
}

async function openPreparing(page: Page): Promise<void> {
  await openMonth(page);
  await page.getByRole('link', { name: 'Prepare the clinic’s files' }).click();
  await expect(preparingIn(page).getByRole('button', { name: 'Choose a file' })).toBeVisible();
}

async function giveUp(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Give up this submission' }).click();
  await page.getByRole('button', { name: 'Give it up' }).click();
}

async function giveReasons(page: Page): Promise<void> {
  const keep = page.getByRole('button', { name: /^Keep this reason/ });
  await expect(page.getByRole('heading', { name: 'Review' })).toBeVisible({ timeout: 120_000 });
  for (let left = await keep.count(); left > 0; left -= 1) {
    await page
      .getByRole('textbox', { name: /Why these stand/ })
      .first()
      .fill('Compared with the record at the clinic; correct.');
    await keep.first().click();
    await expect(keep).toHaveCount(left - 1);
  }
}

const lastMonth = (): string => {
  const now = new Date();
  return new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth() - 1, 1)).toISOString().slice(0, 7);
};

const changesNothing = 'The registry already holds just these rows. A commit would change nothing.';

test('brings a clinic’s own files to a receipt, and no record number, date, name or note leaves the browser or stays in it', async ({
  browser,
  watched,
}) => {
  await letCoordinate(browser, coordinator, site);
  const month = clinicMonth(site, lastMonth());
  expect(month.planted.length).toBeGreaterThanOrEqual(500);
  const { page } = watched;
  const sheet = preparingIn(page);

  await signIn(page, coordinator);
  await openMonth(page);
  await look(page, 'prepare-1-choice');
  await page.getByRole('link', { name: 'Prepare the clinic’s files' }).click();
  await expect(sheet.getByRole('button', { name: 'Choose a file' })).toBeVisible();
  await look(page, 'prepare-2-key');
  const given = await siteKey(site, await heldCodes(page));
  await openKey(page, sheet, given.file);
  await addFiles(page, sheet, clinicCsv(month));
  await expect(sheet.getByText('stays behind').first()).toBeVisible();
  const key = await saveKey(page, sheet);
  await sendAll(sheet);
  await sheet.getByRole('button', { name: 'Go on to the check' }).click();
  await expect(page.getByRole('heading', { level: 1, name: /^Submit / })).toBeVisible();
  await giveReasons(page);
  await look(page, 'prepare-4-review');
  await page.getByRole('button', { name: /^Commit / }).click();
  await page
    .getByRole('alertdialog')
    .getByRole('button', { name: /^Commit / })
    .click();
  await expect(page.getByRole('heading', { level: 1, name: /^Receipt of / })).toBeVisible();
  soFar = { month, key };

  const kept = await page.evaluate(async () => ({
    local: { ...localStorage },
    session: { ...sessionStorage },
    databases: await indexedDB.databases(),
    caches: await caches.keys(),
  }));
  const cookies = await watched.context.cookies();
  const sent = watched.sent();
  const onDisk = await watched.closeAndRead();

  // What was looked through holds what was sent: the search was not made in the wrong place.
  expect(sent.includes('participant,session_day,session_no')).toBe(true);
  expect(sent.length).toBeGreaterThan(300_000);
  expect(leaksIn(sent, month.planted)).toEqual([]);
  const secrets = [passphrase, ...secretsOf(given.file), ...secretsOf(key)];
  expect(leaksIn(sent, secrets)).toEqual([]);
  expect(kept).toMatchObject({ databases: [], caches: [] });
  const storage = Buffer.from(JSON.stringify([kept, cookies]));
  expect(leaksIn(storage, [...month.planted, ...secrets])).toEqual([]);
  // The profile on the disk, with cache, history and what a crash would bring back.
  expect(onDisk.length).toBeGreaterThan(100_000);
  expect(leaksIn(onDisk, [...month.planted, ...secrets])).toEqual([]);
});

interface KeyFileParts {
  readonly header: { readonly kdf: { readonly iterations: number; readonly salt: string }; readonly cipher: { readonly iv: string } };
  readonly ciphertext: string;
}
const partsOf = (file: string): KeyFileParts => JSON.parse(file) as KeyFileParts;

/** What a key file is locked with, and the beginning of what is locked. */
function secretsOf(file: string): string[] {
  const { header, ciphertext } = partsOf(file);
  return [header.kdf.salt, header.cipher.iv, ciphertext.slice(0, 40)];
}

test('finds the same month in the clinic’s workbook, and nothing of that leaves either', async ({ watched }) => {
  const { month, key } = before();
  const { page } = watched;
  const sheet = preparingIn(page);
  await signIn(page, coordinator);
  await openPreparing(page);
  await openKey(page, sheet, key);
  await addFiles(page, sheet, [clinicWorkbook(month)]);
  // Dates are written in another way than in the CSV files, which the key remembers.
  await saveKey(page, sheet);
  await sendAll(sheet);
  await sheet.getByRole('button', { name: 'Go on to the check' }).click();
  await giveReasons(page);
  await expect(page.getByText(changesNothing)).toBeVisible();
  await giveUp(page);
  const sent = watched.sent();
  const onDisk = await watched.closeAndRead();
  expect(sent.includes('participant,session_day,session_no')).toBe(true);
  const planted = [...month.planted, author, 'November of our clinic'];
  expect(leaksIn(sent, planted)).toEqual([]);
  expect(leaksIn(onDisk, planted)).toEqual([]);
});

test('can neither connect nor reach out of its frame, and nor can its worker', async ({ browser }) => {
  // Nobody listens to this window: the browser tells of each refusal in the console, as it should here.
  const context = await browser.newContext();
  const page = await context.newPage();
  const answered: string[] = [];
  context.on('response', (response) => answered.push(response.url()));
  await signIn(page, coordinator);
  await openPreparing(page);
  const frame = page.frames().find((one) => one.url().endsWith('/prepare.html'));
  if (frame === undefined) throw new Error('There is no frame.');
  const tries = (home: string): Promise<Readonly<Record<string, string>>> => {
    const scope = globalThis as unknown as {
      document?: Document;
      parent?: Window;
      navigator: { sendBeacon?: (to: string, what: string) => boolean };
      localStorage: Storage;
      indexedDB: IDBFactory;
      caches: CacheStorage;
    };
    const to = (what: string): string => `${home}/stolen-${what}`;
    const loaded = (element: HTMLElement & { src?: string; href?: string }, address: string): Promise<string> =>
      new Promise((resolve, reject) => {
        element.addEventListener('load', () => resolve('loaded'));
        element.addEventListener('error', () => reject(new Error('blocked')));
        if (element instanceof HTMLLinkElement) element.href = address;
        else element.src = address;
        document.head.append(element);
      });
    const settled = (target: EventTarget, good: string): Promise<string> =>
      new Promise((resolve, reject) => {
        target.addEventListener(good, () => resolve(good));
        target.addEventListener('error', () => reject(new Error('blocked')));
      });
    const ways: Record<string, () => unknown> = {
      fetch: () => fetch(to('fetch'), { mode: 'no-cors' }),
      'fetch elsewhere': () => fetch('http://127.0.0.1:9/stolen', { mode: 'no-cors' }),
      request: () => {
        const request = new XMLHttpRequest();
        request.open('POST', to('request'));
        const end = settled(request, 'load');
        request.send('stolen');
        return end;
      },
      socket: () => settled(new WebSocket(to('socket').replace('http', 'ws')), 'open'),
      events: () => settled(new EventSource(to('events')), 'open'),
      script: () => import(/* @vite-ignore */ to('script.js')),
      'local storage': () => scope.localStorage.setItem('a', 'stolen'),
      database: () => settled(scope.indexedDB.open('stolen'), 'success'),
      cache: () => scope.caches.open('stolen'),
      ...(scope.document === undefined
        ? {}
        : {
            picture: () => loaded(new Image(), to('picture')),
            style: () => loaded(Object.assign(document.createElement('link'), { rel: 'stylesheet' }), to('style')),
            'script element': () => loaded(document.createElement('script'), to('element.js')),
            frame: () => {
              const inner = document.createElement('iframe');
              const end = new Promise((_resolve, reject) =>
                document.addEventListener('securitypolicyviolation', () => reject(new Error('blocked')), { once: true }),
              );
              inner.src = to('frame');
              document.body.append(inner);
              return end;
            },
            'page around': () => scope.parent?.document.title,
            'request of the page around': () => scope.parent?.fetch(to('parent')),
            cookie: () => document.cookie,
            window: () => {
              if (window.open(to('window')) === null) throw new Error('blocked');
            },
            form: () => {
              const form = Object.assign(document.createElement('form'), { action: to('form'), method: 'post' });
              const end = new Promise((_resolve, reject) =>
                document.addEventListener('securitypolicyviolation', () => reject(new Error('blocked')), { once: true }),
              );
              document.body.append(form);
              form.submit();
              return end;
            },
            'page above': () => {
              scope.parent?.location.assign(to('top'));
            },
          }),
    };
    return Promise.all(
      Object.entries(ways).map(async ([name, way]) => {
        try {
          return [name, `open: ${String(await way())}`] as const;
        } catch {
          return [name, 'closed'] as const;
        }
      }),
    ).then((all) => Object.fromEntries(all));
  };
  const home = new URL(page.url()).origin;
  const [worker] = page.workers();
  if (worker === undefined) throw new Error('There is no worker.');
  for (const outcome of [await frame.evaluate(tries, home), await worker.evaluate(tries, home)]) {
    expect(Object.keys(outcome).length).toBeGreaterThanOrEqual(9);
    expect(Object.entries(outcome).filter(([, how]) => how !== 'closed')).toEqual([]);
  }
  // A beacon says it is under way even where it is not.
  await frame.evaluate((to) => navigator.sendBeacon(`${to}/stolen-beacon`, 'stolen'), home);
  await page.waitForTimeout(500);
  expect(answered.some((url) => url.endsWith('/prepare.html'))).toBe(true);
  expect(answered.filter((url) => url.includes('stolen'))).toEqual([]);
  await context.close();
});

test('refuses a wrong key file and says what to do, and tells an older copy', async ({ page }) => {
  const { key, month } = before();
  const { key: content } = await siteKey(site, []);
  await signIn(page, coordinator);
  await openPreparing(page);
  const sheet = preparingIn(page);
  const { header, ciphertext } = partsOf(key);
  const altered = (changes: object) => JSON.stringify({ header: { ...header, ...changes }, ciphertext });
  const other = await saveKeyFile({ ...content, site: 'S04' }, passphrase);
  const wrong: readonly (readonly [what: string, file: string, words: string, says: string])[] = [
    ['of another site', other.file, passphrase, 'belongs to another site'],
    ['with another passphrase', key, 'bafo rina tuke sobi malu pega', 'Type the six words again'],
    ['altered', altered({ cipher: { ...header.cipher, iv: 'AAAAAAAAAAAAAAAA' } }), passphrase, 'or the file was altered'],
    ['made weaker', altered({ kdf: { ...header.kdf, iterations: 1_000 } }), passphrase, 'protected too weakly'],
    ['that would take days', altered({ kdf: { ...header.kdf, iterations: 1_000_000_000 } }), passphrase, 'unreasonably long'],
    ['that is none', '{"rows": []}', passphrase, 'not a key file'],
  ];
  for (const [what, file, words, says] of wrong) {
    await tryKey(page, sheet, file, words);
    await expect(sheet.getByRole('alert'), what).toContainText(says);
    await expect(sheet.getByText('is open: it knows')).toBeHidden();
  }
  await look(page, 'prepare-wrong-key');
  // Of before this month: it lacks the people that came with it.
  const codes = await heldCodes(page);
  await openKey(page, sheet, (await siteKey(site, codes.slice(0, -10))).file);
  await expect(sheet.getByText(`lacks 10 of the ${codes.length} participants that the registry holds`)).toBeVisible();
  // Two small tables: the whole month shows thousands of cells, and each is looked at.
  await addFiles(page, sheet, clinicCsv({ ...month, files: month.files.filter(({ rows }) => rows.length < 74) }));
  await look(page, 'prepare-3-preview');
});

test('prepares without the server and the network, and what it saves is taken as prepared', async ({ page, browser, listen, locale }) => {
  const { month, key } = before();
  await page.goto('/prepare-without-the-server');
  const published = await page.locator('code', { hasText: /^[0-9a-f]{64}$/ }).innerText();
  await look(page, 'prepare-without-the-server');
  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: 'Download the file' }).click();
  const file = await download;
  expect(file.suggestedFilename()).toBe('cairnstep-prepare.html');
  const bytes = await readFile(await file.path());
  expect(createHash('sha256').update(bytes).digest('hex')).toBe(published);

  const folder = mkdtempSync(join(tmpdir(), 'cairnstep-offline-'));
  writeFileSync(join(folder, file.suggestedFilename()), bytes);
  const prepared = await prepareOffline(browser, listen, join(folder, file.suggestedFilename()), month, key, locale);
  rmSync(folder, { recursive: true, force: true });

  await signIn(page, coordinator);
  await openMonth(page);
  await choose(page, page, 'Choose files', prepared);
  await page.getByRole('button', { name: `Send ${prepared.length} files` }).click();
  await expect(page.getByRole('list', { name: 'Files not sent yet' })).toBeHidden();
  await page.getByRole('button', { name: /^Check / }).click();
  await giveReasons(page);
  await expect(page.getByText(changesNothing)).toBeVisible();
  await giveUp(page);
});

test('renews the site key, and the registry holds the people under their new codes', async ({ page }) => {
  const { month, key } = before();
  await signIn(page, coordinator);
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Site key' }).click();
  await page.goto(`/site-key?site=${site}`);
  const sheet = page.frameLocator('iframe[title^="Site key"]');
  const held = await heldCodes(page);
  await openKey(page, sheet, key);
  await look(page, 'prepare-site-key');
  const numbers = month.planted.filter((value) => /^H\d{7}$/.test(value)).slice(0, 3);
  expect(numbers).toHaveLength(3);
  await sheet.getByText('A new secret for the key').click();
  await sheet.getByLabel('Record numbers to carry over now').fill(numbers.join('\n'));
  await sheet.getByRole('button', { name: 'Draw a new secret' }).click();
  await sheet.getByRole('group').getByRole('button', { name: 'Draw a new secret' }).click();
  await expect(sheet.getByText('3 codes were replaced.')).toBeVisible();
  expect(await saveKey(page, sheet)).not.toBe(key);
  await sheet.getByRole('button', { name: 'Tell the registry' }).click();
  await expect(sheet.getByText('The registry has replaced 3 codes.')).toBeVisible();
  const now = new Set(await heldCodes(page));
  expect(held.filter((code) => !now.has(code))).toHaveLength(3);
  expect(now.size).toBe(held.length);
});

/** Opens the file from the disk in a browser without a network, and gives the cleaned files that it saves. */
async function prepareOffline(
  browser: Browser,
  listen: (to: Awaited<ReturnType<Browser['newContext']>>) => void,
  file: string,
  month: ClinicMonth,
  key: string,
  locale: string | undefined,
): Promise<readonly ChosenFile[]> {
  const context = await browser.newContext({ offline: true, ...(locale === undefined ? {} : { locale }) });
  listen(context);
  const sheet = await context.newPage();
  await sheet.goto(pathToFileURL(file).href);
  await look(sheet, 'prepare-offline-1-start');
  await sheet.getByLabel('Code of your site').fill(site);
  await sheet.getByRole('textbox', { name: 'Month' }).fill(lastMonth());
  await sheet.getByRole('button', { name: 'Begin' }).click();
  await openKey(sheet, sheet, key);
  await addFiles(sheet, sheet, clinicCsv(month));
  const saved: ChosenFile[] = [];
  const arrived = new Promise<void>((resolve) => {
    sheet.on('download', async (download) => {
      saved.push({ name: download.suggestedFilename(), mimeType: 'text/csv', buffer: await readFile(await download.path()) });
      if (saved.length === month.files.length + 1) resolve();
    });
  });
  await sheet.getByRole('button', { name: /^Save \d+ cleaned files$/ }).click();
  await arrived;
  await context.close();
  expect(leaksIn(Buffer.concat(saved.map(({ buffer }) => buffer)), month.planted)).toEqual([]);
  return saved.filter(({ name }) => name.endsWith('.csv'));
}
