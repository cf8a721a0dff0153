import { fireEvent, screen, waitFor } from '@testing-library/react';
import { expect, it } from 'vitest';
import { fakeApi, signedInAs, site } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { coordinator, submissionId } from './sample-submission.ts';
import SubmissionsPage from './submissions-page.tsx';

const line = {
  id: submissionId,
  month: '2026-11',
  createdAt: '2026-12-01T08:00:00.000Z',
  createdBy: 'Mara Lind',
  settledAt: null,
  rows: 90,
};
const page = (...items: object[]) => ({ items, page: 1, pageSize: 50, total: items.length });

const lowFell = { ...site, id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a22', code: 'S02', name: 'Low Fell Clinic' };

function open(account: unknown, items: object) {
  const asked = fakeApi({
    'GET /api/account': account,
    'GET /api/sites': { sites: [site, lowFell] },
    'GET /api/submissions': items,
    [`GET /api/sites/${site.id}/safe-headers`]: { headers: [] },
    [`GET /api/sites/${lowFell.id}/safe-headers`]: { headers: [] },
  });
  renderRoutes([{ path: '/submissions', element: <SubmissionsPage /> }], '/submissions?site=S02');
  return asked;
}

it('leads from accepted ones to their receipt and from others back into them', async () => {
  open(coordinator, page({ ...line, status: 'superseded' }, { ...line, id: submissionId.replace('2b', '3c'), status: 'checked' }));
  expect((await screen.findByRole('link', { name: 'Receipt of November 2026' })).getAttribute('href')).toBe(
    `/submissions/${submissionId}/receipt`,
  );
  expect(screen.getByRole('link', { name: 'Submission of November 2026' }).getAttribute('href')).toContain('/submit/3c');
  expect(screen.getByText('corrected by a later submission')).toBeTruthy();
});

it('leads to the headers below a long list, and keeps the site chosen', async () => {
  open(coordinator, page({ ...line, status: 'accepted' }));
  const link = await screen.findByRole('link', { name: 'Headers marked as safe' });
  expect(link.getAttribute('href')).toBe('/submissions?site=S02#safe-headers');
  fireEvent.click(link);
  const section = await screen.findByRole('region', { name: 'Headers marked as safe' });
  await waitFor(() => expect(section.contains(document.activeElement)).toBe(true));
});

it('says where to begin while there is none', async () => {
  open(coordinator, page());
  expect(await screen.findByText(/No submission has been opened yet/)).toBeTruthy();
});

it('shows a steward the site the address names, of all', async () => {
  const asked = open(signedInAs({ role: 'steward', site: null }), page({ ...line, status: 'open' }));
  expect(await screen.findByRole('table', { name: 'Submissions of Low Fell Clinic, newest first' })).toBeTruthy();
  expect(asked.find(({ path }) => path === '/api/submissions')?.search).toContain(`siteId=${lowFell.id}`);
});
