import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { Announcer } from './announcer.tsx';
import { Table } from './table.tsx';
import type { Column } from './table.tsx';

interface Row {
  readonly name: string;
  readonly speed: number | null;
}

const rows: readonly Row[] = [
  { name: 'site 10', speed: 0.5 },
  { name: 'site 2', speed: null },
  { name: 'site 1', speed: -1.25 },
];
const columns: readonly Column<Row>[] = [
  { key: 'name', header: 'Site', value: ({ name }) => name, isRowHeader: true },
  { key: 'speed', header: 'Gait speed', unit: 'm/s', value: ({ speed }) => speed, kind: 'number', decimals: 2 },
  { key: 'next', header: 'Next', value: () => null, cell: ({ name }) => <a href={`#${name}`}>Open</a>, isAct: true },
];

function show(address = '/', shown = rows) {
  return renderPart(
    <>
      <Table
        id="sites"
        caption="Gait speed by site"
        columns={columns}
        rows={shown}
        rowKey={({ name }) => name}
        empty="No site has sent a month yet."
        fileName="sites"
      />
      <Announcer />
    </>,
    address,
  );
}

const order = () => screen.getAllByRole('rowheader').map(({ textContent }) => textContent);

describe('a table', () => {
  it('names itself, its columns with their unit, and its rows', () => {
    show();
    const table = screen.getByRole('table', { name: 'Gait speed by site' });
    expect(within(table).getByRole('columnheader', { name: /^Gait speed ?, m\/s$/ })).toBeTruthy();
    expect(within(table).getByRole('row', { name: /site 1 −1\.25/ })).toBeTruthy();
    expect(within(table).getByRole('row', { name: /site 2 none/ })).toBeTruthy();
  });

  it('sorts numbers from the largest, then the smallest, then as they came; the unknown stay last', () => {
    const router = show();
    const header = screen.getByRole('columnheader', { name: /^Gait speed ?, m\/s$/ });
    const press = () => fireEvent.click(within(header).getByRole('button'));
    press();
    expect(order()).toEqual(['site 10', 'site 1', 'site 2']);
    expect(header.getAttribute('aria-sort')).toBe('descending');
    expect(router.state.location.search).toBe('?sort-sites=-speed');
    press();
    expect(order()).toEqual(['site 1', 'site 10', 'site 2']);
    press();
    expect(order()).toEqual(['site 10', 'site 2', 'site 1']);
    expect(router.state.location.search).toBe('');
  });

  it('opens sorted as its address says, words by their numbers', () => {
    show('/?sort-sites=name');
    expect(order()).toEqual(['site 1', 'site 2', 'site 10']);
  });

  it('does not offer to sort by what is there to be pressed', () => {
    show();
    expect(within(screen.getByRole('columnheader', { name: 'Next' })).queryByRole('button')).toBeNull();
  });

  it('shows the order it was given when the address names no column of it', () => {
    show('/?sort-sites=secret');
    expect(order()).toEqual(['site 10', 'site 2', 'site 1']);
  });

  it('copies what it shows to be read, in the order shown, and says so', async () => {
    const writeText = vi.fn((_text: string) => Promise.resolve());
    vi.stubGlobal('navigator', { ...navigator, clipboard: { writeText } });
    show('/?sort-sites=name');
    fireEvent.click(screen.getByRole('button', { name: 'Copy as text' }));
    await waitFor(() => expect(screen.getByRole('status').textContent).toBe('Copied 3 rows.'));
    expect(writeText).toHaveBeenCalledWith('Site\tGait speed, m/s\nsite 1\t-1.25\nsite 2\t\nsite 10\t0.5');
    vi.unstubAllGlobals();
  });

  it('says what to do instead of showing an empty body', () => {
    show('/', []);
    expect(screen.queryByRole('table')).toBeNull();
    expect(screen.getByText('No site has sent a month yet.')).toBeTruthy();
  });
});
