/** The page around the site key, with messages as the preparing page would send them. */
import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { ToPreparing } from '../../preparing/messages.ts';
import { fakeApi, refusal, site } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { coordinator, therapist } from './sample-submission.ts';
import SiteKeyPage from './site-key-page.tsx';

const replacing = `POST /api/sites/${site.id}/replaced-codes`;
const knowledge = {
  [`GET /api/sites/${site.id}/participant-codes`]: { codes: ['S000000000000000000012'] },
  [`GET /api/sites/${site.id}/safe-headers`]: { headers: [] },
};
const routes = [{ path: '/site-key', element: <SiteKeyPage /> }];
const replacedCodes = [{ from: 'S000000000000000000012', to: 'S00000000000000000002Z' }];

let told: ToPreparing[];
const window_ = { postMessage: (message: ToPreparing) => told.push(message) };
beforeEach(() => {
  told = [];
  vi.spyOn(HTMLIFrameElement.prototype, 'contentWindow', 'get').mockReturnValue(window_ as unknown as Window);
});
afterEach(() => vi.restoreAllMocks());

function open(answers: Readonly<Record<string, unknown>> = {}, account: unknown = coordinator) {
  const asked = fakeApi({ 'GET /api/account': account, ...knowledge, ...answers });
  renderRoutes(routes, '/site-key');
  return asked;
}

const say = (data: unknown): Promise<void> =>
  act(async () => {
    window.dispatchEvent(Object.assign(new MessageEvent('message', { data, origin: location.origin }), { source: window_ }));
  });
const lastSending = () => told.filter((message) => message.kind === 'sending').at(-1);

describe('the page of the site key', () => {
  it('opens the key apart from any month', async () => {
    open();
    await screen.findByTitle(`Site key of ${site.name}`);
    await say({ kind: 'ready' });
    expect(told[0]).toMatchObject({ kind: 'task', view: 'key', month: null, site: { code: site.code } });
  });

  it('has the registry replace codes, and says so to the preparing page', async () => {
    const asked = open({ [replacing]: { replaced: 1, unknown: 0, joined: 0, rows: 3, earlierValues: 1 } });
    await screen.findByTitle(`Site key of ${site.name}`);
    await say({ kind: 'ready' });
    await say({ kind: 'replace-codes', replacedCodes });
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'done' }));
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ codes: replacedCodes });
  });

  it('passes on why the registry did not', async () => {
    open({ [replacing]: () => refusal('codes-collide') });
    await screen.findByTitle(`Site key of ${site.name}`);
    await say({ kind: 'ready' });
    await say({ kind: 'replace-codes', replacedCodes });
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'failed' }));
  });

  const chooseFile = async (content: string): Promise<void> => {
    await screen.findByText('File of replaced codes');
    const input = document.querySelector<HTMLInputElement>('input[type="file"]');
    if (input === null) throw new Error('There is no way to choose a file.');
    fireEvent.change(input, { target: { files: [new File([content], 'replaced-codes.csv', { type: 'text/csv' })] } });
  };

  it('takes the file of the edition without the server, and tells how many codes were replaced', async () => {
    const asked = open({ [replacing]: { replaced: 1, unknown: 2, joined: 0, rows: 3, earlierValues: 1 } });
    await chooseFile(`from,to\r\n${replacedCodes[0]?.from},${replacedCodes[0]?.to}\r\n`);
    fireEvent.click(await screen.findByRole('button', { name: 'Replace 1 code' }));
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    fireEvent.click(within(await screen.findByRole('alertdialog')).getByRole('button', { name: 'Replace the codes' }));
    expect(await screen.findByText(/The registry has replaced 1 code\. Of 2 codes it held no row\./)).toBeTruthy();
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ codes: replacedCodes });
    expect(screen.queryByRole('button', { name: 'Replace 1 code' })).toBeNull();
  });

  it('sends nothing of a file that holds anything but codes', async () => {
    const asked = open();
    await chooseFile('from,to\r\nOkafor,S00000000000000000002Z\r\n');
    const problem = await screen.findByRole('alert');
    expect(problem.textContent).toContain('Line 2 holds something other than participant codes.');
    expect(problem.textContent).not.toContain('Okafor');
    expect(screen.queryByRole('button', { name: /^Replace/ })).toBeNull();
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('is not for a therapist', async () => {
    open({}, therapist);
    expect(await screen.findByText(new RegExp(`Only a coordinator of ${site.name}`))).toBeTruthy();
  });
});
