/**
 * A clinic's workbook dropped on the preparing page, until the preview stands: how long the page could not answer its reader at a
 * stretch, and how the time grows with the rows. Beside it, the least that any reader of workbooks does where people wait for it:
 * unpacking the same file and parsing its sheets on the page's own thread.
 */
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { chromium } from '@playwright/test';
import type { Browser, Page } from '@playwright/test';
import { clinicMonth } from '../../../tests/journeys/support/clinic-month.ts';
import { clinicWorkbook } from '../../../tests/journeys/support/clinic-workbook.ts';
import { openKey } from '../../../tests/journeys/support/preparing.ts';
import { siteKey } from '../../../tests/journeys/support/site-key.ts';
import { projectRoot } from '../../project-root.ts';
import { buildIfChanged } from '../../start/build.ts';
import type { Scenario } from '../scenario.ts';

const site = 'S03';
const month = '2026-11';
const launch = {
  executablePath: '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking'],
};
const patience = { timeout: 300_000 };

interface Workbook {
  readonly rows: number;
  /** On the disk: bytes handed over by the driver would be unpacked on the page's thread and be counted there. */
  readonly path: string;
}

function workbookOf(copies: number, folder: string): Workbook {
  const whole = clinicMonth(site, month, copies);
  const path = join(folder, `workbook-${copies}.xlsx`);
  writeFileSync(path, clinicWorkbook(whole).buffer);
  return { rows: whole.files.reduce((sum, { rows }) => sum + rows.length - 1, 0), path };
}

interface Times {
  readonly rows: number;
  /** Milliseconds from the drop to the preview. */
  readonly ours: number;
  /** Longest task of the page's own thread in that time, ms; 0 where none took 50 ms. */
  readonly longestTask: number;
  readonly peer: number;
}

/** Kept by the page from its beginning on. Tasks under 50 ms are not told (W3C Long Tasks). */
const keepLongTasks = (): void => {
  const kept: number[] = [];
  Object.assign(globalThis, { longTasks: kept });
  new PerformanceObserver((list) => kept.push(...list.getEntries().map(({ duration }) => duration))).observe({ type: 'longtask' });
};

async function prepare(browser: Browser, { path }: Workbook): Promise<Pick<Times, 'ours' | 'longestTask'>> {
  const context = await browser.newContext({ offline: true, locale: 'en-GB' });
  const page = await context.newPage();
  await page.addInitScript(keepLongTasks);
  await page.goto(pathToFileURL(join(projectRoot, 'services/web/dist/prepare.html')).href);
  await page.getByLabel('Code of your site').fill(site);
  await page.getByRole('textbox', { name: 'Month' }).fill(month);
  await page.getByRole('button', { name: 'Begin' }).click();
  await openKey(page, page, (await siteKey(site, [])).file);
  await page.evaluate(() => (globalThis as unknown as { longTasks: number[] }).longTasks.splice(0));
  const begun = performance.now();
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose files' }).click();
  await (await chooser).setFiles(path);
  await page.getByRole('heading', { name: 'Preview' }).waitFor(patience);
  const ours = performance.now() - begun;
  const tasks = await page.evaluate(() => (globalThis as unknown as { longTasks: number[] }).longTasks);
  await context.close();
  return { ours, longestTask: Math.max(0, ...tasks) };
}

async function parseOnPage(page: Page, { path }: Workbook): Promise<number> {
  await page.setContent('<input type="file">');
  await page.addScriptTag({ path: join(projectRoot, 'node_modules/fflate/umd/index.js') });
  await page.setInputFiles('input', path);
  return page.evaluate(async () => {
    const { fflate } = globalThis as unknown as { fflate: { unzipSync: (bytes: Uint8Array) => Record<string, Uint8Array> } };
    const [chosen] = document.querySelector('input')?.files ?? [];
    const begun = performance.now();
    const parts = fflate.unzipSync(new Uint8Array((await chosen?.arrayBuffer()) ?? new ArrayBuffer()));
    let cells = 0;
    for (const [name, bytes] of Object.entries(parts)) {
      if (!name.startsWith('xl/worksheets/')) continue;
      const sheet = new DOMParser().parseFromString(new TextDecoder().decode(bytes), 'application/xml');
      for (const cell of sheet.getElementsByTagName('c')) cells += (cell.textContent ?? '') === '' ? 0 : 1;
    }
    if (cells === 0) throw new Error('The workbook holds no cell.');
    return performance.now() - begun;
  });
}

const rounds = 3;
const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;

async function measure(browser: Browser, copies: number, folder: string): Promise<Times> {
  const workbook = workbookOf(copies, folder);
  const ours = [];
  const peer = [];
  const page = await browser.newPage();
  for (let round = 0; round < rounds; round += 1) {
    ours.push(await prepare(browser, workbook));
    peer.push(await parseOnPage(page, workbook));
  }
  await page.close();
  return {
    rows: workbook.rows,
    ours: median(ours.map((one) => one.ours)),
    longestTask: Math.max(...ours.map((one) => one.longestTask)),
    peer: median(peer),
  };
}

let measured: Promise<{ small: Times; large: Times }> | undefined;
const measureBoth = () =>
  (measured ??= (async () => {
    const folder = mkdtempSync(join(tmpdir(), 'cairnstep-bench-'));
    await buildIfChanged(['client'], { logFile: join(folder, 'build.log'), onWork: () => undefined });
    const browser = await chromium.launch(launch);
    try {
      return { small: await measure(browser, 1, folder), large: await measure(browser, 10, folder) };
    } finally {
      await browser.close();
      rmSync(folder, { recursive: true, force: true });
    }
  })());

const peerName = 'unzipping (fflate) and DOMParser of the same workbook on the page’s thread';

export const scenarios: readonly Scenario[] = [
  {
    name: 'prepare a workbook: longest task of the page',
    run: async () => {
      const { large } = await measureBoth();
      return { ours: large.longestTask, peer: large.peer, unit: 'ms', peerName, goal: 200, note: `${large.rows} rows` };
    },
  },
  {
    name: 'prepare a workbook: from the drop to the preview',
    run: async () => {
      const { large } = await measureBoth();
      return { ours: large.ours / 1000, peer: large.peer / 1000, unit: 's', peerName, note: `${large.rows} rows, in a worker` };
    },
  },
  {
    name: 'prepare a workbook: ten times the rows',
    run: async () => {
      const { small, large } = await measureBoth();
      return {
        ours: large.ours / small.ours,
        peer: large.peer / small.peer,
        unit: 'times',
        peerName: 'the same of its peer',
        goal: 11,
        note: `${small.rows} and ${large.rows} rows`,
      };
    },
  },
];
