import { codebookRows, dictionary, dictionaryAsJson, measures, tableOf } from '@cairnstep/dictionary';
import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { renderRoutes } from '../../testing/render.tsx';
import { measureAddress, variableAddress } from './addresses.ts';
import DictionaryPage from './dictionary-page.tsx';
import MeasurePage from './measure-page.tsx';
import VariablePage from './variable-page.tsx';

const routes = [
  { path: '/dictionary', element: <DictionaryPage /> },
  { path: '/dictionary/measures/:key', element: <MeasurePage /> },
  { path: '/dictionary/:table/:column', element: <VariablePage /> },
];
const at = (address: string) => renderRoutes(routes, address);
const section = (name: string) => screen.getByRole('region', { name });
const title = () => document.querySelector('h1')?.textContent;
/** The column or code among the facts: read directly, because looking up roles takes too long for some 260 pages. */
const column = () => document.querySelector('#facts dd code')?.textContent;

describe('addresses', () => {
  it('lead for every variable to its own page and no other', async () => {
    const router = at('/dictionary');
    const variables = dictionary.tables.flatMap((table) => table.variables);
    expect(new Set(variables.map(variableAddress)).size).toBe(variables.length);
    for (const variable of variables) {
      await act(() => router.navigate(variableAddress(variable)));
      expect(title()).toBe(variable.name);
      expect(column()).toBe(variable.key);
      expect(document.body.textContent).toContain(variable.definition);
    }
  });

  it('lead for every measure to its own page', async () => {
    const router = at('/dictionary');
    for (const { key, name } of measures) {
      await act(() => router.navigate(measureAddress(key)));
      expect(title()).toBe(name);
      expect(column()).toBe(key);
    }
  });

  it('say so when the dictionary has no such entry', () => {
    at('/dictionary/bouts/unheard_of');
    expect(title()).toBe('The dictionary has no such entry');
    expect(screen.getByRole('link', { name: 'To the dictionary' }).getAttribute('href')).toBe('/dictionary');
  });
});

describe('the page of a variable', () => {
  it('writes limits, other units with exact factors, requirement and rules in words', () => {
    at('/dictionary/bouts/treadmill_speed_mps');
    expect(within(section('Other units')).getByText('value in km/h × 5 ÷ 18 = value in m/s')).toBeTruthy();
    const rules = within(section('Rules'));
    expect(rules.getByText('T02')).toBeTruthy();
    expect(rules.getByText(/On a treadmill, mean speed and treadmill speed differ/)).toBeTruthy();
    expect(screen.getByText(/anything else is asked about/)).toBeTruthy();
  });

  it('tells codes, codes for an absent value, and the other cells of the segment', () => {
    at('/dictionary/exams/lt_r_c5');
    expect(within(section('Codes')).getByRole('row', { name: '1 altered' })).toBeTruthy();
    expect(within(section('Codes')).getByRole('row', { name: 'NT not testable' })).toBeTruthy();
    const others = within(section('Other cells of this segment')).getAllByRole('link');
    expect(others.map((link) => link.getAttribute('href'))).toEqual(
      ['pp_r_c5', 'm_r_c5', 'lt_l_c5', 'pp_l_c5', 'm_l_c5'].map((key) => `/dictionary/exams/${key}`),
    );
  });

  it('leads from a column that a measure defines to the measures', () => {
    at('/dictionary/bouts/rpe_end');
    const links = within(section('Measures it can hold')).getAllByRole('link');
    expect(links.map((link) => link.getAttribute('href'))).toEqual(['/dictionary/measures/rpe_cr10', '/dictionary/measures/rpe_6_20']);
  });
});

describe('the page of a measure', () => {
  it('gives each threshold with population, citation and how sure the figure is', () => {
    at('/dictionary/measures/tmwt_ss');
    const thresholds = within(section('Published sizes of change'));
    expect(thresholds.getByText('0.13 m/s')).toBeTruthy();
    expect(thresholds.getByText(/Lam T, Noonan VK, Eng JJ.*from memory, to be confirmed/)).toBeTruthy();
  });

  it('says that there is none where no figure was published', () => {
    at('/dictionary/measures/bbs');
    expect(within(section('Published sizes of change')).getAllByText(/no published figure/)).toHaveLength(2);
  });
});

describe('the dictionary', () => {
  it('folds the cells of the exam by segment, and unfolds those that a search finds', async () => {
    const router = at('/dictionary');
    const fold = () => screen.getByRole('button', { name: /cells of the exam/ });
    expect(fold().getAttribute('aria-expanded')).toBe('false');
    fireEvent.click(fold());
    expect(fold().getAttribute('aria-expanded')).toBe('true');
    expect(screen.getByRole('link', { name: 'lt_r_s4_5' }).getAttribute('href')).toBe('/dictionary/exams/lt_r_s4_5');

    fireEvent.change(screen.getByRole('searchbox', { name: 'Search' }), { target: { value: 'pin prick left T4' } });
    await waitFor(() => expect(router.state.location.search).toBe('?q=pin+prick+left+T4'));
    expect(screen.getByRole('status').textContent).toBe('1 variable and 0 outcome measures');
    expect(screen.getByRole('link', { name: 'pp_l_t4' })).toBeTruthy();
    expect(fold().getAttribute('aria-expanded')).toBe('true');
  });

  it('shows one table by its address, and says what to do when nothing is found', async () => {
    const router = at('/dictionary?show=consents');
    expect(screen.getByRole('status').textContent).toBe(`${tableOf('consents').variables.length} variables and 0 outcome measures`);
    await router.navigate('/dictionary?q=unheard');
    await waitFor(() => expect(screen.getByText(/Nothing holds all of these words/)).toBeTruthy());
    fireEvent.click(screen.getByRole('button', { name: 'Clear the search' }));
    await waitFor(() => expect(router.state.location.search).toBe(''));
  });

  describe('as files', () => {
    const saved: Blob[] = [];
    beforeEach(() => {
      vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => {
        saved.push(blob as Blob);
        return 'blob:made';
      });
      vi.spyOn(URL, 'revokeObjectURL').mockImplementation(() => undefined);
    });
    afterEach(() => {
      saved.length = 0;
      vi.restoreAllMocks();
    });

    it('holds every line of the codebook in a CSV file', async () => {
      at('/dictionary');
      fireEvent.click(screen.getByRole('button', { name: 'Codebook as CSV' }));
      const lines = (await saved[0]?.text())?.split('\r\n') ?? [];
      expect(lines[0]).toBe('table,column,name,definition,type,unit,range,codes,missing,required,source,since');
      expect(lines.filter(Boolean)).toHaveLength(codebookRows().length + 1);
    });

    it('holds the whole dictionary in a JSON file', async () => {
      at('/dictionary');
      fireEvent.click(screen.getByRole('button', { name: 'Everything as JSON' }));
      expect(JSON.parse((await saved[0]?.text()) ?? '')).toEqual(JSON.parse(JSON.stringify(dictionaryAsJson())));
    });
  });
});
