/** A researcher's request: written, refused where it is incomplete, handed in, decided. */
import type { AccessRequest, RequestForm } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { exampleRequest } from '../../testing/example-request.ts';
import { fakeApi, json, refusal, signedInAs } from '../../testing/fake-api.ts';
import type { Asked } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import NewRequestPage from './new-request-page.tsx';
import RequestPage from './request-page.tsx';

const path = `/api/access-requests/${exampleRequest.id}`;
const draft: AccessRequest = { ...exampleRequest, status: 'draft', submittedAt: null, actions: ['edit', 'submit', 'delete'] };
const reach = { inCohort: 85, consenting: null, openQuestions: [], reasons: [] };

function open(request: AccessRequest, answers: Record<string, unknown> = {}, address = `/requests/${request.id}`) {
  const asked = fakeApi({
    'GET /api/account': signedInAs({ role: 'researcher', site: null }),
    [`GET ${path}`]: request,
    [`GET ${path}/reach`]: reach,
    [`PUT ${path}`]: ({ body }: Asked) => json({ ...request, form: (body as { form: RequestForm }).form, versionHash: 'cd'.repeat(32) }),
    ...answers,
  });
  const router = renderRoutes(
    [
      { path: '/requests/new', element: <NewRequestPage /> },
      { path: '/requests/:requestId', element: <RequestPage /> },
      { path: '/exports', element: <h1>Exports</h1> },
      { path: '/requests', element: <h1>Requests</h1> },
    ],
    address,
  );
  return { asked, router };
}

const saved = (asked: readonly Asked[]) =>
  asked.filter(({ method }) => method === 'PUT').map(({ body }) => (body as { form: RequestForm }).form);
const title = () => screen.findByRole('textbox', { name: /^Title/ });

async function handIn(): Promise<void> {
  fireEvent.click(screen.getByRole('button', { name: 'Hand in to the stewards' }));
  fireEvent.click(await screen.findByRole('button', { name: 'Hand it in' }));
}

describe('writing a request', () => {
  it('begins with the cohort of the grid and a title, as a draft', async () => {
    const { asked, router } = open(
      draft,
      { 'POST /api/access-requests': () => json(draft, 201) },
      '/requests/new?outcome=tmwt_ss&cells=t1_t9.D',
    );
    expect(await screen.findByText('T1–T9: AIS D')).toBeTruthy();
    fireEvent.change(await title(), { target: { value: 'Speed ' } });
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    fireEvent.click(screen.getByRole('button', { name: 'Begin the request' }));
    await waitFor(() => expect(router.state.location.pathname).toBe(`/requests/${draft.id}`));
    const { form } = asked.find(({ method }) => method === 'POST')?.body as { form: RequestForm };
    expect(form).toMatchObject({
      title: 'Speed',
      cohort: { outcome: 'tmwt_ss', inDevice: false, cells: [{ levelGroup: 't1_t9', grade: 'D' }] },
    });
  });

  it('is kept as it is typed, with the time, and the reach is counted anew', async () => {
    const { asked } = open(draft);
    fireEvent.change(await title(), { target: { value: 'Speed by grade' } });
    expect(screen.getByText('Keeping what you typed …')).toBeTruthy();
    fireEvent.blur(await title());
    expect(await screen.findByText(/^Kept at \d\d:\d\d\.$/)).toBeTruthy();
    expect(saved(asked).at(-1)?.title).toBe('Speed by grade');
    await waitFor(() => expect(asked.filter(({ path: asking }) => asking === `${path}/reach`)).toHaveLength(2));
  });

  it('shows the reach rounded and hidden as the server gives it', async () => {
    open(draft);
    const reached = await screen.findByText('people in the cohort');
    expect(reached.closest('div')?.textContent).toContain('85');
    expect(screen.getByText('of them consent to this use').closest('div')?.textContent).toContain('not shown');
  });

  it('says which answers are missing before it can be told who consents', async () => {
    const openQuestions = ['country', 'agreesToPublish', 'agreesToReturn'];
    open(draft, { [`GET ${path}/reach`]: { ...reach, openQuestions } });
    expect(await screen.findByText(/worked out once these are answered: country, what you owe in return\.$/)).toBeTruthy();
    expect(screen.queryByText('of them consent to this use')).toBeNull();
  });

  it('can be deleted after asking once, and nothing is sent after it', async () => {
    const { asked, router } = open(draft, { [`DELETE ${path}`]: {} });
    fireEvent.change(await title(), { target: { value: 'Speed by grade' } });
    fireEvent.click(screen.getByRole('button', { name: 'Delete the draft' }));
    const dialog = within(await screen.findByRole('alertdialog', { name: 'Delete the draft of request AR-2026-0007?' }));
    expect(asked.some(({ method }) => method === 'DELETE')).toBe(false);
    fireEvent.click(dialog.getByRole('button', { name: 'Delete it' }));
    expect(await screen.findByRole('heading', { name: 'Requests' })).toBeTruthy();
    expect(router.state.location.pathname).toBe('/requests');
    expect(asked.filter(({ path: asking }) => asking === path).at(-1)?.method).toBe('DELETE');
  });

  it('takes over a cohort brought from the grid and clears the address', async () => {
    const { asked, router } = open(draft, {}, `/requests/${draft.id}?outcome=tmwt_ss&cells=l1_l5.C.D`);
    expect(await screen.findByText('L1–L5: AIS C and D')).toBeTruthy();
    await waitFor(() => expect(router.state.location.search).toBe(''));
    await waitFor(() => expect(saved(asked).at(-1)?.cohort.cells).toHaveLength(2), { timeout: 3000 });
  });

  it('keeps what is typed while the registry cannot be reached, also for who leaves and comes back, and sends it by itself', async () => {
    let isReachable = false;
    const { asked, router } = open(draft, {
      [`PUT ${path}`]: ({ body }: Asked) =>
        isReachable ? json({ ...draft, form: (body as { form: RequestForm }).form }) : Promise.reject(new TypeError('offline')),
    });
    fireEvent.change(await title(), { target: { value: 'Speed by grade' } });
    fireEvent.blur(await title());
    expect(await screen.findByText(/Not kept: the registry cannot be reached/)).toBeTruthy();
    await router.navigate('/exports');
    await screen.findByRole('heading', { name: 'Exports' });
    await router.navigate(`/requests/${draft.id}`);
    expect(((await title()) as HTMLInputElement).value).toBe('Speed by grade');
    isReachable = true;
    expect(await screen.findByText(/^Kept at \d\d:\d\d\.$/, undefined, { timeout: 8000 })).toBeTruthy();
    expect(saved(asked).at(-1)?.title).toBe('Speed by grade');
  });
});

describe('handing a request in', () => {
  it('names all that is missing on top and beside the fields, and a mended field is no longer named', async () => {
    open(draft, {
      [`POST ${path}/submit`]: () =>
        refusal('request-incomplete', 'The draft is kept.', [
          { pointer: '/form/question', detail: 'State the research question.' },
          { pointer: '/form/tables/0/justification', detail: 'Say why this table is needed.' },
          { pointer: '/form/team/0', detail: 'No researcher has this address.' },
        ]),
    });
    await title();
    await handIn();
    const summary = await screen.findByRole('alert', { name: '3 things need mending' });
    await waitFor(() => expect(document.activeElement).toBe(summary));
    const question = screen.getByRole('textbox', { name: /^Research question/ });
    expect(question.getAttribute('aria-invalid')).toBe('true');
    fireEvent.click(within(summary).getByRole('link', { name: 'Say why this table is needed.' }));
    expect(document.activeElement).toBe(screen.getByRole('textbox', { name: /^Why outcomes are needed/ }));
    fireEvent.change(question, { target: { value: 'How fast do people walk?' } });
    expect(await screen.findByRole('alert', { name: '2 things need mending' })).toBeTruthy();
    expect(screen.queryByText('State the research question.')).toBeNull();
  });

  it('names what is missing before it asks to confirm, with links to the fields', async () => {
    const form = { ...exampleRequest.form, question: '  ', country: null, tables: [{ table: 'sessions' as const, justification: '' }] };
    const { asked } = open({ ...draft, form });
    await title();
    fireEvent.click(screen.getByRole('button', { name: 'Hand in to the stewards' }));
    const summary = within(await screen.findByRole('alert', { name: '3 things need mending' }));
    fireEvent.click(summary.getByRole('link', { name: 'State the research question in a sentence or two.' }));
    expect(document.activeElement).toBe(screen.getByRole('textbox', { name: /^Research question/ }));
    expect(summary.getByRole('link', { name: /^Choose the country/ })).toBeTruthy();
    expect(summary.getByRole('link', { name: 'Say why this table is needed.' })).toBeTruthy();
    expect(screen.queryByRole('alertdialog')).toBeNull();
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('does not ask the registry with a day that is none', async () => {
    const { asked } = open(draft);
    fireEvent.change(await screen.findByRole('textbox', { name: /^Last day of the approval/ }), { target: { value: '30 June' } });
    fireEvent.click(screen.getByRole('button', { name: 'Hand in to the stewards' }));
    expect(await screen.findByRole('alert', { name: '1 thing needs mending' })).toBeTruthy();
    expect(asked.some(({ path: asking }) => asking.endsWith('/submit'))).toBe(false);
    expect(saved(asked).every(({ ethicsExpiresOn }) => ethicsExpiresOn === null)).toBe(true);
  });

  it('sends the last word typed before it hands in, and then shows where the request stands', async () => {
    const { asked } = open(draft, { [`POST ${path}/submit`]: exampleRequest });
    fireEvent.change(await title(), { target: { value: 'The last word' } });
    await handIn();
    expect(await screen.findByText('Waiting for a decision.')).toBeTruthy();
    const order = asked.filter(({ method }) => method !== 'GET').map(({ method }) => method);
    expect(order.slice(-2)).toEqual(['PUT', 'POST']);
    expect(saved(asked).at(-1)?.title).toBe('The last word');
  });
});

describe('a request that was handed in', () => {
  it('shows every answer and can be taken back after asking once', async () => {
    const { asked } = open(exampleRequest, { [`POST ${path}/withdraw`]: { ...exampleRequest, status: 'withdrawn', actions: [] } });
    expect(await screen.findByText('Netherlands')).toBeTruthy();
    expect(screen.getByText('C5–C8: AIS D')).toBeTruthy();
    expect(screen.getAllByText('Not answered')).toHaveLength(1);
    fireEvent.click(screen.getByRole('button', { name: 'Take the request back' }));
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    fireEvent.click(await screen.findByRole('button', { name: 'Take it back' }));
    expect(await screen.findByText(/Taken back by its lead/)).toBeTruthy();
  });

  it('shows the decision with its reason and the end of access, and builds the export', async () => {
    const approved: AccessRequest = {
      ...exampleRequest,
      status: 'approved',
      decidedAt: '2026-11-05T09:00:00.000Z',
      accessEndsOn: '2027-11-05',
      votes: [{ steward: 'Tom Steward', vote: 'approve', reason: 'A clear question.', at: '2026-11-05T09:00:00.000Z' }],
      actions: ['build-export'],
    };
    const { router } = open(approved, {
      [`POST ${path}/exports`]: () =>
        json(
          {
            id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a78',
            number: 'EX-2026-0001',
            requestId: approved.id,
            requestTitle: approved.form.title,
            status: 'building',
            builtAt: null,
            participants: null,
            bytes: null,
            sha256: null,
            accessEndsOn: '2027-11-05',
          },
          202,
        ),
    });
    expect(await screen.findByText('Approved on 5 November 2026.')).toBeTruthy();
    expect(screen.getByText(/Access ends on 5 November 2027/)).toBeTruthy();
    expect(screen.getByText('A clear question.')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Build the export' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/exports'));
  });

  it('says that access has ended where the export can no longer be built', async () => {
    open(
      {
        ...exampleRequest,
        status: 'approved',
        decidedAt: '2026-11-05T09:00:00.000Z',
        accessEndsOn: '2027-11-05',
        actions: ['build-export'],
      },
      { [`POST ${path}/exports`]: () => refusal('access-ended', 'The ethics approval named in the request has run out.') },
    );
    fireEvent.click(await screen.findByRole('button', { name: 'Build the export' }));
    expect(await screen.findByText('The ethics approval named in the request has run out.')).toBeTruthy();
  });

  it('is nothing at this address for others', async () => {
    open(exampleRequest, { [`GET ${path}`]: () => refusal('not-found', 'There is nothing at this address, or it is not yours to see.') });
    expect(await screen.findByText(/not yours to see/)).toBeTruthy();
  });
});
