import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, refusal, signedInAs, site } from '../../testing/fake-api.ts';
import { renderPart } from '../../testing/render.tsx';
import { SafeHeaders } from './safe-headers.tsx';
import { coordinator } from './sample-submission.ts';

const steward = signedInAs({ role: 'steward', site: null });
const path = `/api/sites/${site.id}/safe-headers`;
const mobile = { header: 'mobile', markedAt: '2026-11-20T08:00:00.000Z', markedBy: 'Ines Okafor' };
const cell = { header: 'cell', markedAt: '2026-12-01T08:00:00.000Z', markedBy: 'Ines Okafor' };

function open(account: typeof steward, answers: Readonly<Record<string, unknown>> = {}) {
  const asked = fakeApi({ [`GET ${path}`]: { headers: [mobile] }, ...answers });
  renderPart(<SafeHeaders site={site} account={account} />);
  return asked;
}
const write = async (header: string) => {
  fireEvent.change(await screen.findByRole('textbox', { name: /Header/ }), { target: { value: header } });
  fireEvent.click(screen.getByRole('button', { name: 'Mark as safe' }));
};

describe('the headers marked as safe', () => {
  it('are read by the people of the site, who are told whom to ask', async () => {
    open(coordinator);
    expect(await screen.findByRole('row', { name: /^mobile Ines Okafor 20 Nov/ })).toBeTruthy();
    expect(screen.getByText(/ask a data steward to mark it/)).toBeTruthy();
    expect(screen.queryByRole('button', { name: /^(Remove mobile|Mark as safe)$/ })).toBeNull();
  });

  it('say so while there is none', async () => {
    open(coordinator, { [`GET ${path}`]: { headers: [] } });
    expect(await screen.findByText('No header is marked for this site: all are judged.')).toBeTruthy();
  });

  it('gain one that a steward marks, after the clinic was asked', async () => {
    const asked = open(steward, { [`POST ${path}`]: { headers: [cell, mobile] } });
    expect(screen.getByText(/Ask the clinic for the header/)).toBeTruthy();
    await write('cell');
    expect(await screen.findByRole('row', { name: /^cell Ines Okafor/ })).toBeTruthy();
    expect(screen.getByText(/“cell” passes in files of North Harbour Clinic/)).toBeTruthy();
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ header: 'cell' });
  });

  it('are not asked for a mark without a header', async () => {
    const asked = open(steward);
    await write(' ');
    expect(within(await screen.findByRole('alert')).getByRole('link', { name: 'Write the header' })).toBeTruthy();
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
  });

  it('show why one was refused, and keep what was typed', async () => {
    open(steward, { [`POST ${path}`]: () => refusal('identifies-somebody', 'A header that could itself be a name cannot be marked.') });
    await write('SMITH, John');
    expect(await screen.findByText('A header that could itself be a name cannot be marked.')).toBeTruthy();
    expect(screen.getByRole('textbox', { name: /Header/ })).toHaveProperty('value', 'SMITH, John');
  });

  it('lose one once the steward has read what follows', async () => {
    const asked = open(steward, { [`DELETE ${path}`]: { headers: [] } });
    fireEvent.click(await screen.findByRole('button', { name: 'Remove mobile' }));
    const dialog = within(await screen.findByRole('alertdialog', { name: 'Have “mobile” judged again?' }));
    expect(dialog.getByText(/From the next check on/)).toBeTruthy();
    fireEvent.click(dialog.getByRole('button', { name: 'Remove the mark' }));
    expect(await screen.findByText(/No header is marked/)).toBeTruthy();
    expect(asked.find(({ method }) => method === 'DELETE')?.search).toBe('?header=mobile');
  });
});
