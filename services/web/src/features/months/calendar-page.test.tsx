import type { MonthState, SiteMonth } from '@cairnstep/contract';
import { cleanup, fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, signedInAs, site } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import CalendarPage from './calendar-page.tsx';

const second = { id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a22', code: 'S02', name: 'Low Fell Clinic' };
const submissionId = '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a33';
const month = (name: string, state: MonthState, more: Partial<SiteMonth> = {}): SiteMonth => ({
  month: name,
  state,
  dueOn: '2026-12-15',
  submissionId: null,
  acceptedAt: null,
  rows: null,
  closed: null,
  ...more,
});
const calendar = {
  months: ['2026-09', '2026-10', '2026-11'],
  sites: [
    {
      site,
      months: [
        month('2026-09', 'accepted', { submissionId, acceptedAt: '2026-10-04T09:00:00.000Z', rows: 700 }),
        month('2026-10', 'nothing-to-report', { closed: { at: '2026-11-02T09:00:00.000Z', by: 'Mara Lind' } }),
        month('2026-11', 'due'),
      ],
    },
    { site: second, months: [month('2026-10', 'overdue'), month('2026-11', 'checking', { submissionId })] },
  ],
};

const steward = signedInAs({ role: 'steward', site: null });

function open(answer: unknown = calendar, address = '/calendar', account = steward) {
  fakeApi({ 'GET /api/account': account, 'GET /api/calendar': answer });
  return renderRoutes([{ path: '/calendar', element: <CalendarPage /> }], address);
}

describe('the calendar', () => {
  it('shows the sites with the state of each month in words, newest month first', async () => {
    open();
    const table = await screen.findByRole('table', { name: 'Sites and their last twelve months, newest first' });
    const text = (row: HTMLElement) =>
      within(row)
        .getAllByRole('cell')
        .map((cell) => cell.textContent);
    const [header, first, other] = within(table).getAllByRole('row') as [HTMLElement, HTMLElement, HTMLElement];
    expect(
      within(header)
        .getAllByRole('columnheader')
        .map((cell) => cell.textContent),
    ).toEqual(['Site', 'Nov 2026', 'Oct 2026', 'Sep 2026']);
    expect(text(first)).toEqual(['due', 'nothing to reportsaid by Mara Lind', 'accepted, North Harbour Clinic, September 2026']);
    expect(text(other)).toEqual(['checking, Low Fell Clinic, November 2026', 'overdue', 'not yet in the registry']);
    expect(screen.getByText('1 month overdue at 1 site; 1 month due at 1 site; 1 month being checked at 1 site.')).toBeTruthy();
  });

  it('leads to the receipt of an accepted month and to a submission under way', async () => {
    open();
    expect((await screen.findByRole('link', { name: /^accepted\b.*North Harbour/ })).getAttribute('href')).toBe(
      `/submissions/${submissionId}/receipt`,
    );
    expect(screen.getByRole('link', { name: /^checking\b.*Low Fell/ }).getAttribute('href')).toBe(`/submit/${submissionId}`);
  });

  it('leads stewards to what a site sent, and the people of a site to its months', async () => {
    open();
    const leads = async () => (await screen.findByRole('link', { name: 'Low Fell Clinic (S02)' })).getAttribute('href');
    await screen.findByText(/every site/);
    expect(await leads()).toBe('/submissions?site=S02');
    cleanup();
    open(calendar, '/calendar', signedInAs({ role: 'coordinator', site: second }));
    await screen.findByText(/your sites/);
    expect(await leads()).toBe('/month?site=S02');
  });

  it('keeps in the address that only sites with an overdue month are shown', async () => {
    const router = open();
    fireEvent.click(await screen.findByRole('checkbox', { name: 'Only sites with an overdue month' }));
    expect(router.state.location.search).toBe('?only=overdue');
    expect(screen.queryByRole('rowheader', { name: /North Harbour/ })).toBeNull();
    expect(screen.getByRole('rowheader', { name: /Low Fell/ })).toBeTruthy();
  });

  it('says so when nothing is missing, and when no site is overdue', async () => {
    open(
      {
        months: ['2026-11'],
        sites: [
          { site, months: [month('2026-11', 'not-yet-due')] },
          { site: second, months: [] },
        ],
      },
      '/calendar?only=overdue',
    );
    expect(await screen.findByText('Every month that is over is accepted or had nothing to report.')).toBeTruthy();
    expect(screen.getByText(/^No site has an overdue month/)).toBeTruthy();
  });
});
