/** The whole client at an address, against canned answers. */
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { fakeApi, json, nobody, refusal, signedInAs, site } from '../testing/fake-api.ts';
import { renderRoutes } from '../testing/render.tsx';
import { routes } from './router.tsx';

const figures = {
  release: { number: 3, madeAt: '2026-11-02T09:00:00.000Z' },
  sites: 8,
  participants: 1235,
  sessions: null,
  bouts: 98_755,
  levelGroups: [
    { label: 'C1 to C4', participants: 180 },
    { label: 'S1 to S3', participants: null },
  ],
  completeness: [{ label: 'Complete (A)', participants: 410 }],
};
const publicAnswers = { 'GET /api/account': nobody, 'GET /api/public/figures': figures };

const heading = (name: string | RegExp) => screen.findByRole('heading', { level: 1, name });

describe('the frame', () => {
  it('has a way past itself, the landmarks and the cautions', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/');
    await heading(/Walking training/);
    expect(screen.getByRole('link', { name: 'Skip to the content' }).getAttribute('href')).toBe('#main');
    expect(screen.getByRole('main').id).toBe('main');
    expect(screen.getByRole('navigation', { name: 'Pages' })).toBeTruthy();
    expect(within(screen.getByRole('contentinfo')).getByText(/do not choose or dose treatment/)).toBeTruthy();
    expect(document.title).toMatch(/Cairnstep$/);
  });

  it('labels invented data as invented, and only then', async () => {
    fakeApi({ ...publicAnswers, 'GET /api/account': { ...nobody, demonstration: true } });
    renderRoutes(routes, '/');
    const label = await screen.findByText(/Demonstration: invented data/);
    // It is printed too, with a receipt or a report.
    expect(label.closest('.not-printed')).toBeNull();
  });

  it('labels them before the account is known where the page itself says so', async () => {
    document.documentElement.setAttribute('data-demonstration', '');
    fakeApi({ ...publicAnswers, 'GET /api/account': () => new Promise<Response>(() => undefined) });
    renderRoutes(routes, '/');
    expect(await screen.findByText(/Demonstration: invented data/)).toBeTruthy();
    document.documentElement.removeAttribute('data-demonstration');
  });

  it('says nothing of a demonstration where there is none', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/');
    await screen.findByRole('link', { name: 'Sign in' });
    expect(screen.queryByText(/Demonstration/)).toBeNull();
  });

  it('moves the focus to the content of the page one goes to', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/');
    await heading(/Walking training/);
    fireEvent.click(within(screen.getByRole('navigation', { name: 'Pages' })).getByRole('link', { name: 'For participants' }));
    await heading('For participants');
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('main')));
  });

  it('keeps the theme chosen', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/');
    await heading(/Walking training/);
    fireEvent.click(screen.getByRole('button', { name: 'Appearance' }));
    fireEvent.click(screen.getByRole('radio', { name: 'Dark' }));
    expect(document.documentElement.dataset['theme']).toBe('dark');
    expect(localStorage.getItem('cairnstep-theme')).toBe('dark');
    fireEvent.click(screen.getByRole('radio', { name: 'As the system' }));
    expect(document.documentElement.dataset['theme']).toBeUndefined();
  });

  it('signs out here and goes on to where the session ends', async () => {
    const asked = fakeApi({
      ...publicAnswers,
      'GET /api/account': signedInAs({ role: 'coordinator', site }),
      'POST /api/sign-out': { continueAt: 'https://id.example/end' },
    });
    const assign = vi.spyOn(window.location, 'assign').mockImplementation(() => undefined);
    renderRoutes(routes, '/');
    fireEvent.click(await screen.findByRole('button', { name: 'Mara Lind' }));
    expect(screen.getByText('site coordinator, North Harbour Clinic (S01)')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    await waitFor(() => expect(assign).toHaveBeenCalledWith('https://id.example/end'));
    expect(asked.some(({ method, path }) => method === 'POST' && path === '/api/sign-out')).toBe(true);
    assign.mockRestore();
  });

  it('says so when signing out does not work, and lets it be tried again', async () => {
    fakeApi({
      ...publicAnswers,
      'GET /api/account': signedInAs({ role: 'coordinator', site }),
      'POST /api/sign-out': () => refusal('busy'),
    });
    renderRoutes(routes, '/');
    fireEvent.click(await screen.findByRole('button', { name: 'Mara Lind' }));
    fireEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    expect((await screen.findByRole('alert')).textContent).toContain('You are still signed in');
    expect(screen.getByRole('button', { name: 'Sign out' })).toBeTruthy();
  });
});

describe('the public figures', () => {
  it('stand with their release, and one mark for every number not shown', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/');
    const table = await screen.findByRole('table', { name: 'Participants by level of injury' });
    expect(within(table).getByRole('row', { name: /C1 to C4 180/ })).toBeTruthy();
    expect(within(table).getByRole('row', { name: /S1 to S3 not shown/ })).toBeTruthy();
    expect(screen.getByText(/Release 3, made on 2 November 2026/)).toBeTruthy();
    expect(screen.getByText(/not shown \(fewer than 11, or protecting such a count\)/)).toBeTruthy();
    expect(screen.getByText(/The largest group is C1 to C4, with about 180 participants/)).toBeTruthy();
  });

  it('say when the first will come while there is no release', async () => {
    fakeApi({ ...publicAnswers, 'GET /api/public/figures': { ...figures, release: null } });
    renderRoutes(routes, '/');
    expect(await screen.findByText(/No release has been made yet/)).toBeTruthy();
    expect(screen.queryByRole('table')).toBeNull();
  });

  it('say what to do when they are refused, and come after another try', async () => {
    let tries = 0;
    fakeApi({
      ...publicAnswers,
      'GET /api/public/figures': () => (tries++ === 0 ? refusal('too-many-requests', 'Wait a minute, then go on.') : json(figures)),
    });
    renderRoutes(routes, '/');
    expect((await screen.findByRole('alert')).textContent).toContain('Wait a minute, then go on.');
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('table', { name: 'Participants by level of injury' })).toBeTruthy();
  });
});

describe('signing in', () => {
  it('leads to the provider and back to the address asked for', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/sign-in?returnTo=%2Fexplore%3Foutcome%3Dx');
    const link = await screen.findByRole('link', { name: 'Sign in with your organisation' });
    expect(link.getAttribute('href')).toBe('/api/sign-in?returnTo=%2Fexplore%3Foutcome%3Dx');
  });

  it('shows a person without a role whom to ask', async () => {
    fakeApi({ ...publicAnswers, 'GET /api/account': signedInAs() });
    const router = renderRoutes(routes, '/start');
    await heading('Nobody has given this account a role yet');
    expect(router.state.location.pathname).toBe('/whom-to-ask');
    expect(screen.getByText('office@cairnstep.example')).toBeTruthy();
  });

  it('sends a stranger from there to signing in', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/whom-to-ask');
    await heading('Sign in');
  });
});

describe('an invitation', () => {
  const token = 'x'.repeat(43);
  const offer = { role: 'coordinator', site, expiresAt: '2026-12-08T10:00:00.000Z' };

  it('says what it offers and asks a stranger to sign in and come back', async () => {
    fakeApi({ ...publicAnswers, [`GET /api/invitations/${token}`]: offer });
    renderRoutes(routes, `/invitation/${token}`);
    expect(await screen.findByText('site coordinator, North Harbour Clinic (S01)')).toBeTruthy();
    const link = await screen.findByRole('link', { name: 'Sign in with your organisation' });
    expect(link.getAttribute('href')).toBe(`/api/sign-in?returnTo=%2Finvitation%2F${token}`);
  });

  it('is taken with one press', async () => {
    const asked = fakeApi({
      ...publicAnswers,
      'GET /api/account': signedInAs(),
      [`GET /api/invitations/${token}`]: offer,
      [`POST /api/invitations/${token}/accept`]: signedInAs({ role: 'coordinator', site }),
    });
    const router = renderRoutes(routes, `/invitation/${token}`);
    fireEvent.click(await screen.findByRole('button', { name: 'Take this role' }));
    await waitFor(() => expect(router.state.location.pathname).not.toMatch(/^\/(invitation|start)/));
    expect(asked.filter(({ method }) => method === 'POST')).toHaveLength(1);
    expect(screen.getByText('You now work here as site coordinator, North Harbour Clinic (S01).')).toBeTruthy();
  });

  it('says why it cannot be used', async () => {
    fakeApi({ ...publicAnswers, [`GET /api/invitations/${token}`]: () => refusal('invitation-unusable', 'Ask for a new one.') });
    renderRoutes(routes, `/invitation/${token}`);
    expect((await screen.findByRole('alert')).textContent).toContain('Ask for a new one.');
  });

  it('tells a link cut short from one that was used, without asking the server', async () => {
    const asked = fakeApi(publicAnswers);
    renderRoutes(routes, '/invitation/abc');
    expect(await screen.findByText(/This link is not complete/)).toBeTruthy();
    expect(asked.some(({ path }) => path.startsWith('/api/invitations'))).toBe(false);
  });
});

describe('addresses that explain', () => {
  it('say what a problem means, what was kept and what to do', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/problems/submission-stale');
    await heading('The registry changed since this preview was made');
    expect(screen.getByRole('heading', { name: 'What was kept' })).toBeTruthy();
    expect(screen.getByRole('heading', { name: 'What to do' })).toBeTruthy();
  });

  it('list the known problems for a name nobody uses', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/problems/toString');
    await heading('No message has this name');
    expect(screen.getByRole('link', { name: 'Sign in first' }).getAttribute('href')).toBe('/problems/not-signed-in');
  });

  it('list the addresses a program can use', async () => {
    fakeApi({
      ...publicAnswers,
      'GET /api/openapi.json': {
        openapi: '3.1.0',
        paths: {
          '/api/account': { get: { summary: 'Who is signed in', security: [] }, parameters: [] },
          '/api/sites': { get: { summary: 'The sites', security: [{ session: [] }, { siteSystem: ['submissions'] }] } },
        },
      },
    });
    renderRoutes(routes, '/developers');
    expect(await screen.findByRole('row', { name: 'Who is signed in anyone GET /api/account' })).toBeTruthy();
    expect(screen.getByRole('row', { name: 'The sites people, sites’ systems GET /api/sites' })).toBeTruthy();
    expect(screen.getByLabelText('Script that submits a month').textContent).toContain('grant_type=client_credentials');
  });

  it('say that there is nothing at an unknown address', async () => {
    fakeApi(publicAnswers);
    renderRoutes(routes, '/nowhere');
    await heading('There is nothing at this address');
  });
});

describe('a page that fails', () => {
  it('says so within the frame', async () => {
    fakeApi(publicAnswers);
    const failing = () => {
      throw new Error('a fault');
    };
    const silenced = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    const [frame] = routes;
    const children = [{ path: '/', element: <Failing act={failing} />, errorElement: frame?.errorElement }];
    renderRoutes([{ element: frame?.element, children }], '/');
    await heading('This page could not be shown');
    expect(screen.getByRole('navigation', { name: 'Pages' })).toBeTruthy();
    silenced.mockRestore();
  });
});

function Failing({ act }: { readonly act: () => void }) {
  act();
  return null;
}
