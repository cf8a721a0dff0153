/** The page around the site key, with messages as the preparing page would send them. */
import { act, screen, waitFor } from '@testing-library/react';
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

  it('is not for a therapist', async () => {
    open({}, therapist);
    expect(await screen.findByText(new RegExp(`Only a coordinator of ${site.name}`))).toBeTruthy();
  });
});
