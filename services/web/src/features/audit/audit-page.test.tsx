import { fireEvent, screen } from '@testing-library/react';
import { expect, it } from 'vitest';
import { fakeApi, signedInAs, site } from '../../testing/fake-api.ts';
import { renderPart } from '../../testing/render.tsx';
import AuditPage from './audit-page.tsx';

const entry = { at: '2026-12-01T09:00:00.000Z', actor: 'Mara Lind', role: 'coordinator', object: 'S01', result: 'ok' };
const entries = [
  { ...entry, seq: 1_204, act: 'submission.commit' },
  { ...entry, seq: 1_203, act: 'unheard.of', role: 'administrator steward', result: 'refused' },
  { ...entry, seq: 1_202, act: 'sign-in', actor: 'system', role: 'system', object: null },
  { ...entry, seq: 1_201, act: 'submission.open', actor: 'Training records', role: 'site-system' },
];
const steward = signedInAs({ role: 'steward', site: null });

function open(account: unknown, verdict?: object) {
  const asked = fakeApi({
    'GET /api/account': account,
    'GET /api/audit': { items: entries, page: 1, pageSize: 50, total: 120 },
    ...(verdict !== undefined && { 'POST /api/audit/verification': verdict }),
  });
  renderPart(<AuditPage />, '/audit?page=1');
  return asked;
}

it('tells who did what, newest first, in words where they are known', async () => {
  open(steward);
  expect(await screen.findByRole('row', { name: /^1\u202F204 .* Mara Lind site coordinator submission committed S01 done$/ })).toBeTruthy();
  expect(screen.getByRole('row', { name: /administrator, data steward|data steward, administrator/ }).textContent).toContain('unheard.of');
  expect(screen.getByRole('row', { name: /the registry itself none signed in nothing named done$/ })).toBeTruthy();
  expect(screen.getByRole('row', { name: /Training records system of a site submission opened S01 done$/ })).toBeTruthy();
  expect(screen.getByRole('link', { name: 'Next page' }).getAttribute('href')).toBe('/audit?page=2#entries');
});

it('gives a steward the verdict that the log holds', async () => {
  open(steward, { entries: 1_204, holds: true, firstBrokenSeq: null, head: 'ab'.repeat(32) });
  fireEvent.click(await screen.findByRole('button', { name: 'Verify the log' }));
  expect(await screen.findByText(/The log holds: all 1\s204 entries fit\./)).toBeTruthy();
  expect(screen.getByText('ab'.repeat(32))).toBeTruthy();
});

it('gives a steward the verdict that it does not, and what to do', async () => {
  open(steward, { entries: 1_204, holds: false, firstBrokenSeq: 17, head: null });
  fireEvent.click(await screen.findByRole('button', { name: 'Verify the log' }));
  expect(await screen.findByText(/The log does not hold: entry 17 was changed/)).toBeTruthy();
  expect(screen.getByText(/Stop, keep the database as it is/)).toBeTruthy();
});

it('shows others their own acts, without the verification', async () => {
  open(signedInAs({ role: 'coordinator', site }));
  expect(await screen.findByText('Your own acts in the registry.')).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Verify the log' })).toBeNull();
});
