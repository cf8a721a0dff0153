import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, refusal, signedInAs, site } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import PeoplePage from './people-page.tsx';
import type { People } from './people.queries.ts';
import PersonPage from './person-page.tsx';

const administrator = signedInAs({ role: 'administrator', site: null });
const steward = signedInAs({ role: 'steward', site: null });
const id = (end: string) => `8c0a7d52-11aa-4a6e-9a55-0000000000${end}`;
const own = {
  id: id('01'),
  name: 'Mara Lind',
  email: null,
  institution: null,
  status: 'active' as const,
  lastSignInAt: null,
  grants: administrator.grants,
};
const nils = {
  ...own,
  id: id('02'),
  name: 'Nils Aldan',
  email: 'nils@low-fell.example',
  grants: [{ id: id('03'), role: 'coordinator' as const, site, startsOn: '2026-01-01', endsOn: null }],
};
const invitation = {
  id: id('04'),
  email: 'guest@low-fell.example',
  role: 'researcher' as const,
  site: null,
  status: 'sent' as const,
  expiresAt: '2026-12-08T10:00:00.000Z',
};
const everyone: People = { people: [own, nils], invitations: [invitation] };

function open(address: string, answers: Readonly<Record<string, unknown>> = {}, account = administrator) {
  const asked = fakeApi({ 'GET /api/account': account, 'GET /api/people': everyone, 'GET /api/sites': { sites: [site] }, ...answers });
  renderRoutes(
    [
      { path: '/people', element: <PeoplePage /> },
      { path: '/people/:personId', element: <PersonPage /> },
    ],
    address,
  );
  return () => asked.filter(({ method }) => method !== 'GET').map(({ method, path, body }) => ({ method, path, body }));
}

const write = (name: RegExp, value: string) => fireEvent.change(screen.getByRole('textbox', { name }), { target: { value } });
const press = async (name: string | RegExp) => fireEvent.click(await screen.findByRole('button', { name }));
const confirm = (name: string) => fireEvent.click(within(screen.getByRole('alertdialog')).getByRole('button', { name }));

describe('inviting someone', () => {
  it('names all that is missing and sends nothing', async () => {
    const sent = open('/people');
    await press('Send the invitation');
    expect(screen.getByRole('alert', { name: '2 things need mending' })).toBeTruthy();
    fireEvent.click(screen.getByRole('radio', { name: /^site coordinator/ }));
    write(/^E-mail/, 'guest@low-fell.example');
    write(/^Last day/, '30.6.2027');
    await press('Send the invitation');
    const missing = within(screen.getByRole('alert'))
      .getAllByRole('link')
      .map(({ textContent }) => textContent);
    expect(missing).toEqual(['Choose the site this person works at', 'Write the last day as year, month and day, such as 2027-06-30']);
    expect(sent()).toEqual([]);
  });

  it('sends address, role and last day, says so and lists the invitation', async () => {
    const added = { ...invitation, id: id('05'), email: 'new@low-fell.example', accountsWithAddress: [] };
    const sent = open('/people', { 'POST /api/invitations': added });
    fireEvent.click(await screen.findByRole('radio', { name: /^researcher/ }));
    write(/^E-mail/, ' new@low-fell.example ');
    write(/^Last day/, '2099-06-30');
    await press('Send the invitation');
    expect(await screen.findByText(/An invitation is on its way to new@low-fell\.example/)).toBeTruthy();
    const body = { email: 'new@low-fell.example', role: 'researcher', siteId: null, grantEndsOn: '2099-06-30' };
    expect(sent()).toEqual([{ method: 'POST', path: '/api/invitations', body }]);
    expect(screen.getByRole('row', { name: /^new@low-fell\.example researcher sent, not used yet/ })).toBeTruthy();
    expect(screen.getByRole('textbox', { name: /^E-mail/ }).getAttribute('value')).toBe('');
  });

  it('says whose account has the address already, before and after', async () => {
    const added = { ...invitation, id: id('06'), email: 'nils@low-fell.example', accountsWithAddress: [{ id: nils.id, name: nils.name }] };
    open('/people', { 'POST /api/invitations': added });
    fireEvent.click(await screen.findByRole('radio', { name: /^researcher/ }));
    write(/^E-mail/, 'NILS@low-fell.example');
    expect(await screen.findByText(/No invitation is needed/)).toBeTruthy();
    expect(screen.getByText(/has an account with this address/)).toBeTruthy();
    await press('Send the invitation');
    expect(await screen.findByText(/An invitation is on its way to nils@low-fell\.example/)).toBeTruthy();
    expect(
      screen
        .getByText(/has an account with this address/)
        .querySelector('a')
        ?.getAttribute('href'),
    ).toBe(`/people/${nils.id}`);
  });

  it('places what the registry refuses beside its field, and keeps what was typed', async () => {
    const errors = [{ pointer: '/body/email', detail: 'This address cannot be written to' }];
    open('/people', { 'POST /api/invitations': () => refusal('invalid-input', 'Nothing was kept.', errors) });
    fireEvent.click(await screen.findByRole('radio', { name: /^steward|data steward/ }));
    write(/^E-mail/, 'a@b.example');
    await press('Send the invitation');
    expect(await screen.findAllByText('This address cannot be written to')).toHaveLength(2);
    expect(screen.getByRole('textbox', { name: /^E-mail/ }).getAttribute('value')).toBe('a@b.example');
  });

  it('can be taken back after asking', async () => {
    const sent = open('/people', { [`DELETE /api/invitations/${invitation.id}`]: { ...invitation, status: 'revoked' } });
    await press('Take back the invitation of guest@low-fell.example');
    expect(sent()).toEqual([]);
    confirm('Take it back');
    expect(await screen.findByRole('row', { name: /^guest@low-fell\.example researcher taken back/ })).toBeTruthy();
  });
});

describe('the list of people', () => {
  it('is searched by name, site and role', async () => {
    open('/people?search=coordinator+harbour');
    expect(await screen.findByRole('table', { name: '1 of 2 accounts' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Nils Aldan' }).getAttribute('href')).toBe(`/people/${nils.id}`);
  });

  it('offers a steward nothing to change', async () => {
    open('/people', {}, steward);
    await screen.findByRole('table', { name: '2 of 2 accounts' });
    expect(screen.queryByRole('heading', { name: 'Invite someone' })).toBeNull();
    expect(screen.queryByRole('button', { name: /^Take back/ })).toBeNull();
  });
});

describe('one person', () => {
  const path = `/api/people/${nils.id}`;

  it('gets another role from today, but not one held already', async () => {
    const given = {
      ...nils,
      grants: [...nils.grants, { id: id('06'), role: 'researcher' as const, site: null, startsOn: '2026-12-01', endsOn: null }],
    };
    const sent = open(`/people/${nils.id}`, { [`POST ${path}/grants`]: given });
    await press('Give the role from today');
    expect(screen.getByRole('alert').textContent).toContain('Choose a role');
    fireEvent.click(screen.getByRole('radio', { name: /^researcher/ }));
    await press('Give the role from today');
    await waitFor(() => expect(within(screen.getByRole('list', { name: 'Roles' })).getAllByRole('listitem')).toHaveLength(2));
    expect(sent()[0]?.body).toEqual({ role: 'researcher', siteId: null, startsOn: new Date().toISOString().slice(0, 10), endsOn: null });
    fireEvent.click(screen.getByRole('radio', { name: /^researcher/ }));
    await press('Give the role from today');
    expect(screen.getByRole('alert').textContent).toContain('The person has this role already');
    expect(sent()).toHaveLength(1);
  });

  it('loses a role after asking, which names what is left', async () => {
    const sent = open(`/people/${nils.id}`, { [`POST ${path}/grants/${id('03')}/end`]: { ...nils, grants: [] } });
    await press(/^End the role site coordinator/);
    expect(screen.getByRole('alertdialog').textContent).toContain('It is the person’s only role');
    confirm('End the role');
    expect(await screen.findByText(/No role\. The person can sign in/)).toBeTruthy();
    expect(sent()).toHaveLength(1);
  });

  it('is disabled and enabled again after asking', async () => {
    const sent = open(`/people/${nils.id}`, { [`PUT ${path}/status`]: { ...nils, status: 'disabled' } });
    await press('Disable the account');
    confirm('Disable the account');
    expect(await screen.findByText('The account is disabled.')).toBeTruthy();
    expect(sent()[0]?.body).toEqual({ status: 'disabled' });
    expect(screen.getByRole('button', { name: 'Enable the account again' })).toBeTruthy();
  });

  it('who is oneself cannot be changed, and the page says so', async () => {
    open(`/people/${own.id}`);
    expect(await screen.findByText(/Nobody can change their own roles or account/)).toBeTruthy();
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('who is not there is told of in words', async () => {
    open(`/people/${id('99')}`);
    expect(await screen.findByText('Nobody has this address.')).toBeTruthy();
  });
});
