/** The page against canned answers: what is hidden stays hidden, and the address holds what is chosen. */
import type { Account, Grid } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import * as files from '../../lib/save-file.ts';
import { exampleGrid, knownOutcomes } from '../../testing/example-grid.ts';
import { fakeApi, refusal, signedInAs, site } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import ExplorePage from './explore-page.tsx';

const researcher = signedInAs({ role: 'researcher', site: null });

function open(address = '/explore', { account = researcher, grid = exampleGrid as unknown }: { account?: Account; grid?: unknown } = {}) {
  const asked = fakeApi({ 'GET /api/account': account, 'GET /api/explore/outcomes': knownOutcomes, 'GET /api/explore/grid': grid });
  const router = renderRoutes([{ path: '*', element: <ExplorePage /> }], address);
  return { asked, router };
}

const gridShown = () => screen.findByRole('grid');
/** A cell by its row and grade, as the browser would find it. */
async function cellAt(row: string, grade: string): Promise<HTMLElement> {
  const grid = await gridShown();
  const heads = within(grid).getAllByRole('columnheader');
  const at = heads.findIndex((head) => head.textContent?.startsWith(`AIS ${grade}`));
  const line = within(grid).getByRole('rowheader', { name: row }).closest('tr');
  const cell = line === null ? undefined : within(line).getAllByRole('gridcell')[at];
  if (cell === undefined) throw new Error(`There is no cell ${row}, ${grade}`);
  return cell;
}
const search = ({ router }: ReturnType<typeof open>) => new URLSearchParams(router.state.location.search);

describe('hidden cells', () => {
  it('show one mark and nothing else: no number, no mark of an interval, no attribute', async () => {
    open();
    const cell = await cellAt('T1–T9', 'D');
    expect(cell.textContent).toBe('AIS DDnot shown');
    expect(cell.querySelectorAll('circle, line')).toHaveLength(0);
    expect(
      cell.outerHTML.replace(/class="[^"]*"|data-place="[^"]*"|<path[^>]*>|(width|height|viewBox|stroke-width|tabindex)="[^"]*"/g, ''),
    ).not.toMatch(/\d/);
  });

  it('look the same whatever else they would be, and unlike empty ones', async () => {
    open();
    const [first, second] = [await cellAt('T1–T9', 'B'), await cellAt('T1–T9', 'D')];
    const look = (cell: HTMLElement) => cell.querySelector('.hidden-mark')?.outerHTML;
    expect(look(first)).toBe(look(second));
    expect((await cellAt('C5–C8', 'A')).textContent).toContain('none');
  });

  it('stay hidden in the plain table, at the end however it is sorted', async () => {
    open('/explore?view=table');
    const table = await screen.findByRole('table');
    for (const direction of ['descending', 'ascending']) {
      fireEvent.click(within(table).getByRole('button', { name: /People/ }));
      await waitFor(() => expect(table.querySelector(`[aria-sort=${direction}]`)).toBeTruthy());
      const states = within(table)
        .getAllByRole('row')
        .slice(1)
        .map((row) => row.lastElementChild?.textContent);
      const firstHidden = states.indexOf('not shown');
      expect(firstHidden).toBeGreaterThan(0);
      expect(states.slice(firstHidden).every((state) => state === 'not shown')).toBe(true);
    }
  });

  it('are empty cells of the file, which says that they are not shown', async () => {
    const save = vi.spyOn(files, 'saveFile').mockImplementation(() => undefined);
    open();
    await gridShown();
    fireEvent.click(screen.getByRole('button', { name: 'Download CSV' }));
    const [name, text] = save.mock.calls[0] ?? [];
    expect(name).toBe('cairnstep-release-3-tmwt_ss-without-device-change.csv');
    const lines = String(text).split('\r\n');
    expect(lines[0]).toBe('Level,AIS grade,People,"Mean change, m/s","SD, m/s","95% from, m/s","95% to, m/s",State');
    expect(lines).toContain('T1–T9,D,,,,,,not shown');
    expect(lines).toContain('C5–C8,A,0,,,,,nobody');
    expect(lines.find((line) => line.startsWith('C5–C8,D,'))).toMatch(/^C5–C8,D,51,0\.13,0\.1,.*,shown$/);
    expect(lines.filter((line) => line.endsWith('not shown')).every((line) => /,{6}not shown$/.test(line))).toBe(true);
    save.mockRestore();
  });

  it('are not counted among those left out or at a level', async () => {
    open();
    await gridShown();
    expect(screen.getByText(/who tried and were unable/).textContent).toContain('not shown who tried and were unable');
    expect(screen.getByRole('option', { name: /^T4/ }).textContent).toBe('T4not shown');
  });
});

describe('the cohort', () => {
  it('is in the address: a click chooses, a second gives up', async () => {
    const page = open();
    fireEvent.click(await cellAt('C5–C8', 'D'));
    await waitFor(() => expect(search(page).get('cells')).toBe('c5_c8.D'));
    expect((await cellAt('C5–C8', 'D')).getAttribute('aria-selected')).toBe('true');
    fireEvent.click(await cellAt('T1–T9', 'C'));
    await waitFor(() => expect(search(page).get('cells')).toBe('c5_c8.D-t1_t9.C'));
    expect(screen.getByText('68 of 112 people with both values')).toBeTruthy();
    fireEvent.click(await cellAt('C5–C8', 'D'));
    await waitFor(() => expect(search(page).get('cells')).toBe('t1_t9.C'));
    fireEvent.click(screen.getByRole('button', { name: 'Clear' }));
    await waitFor(() => expect(search(page).has('cells')).toBe(false));
  });

  it('is read from the address, so that a mailed link shows the same', async () => {
    open('/explore?cells=c5_c8.C.D');
    expect((await cellAt('C5–C8', 'C')).getAttribute('aria-selected')).toBe('true');
    expect((await cellAt('T1–T9', 'C')).getAttribute('aria-selected')).toBe('false');
    expect(screen.getByText('C5–C8: AIS C and D')).toBeTruthy();
    expect(screen.getAllByRole('option', { selected: true }).map((option) => option.dataset['segment'])).toEqual(['C5', 'C6', 'C7', 'C8']);
  });

  it('is chosen by the keyboard alone, quick presses building on each other', async () => {
    const page = open();
    const first = await cellAt('C1–C4', 'A');
    expect(first.tabIndex).toBe(0);
    first.focus();
    fireEvent.keyDown(first, { key: 'ArrowDown' });
    fireEvent.keyDown(document.activeElement ?? first, { key: 'End' });
    fireEvent.keyDown(document.activeElement ?? first, { key: 'ArrowLeft' });
    fireEvent.keyDown(document.activeElement ?? first, { key: 'ArrowLeft' });
    expect(document.activeElement).toBe(await cellAt('C5–C8', 'D'));
    fireEvent.keyDown(document.activeElement ?? first, { key: ' ' });
    fireEvent.keyDown(document.activeElement ?? first, { key: 'ArrowDown', shiftKey: true });
    await waitFor(() => expect(search(page).get('cells')).toBe('c5_c8.D-t1_t9.D'));
    fireEvent.keyDown(document.activeElement ?? first, { key: 'Escape' });
    await waitFor(() => expect(search(page).has('cells')).toBe(false));
  });

  it('takes a whole row, a whole grade, or the level groups of a range', async () => {
    const page = open();
    const grid = await gridShown();
    fireEvent.click(within(grid).getByRole('rowheader', { name: 'C5–C8' }));
    await waitFor(() => expect(search(page).get('cells')).toBe('c5_c8.A.B.C.D.E.ND'));
    fireEvent.click(within(grid).getByRole('rowheader', { name: 'C5–C8' }));
    fireEvent.click(within(grid).getByRole('columnheader', { name: /^AIS D/ }));
    await waitFor(() => expect(search(page).get('cells')).toMatch(/^c1_c4\.D-.*-ND\.D$/));
    fireEvent.click(screen.getByRole('option', { name: /^T4/ }));
    await waitFor(() => expect(search(page).get('cells')).toBe('t1_t9.D'));
  });

  it('is what a request begins with, for those who may write one', async () => {
    open('/explore?cells=c5_c8.D');
    await gridShown();
    expect(screen.getByRole('link', { name: 'Request these rows' }).getAttribute('href')).toBe(
      '/requests/new?outcome=tmwt_ss&cells=c5_c8.D',
    );
  });

  it('goes back to the draft it is chosen for', async () => {
    open('/explore?cells=c5_c8.D&draft=6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a77');
    await gridShown();
    expect(screen.getByRole('link', { name: 'Take these for the draft' }).getAttribute('href')).toBe(
      '/requests/6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a77?outcome=tmwt_ss&cells=c5_c8.D',
    );
  });

  it('cannot be requested by others', async () => {
    open('/explore', { account: signedInAs({ role: 'steward', site: null }) });
    await gridShown();
    expect(screen.queryByRole('link', { name: 'Request these rows' })).toBeNull();
  });
});

describe('what is asked', () => {
  it('asks once for a release and does not ask again for what it has', async () => {
    const page = open('/explore?release=3');
    await gridShown();
    fireEvent.click(screen.getByRole('radio', { name: 'Value at baseline' }));
    await waitFor(() => expect(search(page).get('statistic')).toBe('baseline'));
    fireEvent.click(screen.getByRole('radio', { name: 'Change over the course' }));
    await waitFor(() => expect(search(page).has('statistic')).toBe(false));
    const grids = page.asked.filter(({ path }) => path === '/api/explore/grid').map(({ search: query }) => query);
    await waitFor(() => expect(grids).toHaveLength(2));
    expect(grids[0]).toBe('?outcome=tmwt_ss&inDevice=no&statistic=change&release=3');
  });

  it('lets site people switch to their own figures, and passes over a site that is not theirs', async () => {
    const own: Grid = { ...exampleGrid, release: null, site };
    const page = open(`/explore?site=6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a99`, {
      account: signedInAs({ role: 'therapist', site }),
      grid: own,
    });
    await gridShown();
    expect(page.asked.some(({ search: query }) => query.includes('siteId'))).toBe(false);
    fireEvent.click(screen.getByRole('radio', { name: /My site: North Harbour Clinic/ }));
    await waitFor(() => expect(page.asked.some(({ search: query }) => query.includes(`siteId=${site.id}`))).toBe(true));
    expect(await screen.findByText(/exact and live: they change with every month/)).toBeTruthy();
  });

  it('says what to do when there is no release, and when the figures cannot be read', async () => {
    fakeApi({
      'GET /api/account': signedInAs({ role: 'steward', site: null }),
      'GET /api/explore/outcomes': { outcomes: [], releases: [] },
      'GET /api/explore/grid': () => refusal('not-found'),
    });
    renderRoutes([{ path: '*', element: <ExplorePage /> }], '/explore');
    expect(await screen.findByText(/No release has been made yet/)).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Make the first release' })).toBeTruthy();
  });

  it('tells an outcome that the registry does not have', async () => {
    open('/explore?outcome=nothing', { grid: () => refusal('not-found', 'The registry has no such outcome.') });
    expect(await screen.findByText('The registry has no such outcome.')).toBeTruthy();
  });
});
