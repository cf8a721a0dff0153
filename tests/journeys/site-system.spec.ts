/** A clinic's own system submits the month with the script that the page for developers hands out; people see what it did. */
import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { promisify } from 'node:util';
import { demonstrationSystems } from '../../services/fake-oidc/src/demonstration-people.ts';
import { look } from './looks.ts';
import { exampleFilesVariable, providerUrlVariable } from './product-variables.ts';
import { exampleMonth } from './support/example-month.ts';
import { expect, test } from './support/journey.ts';
import { signIn } from './support/sign-in.ts';

// Every page is looked at in four ways, which takes its time on a busy machine.
test.describe.configure({ timeout: 900_000 });

const system = demonstrationSystems[0] ?? { clientId: '', label: '', site: '' };

interface Ended {
  readonly code: number;
  readonly stdout: string;
  readonly stderr: string;
}

/** As a clinic's timer would run it. The system's secret is among those of the product's data folder. */
async function submitBy(script: string, registry: string): Promise<Ended> {
  const { month, files } = exampleMonth('clean');
  const discovery = await fetch(`${process.env[providerUrlVariable]}/.well-known/openid-configuration`);
  const { token_endpoint: tokenEndpoint } = (await discovery.json()) as { token_endpoint: string };
  const secrets = await readFile(join(dirname(process.env[exampleFilesVariable] ?? ''), 'secrets.json'), 'utf8');
  const { siteSystemSecret } = JSON.parse(secrets) as { siteSystemSecret: string };
  const environment = {
    PATH: process.env['PATH'],
    REGISTRY: registry,
    TOKEN_ENDPOINT: tokenEndpoint,
    CLIENT_ID: system.clientId,
    CLIENT_SECRET: siteSystemSecret,
    MONTH: month,
    FOLDER: dirname(files[0] ?? ''),
  };
  return promisify(execFile)('sh', [script], { env: environment }).then(
    ({ stdout, stderr }) => ({ code: 0, stdout, stderr }),
    ({ code, stdout, stderr }: Ended) => ({ code, stdout, stderr }),
  );
}

test('a month comes from a clinic’s own system, until an administrator disables it', async ({ page, browser, baseURL, listen }) => {
  const { month, name } = exampleMonth('clean');
  const registry = baseURL ?? '';
  const folder = await mkdtemp(join(tmpdir(), 'cairnstep-script-'));
  const script = join(folder, 'submit-month.sh');

  await page.goto('/developers');
  await look(page, 'site-system-1-interface');
  const download = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Download the script' }).click();
  await (await download).saveAs(script);

  // Nothing of the example month warns, and nothing is removed by it.
  const submitted = await submitBy(script, registry);
  expect(submitted.code, submitted.stderr).toBe(0);
  expect(JSON.parse(submitted.stdout)).toMatchObject({ month, site: { code: system.site }, acceptedBy: system.label });

  const elsewhere = await browser.newContext({ baseURL: registry, locale: 'en-GB', timezoneId: 'Etc/UTC', reducedMotion: 'reduce' });
  listen(elsewhere);
  const theirs = await elsewhere.newPage();
  await signIn(theirs, 'Mira Okafor');
  await theirs.goto('/submissions');
  const row = theirs.getByRole('row', { name: new RegExp(`^${name} accepted .* ${system.label}`) });
  await expect(row).toHaveCount(1);
  await row.getByRole('link', { name: `Receipt of ${name}` }).click();
  await expect(theirs.getByText(system.label)).toBeVisible();
  await elsewhere.close();

  await signIn(page, 'Ruth Adeyemi');
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Site systems' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Site systems' })).toBeVisible();
  await look(page, 'site-system-2-register');
  await page.getByRole('button', { name: `Disable ${system.label}` }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Disable the system' }).click();
  await expect(page.getByRole('row', { name: new RegExp(`^${system.label} .* disabled`) })).toBeVisible();
  const refused = await submitBy(script, registry);
  expect(refused.code).not.toBe(0);
  expect(refused.stderr).toContain('/problems/token-refused');

  await page.getByRole('button', { name: `Enable ${system.label}` }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Enable the system' }).click();
  await expect(page.getByRole('row', { name: new RegExp(`^${system.label} .* active`) })).toBeVisible();
  await rm(folder, { recursive: true });
});
