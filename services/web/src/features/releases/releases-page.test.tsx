import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { release } from '../../testing/example-grid.ts';
import { fakeApi, json, refusal, signedInAs } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import ReleasesPage from './releases-page.tsx';

const steward = signedInAs({ role: 'steward', site: null });

function open(answers: Record<string, unknown>) {
  const asked = fakeApi({ 'GET /api/account': steward, 'GET /api/releases': { releases: [release] }, ...answers });
  renderRoutes([{ path: '*', element: <ReleasesPage /> }], '/releases');
  return asked;
}

async function make(note: string): Promise<void> {
  fireEvent.change(await screen.findByRole('textbox', { name: /What this release is for/ }), { target: { value: note } });
  fireEvent.click(await screen.findByRole('button', { name: 'Make release 4' }));
}

describe('releases', () => {
  it('are listed, each a way to its figures', async () => {
    open({});
    expect((await screen.findByRole('link', { name: 'Release 3' })).getAttribute('href')).toBe('/explore?release=3');
  });

  it('are made by a steward, who says what for and is asked once', async () => {
    const asked = open({ 'POST /api/releases': () => json({ ...release, number: 4 }, 201) });
    await make('');
    expect(await screen.findByRole('alert', { name: '1 thing needs mending' })).toBeTruthy();
    await make('Figures for March');
    const dialog = await screen.findByRole('alertdialog', { name: 'Make release 4?' });
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    fireEvent.click(within(dialog).getByRole('button', { name: 'Make release 4' }));
    await waitFor(() => expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ note: 'Figures for March' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
  });

  it('are not made when nothing has changed, and the reason is said', async () => {
    open({ 'POST /api/releases': () => refusal('release-unchanged', 'Release 3 already holds the registry as it is.') });
    await make('Figures for March');
    fireEvent.click(within(await screen.findByRole('alertdialog')).getByRole('button', { name: 'Make release 4' }));
    expect(await screen.findByText('Release 3 already holds the registry as it is.')).toBeTruthy();
  });

  it('cannot be made by others', async () => {
    open({ 'GET /api/account': signedInAs({ role: 'researcher', site: null }), 'GET /api/releases': { releases: [] } });
    expect(await screen.findByText(/No release has been made yet/)).toBeTruthy();
    expect(screen.queryByRole('textbox')).toBeNull();
  });
});
