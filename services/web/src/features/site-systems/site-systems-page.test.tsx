import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, refusal, signedInAs, site } from '../../testing/fake-api.ts';
import { renderPart } from '../../testing/render.tsx';
import type { System } from './site-systems.queries.ts';
import SiteSystemsPage from './site-systems-page.tsx';

const system: System = {
  id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a55',
  site,
  issuer: 'https://provider.example',
  subject: 'records-7',
  label: 'Training records',
  status: 'active',
  addedAt: '2026-11-02T09:00:00.000Z',
  addedBy: 'Ruth Adeyemi',
  lastUsedAt: null,
};
const tokens = { issuer: 'https://provider.example', audience: 'https://cairnstep.example/api', scope: 'submissions' };

function open(role: 'administrator' | 'steward', answers: Readonly<Record<string, unknown>> = {}, systems: readonly System[] = [system]) {
  const asked = fakeApi({
    'GET /api/account': signedInAs({ role, site: null }),
    'GET /api/site-systems': { systems, tokens },
    'GET /api/sites': { sites: [site] },
    ...answers,
  });
  renderPart(<SiteSystemsPage />);
  return asked;
}
const type = async (label: RegExp, text: string) =>
  fireEvent.change(await screen.findByRole('textbox', { name: label }), { target: { value: text } });

describe("the page of sites' systems", () => {
  it('says which system submits for which site, and what its tokens must say', async () => {
    open('steward');
    const row = await screen.findByRole('row', { name: /^Training records North Harbour Clinic \(S01\) records-7 active never/ });
    expect(within(row).getByText('by Ruth Adeyemi')).toBeTruthy();
    expect(await screen.findByText('https://cairnstep.example/api')).toBeTruthy();
    expect(screen.queryByRole('button', { name: /^(Disable|Register the)/ })).toBeNull();
  });

  it('registers a system for a site', async () => {
    const asked = open('administrator', {
      'POST /api/site-systems': { ...system, id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a66', label: 'Second system', subject: 'records-8' },
    });
    fireEvent.click(await screen.findByRole('button', { name: /Choose/ }));
    fireEvent.click(await screen.findByRole('option', { name: 'North Harbour Clinic (S01)' }));
    await type(/Client id/, 'records-8');
    await type(/Name/, 'Second system');
    fireEvent.click(screen.getByRole('button', { name: 'Register the system' }));
    expect(await screen.findByRole('row', { name: /^Second system/ })).toBeTruthy();
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ siteId: site.id, subject: 'records-8', label: 'Second system' });
  });

  it('names what is missing before anything is sent', async () => {
    const asked = open('administrator');
    fireEvent.click(await screen.findByRole('button', { name: 'Register the system' }));
    const summary = within(await screen.findByRole('alert'));
    expect(summary.getByRole('link', { name: 'Choose the site that the system belongs to' })).toBeTruthy();
    expect(summary.getByRole('link', { name: 'Write the client id that the identity provider gave to the system' })).toBeTruthy();
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('disables a system once the reader has seen what follows, and shows why it could not', async () => {
    open('administrator', { [`PUT /api/site-systems/${system.id}/status`]: () => refusal('busy', 'Try again in a moment.') });
    fireEvent.click(await screen.findByRole('button', { name: 'Disable Training records' }));
    const dialog = within(await screen.findByRole('alertdialog', { name: 'Disable Training records?' }));
    expect(dialog.getByText(/From its next request on it is refused/)).toBeTruthy();
    fireEvent.click(dialog.getByRole('button', { name: 'Disable the system' }));
    expect(await dialog.findByText('Try again in a moment.')).toBeTruthy();
  });
});
