import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { fakeApi, refusal, signedInAs, site } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import MonthPage from './month-page.tsx';
import type { Month } from './months.ts';
import { coordinator, sample, submissionId, therapist } from './sample-submission.ts';

const second = { id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a22', code: 'S02', name: 'Low Fell Clinic' };
const month = (name: string, state: Month['state'], dueOn: string, more: Partial<Month> = {}): Month => ({
  month: name,
  state,
  dueOn,
  submissionId: null,
  acceptedAt: null,
  rows: null,
  closed: null,
  ...more,
});
const months = [
  month('2026-12', 'not-yet-due', '2027-01-15'),
  month('2026-11', 'due', '2026-12-15'),
  month('2026-10', 'accepted', '2026-11-15', { submissionId, acceptedAt: '2026-11-04T09:00:00.000Z', rows: 751 }),
];

function open(account = coordinator, answers: Readonly<Record<string, unknown>> = {}, address = '/month') {
  vi.setSystemTime('2026-12-01T10:00:00Z');
  const asked = fakeApi({ 'GET /api/account': account, [`GET /api/sites/${site.id}/months`]: { site, months }, ...answers });
  const router = renderRoutes(
    [
      { path: '/month', element: <MonthPage /> },
      { path: '*', element: <p>elsewhere</p> },
    ],
    address,
  );
  vi.useRealTimers();
  return { asked, router };
}

const next = async () => within(await screen.findByRole('region', { name: 'North Harbour Clinic (S01)' }));

describe('the months of a site', () => {
  it('begin with what is due and until when, and lead straight into submitting it', async () => {
    const { asked, router } = open(coordinator, { 'POST /api/submissions': sample() });
    const section = await next();
    expect(section.getByText(/is due on/).textContent).toBe('November 2026 is due on 15 December 2026');
    fireEvent.click(section.getByRole('button', { name: 'Submit November 2026' }));
    await waitFor(() => expect(router.state.location.pathname).toBe(`/submit/${submissionId}`));
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ siteId: site.id, month: '2026-11' });
  });

  it('show what can be done with each beside its name where the window is narrow', async () => {
    vi.stubGlobal('matchMedia', () => Object.assign(new EventTarget(), { matches: true }));
    open();
    const table = await screen.findByRole('table', { name: 'Months of North Harbour Clinic' });
    const headers = within(table).getAllByRole('columnheader');
    expect(headers.slice(0, 3).map(({ textContent }) => textContent)).toEqual(['Month', 'Next', 'State']);
  });

  it('stand in a table with their state, the way to the receipt, and to a correction', async () => {
    open();
    const table = await screen.findByRole('table', { name: 'Months of North Harbour Clinic' });
    expect(
      within(table).getByRole('row', {
        name: /^October 2026 accepted 15 November 2026 .* 751 Receipt of October 2026 Correct$/,
      }),
    ).toBeTruthy();
    expect(within(table).getByRole('link', { name: 'Receipt of October 2026' }).getAttribute('href')).toBe(
      `/submissions/${submissionId}/receipt`,
    );
    expect(within(table).getByRole('row', { name: /^December 2026 not over yet/ })).toBeTruthy();
    expect(screen.getByText('1 of 2 months are accepted or closed.')).toBeTruthy();
  });

  it('offer to go on where a month was begun', async () => {
    const begun = [month('2026-11', 'in-progress', '2026-12-15', { submissionId })];
    open(coordinator, { [`GET /api/sites/${site.id}/months`]: { site, months: begun } });
    expect((await next()).getByRole('link', { name: 'Go on with November 2026' }).getAttribute('href')).toBe(`/submit/${submissionId}`);
  });

  it('say when the next can be submitted while nothing is due', async () => {
    open(coordinator, { [`GET /api/sites/${site.id}/months`]: { site, months: [months[0], months[2]] } });
    const section = await next();
    expect(section.getByText('Nothing is due')).toBeTruthy();
    expect(section.getByText(/December 2026 can be submitted once it is over, and is due on 15 January 2027/)).toBeTruthy();
  });

  it('close a month with nothing to report, once the reader has seen what follows', async () => {
    const closed = month('2026-11', 'nothing-to-report', '2026-12-15', { closed: { at: '2026-12-01T10:00:00.000Z', by: 'Mara Lind' } });
    const { asked } = open(coordinator, { [`POST /api/sites/${site.id}/months/2026-11/nothing-to-report`]: closed });
    fireEvent.click((await next()).getByRole('button', { name: 'Nothing to report for November 2026' }));
    const dialog = within(await screen.findByRole('alertdialog', { name: 'Nothing to report for November 2026?' }));
    expect(dialog.getByText(/no session, assessment or event in November 2026/)).toBeTruthy();
    fireEvent.click(dialog.getByRole('button', { name: 'Close November 2026' }));
    expect(await screen.findByText('2 of 2 months are accepted or closed.')).toBeTruthy();
    const row = screen.getByRole('row', { name: /^November 2026 nothing to report/ });
    expect(within(row).getByText(/said by Mara Lind/)).toBeTruthy();
    expect(within(row).getByRole('button', { name: 'Submit after all November 2026' })).toBeTruthy();
    expect(asked.filter(({ method }) => method === 'POST')).toHaveLength(1);
  });

  it('say why a month could not be opened', async () => {
    open(coordinator, { 'POST /api/submissions': () => refusal('month-not-open', 'A month can be submitted once it has ended.') });
    fireEvent.click((await next()).getByRole('button', { name: 'Submit November 2026' }));
    expect((await screen.findByRole('alert')).textContent).toContain('A month can be submitted once it has ended.');
  });

  it('offer a therapist nothing to change', async () => {
    open(therapist);
    expect((await next()).getByText(/The site coordinator submits/)).toBeTruthy();
    expect(screen.queryByRole('button', { name: /^(Submit|Correct)/ })).toBeNull();
    expect(screen.getByRole('link', { name: 'Receipt of October 2026' })).toBeTruthy();
  });

  it('keep the chosen one of several sites in the address', async () => {
    const both = signedInAs({ role: 'coordinator', site }, { role: 'coordinator', site: second });
    const { router } = open(both, { [`GET /api/sites/${second.id}/months`]: { site: second, months } });
    fireEvent.click(await screen.findByRole('radio', { name: 'Low Fell Clinic (S02)' }));
    expect(await screen.findByRole('table', { name: 'Months of Low Fell Clinic' })).toBeTruthy();
    expect(router.state.location.search).toBe('?site=S02');
  });
});
