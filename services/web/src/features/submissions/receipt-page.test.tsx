import { fireEvent, screen, within } from '@testing-library/react';
import { expect, it, vi } from 'vitest';
import { fakeApi, refusal } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import ReceiptPage from './receipt-page.tsx';
import { checked, coordinator, receipt, submissionId, warning } from './sample-submission.ts';

const path = `/api/submissions/${submissionId}`;

function open(answers: Readonly<Record<string, unknown>> = {}) {
  fakeApi({
    'GET /api/account': coordinator,
    [`GET ${path}/receipt`]: receipt,
    [`GET ${path}`]: checked({ status: 'accepted', findings: [warning] }),
    ...answers,
  });
  renderRoutes([{ path: '/submissions/:submissionId/receipt', element: <ReceiptPage /> }], `/submissions/${submissionId}/receipt`);
}

it('tells who had what accepted when, by table, by file and with every warning that stands', async () => {
  open();
  expect(await screen.findByRole('heading', { level: 1, name: 'Receipt of November 2026' })).toBeTruthy();
  const facts = within(screen.getByRole('region', { name: 'Accepted' }));
  expect(facts.getByText('Mara Lind')).toBeTruthy();
  expect(facts.getByText(/^1 December 2026, \d\d:\d\d \S+$/)).toBeTruthy();
  expect(facts.getByText(receipt.digest)).toBeTruthy();
  expect(screen.getByRole('row', { name: 'Sessions 1 2 88 0' })).toBeTruthy();
  expect(screen.getByRole('row', { name: `Sessions sessions.csv 90 0 ${'ab'.repeat(32)}` })).toBeTruthy();
  expect(await screen.findByRole('row', { name: `T04 ${warning.statement} 2 Short steps are right for this person.` })).toBeTruthy();
});

it('can be kept as JSON and on paper', async () => {
  const saved: Blob[] = [];
  vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => `blob:${saved.push(blob as Blob)}`);
  const print = vi.fn();
  vi.stubGlobal('print', print);
  open();
  fireEvent.click(await screen.findByRole('button', { name: 'Download as JSON' }));
  expect(JSON.parse(await (saved[0] as Blob).text())).toEqual(receipt);
  fireEvent.click(screen.getByRole('button', { name: 'Print' }));
  expect(print).toHaveBeenCalledTimes(1);
  vi.restoreAllMocks();
});

it('says so when there is none', async () => {
  open({ [`GET ${path}/receipt`]: () => refusal('not-found', 'There is nothing at this address, or it is not yours to see.') });
  expect((await screen.findByRole('alert')).textContent).toContain('not yours to see');
});
