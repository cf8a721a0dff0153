import type { DataExport } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, json } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { Announcer } from '../../ui/announcer.tsx';
import ExportsPage from './exports-page.tsx';

const ready: DataExport = {
  id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a78',
  number: 'EX-2026-0001',
  requestId: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a77',
  requestTitle: 'Walking speed after training',
  status: 'ready',
  builtAt: '2026-11-05T09:00:00.000Z',
  participants: 139,
  bytes: 22_000,
  sha256: 'ab'.repeat(32),
  accessEndsOn: '2099-11-05',
};
const building: DataExport = { ...ready, status: 'building', builtAt: null, participants: null, bytes: null, sha256: null };

function open(answer: unknown, more: Record<string, unknown> = {}) {
  const asked = fakeApi({ 'GET /api/exports': answer, ...more });
  renderRoutes([{ path: '*', element: <><ExportsPage /><Announcer /></> }], '/exports'); // prettier-ignore
  return asked;
}

describe('exports', () => {
  it('are downloaded by a plain link, with their checksum and the end of access', async () => {
    open({ exports: [ready] });
    const link = await screen.findByRole('link', { name: 'Download EX-2026-0001.zip' });
    expect(link.getAttribute('href')).toBe(`/api/exports/${ready.id}/file`);
    expect(screen.getByText('ab'.repeat(32))).toBeTruthy();
    expect(screen.getByText('5 November 2099')).toBeTruthy();
    expect(screen.getByText('139 people')).toBeTruthy();
  });

  it('are looked at again while one is being built, and its end is announced', async () => {
    let asked = 0;
    open(() => json({ exports: [asked++ === 0 ? building : ready] }));
    expect(await screen.findByText(/Being built/)).toBeTruthy();
    expect(screen.queryByRole('link', { name: /Download/ })).toBeNull();
    expect(await screen.findByRole('link', { name: /Download/ }, { timeout: 5000 })).toBeTruthy();
    await waitFor(() => expect(screen.getByText('Export EX-2026-0001 is ready to download.')).toBeTruthy());
  });

  it('cannot be downloaded once somebody has withdrawn, and are built again without them', async () => {
    const asked = open(
      { exports: [{ ...ready, status: 'stale' }] },
      { [`POST /api/access-requests/${ready.requestId}/exports`]: () => json(building, 202) },
    );
    expect(await screen.findByText('Somebody in it has withdrawn consent.')).toBeTruthy();
    expect(screen.queryByRole('link', { name: /Download/ })).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Build it again' }));
    await waitFor(() => expect(asked.some(({ method }) => method === 'POST')).toBe(true));
  });

  it('say so when building failed, and offer nothing after access has ended', async () => {
    open({
      exports: [
        { ...building, status: 'failed' },
        { ...ready, id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a79', number: 'EX-2026-0002', accessEndsOn: '2020-01-01' },
      ],
    });
    const [failed, ended] = await screen.findAllByRole('listitem');
    if (failed === undefined || ended === undefined) throw new Error('Both are listed.');
    expect(within(failed).getByText('It could not be built.')).toBeTruthy();
    expect(within(ended).getByText('Access has ended.')).toBeTruthy();
    expect(within(ended).queryByRole('link', { name: /Download/ })).toBeNull();
    expect(within(ended).queryByRole('button')).toBeNull();
  });

  it('say where to begin when there are none', async () => {
    open({ exports: [] });
    expect(await screen.findByText(/No export has been built yet/)).toBeTruthy();
  });
});
