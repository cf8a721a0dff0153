/** Lets somebody coordinate a site, as an administrator does. */
import type { Browser, Page } from '@playwright/test';
import { productUrlVariable } from '../product-variables.ts';
import { signIn } from './sign-in.ts';

interface Named {
  readonly id: string;
  readonly name: string;
  readonly code: string;
}

/** Asks the API as the page that is signed in would. */
export const askAs = <T>(page: Page, method: 'GET' | 'POST', path: string, body?: object): Promise<T> =>
  page.evaluate(
    async ([how, where, what]) => {
      const answer = await fetch(where, {
        method: how,
        headers: { 'X-Cairnstep-Request': '1', 'Content-Type': 'application/json' },
        ...(what === undefined ? {} : { body: JSON.stringify(what) }),
      });
      if (!answer.ok) throw new Error(`${how} ${where}: ${answer.status}`);
      return (await answer.json()) as never;
    },
    [method, path, body] as const,
  );

export async function letCoordinate(browser: Browser, person: string, siteCode: string): Promise<void> {
  const context = await browser.newContext({ baseURL: process.env[productUrlVariable] ?? '' });
  const page = await context.newPage();
  await signIn(page, 'Ruth Adeyemi');
  const { people } = await askAs<{ people: (Named & { grants: { role: string; site: Named | null }[] })[] }>(page, 'GET', '/api/people');
  const { sites } = await askAs<{ sites: Named[] }>(page, 'GET', '/api/sites');
  const found = people.find(({ name }) => name === person);
  const siteId = sites.find(({ code }) => code === siteCode)?.id;
  const holds = found?.grants.some(({ role, site }) => role === 'coordinator' && site?.id === siteId) ?? false;
  if (!holds)
    await askAs(page, 'POST', `/api/people/${found?.id}/grants`, { role: 'coordinator', siteId, startsOn: '2026-01-01', endsOn: null });
  await context.close();
}
