/** A steward at the desk: what waits, the evidence, the decision. */
import type { AccessRequest } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { exampleRequest } from '../../testing/example-request.ts';
import { fakeApi, refusal, signedInAs } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import DeskPage from './desk-page.tsx';
import ReviewPage from './review-page.tsx';

const path = `/api/access-requests/${exampleRequest.id}`;
const open: AccessRequest = { ...exampleRequest, actions: ['vote'] };
const reach = {
  inCohort: 42,
  consenting: 31,
  openQuestions: [],
  reasons: [
    { reason: 'commercial_purpose', verdict: 'not_permitted', participants: 9 },
    { reason: 'a_reason_of_tomorrow', verdict: 'manual_review', participants: 2 },
  ],
};

function review(request: AccessRequest, answers: Record<string, unknown> = {}) {
  const asked = fakeApi({
    'GET /api/account': signedInAs({ role: 'steward', site: null }),
    [`GET ${path}`]: request,
    [`GET ${path}/reach`]: reach,
    ...answers,
  });
  renderRoutes([{ path: '/desk/:requestId', element: <ReviewPage /> }], `/desk/${request.id}`);
  return asked;
}

const decide = () => screen.findByRole('button', { name: 'Decide' });

async function fillIn(vote: 'Approve' | 'Decline', reason: string): Promise<void> {
  fireEvent.click(await screen.findByRole('radio', { name: vote }));
  fireEvent.change(screen.getByRole('textbox', { name: /^Reason/ }), { target: { value: reason } });
  fireEvent.click(screen.getByRole('checkbox', { name: /I have no interest/ }));
}

describe('the desk', () => {
  const summary = (number: string, waitsForYou: boolean, submittedAt: string) => ({
    id: crypto.randomUUID(),
    number,
    title: `Request ${number}`,
    status: 'submitted',
    lead: 'Anna Researcher',
    submittedAt,
    updatedAt: submittedAt,
    waitsForYou,
  });

  it('puts what waits for this steward first, the oldest on top, and the others below', async () => {
    fakeApi({
      'GET /api/access-requests': {
        requests: [
          summary('AR-2026-0003', true, '2026-11-03T09:00:00.000Z'),
          summary('AR-2026-0002', false, '2026-11-02T09:00:00.000Z'),
          summary('AR-2026-0001', true, '2026-11-01T09:00:00.000Z'),
        ],
      },
    });
    renderRoutes([{ path: '*', element: <DeskPage /> }], '/desk');
    const waiting = await screen.findByRole('table', { name: 'Requests you can decide' });
    expect(
      within(waiting)
        .getAllByRole('rowheader')
        .map(({ textContent }) => textContent),
    ).toEqual(['AR-2026-0001', 'AR-2026-0003']);
    expect(within(screen.getByRole('table', { name: 'All other requests' })).getByRole('link', { name: 'AR-2026-0002' })).toBeTruthy();
  });

  it('says when nothing waits', async () => {
    fakeApi({ 'GET /api/access-requests': { requests: [] } });
    renderRoutes([{ path: '*', element: <DeskPage /> }], '/desk');
    expect(await screen.findByText(/Nothing waits for your decision/)).toBeTruthy();
  });
});

describe('a review', () => {
  it('lays the request out with the exact reach and each reason in words', async () => {
    review(open);
    for (const heading of ['The project', 'The people', 'The setting', 'The data', 'The outputs'])
      expect(await screen.findByRole('heading', { level: 2, name: heading })).toBeTruthy();
    const table = await screen.findByRole('table', { name: 'Why consent does not reach the others' });
    expect(within(table).getByRole('row', { name: 'The purpose is commercial. not permitted 9' })).toBeTruthy();
    expect(within(table).getByRole('row', { name: 'a_reason_of_tomorrow a person has to decide 2' })).toBeTruthy();
    expect(screen.getByText('people in the cohort').closest('div')?.textContent).toContain('42');
  });

  it('asks for all three parts of a decision before it asks to confirm', async () => {
    const asked = review(open);
    fireEvent.click(await decide());
    expect(await screen.findByRole('alert', { name: '3 things need mending' })).toBeTruthy();
    fireEvent.click(screen.getByRole('radio', { name: 'Decline' }));
    expect(await screen.findByRole('alert', { name: '2 things need mending' })).toBeTruthy();
    expect(screen.queryByRole('alertdialog')).toBeNull();
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('names the consequence, then binds the decision to the wording that was read', async () => {
    const votes = [{ steward: 'Mara Lind', vote: 'approve' as const, reason: 'A clear question.', at: '2026-11-05T09:00:00.000Z' }];
    const asked = review(open, {
      [`POST ${path}/votes`]: {
        ...open,
        status: 'approved',
        decidedAt: '2026-11-05T09:00:00.000Z',
        accessEndsOn: '2027-11-05',
        votes,
        actions: [],
      },
    });
    await screen.findByRole('table', { name: /Why consent/ });
    await fillIn('Approve', 'A clear question.');
    fireEvent.click(await decide());
    const dialog = await screen.findByRole('alertdialog', { name: 'Approve request AR-2026-0007?' });
    expect(dialog.textContent).toContain('rows of up to 31 consenting people for 12 months');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Approve it' }));
    expect(await screen.findByText('Approved on 5 November 2026.')).toBeTruthy();
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({
      versionHash: open.versionHash,
      vote: 'approve',
      reason: 'A clear question.',
      noConflict: true,
    });
  });

  it('keeps the reason typed when the request has changed meanwhile', async () => {
    review(open, { [`POST ${path}/votes`]: () => refusal('request-not-in-state', 'The request has changed since you read it.') });
    await fillIn('Decline', 'Too little is said about storage.');
    fireEvent.click(await decide());
    const dialog = await screen.findByRole('alertdialog');
    expect(dialog.textContent).toContain('gets no rows');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Decline it' }));
    expect(await within(dialog).findByText('The request has changed since you read it.')).toBeTruthy();
    fireEvent.click(within(dialog).getByRole('button', { name: 'Read it again' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect((screen.getByRole('textbox', { name: /^Reason/ }) as HTMLTextAreaElement).value).toBe('Too little is said about storage.');
  });

  it('says why a steward may not decide, and offers no form', async () => {
    review({ ...open, actions: [], mayNotVoteBecause: 'You belong to the team of this request.' });
    expect(await screen.findByText('You belong to the team of this request.')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Decide' })).toBeNull();
  });

  it('says why several have to agree, and warns of the same institution and of an approval that ends early', async () => {
    review({
      ...open,
      institution: 'North Harbour Clinic',
      form: { ...open.form, ethicsExpiresOn: '2020-01-31' },
    });
    expect(await screen.findByText('The lead works at your institution.')).toBeTruthy();
    expect(screen.getByText('The ethics approval ends before the access would.')).toBeTruthy();
  });

  it('tells how many are needed and why', async () => {
    review({ ...open, votesNeeded: 2, votesNeededBecause: ['Somebody has a commercial interest.'] });
    expect(await screen.findByText('2 stewards have to agree on this request.')).toBeTruthy();
    expect(screen.getAllByText('Somebody has a commercial interest.').length).toBeGreaterThan(0);
  });
});
